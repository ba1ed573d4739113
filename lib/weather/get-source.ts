import "server-only";
import { env } from "@/lib/env";
import { httpSource } from "./http-source";
import { sampleSource } from "./sample-source";
import type { ForecastSource } from "./source";

/** The service of the environment, or the sample. */
export function getForecastSource(): ForecastSource {
  const { forecastUrl, forecastName } = env;
  if (!forecastUrl) return sampleSource;
  return httpSource({ url: forecastUrl, name: forecastName ?? new URL(forecastUrl).host });
}
