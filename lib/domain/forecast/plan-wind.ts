import { joinArcs, widenArc } from "@/lib/calc/weather";
import type { CampDetails } from "../camp/schema";
import type { ForecastContent, NightForecast } from "./schema";

/** What a forecast's direction is good to, either side, degrees: judgement. Hills turn the wind by more. */
export const DIRECTION_SPREAD_DEG = 30;

export type PlannedWind = Pick<CampDetails, "wind" | "windFromDeg" | "windToDeg" | "temperatureC">;

export type WindOfForecast =
  | { readonly isComplete: true; readonly planned: PlannedWind; readonly strongestDay: string }
  /** Nothing of it can be planned with; `reason` is for people. */
  | { readonly isComplete: false; readonly reason: string };

const isKnown = (value: number | null): value is number => value !== null;

function strongest(nights: readonly NightForecast[], quantity: "gustMs" | "meanMs") {
  const values = nights.map((night) => night[quantity]);
  if (values.length === 0 || !values.every(isKnown)) return null;
  const speedMs = Math.max(...values.filter(isKnown));
  return { speedMs, day: nights[values.indexOf(speedMs)]?.day ?? "" };
}

/** The range of all nights together, wider by what a forecast may be out; null when a night doesn't say, or all round. */
function rangeOf(nights: readonly NightForecast[]): { readonly fromDeg: number; readonly toDeg: number } | null {
  const arcs = nights.flatMap(({ rangeFromDeg, rangeToDeg }) =>
    rangeFromDeg === null || rangeToDeg === null ? [] : [{ fromDeg: rangeFromDeg, toDeg: rangeToDeg }],
  );
  const arc = arcs.length === nights.length ? joinArcs(arcs) : null;
  const wide = arc && widenArc(arc, DIRECTION_SPREAD_DEG);
  return wide && { fromDeg: Math.floor(wide.fromDeg), toDeg: Math.ceil(wide.toDeg) % 360 };
}

/**
 * What a forecast puts into a camp's plan: the strongest of its nights, from wherever it may come, in the coldest air.
 * A direction that isn't known makes it any direction; a temperature that isn't known leaves the camp's own.
 */
export function windOfForecast(
  content: Pick<ForecastContent, "nights">,
  days: readonly string[],
  current: Pick<CampDetails, "temperatureC">,
): WindOfForecast {
  const nights = days.flatMap((day) => content.nights.find((night) => night.day === day) ?? []);
  if (nights.length < days.length) {
    return { isComplete: false, reason: "This forecast is for other nights. Fetch a new one." };
  }
  const gust = strongest(nights, "gustMs");
  const strength = gust ?? strongest(nights, "meanMs");
  if (!strength) return { isComplete: false, reason: "This forecast does not reach over all nights here yet." };
  const range = rangeOf(nights);
  const temperatures = nights.map((night) => night.temperatureC);
  const temperatureC = temperatures.every(isKnown) ? Math.min(...temperatures) : current.temperatureC;
  const { speedMs, day } = strength;
  return {
    isComplete: true,
    strongestDay: day,
    planned: {
      wind: gust ? { kind: "gust", speedMs } : { kind: "mean", speedMs },
      windFromDeg: range?.fromDeg ?? null,
      windToDeg: range?.toDeg ?? null,
      temperatureC,
    },
  };
}

/** A form shows tenths of a unit, so saving it unchanged moves the speed by less than this, m/s. */
const SAME_SPEED_MS = 0.06;

/** Whether the camp is still planned for what a forecast said, or somebody has changed it since. */
export function isStillPlanned(planned: PlannedWind, camp: PlannedWind): boolean {
  const [said, now] = [planned.wind, camp.wind];
  if (!said || !now || said.kind === "beaufort" || now.kind !== said.kind) return false;
  const isSameRange = planned.windFromDeg === camp.windFromDeg && planned.windToDeg === camp.windToDeg;
  return isSameRange && Math.abs(said.speedMs - now.speedMs) < SAME_SPEED_MS;
}
