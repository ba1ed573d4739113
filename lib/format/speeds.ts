import type { Preferences } from "@/lib/domain/preferences";
import { METRES_PER_SECOND } from "./factors";
import { formatFixed, withUnit } from "./numbers";

type SpeedUnit = Preferences["speedUnit"];

/** Lower limits of Beaufort 1…12, m/s: WMO-No. 306 Vol. I.1, code table 1100. */
const BEAUFORT_FROM_MS = [0.3, 1.6, 3.4, 5.5, 8.0, 10.8, 13.9, 17.2, 20.8, 24.5, 28.5, 32.7] as const;

export function beaufortOf(speedMs: number): number {
  return BEAUFORT_FROM_MS.filter((limit) => speedMs >= limit).length;
}

export function formatBeaufort(speedMs: number): string {
  return `Beaufort ${beaufortOf(speedMs)}`;
}

/** 20.8 m/s → "75 km/h"; as Beaufort, the speed stands behind it: "Beaufort 9, 75 km/h". */
export function formatSpeed(speedMs: number, unit: SpeedUnit = "km/h"): string {
  if (unit === "Beaufort") return `${formatBeaufort(speedMs)}, ${formatSpeed(speedMs, "km/h")}`;
  return withUnit(formatFixed(speedMs / METRES_PER_SECOND[unit]), unit);
}

/** What a plan holds to, cut to the whole unit: never more than was found. */
export function formatHoldsTo(speedMs: number, unit: SpeedUnit = "km/h"): string {
  if (unit === "Beaufort") return `${formatBeaufort(speedMs)}, ${formatHoldsTo(speedMs, "km/h")}`;
  return withUnit(formatFixed(Math.floor(speedMs / METRES_PER_SECOND[unit] + 1e-6)), unit);
}

/** With Beaufort beside it: "75 km/h, Beaufort 9". */
export function formatSpeedWithBeaufort(speedMs: number, unit: SpeedUnit = "km/h"): string {
  if (unit === "Beaufort") return formatSpeed(speedMs, unit);
  return `${formatSpeed(speedMs, unit)}, ${formatBeaufort(speedMs)}`;
}

/** The number alone, for a heading that already names the unit. */
export function speedInUnit(speedMs: number, unit: Exclude<SpeedUnit, "Beaufort">): number {
  return speedMs / METRES_PER_SECOND[unit];
}

export function speedFromUnit(value: number, unit: Exclude<SpeedUnit, "Beaufort">): number {
  return value * METRES_PER_SECOND[unit];
}
