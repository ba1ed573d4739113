import { getMoonIllumination, getMoonPosition, getMoonTimes, getPosition, getTimes } from "suncalc";
import type { LatLon } from "@/lib/calc/places/utm";
import { addDays, instantOf } from "@/lib/format/days";

/** The sun's centre at the end of civil twilight, degrees above the horizon. */
const CIVIL_DEG = -6;
const NOON_MIN = 12 * 60;

export type Light = "usual" | "light-all-night" | "sun-all-day" | "no-sun" | "dark-all-day";

/** The sun over the local day at a place; instants as ISO text, null where the event does not happen. */
export interface SunDay {
  readonly light: Light;
  readonly dawn: string | null;
  readonly sunrise: string | null;
  readonly sunset: string | null;
  /** End of civil twilight: dark. */
  readonly dusk: string | null;
}

const iso = (date: Date | null | undefined): string | null => (date ? date.toISOString() : null);

/**
 * Sunrise, sunset and civil twilight of the local day, to about a minute on level ground: hills to the west bring the
 * dark earlier. The evening is that of the day's noon, also where it falls after midnight.
 * @param day yyyy-mm-dd in `timeZone`
 */
export function sunOn(place: LatLon, day: string, timeZone: string): SunDay {
  const noon = instantOf(day, NOON_MIN, timeZone);
  const times = getTimes(noon, place.latitude, place.longitude);
  const highestDeg = getPosition(times.solarNoon, place.latitude, place.longitude).altitude;
  return {
    light: lightOf(times, highestDeg),
    dawn: iso(times.dawn),
    sunrise: iso(times.sunrise),
    sunset: iso(times.sunset),
    dusk: iso(times.dusk),
  };
}

function lightOf(times: ReturnType<typeof getTimes>, highestDeg: number): Light {
  if (times.dusk && times.sunset) return "usual";
  if (times.dusk) return "no-sun";
  if (highestDeg <= CIVIL_DEG) return "dark-all-day";
  return times.sunset ? "light-all-night" : "sun-all-day";
}

/** The moon over the night that follows a day, from noon to noon. */
export interface MoonNight {
  /** Lit share of the disc at midnight, 0…1. */
  readonly lit: number;
  readonly isWaxing: boolean;
  readonly rise: string | null;
  readonly set: string | null;
  readonly isUpAtMidnight: boolean;
}

export function moonOn(place: LatLon, day: string, timeZone: string): MoonNight {
  const from = instantOf(day, NOON_MIN, timeZone);
  const next = addDays(day, 1);
  const to = instantOf(next, NOON_MIN, timeZone);
  const midnight = instantOf(next, 0, timeZone);
  const dayMs = 86_400_000;
  const found = [-1, 0, 1, 2].map((shift) =>
    getMoonTimes(new Date(from.getTime() + shift * dayMs), place.latitude, place.longitude),
  );
  const within = (dates: readonly (Date | undefined)[]) =>
    iso(dates.find((date) => date !== undefined && date >= from && date < to));
  const { fraction, waxing } = getMoonIllumination(midnight);
  return {
    lit: fraction,
    isWaxing: waxing,
    rise: within(found.map((one) => one.rise)),
    set: within(found.map((one) => one.set)),
    isUpAtMidnight: getMoonPosition(midnight, place.latitude, place.longitude).altitude > 0,
  };
}
