import { z } from "zod";
import { idSchema } from "../ids";

/** What a forecast says of one night at one place, worked out from its hours. Null: the forecast does not say. */
export interface NightForecast {
  /** Calendar day of the evening, yyyy-mm-dd, in the trip's time zone. */
  readonly day: string;
  /** Strongest 3-second gust at 10 m, m/s. */
  readonly gustMs: number | null;
  /** Strongest hourly mean at 10 m, m/s. */
  readonly meanMs: number | null;
  /** Wind from, degrees clockwise from north, in the hour of the strongest wind. */
  readonly fromDeg: number | null;
  /** Range of the hours with at least half of the strongest mean, clockwise from `rangeFromDeg` to `rangeToDeg`. */
  readonly rangeFromDeg: number | null;
  readonly rangeToDeg: number | null;
  /** All rain of the night, mm. */
  readonly rainMm: number | null;
  /** Coldest hour, °C. */
  readonly temperatureC: number | null;
  /** Coldest wind chill of an hour to which the formula applies, °C. */
  readonly windChillC: number | null;
}

/** A forecast as it was fetched, for all nights of a camp. */
export interface ForecastContent {
  readonly source: string;
  /** Invented by the sample source, for demonstration: not a forecast. */
  readonly isSample: boolean;
  /** ISO instant. */
  readonly fetchedAt: string;
  readonly nights: readonly NightForecast[];
}

export const forecastFetchInput = z.object({ tripId: idSchema, campId: idSchema });
/** `version` is the camp's, as it was when its verdict under the forecast was shown. */
export const forecastAcceptInput = z.object({
  tripId: idSchema,
  campId: idSchema,
  forecastId: idSchema,
  version: z.number().int().min(1),
});
