import { createHash } from "node:crypto";
import { HOURLY, readAnswer } from "./read-answer";
import sample from "./sample-weather.json";
import type { ForecastRequest, ForecastSource } from "./source";

const DAY_MS = 86_400_000;
const HOUR_MS = 3_600_000;
/** So often a service would have new values; the sample changes with it, so that a later one can be worse. */
const NEW_EVERY_MS = 6 * HOUR_MS;

const one = (value: number) => Math.round(value * 10) / 10;

function pick<Item>(items: readonly Item[], number: number): Item {
  const item = items[number % items.length];
  if (item === undefined) throw new Error("The sample is empty.");
  return item;
}

function numberOf(text: string): number {
  return createHash("sha256").update(text).digest().readUInt32BE(0);
}

function listDays(fromDay: string, toDay: string): string[] {
  const days: string[] = [];
  for (let at = Date.parse(fromDay); at <= Date.parse(toDay); at += DAY_MS) {
    days.push(new Date(at).toISOString().slice(0, 10));
  }
  return days;
}

/** Between the three-hourly values of a day, straight. */
function between(values: readonly number[], hour: number): number {
  const index = Math.floor(hour / 3);
  const from = pick(values, index);
  const to = index + 1 < values.length ? pick(values, index + 1) : from;
  return from + ((to - from) * (hour % 3)) / 3;
}

/** The sample's answer to a question, in the same shape as that of a hosted service. */
export function writeSampleAnswer({ latitude, longitude, fromDay, toDay, askedAt }: ForecastRequest): string {
  const place = `${latitude.toFixed(1)} ${longitude.toFixed(1)}`;
  const issue = Math.floor(askedAt.getTime() / NEW_EVERY_MS);
  const hourly = {
    time: [] as string[],
    wind_speed_10m: [] as number[],
    wind_gusts_10m: [] as number[],
    wind_direction_10m: [] as number[],
    precipitation: [] as number[],
    temperature_2m: [] as number[],
  };
  for (const day of listDays(fromDay, toDay)) {
    const weather = pick(sample.days, numberOf(`${place} ${day}`));
    const strength = pick(sample.strength, numberOf(place) + issue);
    for (let hour = 0; hour < 24; hour += 1) {
      const mean = strength * between(weather.meanMs, hour);
      hourly.time.push(`${day}T${String(hour).padStart(2, "0")}:00`);
      hourly.wind_speed_10m.push(one(mean));
      hourly.wind_gusts_10m.push(one(mean * weather.gustRatio));
      hourly.wind_direction_10m.push(Math.round(between(weather.fromDeg, hour)));
      hourly.precipitation.push(one(between(weather.rainMm, hour)));
      hourly.temperature_2m.push(one(between(weather.temperatureC, hour)));
    }
  }
  return JSON.stringify({ utc_offset_seconds: 0, hourly_units: HOURLY, hourly });
}

/** Stands in where no service is set: answers for any place and day, and says that it is no forecast. */
export const sampleSource: ForecastSource = {
  name: "sample data",
  isSample: true,
  async fetchHours(request) {
    return readAnswer(writeSampleAnswer(request));
  },
};
