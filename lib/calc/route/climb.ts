import { itemAt } from "../indexed";
import { RADIANS_PER_DEGREE } from "../units";
import { stationAtM } from "./profile";
import { toblerSpeedMs, walkedSlope } from "./walking-time";
import type { LegFacts, Profile } from "./types";

/** Rises and falls smaller than this, m, are taken for scatter of the heights and not counted. Our choice. */
export const CLIMB_THRESHOLD_M = 5;
/** Slopes between which Langmuir takes time off a descent, degrees. */
const GENTLE_FROM_DEG = 5;
const STEEP_FROM_DEG = 12;

/**
 * Running totals at each station. A leg is the difference of two of them: so the parts of a leg always add up to the
 * whole, wherever it is split.
 */
export interface RunningTotals {
  readonly profile: Profile;
  readonly ascentM: Float64Array;
  readonly descentM: Float64Array;
  readonly gentleM: Float64Array;
  readonly steepM: Float64Array;
  readonly toblerH: Float64Array;
  /** Length without heights, m. */
  readonly unknownM: Float64Array;
}

/** Indices at which the way turns from up to down or back by at least the threshold, within one run of known heights. */
function turningPoints(heights: readonly number[]): number[] {
  const turns: number[] = [];
  let low = 0;
  let high = 0;
  let direction = 0;
  heights.forEach((height, index) => {
    if (height < itemAt(heights, low)) low = index;
    if (height > itemAt(heights, high)) high = index;
    if (direction >= 0 && itemAt(heights, high) - height >= CLIMB_THRESHOLD_M) {
      turns.push(high);
      direction = -1;
      low = index;
    } else if (direction <= 0 && height - itemAt(heights, low) >= CLIMB_THRESHOLD_M) {
      turns.push(low);
      direction = 1;
      high = index;
    }
    if (direction > 0 && height >= itemAt(heights, high)) high = index;
    if (direction < 0 && height <= itemAt(heights, low)) low = index;
  });
  if (direction > 0) turns.push(high);
  if (direction < 0) turns.push(low);
  return turns;
}

/** Metres of ascent (positive) and descent (negative) of each step of a run: only new heights in the way's direction count. */
function countedSteps(heights: readonly number[]): Float64Array {
  const steps = new Float64Array(Math.max(0, heights.length - 1));
  const turns = turningPoints(heights);
  turns.slice(0, -1).forEach((from, index) => {
    const to = itemAt(turns, index + 1);
    const sign = itemAt(heights, to) >= itemAt(heights, from) ? 1 : -1;
    let reached = itemAt(heights, from);
    for (let at = from; at < to; at += 1) {
      const next = itemAt(heights, at + 1);
      if ((next - reached) * sign <= 0) continue;
      steps[at] = next - reached;
      reached = next;
    }
  });
  return steps;
}

/** Counted metres of each step of the whole profile; NaN where a step has no heights. */
function stepsOf(profile: Profile): Float64Array {
  const steps = new Float64Array(Math.max(0, profile.heightsM.length - 1)).fill(Number.NaN);
  let start = 0;
  while (start < profile.heightsM.length) {
    let end = start;
    const run: number[] = [];
    for (; end < profile.heightsM.length; end += 1) {
      const height = profile.heightsM[end] ?? null;
      if (height === null) break;
      run.push(height);
    }
    steps.set(countedSteps(run), start);
    start = end + 1;
  }
  return steps;
}

/**
 * Ascent, descent, slopes and Tobler's time along a profile, as running totals. Ascent is the sum of rises of at least
 * CLIMB_THRESHOLD_M of the smoothed heights.
 */
export function runningTotals(profile: Profile): RunningTotals {
  const steps = stepsOf(profile);
  const size = Math.max(1, profile.heightsM.length);
  const totals: RunningTotals = {
    profile,
    ascentM: new Float64Array(size),
    descentM: new Float64Array(size),
    gentleM: new Float64Array(size),
    steepM: new Float64Array(size),
    toblerH: new Float64Array(size),
    unknownM: new Float64Array(size),
  };
  for (let index = 0; index < steps.length; index += 1) addStep(totals, index, itemAt(steps, index));
  return totals;
}

function addStep(totals: RunningTotals, index: number, counted: number): void {
  const { profile } = totals;
  const lengthM = stationAtM(profile, index + 1) - stationAtM(profile, index);
  const isKnown = !Number.isNaN(counted);
  const up = isKnown ? Math.max(0, counted) : 0;
  const down = isKnown ? Math.max(0, -counted) : 0;
  const slopeDeg = lengthM > 0 ? Math.atan(down / lengthM) / RADIANS_PER_DEGREE : 0;
  const rise = (profile.heightsM[index + 1] ?? 0) - (profile.heightsM[index] ?? 0);
  const slope = isKnown && lengthM > 0 ? walkedSlope(rise / lengthM) : 0;
  const add = (sums: Float64Array, value: number) => (sums[index + 1] = itemAt(sums, index) + value);
  add(totals.ascentM, up);
  add(totals.descentM, down);
  add(totals.gentleM, slopeDeg >= GENTLE_FROM_DEG && slopeDeg <= STEEP_FROM_DEG ? down : 0);
  add(totals.steepM, slopeDeg > STEEP_FROM_DEG ? down : 0);
  add(totals.toblerH, lengthM / toblerSpeedMs(slope) / 3600);
  add(totals.unknownM, isKnown ? 0 : lengthM);
}

/** A running total at any place, linear between stations. */
function totalAt(profile: Profile, sums: Float64Array, atM: number): number {
  const index = Math.min(Math.floor(atM / profile.stepM), sums.length - 1);
  const fromM = stationAtM(profile, index);
  const toM = stationAtM(profile, index + 1);
  const own = itemAt(sums, index);
  if (index + 1 >= sums.length || toM <= fromM) return own;
  return own + ((itemAt(sums, index + 1) - own) * (atM - fromM)) / (toM - fromM);
}

/**
 * The leg between two places of the line, walked in the direction of the line.
 * @param fromM, toM places along it, m, 0 ≤ fromM ≤ toM ≤ its length; throws RangeError otherwise
 */
export function legBetween(totals: RunningTotals, fromM: number, toM: number): LegFacts {
  const { profile } = totals;
  if (!(fromM >= 0 && fromM <= toM && toM <= profile.lengthM + 1e-6)) {
    throw new RangeError(`A leg from ${fromM} to ${toM} does not lie on a line of ${profile.lengthM} m.`);
  }
  const between = (sums: Float64Array) =>
    totalAt(profile, sums, Math.min(toM, profile.lengthM)) - totalAt(profile, sums, fromM);
  const isKnown = between(totals.unknownM) < 1e-6;
  const known = (sums: Float64Array) => (isKnown ? between(sums) : null);
  return {
    distanceM: toM - fromM,
    ascentM: known(totals.ascentM),
    descentM: known(totals.descentM),
    gentleDescentM: known(totals.gentleM),
    steepDescentM: known(totals.steepM),
    toblerH: known(totals.toblerH),
  };
}
