import { dependableFromMedian } from "./constants";
import { normalDistribution } from "./statistics";
import type { Verdict } from "./types";

/**
 * The dependable value of a strength that scatters lognormally: its 5 % fractile, median·exp(−1.645 σ), in the unit of
 * `median` (≥ 0). `scatter` is σ of the logarithm, ≥ 0. Characteristic value: EN 1990:2002, 4.2(3).
 */
export function dependable(median: number, scatter: number): number {
  return dependableFromMedian(median, scatter);
}

/**
 * Chance, 0…1, that a strength with this median (N) and scatter (σ of the logarithm) is at least the demand (N):
 * Φ(ln(median/demand)/σ), the lognormal distribution function. Nothing pulling: 1. Nothing holding: 0.
 */
export function chanceHolds(medianN: number, scatter: number, demandN: number): number {
  if (demandN <= 0) return 1;
  if (medianN <= 0) return 0;
  const distance = Math.log(medianN / demandN);
  if (scatter <= 0) return distance >= 0 ? 1 : 0;
  return normalDistribution(distance / scatter);
}

/**
 * Holds: the dependable value covers the demand. Thin: only the median does. Gives way: not even that. All in N.
 * The three classes are ours (judgement); the values they compare are EN 1990's characteristic and mean.
 */
export function verdictOf(medianN: number, dependableN: number, demandN: number): Exclude<Verdict, "unknown"> {
  if (dependableN >= demandN) return "holds";
  return medianN >= demandN ? "thin" : "gives-way";
}

/** Worst first: a sure failure outranks what is not known, which outranks a thin margin. */
const WORST_FIRST: readonly Verdict[] = ["gives-way", "unknown", "thin", "holds"];

/** The verdict of a whole from those of its parts: the worst of them; "unknown" when there are none. */
export function worstVerdict(verdicts: readonly Verdict[]): Verdict {
  return WORST_FIRST.find((verdict) => verdicts.includes(verdict)) ?? "unknown";
}
