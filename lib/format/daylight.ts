import type { LegResult } from "@/lib/domain/route/views";
import { formatClock, formatHours } from "./distances";
import { withUnit } from "./numbers";

export type DaylightTone = "light" | "thin" | "dark" | "unknown";

export interface DaylightSentence {
  readonly tone: DaylightTone;
  readonly text: string;
}

/** Less light than this left when pitching begins is thin. Common practice, no source. */
const THIN_MIN = 60;

function aboutMinutes(minutes: number): string {
  if (minutes < 120) return withUnit(String(Math.max(0, Math.round(minutes))), "min");
  return formatHours(Math.floor(minutes / 5) / 12);
}

/** Arrival against the end of civil twilight: "Pitching begins 40 min before dark", "In the dark by 25 min". */
export function describeDaylight(
  leg: Pick<LegResult, "key" | "arriveMin" | "evening" | "missing">,
  pitchingMin: number | null,
): DaylightSentence {
  const { arriveMin, evening, missing } = leg;
  if (arriveMin === null) return { tone: "unknown", text: `No arrival yet: ${missing.join(", ")} missing.` };
  if (!evening) return { tone: "unknown", text: "Light not known: the camp has no position." };
  if (evening.light === "light-all-night" || evening.light === "sun-all-day") {
    return { tone: "light", text: "Light all night." };
  }
  if (evening.light === "dark-all-day" || evening.duskMin === null) {
    return { tone: "dark", text: "No daylight on this day." };
  }
  const before = Math.floor(evening.duskMin - arriveMin);
  if (before < 0) return { tone: "dark", text: `In the dark by ${aboutMinutes(-before)}.` };
  if (leg.key === "home")
    return { tone: before < THIN_MIN ? "thin" : "light", text: `Home ${aboutMinutes(before)} before dark.` };
  const text = `Pitching begins ${aboutMinutes(before)} before dark`;
  if (pitchingMin === null) return { tone: before < THIN_MIN ? "thin" : "light", text: `${text}.` };
  const left = Math.floor(before - pitchingMin);
  if (left < 0) return { tone: "dark", text: `${text}, and ends ${aboutMinutes(-left)} after it.` };
  return { tone: left < THIN_MIN / 2 ? "thin" : "light", text: `${text}, and ends ${aboutMinutes(left)} before it.` };
}

/** "Sunset 21:04, dark 21:52." */
export function describeEvening(evening: LegResult["evening"]): string {
  if (!evening) return "";
  if (evening.light === "sun-all-day") return "The sun does not set.";
  if (evening.light === "dark-all-day") return "It does not get light.";
  const sunset = evening.sunsetMin === null ? "The sun does not rise" : `Sunset ${formatClock(evening.sunsetMin)}`;
  if (evening.duskMin === null) return `${sunset}, light all night.`;
  return `${sunset}, dark ${formatClock(evening.duskMin)}.`;
}
