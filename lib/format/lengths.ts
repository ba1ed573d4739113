import type { Preferences } from "@/lib/domain/preferences";
import { METRES } from "./factors";
import { formatFixed, withUnit } from "./numbers";

type LengthUnit = Preferences["lengthUnit"];

/** Lines, shelters: "1.6 m", "0.25 m", "5.2 ft". */
export function formatLength(metres: number, unit: LengthUnit = "m"): string {
  const decimals = unit === "m" && Math.abs(metres) < 1 ? 2 : 1;
  return withUnit(formatFixed(metres / METRES[unit], decimals), unit);
}

/** Heights above the sea, whole: "742 m", "2434 ft". */
export function formatAltitude(metres: number, unit: LengthUnit = "m"): string {
  return withUnit(formatFixed(metres / METRES[unit]), unit);
}

/** Parts of anchors: "200 mm". */
export function formatMillimetres(metres: number): string {
  return withUnit(formatFixed(metres * 1000), "mm");
}

export function lengthFromUnit(value: number, unit: LengthUnit): number {
  return value * METRES[unit];
}
