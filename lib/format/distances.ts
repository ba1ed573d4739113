import { METRES_PER_MILE } from "@/lib/calc/units";
import type { Preferences } from "@/lib/domain/preferences";
import { METRES } from "./factors";
import { formatFixed, withUnit } from "./numbers";

type LengthUnit = Preferences["lengthUnit"];

/** What one of the long unit is in metres, for those who measure short lengths in m or ft. */
export const LONG_UNITS = {
  m: { name: "km", metres: 1000 },
  ft: { name: "mi", metres: METRES_PER_MILE },
} as const;

/** Ways walked: "14.2 km", "8.8 mi". */
export function formatDistance(metres: number, unit: LengthUnit = "m"): string {
  const long = LONG_UNITS[unit];
  return withUnit(formatFixed(metres / long.metres, 1), long.name);
}

/** Heights gained or lost, to the ten: "480 m", "1570 ft". Heights of a file are not better than that. */
export function formatClimb(metres: number, unit: LengthUnit = "m"): string {
  return withUnit(formatFixed(Math.round(metres / METRES[unit] / 10) * 10), unit);
}

/** "5 h 10 min", "40 min"; to five minutes, rounded up: a walk is never said to be shorter than it was worked out. */
export function formatHours(hours: number): string {
  const minutes = Math.ceil((hours * 60) / 5 - 1e-6) * 5;
  const whole = Math.floor(minutes / 60);
  const rest = minutes % 60;
  if (whole === 0) return withUnit(String(rest), "min");
  return rest === 0 ? withUnit(String(whole), "h") : `${withUnit(String(whole), "h")} ${withUnit(String(rest), "min")}`;
}

/** Minutes after midnight on a clock: "16:20", and "0:15 next day" beyond it. */
export function formatClock(minuteOfDay: number): string {
  const whole = Math.round(minuteOfDay);
  const clock = `${Math.floor((whole % 1440) / 60)}:${String(whole % 60).padStart(2, "0")}`;
  if (whole < 1440) return clock;
  return whole < 2880 ? `${clock} next day` : `${clock}, ${Math.floor(whole / 1440)} days later`;
}
