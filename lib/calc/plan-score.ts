import { marginOf } from "./camp";
import { itemAt } from "./indexed";
import type { PreparedCamp } from "./prepare-camp";
import { readPlan } from "./rig-anchor";
import { Stock } from "./stock";
import type { Placement } from "./types";

/** A larger margin than this counts no more than this (judgement): better anchors are then free for others. */
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

/** Mass in whole tenths of a gram: finer than any scale in a pack, and exact to add. */
export const massUnits = (massKg: number): number => Math.round(massKg * 10_000);

export interface PlanScore {
  /** Weighted margins from the worst on. */
  readonly values: readonly number[];
  /** Tenths of a gram. */
  readonly mass: number;
}

/** How good a plan is, by the measure of the proposal. */
export function scorePlan(prepared: PreparedCamp, placements: readonly Placement[]): PlanScore {
  const largest = largestWeight(prepared);
  const values = readPlan(prepared, placements).map(({ tieOut, strength }) =>
    weightedMargin(strength && strength.dependableN, tieOut.weightN, largest),
  );
  const { tray } = prepared.input;
  const stock = new Stock(tray, placements);
  const mass = tray.reduce((sum, { id, count, massKg }) => sum + (count - stock.left(id)) * massUnits(massKg), 0);
  return { values: values.sort((a, b) => a - b), mass };
}

/** Lexicographic in the weighted margins, worst first, then lighter. Both of the same camp. */
export function isBetter(a: PlanScore, b: PlanScore): boolean {
  const differences = a.values.map((value, index) => value - itemAt(b.values, index));
  const first = differences.find((difference) => Math.abs(difference) > MARGIN_STEP / 2);
  return first === undefined ? a.mass < b.mass : first > 0;
}
