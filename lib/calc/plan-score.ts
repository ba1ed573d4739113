import { marginOf } from "./camp";
import type { PreparedCamp } from "./prepare-camp";
import { strengthOf } from "./rig-anchor";
import { spotKey } from "./tie-out-strength";
import type { Placement } from "./types";

/** A margin above this is as good as any (judgement): better anchors are then free for others. */
export const MARGIN_CAP = 3;
/** Weighted margins closer than this count as equal, so that rounding does not decide over mass and work. */
const MARGIN_STEP = 1e-6;
const inSteps = (value: number): number => Math.round(value / MARGIN_STEP) * MARGIN_STEP;

/**
 * Weighted margin: dependable ÷ (T·C), at most MARGIN_CAP. `dependableN` in N; T·C = demand × consequence, N.
 * An empty tie-out counts below any that has something, and the lower the more it matters.
 */
export function weightedMargin(dependableN: number | null, weightN: number, largestWeightN: number): number {
  if (dependableN !== null) return inSteps(Math.min(MARGIN_CAP, marginOf(dependableN, weightN)));
  return inSteps(-1 - (largestWeightN > 0 ? weightN / largestWeightN : 0));
}

/** The largest demand × consequence of a camp, N. */
export const largestWeight = (prepared: PreparedCamp): number =>
  Math.max(0, ...prepared.shelters.flatMap((shelter) => shelter.tieOuts.map((tieOut) => tieOut.weightN ?? 0)));

export interface PlanScore {
  /** Weighted margins from the worst on. */
  readonly values: readonly number[];
  /** Tenths of a gram. */
  readonly mass: number;
}

/** How good a plan is, by the measure of the proposal. */
export function scorePlan(prepared: PreparedCamp, placements: readonly Placement[]): PlanScore {
  const largest = largestWeight(prepared);
  const placementAt = new Map(placements.map((one) => [spotKey(one.pitchId, one.tieOutId), one]));
  const values: number[] = [];
  let mass = 0;
  for (const shelter of prepared.shelters) {
    for (const tieOut of shelter.tieOuts) {
      if (tieOut.weightN === null) continue;
      const placement = placementAt.get(spotKey(shelter.pitch.pitchId, tieOut.tieOut.id));
      const strength = placement ? strengthOf(prepared, shelter, tieOut, placement) : null;
      values.push(weightedMargin(strength?.dependableN ?? null, tieOut.weightN, largest));
      for (const id of placement ? [placement.anchorId, placement.tandem?.anchorId] : []) {
        mass += Math.round((prepared.anchors.get(id ?? "")?.massKg ?? 0) * 10_000);
      }
    }
  }
  return { values: values.sort((a, b) => a - b), mass };
}

/** Lexicographic in the weighted margins, worst first, then lighter. */
export function isBetter(a: PlanScore, b: PlanScore): boolean {
  for (let i = 0; i < a.values.length; i++) {
    const difference = (a.values[i] ?? 0) - (b.values[i] ?? 0);
    if (Math.abs(difference) > MARGIN_STEP / 2) return difference > 0;
  }
  return a.mass < b.mass;
}
