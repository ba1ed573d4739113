import type { Preferences } from "@/lib/domain/preferences";
import { METRES } from "@/lib/format/factors";

/** Metres as text for a field in the person's own unit; empty when nobody has said. */
export function lengthInUnit(metres: number | null, unit: Preferences["lengthUnit"], decimals = 1): string {
  if (metres === null) return "";
  const factor = 10 ** decimals;
  return String(Math.round((metres / METRES[unit]) * factor) / factor);
}
