import type { Preferences } from "@/lib/domain/preferences";
import { NEWTONS } from "./factors";
import { formatSignificant, withUnit } from "./numbers";

type ForceUnit = Preferences["forceUnit"];

/** Two significant figures: 238 N → "240 N". */
export function formatForce(newtons: number, unit: ForceUnit = "N"): string {
  return withUnit(formatForceNumber(newtons, unit), unit);
}

/** Without the unit, for a column whose heading names it. */
export function formatForceNumber(newtons: number, unit: ForceUnit = "N"): string {
  return formatSignificant(newtons / NEWTONS[unit]);
}

export function forceFromUnit(value: number, unit: ForceUnit): number {
  return value * NEWTONS[unit];
}
