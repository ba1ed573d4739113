/** What one pull says of the ground it was made in, held against the model. */

import { capacityNumbers, groundMedianN, type CapacityInput } from "./capacity";
import { requireInRange } from "./constants";
import type { PullReading } from "./learning";
import type { AnchorSpec, CapacityMode, GroundState, Rigging } from "./types";

export interface PulledAnchor {
  readonly anchor: AnchorSpec;
  /** The ground by the table: what was learned is not counted here. */
  readonly ground: Omit<GroundState, "learned">;
  /** Drive lean, degrees, −10…60. */
  readonly leanDeg: number;
  /** Line above the ground, degrees, 0…90. */
  readonly lineAngleDeg: number;
  /** Length left out of the ground, m, 0…3. */
  readonly depthOutM: number;
}

export interface PullPrediction {
  /** Median force at which the ground gives, N. */
  readonly groundMedianN: number;
  /** Median force at which anything gives, and what, line and knot left out. */
  readonly medianN: number;
  readonly scatter: number;
  readonly mode: CapacityMode;
}

/** A line far stronger than any stake: what is tested is anchor and ground. */
const TEST_LINE = { line: { material: "uhmwpe", diameterMm: 12 }, knot: "bowline" } as const;

function asInput({ anchor, ground, leanDeg, lineAngleDeg, depthOutM }: PulledAnchor): CapacityInput {
  const rigging: Rigging = { leanDeg, depthOutM, tandem: null, rockKg: 0, shockCord: false, ...TEST_LINE };
  return { anchor, ground: { ...ground, learned: null }, lineAngleDeg, rigging };
}

/**
 * What the table's model expects of an anchor under a scale; null where a pull says nothing of the ground (weights,
 * trees, fixings) or the anchor can't stand in it. Units and ranges as `PulledAnchor`.
 * @throws RangeError for a number out of range or a shape that can't be built
 * Source: capacity.ts and what it stands on.
 */
export function predictPull(pulled: PulledAnchor): PullPrediction | null {
  const input = asInput(pulled);
  const medianN = groundMedianN(input);
  const numbers = capacityNumbers(input);
  if (medianN === null || numbers === null || !(medianN > 0)) return null;
  return { groundMedianN: medianN, medianN: numbers.medianN, scatter: numbers.scatter, mode: numbers.mode };
}

/** What happened at the force that was read; only the first is a failure of the ground. */
export type PullEnd = "came-out" | "bent" | "line-failed" | "still-holding";

/** Beyond twenty times the model either way a reading is taken for a slip of the pen until somebody has looked (judgement). */
export const MOST_LOG_RATIO = Math.log(20);
/** Lower than this a reading that held says nothing at all, to the last digit. */
const LEAST_LOG_RATIO = -9;

export type ReadPull =
  | { readonly status: "counts"; readonly reading: PullReading; readonly prediction: PullPrediction }
  | { readonly status: "implausible"; readonly prediction: PullPrediction }
  | { readonly status: "says-nothing" };

/**
 * A pull as the learning takes it. "Bent" and "line failed" mean that the ground held at least that force.
 * @param forceN read off the scale, N, above 0
 * @throws RangeError as `predictPull`
 * Source: right-censored readings, Meeker & Escobar (1998); the limits are judgement.
 */
export function readPull(pulled: PulledAnchor, forceN: number, end: PullEnd): ReadPull {
  requireInRange("forceN", forceN, Number.MIN_VALUE, 1e6);
  const prediction = predictPull(pulled);
  if (prediction === null) return { status: "says-nothing" };
  const logRatio = Math.log(forceN / prediction.groundMedianN);
  const isExact = end === "came-out";
  if (logRatio > MOST_LOG_RATIO || (isExact && logRatio < -MOST_LOG_RATIO)) {
    return { status: "implausible", prediction };
  }
  const reading: PullReading = {
    logRatio: Math.max(logRatio, LEAST_LOG_RATIO),
    kind: isExact ? "exact" : "at-least",
  };
  return { status: "counts", reading, prediction };
}
