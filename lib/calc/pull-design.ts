/** Which pulls of a training day teach most of a ground, one after the other. */

import { requireInRange } from "./constants";
import { itemAt } from "./indexed";
import { predictPull, type PulledAnchor } from "./pull-reading";
import { normalDensity, normalDistribution } from "./statistics";

export interface DesignInput {
  /** What can be pulled, all in the same ground. */
  readonly candidates: readonly PulledAnchor[];
  /** Mean and σ of the logarithm of the ground's factor, as known now; σ 0.001…2. */
  readonly mean: number;
  readonly deviation: number;
  /** σ of the logarithm between two pulls in one ground, 0.01…1.5. */
  readonly within: number;
  /** What the scale ends at, N; null where it shows everything. */
  readonly scaleEndN: number | null;
  /** How many pulls, 1…60. */
  readonly count: number;
}

export interface DesignedPull {
  /** Place in `candidates`. */
  readonly index: number;
  /** Median and 90 % range of what the scale would show if it had no end and the stake did not bend, N. */
  readonly expectedN: number;
  readonly lowN: number;
  readonly highN: number;
  /** Chance that the ground gives before the scale ends or the anchor does. */
  readonly chanceExact: number;
  /** What this pull adds to what the ones before it taught, bits. */
  readonly gainBits: number;
}

/** Half of the scatter between pulls is taken to follow the set-up: what the model does not know of it (judgement). */
const SET_UP_SHARE = 0.5;
/** How much two set-ups of different anchors have in common (judgement). */
const OTHER_ANCHOR = 0.3;
/** Differences of lean or line over which set-ups become strangers, degrees (judgement). */
const RELATED_DEG = 20;
const NINETY_PERCENT = 1.6449;

/** Share of an exact reading's information that is left when it is cut off at `z` standard deviations from its middle. */
export function informationShare(z: number): number {
  if (z > 8) return 1;
  if (z < -8) return 0;
  const density = normalDensity(z);
  const above = normalDistribution(-z);
  return normalDistribution(z) - z * density + (density * density) / above;
}

function kinship(a: PulledAnchor, b: PulledAnchor): number {
  const lean = (a.leanDeg - b.leanDeg) / RELATED_DEG;
  const line = (a.lineAngleDeg - b.lineAngleDeg) / RELATED_DEG;
  const anchor = JSON.stringify(a.anchor) === JSON.stringify(b.anchor) ? 1 : OTHER_ANCHOR;
  return anchor * Math.exp(-0.5 * (lean * lean + line * line));
}

interface Prepared {
  readonly index: number;
  readonly pulled: PulledAnchor;
  readonly expectedN: number;
  readonly chanceExact: number;
  readonly noise: number;
}

function prepare(input: DesignInput, pulled: PulledAnchor, index: number): Prepared | null {
  const prediction = predictPull(pulled);
  if (!prediction) return null;
  const { mean, deviation, within, scaleEndN } = input;
  const expectedN = prediction.groundMedianN * Math.exp(mean);
  // Where the anchor itself gives first by the table, that is as good as the end of a scale.
  const anchorEndN = prediction.medianN < prediction.groundMedianN ? prediction.medianN : Infinity;
  const endN = Math.min(scaleEndN ?? Infinity, anchorEndN);
  const z = Math.log(endN / expectedN) / Math.hypot(deviation, within);
  const share = Math.max(informationShare(z), 1e-6);
  const noise = ((1 - SET_UP_SHARE) * within * within) / share;
  return { index, pulled, expectedN, chanceExact: normalDistribution(z), noise };
}

/**
 * A set of pulls, the most telling first: each is the one that adds most information to those before it.
 * @throws RangeError for a σ, a count or a scale out of range
 * Source: greedy choice by entropy in a Gaussian process, C. W. Ko, J. Lee, M. Queyranne, Operations Research 43 (1995)
 * 684 (from memory); Fisher information of a right-censored normal location, Meeker & Escobar (1998), from memory for
 * the section and checked by quadrature; shares and distances are judgement.
 */
export function designPulls(input: DesignInput): readonly DesignedPull[] {
  const { deviation, within, scaleEndN, count } = input;
  requireInRange("deviation", deviation, 0.001, 2);
  requireInRange("within", within, 0.01, 1.5);
  requireInRange("count", count, 1, 60);
  if (scaleEndN !== null) requireInRange("scaleEndN", scaleEndN, 1, 1e6);
  const usable = input.candidates.flatMap((pulled, index) => prepare(input, pulled, index) ?? []);
  if (usable.length === 0) return [];
  const setUp = SET_UP_SHARE * within * within;
  const covariance = usable.map((a) => usable.map((b) => deviation * deviation + setUp * kinship(a.pulled, b.pulled)));
  const chosen: DesignedPull[] = [];
  const spread = NINETY_PERCENT * Math.hypot(deviation, within);
  while (chosen.length < count) {
    const gains = usable.map((one, i) => 0.5 * Math.log2(1 + itemAt(itemAt(covariance, i), i) / one.noise));
    const best = gains.indexOf(Math.max(...gains));
    const { index, expectedN, chanceExact, noise } = itemAt(usable, best);
    const [lowN, highN] = [expectedN * Math.exp(-spread), expectedN * Math.exp(spread)];
    chosen.push({ index, expectedN, lowN, highN, chanceExact, gainBits: itemAt(gains, best) });
    const column = covariance.map((row) => itemAt(row, best));
    const pivot = itemAt(column, best) + noise;
    covariance.forEach((row, i) => {
      for (let j = 0; j < row.length; j++) row[j] = itemAt(row, j) - (itemAt(column, i) * itemAt(column, j)) / pivot;
    });
  }
  return chosen;
}
