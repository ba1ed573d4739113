import { TZDate } from "@date-fns/tz";
import { smallestArc, windChillC } from "@/lib/calc/weather";
import type { NightForecast } from "@/lib/domain/forecast/schema";
import { addDays } from "@/lib/format/days";
import type { ForecastHour } from "./source";

/** While shelters stand: from four in the afternoon to ten in the morning, by the trip's clock. */
export const NIGHT_FROM_HOUR = 16;
export const NIGHT_TO_HOUR = 10;
const HOUR_MS = 3_600_000;
/** Hours with at least this share of the night's strongest mean say from where the wind to plan for may come. */
const STRONG_SHARE = 0.5;

function instantOf(day: string, hour: number, timeZone: string): number {
  const [year = 0, month = 1, date = 1] = day.split("-").map(Number);
  return new TZDate(year, month - 1, date, hour, 0, 0, 0, timeZone).getTime();
}

/** First and last instant of a night, ms. */
export function nightWindow(day: string, timeZone: string): { readonly fromMs: number; readonly toMs: number } {
  return {
    fromMs: instantOf(day, NIGHT_FROM_HOUR, timeZone),
    toMs: instantOf(addDays(day, 1), NIGHT_TO_HOUR, timeZone),
  };
}

type Quantity = Exclude<keyof ForecastHour, "atMs">;

/** The values of a quantity when every hour has one, else null: a worst of half a night is no worst. */
function wholeNight(hours: readonly ForecastHour[], quantity: Quantity): readonly number[] | null {
  const values = hours.flatMap((hour) => hour[quantity] ?? []);
  return values.length === hours.length && values.length > 0 ? values : null;
}

const most = (values: readonly number[] | null) => values && Math.max(...values);
const least = (values: readonly number[] | null) => values && Math.min(...values);

function listStrongHours(hours: readonly ForecastHour[], strongestMs: number): readonly ForecastHour[] {
  return hours.filter((hour) => (hour.meanMs ?? 0) >= STRONG_SHARE * strongestMs);
}

function summarise(day: string, hours: readonly ForecastHour[]): NightForecast {
  const means = wholeNight(hours, "meanMs");
  const gusts = wholeNight(hours, "gustMs");
  const meanMs = most(means);
  // A gust is the strongest of its hour, so it is at least the mean; models that mix the two can say otherwise.
  const gustMs = gusts && Math.max(...gusts, meanMs ?? 0);
  const strength = (hour: ForecastHour) => hour.gustMs ?? hour.meanMs ?? 0;
  const [strongest] = [...hours].sort((a, b) => strength(b) - strength(a));
  const strong = meanMs === null ? [] : listStrongHours(hours, meanMs);
  const directions = wholeNight(strong, "fromDeg");
  const range = directions && smallestArc(directions);
  const chills = hours.flatMap(({ temperatureC, meanMs: mean }) =>
    temperatureC === null || mean === null ? [] : (windChillC(temperatureC, mean) ?? []),
  );
  const temperatures = wholeNight(hours, "temperatureC");
  const rain = wholeNight(hours.slice(1), "rainMm");
  return {
    day,
    gustMs,
    meanMs,
    fromDeg: strongest?.fromDeg ?? null,
    rangeFromDeg: range?.fromDeg ?? null,
    rangeToDeg: range?.toDeg ?? null,
    rainMm: rain && rain.reduce((sum, one) => sum + one, 0),
    temperatureC: least(temperatures),
    windChillC: means && temperatures && chills.length > 0 ? Math.min(...chills) : null,
  };
}

/** Each night's worst; a night of which hours are missing in the answer says nothing of what they lack. */
export function summariseNights(
  hours: readonly ForecastHour[],
  days: readonly string[],
  timeZone: string,
): NightForecast[] {
  return days.map((day) => {
    const { fromMs, toMs } = nightWindow(day, timeZone);
    const own = hours.filter((hour) => hour.atMs >= fromMs && hour.atMs <= toMs);
    // Time zones at half hours have one full hour fewer inside.
    const wanted = Math.floor(toMs / HOUR_MS) - Math.ceil(fromMs / HOUR_MS) + 1;
    return summarise(day, own.length === wanted ? own : []);
  });
}
