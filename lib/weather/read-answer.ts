import { z } from "zod";
import { ForecastTrouble, type ForecastHour } from "./source";

/** What is asked for, hour by hour, and the unit in which it has to come. */
export const HOURLY = {
  wind_speed_10m: "m/s",
  wind_gusts_10m: "m/s",
  wind_direction_10m: "°",
  precipitation: "mm",
  temperature_2m: "°C",
} as const;

/** A month of hours; no answer to a question of ours has more. */
const MAX_HOURS = 24 * 31;

const series = z.array(z.number().nullable()).max(MAX_HOURS);
const answerSchema = z.object({
  utc_offset_seconds: z.literal(0),
  hourly_units: z.object({
    wind_speed_10m: z.string().max(20),
    wind_gusts_10m: z.string().max(20),
    wind_direction_10m: z.string().max(20),
    precipitation: z.string().max(20),
    temperature_2m: z.string().max(20),
  }),
  hourly: z.object({
    time: z.array(z.string().regex(/^\d{4}-\d\d-\d\dT\d\d:\d\d$/)).max(MAX_HOURS),
    wind_speed_10m: series,
    wind_gusts_10m: series,
    wind_direction_10m: series,
    precipitation: series,
    temperature_2m: series,
  }),
});

/**
 * What the air can do near the ground, with room: strongest gust measured 113 m/s (WMO, Barrow Island 1996), but a plan
 * takes none above 90; coldest and warmest −89 and 57 °C, of which a plan takes −60 … 50; most rain in an hour 305 mm
 * (WMO records, from memory). Outside is an error of the service, not weather.
 */
const LIMITS: Readonly<Record<keyof typeof HOURLY, readonly [number, number]>> = {
  wind_speed_10m: [0, 60],
  wind_gusts_10m: [0, 90],
  wind_direction_10m: [0, 360],
  precipitation: [0, 305],
  temperature_2m: [-60, 50],
};

/** Gusts well below the mean wind are in another unit than they say. Judgement. */
const LEAST_GUST_RATIO = 0.5;

type Answer = z.infer<typeof answerSchema>;

function parse(text: string): Answer {
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch {
    throw new ForecastTrouble("malformed", "not JSON");
  }
  const parsed = answerSchema.safeParse(json);
  if (parsed.success) return parsed.data;
  const [issue] = parsed.error.issues;
  throw new ForecastTrouble(
    "malformed",
    `${issue?.path.join(".") ?? ""}: ${issue?.message ?? "unlike what was asked"}`,
  );
}

function requireUnits({ hourly_units: units }: Answer): void {
  for (const [name, unit] of Object.entries(HOURLY)) {
    const given = units[name as keyof typeof HOURLY];
    if (given !== unit) throw new ForecastTrouble("malformed", `${name} in "${given}" instead of ${unit}`);
  }
}

function requireEqualLengths({ hourly }: Answer): void {
  for (const [name, values] of Object.entries(hourly)) {
    if (values.length !== hourly.time.length) {
      throw new ForecastTrouble("malformed", `${values.length} of ${name} for ${hourly.time.length} hours`);
    }
  }
}

function requireTrue({ hourly }: Answer): void {
  for (const [name, [least, most]] of Object.entries(LIMITS)) {
    const wrong = hourly[name as keyof typeof HOURLY].find(
      (value) => value !== null && (value < least || value > most),
    );
    if (wrong !== undefined) throw new ForecastTrouble("absurd", `${name} of ${wrong}`);
  }
  hourly.wind_gusts_10m.forEach((gust, index) => {
    const mean = hourly.wind_speed_10m[index] ?? null;
    if (gust !== null && mean !== null && mean > 2 && gust < LEAST_GUST_RATIO * mean) {
      throw new ForecastTrouble("absurd", `gust of ${gust} in a mean wind of ${mean}`);
    }
  });
}

/**
 * The hours in an answer: JSON with one list per quantity under `hourly` beside `time` (UTC, yyyy-mm-ddThh:mm), and
 * their units under `hourly_units`. All of it is looked at before any of it is used.
 *
 * @throws ForecastTrouble "malformed" (not JSON, another shape, other units, lists of different length, times that
 * don't go up) or "absurd" (values that the air can't have)
 */
export function readAnswer(text: string): readonly ForecastHour[] {
  const answer = parse(text);
  requireUnits(answer);
  requireEqualLengths(answer);
  requireTrue(answer);
  const { hourly } = answer;
  let before = -Infinity;
  return hourly.time.map((time, index) => {
    const atMs = Date.parse(`${time}:00Z`);
    if (!Number.isFinite(atMs) || atMs <= before) throw new ForecastTrouble("malformed", `time ${time} out of order`);
    before = atMs;
    return {
      atMs,
      meanMs: hourly.wind_speed_10m[index] ?? null,
      gustMs: hourly.wind_gusts_10m[index] ?? null,
      fromDeg: hourly.wind_direction_10m[index] ?? null,
      rainMm: hourly.precipitation[index] ?? null,
      temperatureC: hourly.temperature_2m[index] ?? null,
    };
  });
}
