/** What pull tests teach of a ground: the posterior of its strength factor, and how well each reading fits. */

import { FIVE_PERCENT_QUANTILE, requireInRange } from "./constants";
import { itemAt } from "./indexed";
import { normalDistribution, normalQuantile } from "./statistics";

/** One pull, as the natural logarithm of force ÷ the model's median for the ground. */
export interface PullReading {
  /** ln(F / model median of the ground), −10…10. */
  readonly logRatio: number;
  /** "exact": the ground gave way at F; "at-least": the ground still held at F (right-censored). */
  readonly kind: "exact" | "at-least";
}

export interface LearnInput {
  /** σ of the logarithm of the ground's table row, 0.05…1.5: ground, place in it and model together. */
  readonly tableScatter: number;
  /** Readings in this ground at this camp. */
  readonly own: readonly PullReading[];
  /** Readings in the same kind of ground elsewhere, one list per place; they count for less. */
  readonly elsewhere: readonly (readonly PullReading[])[];
}

export interface LearnedGround {
  /** Median of what an anchor holds, as a multiple of the table's. */
  readonly factor: number;
  /** σ of the logarithm that joins the median and the 5 % value of the next pull. */
  readonly scatter: number;
  /** Mean and σ of the logarithm of the ground's own factor. */
  readonly mean: number;
  readonly deviation: number;
  /** 90 % interval of the ground's own factor. */
  readonly from: number;
  readonly to: number;
}

/**
 * Share of a row's scatter that is between two pulls in the same ground (judgement): 0.6, so that 0.8 of it is between
 * grounds of one kind (0.6² + 0.8² = 1, and without readings the table's scatter comes out again).
 */
export const WITHIN_SHARE = 0.6;
export const BETWEEN_SHARE = 0.8;
/** Half of the variance between grounds of one kind is shared by all places of one group's trip (judgement). */
const SHARED_VARIANCE = 0.5;

const GRID_HALF = 400;
const GRID_WIDTH = 8;
/** Readings above this number are brought together in steps of 0.01 of the logarithm. */
const FINE_READINGS = 300;

/** ln Φ(x), also far in the lower tail (Abramowitz & Stegun 1964, 26.2.12, first terms). Any finite x. */
export function logNormalDistribution(x: number): number {
  if (x > -30) return Math.log(normalDistribution(x));
  return -0.5 * x * x - Math.log(-x * Math.sqrt(2 * Math.PI)) + Math.log1p(-1 / (x * x));
}

interface Likelihood {
  readonly count: number;
  readonly mean: number;
  readonly held: readonly (readonly [logRatio: number, count: number])[];
}

function gather(readings: readonly PullReading[]): Likelihood {
  const exact = readings.filter((one) => one.kind === "exact");
  const held = new Map<number, number>();
  const isCoarse = readings.length > FINE_READINGS;
  for (const { logRatio, kind } of readings) {
    requireInRange("reading.logRatio", logRatio, -10, 10);
    if (kind === "exact") continue;
    const key = isCoarse ? Math.floor(logRatio * 100) / 100 : logRatio;
    held.set(key, (held.get(key) ?? 0) + 1);
  }
  const sum = exact.reduce((total, one) => total + one.logRatio, 0);
  return { count: exact.length, mean: exact.length === 0 ? 0 : sum / exact.length, held: [...held] };
}

/** ln likelihood of a ground whose log factor is `g`, up to a constant. */
function logLikelihood(data: Likelihood, g: number, within: number): number {
  let sum = (-0.5 * data.count * (data.mean - g) ** 2) / (within * within);
  for (const [at, count] of data.held) sum += count * logNormalDistribution((g - at) / within);
  return sum;
}

/** Weights of ln densities, scaled so that they add up to 1. */
function normalised(logs: readonly number[]): number[] {
  const top = logs.reduce((most, one) => Math.max(most, one), -Infinity);
  const weights = logs.map((one) => Math.exp(one - top));
  const sum = weights.reduce((total, one) => total + one, 0);
  return weights.map((one) => one / sum);
}

/** Weights below this share of the largest add less than 1e-11 to any probability and cost as much as the others. */
const NEGLIGIBLE = 1e-14;

/** ln of the weights smeared by a normal of deviation `sigma`, on the same grid. */
function smearedLogs(grid: readonly number[], weights: readonly number[], sigma: number): number[] {
  const step = itemAt(grid, 1) - itemAt(grid, 0);
  // The grid is even: the smear depends on the distance of two points only.
  const kernel = grid.map((_, distance) => Math.exp(-0.5 * ((distance * step) / sigma) ** 2));
  const limit = NEGLIGIBLE * weights.reduce((most, one) => Math.max(most, one), 0);
  const heavy = weights.flatMap((weight, i) => (weight > limit ? [{ weight, i }] : []));
  return grid.map((_, at) => {
    let sum = 0;
    for (const { weight, i } of heavy) sum += weight * itemAt(kernel, at < i ? i - at : at - i);
    return Math.log(Math.max(sum, 1e-300));
  });
}

export interface GroundPosterior {
  /** Log factors, evenly spaced. */
  readonly grid: readonly number[];
  /** Share of the probability at each. */
  readonly weights: readonly number[];
  readonly within: number;
  readonly between: number;
}

function evenGrid(from: number, to: number): number[] {
  const step = (to - from) / (2 * GRID_HALF);
  return Array.from({ length: 2 * GRID_HALF + 1 }, (_, i) => from + i * step);
}

/** ln prior of the log factor here, on `grid`: normal, moved by what was read in the same kind of ground elsewhere. */
function priorLogs(input: LearnInput, grid: readonly number[], within: number, between: number): number[] {
  const places = input.elsewhere.filter((one) => one.length > 0);
  if (places.length === 0) return grid.map((g) => (-0.5 * g * g) / (between * between));
  const shared = between * Math.sqrt(SHARED_VARIANCE);
  const local = between * Math.sqrt(1 - SHARED_VARIANCE);
  const common = grid.map((a) => (-0.5 * a * a) / (shared * shared));
  for (const readings of places) {
    const data = gather(readings);
    const likelihood = normalised(grid.map((g) => logLikelihood(data, g, within)));
    smearedLogs(grid, likelihood, local).forEach((log, i) => (common[i] = itemAt(common, i) + log));
  }
  return smearedLogs(grid, normalised(common), local);
}

function interpolate(grid: readonly number[], values: readonly number[], x: number): number {
  const first = itemAt(grid, 0);
  const step = itemAt(grid, 1) - first;
  const at = Math.min(Math.max((x - first) / step, 0), grid.length - 1.000001);
  const i = Math.floor(at);
  return itemAt(values, i) + (at - i) * (itemAt(values, i + 1) - itemAt(values, i));
}

/**
 * Posterior of the natural logarithm of a ground's strength factor by quadrature on an even grid, drawn in round the
 * mass where many readings make it narrow.
 * @param input readings as `PullReading`; `tableScatter` σ of the row, 0.05…1.5
 * @throws RangeError for a scatter or a log ratio out of range
 * Source: Bayes' rule with normal likelihood of exact and Φ of right-censored log readings (Meeker & Escobar 1998,
 * §§7–8, from memory for the section); prior normal(0, σ_ground); shares of scatter are judgement.
 */
export function groundPosterior(input: LearnInput): GroundPosterior {
  requireInRange("tableScatter", input.tableScatter, 0.05, 1.5);
  const within = WITHIN_SHARE * input.tableScatter;
  const between = BETWEEN_SHARE * input.tableScatter;
  const wide = evenGrid(-GRID_WIDTH * between, GRID_WIDTH * between);
  const prior = priorLogs(input, wide, within, between);
  const data = gather(input.own);
  const at = (grid: readonly number[]) =>
    normalised(grid.map((g) => interpolate(wide, prior, g) + logLikelihood(data, g, within)));
  let grid = wide;
  let weights = at(grid);
  for (let round = 0; round < 4; round++) {
    const top = Math.max(...weights);
    const first = weights.findIndex((one) => one > top * 1e-14);
    const last = weights.findLastIndex((one) => one > top * 1e-14);
    if (last - first > GRID_HALF / 4) break;
    grid = evenGrid(itemAt(grid, Math.max(0, first - 2)), itemAt(grid, Math.min(grid.length - 1, last + 2)));
    weights = at(grid);
  }
  return { grid, weights, within, between };
}

/** Share of the posterior, smeared by `sigma` (0 = the ground's factor itself), that lies below `x`. */
export function shareBelow({ grid, weights }: GroundPosterior, x: number, sigma: number): number {
  const step = itemAt(grid, 1) - itemAt(grid, 0);
  let sum = 0;
  grid.forEach((g, i) => {
    // Without a smear each grid point stands for the strip about it.
    const share = sigma > 0 ? normalDistribution((x - g) / sigma) : Math.min(1, Math.max(0, (x - g) / step + 0.5));
    sum += itemAt(weights, i) * share;
  });
  return sum;
}

/** The part of a posterior that carries weight. */
function trimmed(posterior: GroundPosterior): GroundPosterior {
  const { grid, weights } = posterior;
  const limit = NEGLIGIBLE * weights.reduce((most, one) => Math.max(most, one), 0);
  const first = Math.max(
    0,
    weights.findIndex((one) => one > limit),
  );
  const last = weights.findLastIndex((one) => one > limit);
  return { ...posterior, grid: grid.slice(first, last + 1), weights: weights.slice(first, last + 1) };
}

function quantile(whole: GroundPosterior, p: number, sigma: number): number {
  const posterior = trimmed(whole);
  const { grid } = posterior;
  let low = itemAt(grid, 0) - 8 * sigma;
  let high = itemAt(grid, grid.length - 1) + 8 * sigma;
  for (let i = 0; i < 48; i++) {
    const middle = (low + high) / 2;
    if (shareBelow(posterior, middle, sigma) < p) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Mean, σ, intervals and the factor and scatter that go into the plan. Input as `groundPosterior`. */
export function learnGround(input: LearnInput): LearnedGround {
  const posterior = groundPosterior(input);
  const { grid, weights, within } = posterior;
  const mean = grid.reduce((sum, g, i) => sum + g * itemAt(weights, i), 0);
  const variance = grid.reduce((sum, g, i) => sum + (g - mean) ** 2 * itemAt(weights, i), 0);
  // The next pull scatters about the ground's factor: its median and 5 % value are what margins stand on.
  const median = quantile(posterior, 0.5, within);
  const fifth = quantile(posterior, 0.05, within);
  return {
    factor: Math.exp(median),
    scatter: (median - fifth) / FIVE_PERCENT_QUANTILE,
    mean,
    deviation: Math.sqrt(variance),
    from: Math.exp(quantile(posterior, 0.05, 0)),
    to: Math.exp(quantile(posterior, 0.95, 0)),
  };
}

export interface ReadingInfluence {
  /** Middle of the ground's factor with this reading ÷ without it: above 1 it lifts the estimate. */
  readonly pull: number;
  /** How likely a reading at least as far out was, given all others, 0…1. */
  readonly chance: number;
  readonly isOutlier: boolean;
}

/** Chance below which a reading is pointed out: both tails beyond 2.5 σ (judgement). */
const OUTLIER_CHANCE = 0.0124;

const meanOf = (grid: readonly number[], weights: readonly number[]) =>
  grid.reduce((sum, g, i) => sum + g * itemAt(weights, i), 0);

/** Posterior without one reading that it counts: its likelihood is taken out of the product, which is exact. */
function withoutOne(posterior: GroundPosterior, reading: PullReading): GroundPosterior {
  const own = gather([reading]);
  const logs = posterior.weights.map(
    (one, i) => Math.log(Math.max(one, 1e-300)) - logLikelihood(own, itemAt(posterior.grid, i), posterior.within),
  );
  return trimmed({ ...posterior, weights: normalised(logs) });
}

function chanceOf(reading: PullReading, others: GroundPosterior): number {
  const below = shareBelow(others, reading.logRatio, others.within);
  return reading.kind === "exact" ? 2 * Math.min(below, 1 - below) : 1 - below;
}

/** At most so many readings, and a third of all, are held not to fit: beyond that it is the ground that is odd (judgement). */
const MOST_OUTLIERS = 8;

/** The worst one is set aside and the others judged without it, until all that are left fit: none hides another. */
function findOutliers(input: LearnInput, indices: readonly number[]): ReadonlySet<number> {
  const outliers = new Set<number>();
  const most = Math.min(MOST_OUTLIERS, Math.max(1, Math.floor(input.own.length / 3)));
  while (outliers.size < most) {
    const posterior = groundPosterior({ ...input, own: input.own.filter((_, i) => !outliers.has(i)) });
    let worst = { index: -1, chance: OUTLIER_CHANCE };
    for (const index of indices) {
      if (outliers.has(index)) continue;
      const reading = itemAt(input.own, index);
      const chance = chanceOf(reading, withoutOne(posterior, reading));
      if (chance < worst.chance) worst = { index, chance };
    }
    if (worst.index < 0) break;
    outliers.add(worst.index);
  }
  return outliers;
}

/**
 * What each of the readings at `indices` of `own` does to the result, and how it fits the others (those that do not
 * fit left out); a lone reading is held against the table. Input as `groundPosterior`.
 * @throws RangeError for an index without a reading, and as `groundPosterior`
 */
export function readingInfluences(input: LearnInput, indices: readonly number[]): readonly ReadingInfluence[] {
  for (const index of indices) {
    if (input.own[index] === undefined) throw new RangeError("There is no such reading.");
  }
  const outliers = findOutliers(input, indices);
  const posterior = groundPosterior(input);
  const fitting = groundPosterior({ ...input, own: input.own.filter((_, i) => !outliers.has(i)) });
  const mean = meanOf(posterior.grid, posterior.weights);
  return indices.map((index) => {
    const reading = itemAt(input.own, index);
    const isOutlier = outliers.has(index);
    const rest = withoutOne(posterior, reading);
    return {
      pull: Math.exp(mean - meanOf(rest.grid, rest.weights)),
      chance: chanceOf(reading, isOutlier ? fitting : withoutOne(fitting, reading)),
      isOutlier,
    };
  });
}

export interface LognormalFit {
  /** Mean of the logarithm. */
  readonly mean: number;
  /** σ of the logarithm. */
  readonly deviation: number;
}

/**
 * Maximum likelihood of a lognormal with right-censored readings, by expectation–maximisation, at most
 * 20 000 rounds. Null with fewer than two different exact readings.
 * @param readings logarithms in any unit; "at-least" = still holding
 * Source: censored lognormal likelihood, Meeker & Escobar, Statistical Methods for Reliability Data (1998); EM for
 * censored normal data, Dempster, Laird & Rubin (1977).
 */
export function fitCensoredLognormal(readings: readonly PullReading[]): LognormalFit | null {
  const exact = readings.filter((one) => one.kind === "exact").map((one) => one.logRatio);
  const held = readings.filter((one) => one.kind === "at-least").map((one) => one.logRatio);
  if (new Set(exact).size < 2) return null;
  const n = exact.length + held.length;
  let mean = exact.reduce((sum, y) => sum + y, 0) / exact.length;
  let deviation = Math.sqrt(exact.reduce((sum, y) => sum + (y - mean) ** 2, 0) / exact.length);
  for (let round = 0; round < 20_000; round++) {
    let first = exact.reduce((sum, y) => sum + y, 0);
    const tails = held.map((y) => {
      const z = (y - mean) / deviation;
      const hazard = Math.exp(-0.5 * z * z - 0.5 * Math.log(2 * Math.PI) - logNormalDistribution(-z));
      first += mean + deviation * hazard;
      return deviation * deviation * (1 + z * hazard - hazard * hazard);
    });
    const next = first / n;
    let second = exact.reduce((sum, y) => sum + (y - next) ** 2, 0);
    held.forEach((y, i) => {
      const z = (y - mean) / deviation;
      const hazard = Math.exp(-0.5 * z * z - 0.5 * Math.log(2 * Math.PI) - logNormalDistribution(-z));
      second += itemAt(tails, i) + (mean + deviation * hazard - next) ** 2;
    });
    const nextDeviation = Math.sqrt(second / n);
    const step = Math.abs(next - mean) + Math.abs(nextDeviation - deviation);
    mean = next;
    deviation = nextDeviation;
    if (step < 1e-12) break;
  }
  return { mean, deviation };
}

/** Prior and posterior densities of the log factor at even steps, for drawing; `points` 2…400. */
export function learningCurve(
  input: LearnInput,
  points: number,
): readonly { readonly logFactor: number; readonly before: number; readonly after: number }[] {
  const { grid, weights, between } = groundPosterior(input);
  const step = itemAt(grid, 1) - itemAt(grid, 0);
  const density = weights.map((one) => one / step);
  const [low, high] = [itemAt(grid, 0), itemAt(grid, grid.length - 1)];
  return Array.from({ length: points }, (_, i) => {
    const logFactor = normalQuantile(0.0005) * between + (i / (points - 1)) * 2 * normalQuantile(0.9995) * between;
    const z = logFactor / between;
    const isInside = logFactor >= low && logFactor <= high;
    return {
      logFactor,
      before: Math.exp(-0.5 * z * z) / (between * Math.sqrt(2 * Math.PI)),
      after: isInside ? interpolate(grid, density, logFactor) : 0,
    };
  });
}
