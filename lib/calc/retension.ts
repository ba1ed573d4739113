import { pullCyclesInNight } from "./loosening";
import type { ShelterResult } from "./types";

/** After so many strong gusts a look is worth most: early gusts loosen a stake far more than late ones. */
const FIRST_GUSTS = 10;

/**
 * When to tighten the lines in a windy night, in words; null when the hours are not said or 0.
 *
 * Loosening goes with N^−t (Long & Vanneste 1994, from memory), so half of it, by its logarithm, is done after √N of N
 * gusts: `strongWindHours` (0…24) give N, and √N of them come in hours/√N. Names what the morning finds below 1.
 */
export function retensionSentence(strongWindHours: number | null, shelters: readonly ShelterResult[]): string | null {
  if (strongWindHours === null || strongWindHours <= 0) return null;
  const gusts = pullCyclesInNight(strongWindHours);
  if (gusts < FIRST_GUSTS) return null;
  const halfwayMinutes = Math.max(1, Math.round((strongWindHours * 60) / Math.sqrt(gusts)));
  const lost = shelters.flatMap((shelter) =>
    shelter.tieOuts
      .filter((one) => one.margin !== null && one.margin >= 1 && one.morningMargin !== null && one.morningMargin < 1)
      .map((one) => ({ ...one, shelter: shelter.name })),
  );
  const advice = `Tighten the lines after the first ${FIRST_GUSTS} strong gusts and again after about ${halfwayMinutes} minutes of strong wind: half of the loosening is done by then.`;
  lost.sort((a, b) => (a.morningMargin ?? 0) - (b.morningMargin ?? 0));
  const [first] = lost;
  if (!first) return advice;
  const more = lost.length - 1;
  const others = more === 0 ? "" : more === 1 ? " and one more" : ` and ${more} more`;
  const verb = more === 0 ? "is" : "are";
  return `${advice} By morning tie-out ${first.number} of ${first.shelter}${others} ${verb} below what the gust pulls.`;
}
