/** The few distributions that the verdicts and pull tests need. */

import { FIVE_PERCENT_QUANTILE } from "./constants";

const SQRT_TWO_PI = Math.sqrt(2 * Math.PI);

/** Density of the standard normal distribution at `x`. Any finite x. */
export function normalDensity(x: number): number {
  return Math.exp(-0.5 * x * x) / SQRT_TWO_PI;
}

/**
 * Φ(x), the standard normal distribution function; any x, also ±∞. Within 1e-15 of the true value for |x| ≤ 6 and to a
 * relative 1e-10 in the lower tail.
 *
 * Series: G. Marsaglia, "Evaluating the normal distribution", J. Statistical Software 11(4), 2004. Tail: continued
 * fraction, Abramowitz & Stegun (1964), 26.2.14.
 */
export function normalDistribution(x: number): number {
  if (x < -38) return 0;
  if (x > 8.5) return 1;
  if (Math.abs(x) > 4) {
    const z = Math.abs(x);
    let fraction = z;
    for (let k = 60; k >= 1; k--) fraction = z + k / fraction;
    const tail = normalDensity(z) / fraction;
    return x < 0 ? tail : 1 - tail;
  }
  let term = x;
  let sum = x;
  for (let k = 3; Math.abs(term) > 1e-18 && k < 400; k += 2) {
    term *= (x * x) / k;
    sum += term;
  }
  return 0.5 + normalDensity(x) * sum;
}

const horner = (coefficients: readonly number[], r: number): number =>
  coefficients.reduceRight((sum, coefficient) => sum * r + coefficient, 0);

/** Coefficients of PPND16, lowest power first. */
const AS241 = {
  a: [
    3.387132872796366608, 133.14166789178437745, 1971.5909503065514427, 13731.693765509461125, 45921.953931549871457,
    67265.770927008700853, 33430.575583588128105, 2509.0809287301226727,
  ],
  b: [
    1, 42.313330701600911252, 687.1870074920579083, 5394.1960214247511077, 21213.794301586595867, 39307.89580009271061,
    28729.085735721942674, 5226.495278852545925,
  ],
  c: [
    1.42343711074968357734, 4.6303378461565452959, 5.7694972214606914055, 3.64784832476320460504,
    1.27045825245236838258, 0.24178072517745061177, 0.0227238449892691845833, 7.7454501427834140764e-4,
  ],
  d: [
    1, 2.05319162663775882187, 1.6763848301838038494, 0.68976733498510000455, 0.14810397642748007459,
    0.0151986665636164571966, 5.475938084995344946e-4, 1.05075007164441684324e-9,
  ],
  e: [
    6.6579046435011037772, 5.4637849111641143699, 1.7848265399172913358, 0.29656057182850489123,
    0.026532189526576123093, 0.0012426609473880784386, 2.71155556874348757815e-5, 2.01033439929228813265e-7,
  ],
  f: [
    1, 0.59983220655588793769, 0.13692988092273580531, 0.0148753612908506148525, 7.868691311456132591e-4,
    1.8463183175100546818e-5, 1.4215117583164458887e-7, 2.04426310338993978564e-15,
  ],
} as const;

/**
 * The standard normal quantile of probability `p`, 0 < p < 1.
 * M. J. Wichura, "Algorithm AS 241: The percentage points of the normal distribution", Applied Statistics 37(3), 1988,
 * PPND16. Throws RangeError outside 0…1 exclusive.
 */
export function normalQuantile(p: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError("A quantile needs a probability between 0 and 1.");
  const q = p - 0.5;
  if (Math.abs(q) <= 0.425) {
    const r = 0.180625 - q * q;
    return (q * horner(AS241.a, r)) / horner(AS241.b, r);
  }
  const r = Math.sqrt(-Math.log(q < 0 ? p : 1 - p));
  const size =
    r <= 5 ? horner(AS241.c, r - 1.6) / horner(AS241.d, r - 1.6) : horner(AS241.e, r - 5) / horner(AS241.f, r - 5);
  return q < 0 ? -size : size;
}

/**
 * Regularised incomplete beta I_x(a, b), a and b > 0, 0 ≤ x ≤ 1: continued fraction of Abramowitz & Stegun (1964)
 * 26.5.8, evaluated by Lentz's method.
 */
function incompleteBeta(x: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (x >= 1) return 1;
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(1 - x, b, a);
  const front = Math.exp(
    logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log(1 - x) - Math.log(a),
  );
  const tiny = 1e-300;
  let c = 1;
  let d = 1 / Math.max(tiny, 1 - ((a + b) * x) / (a + 1));
  let fraction = d;
  for (let m = 1; m <= 300; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / (1 + even * d || tiny);
    c = 1 + even / c || tiny;
    fraction *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / (1 + odd * d || tiny);
    c = 1 + odd / c || tiny;
    const step = d * c;
    fraction *= step;
    if (Math.abs(step - 1) < 1e-15) break;
  }
  return front * fraction;
}

/** ln Γ(x), x > 0: Stirling's series (Abramowitz & Stegun 1964, 6.1.41) after raising x above 8 by recurrence. */
function logGamma(x: number): number {
  let shift = 0;
  let z = x;
  while (z < 8) {
    shift -= Math.log(z);
    z += 1;
  }
  const w = 1 / (z * z);
  const series = (1 / 12 - w * (1 / 360 - w * (1 / 1260 - w * (1 / 1680 - w / 1188)))) / z;
  return shift + (z - 0.5) * Math.log(z) - z + 0.5 * Math.log(2 * Math.PI) + series;
}

/**
 * The distribution function of Student's t with `degrees` > 0 degrees of freedom at `t`.
 * Abramowitz & Stegun (1964), 26.7.1 with 26.5.
 */
export function studentDistribution(t: number, degrees: number): number {
  const tail = 0.5 * incompleteBeta(degrees / (degrees + t * t), degrees / 2, 0.5);
  return t > 0 ? 1 - tail : tail;
}

/** The quantile of Student's t with `degrees` > 0 at probability `p`, 0 < p < 1, by bisection to 1e-12. */
export function studentQuantile(p: number, degrees: number): number {
  if (!(p > 0 && p < 1) || !(degrees > 0)) throw new RangeError("A quantile needs 0 < p < 1 and degrees above 0.");
  if (p < 0.5) return -studentQuantile(1 - p, degrees);
  let low = 0;
  let high = 1;
  while (studentDistribution(high, degrees) < p && high < 1e12) high *= 2;
  for (let i = 0; i < 200 && high - low > 1e-12 * Math.max(1, high); i++) {
    const middle = (low + high) / 2;
    if (studentDistribution(middle, degrees) < p) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/**
 * k_n of EN 1990:2002 Annex D, D.7.2 (Table D.1): how many standard deviations the 5 % characteristic value lies below
 * the mean of `readings` tests; known scatter 1.645·√(1 + 1/n), unknown t₀.₉₅,ₙ₋₁·√(1 + 1/n).
 * `readings` from 1 (known) or 3 (unknown; the table has no value below). Throws RangeError below.
 */
export function characteristicFactor(readings: number, scatter: "known" | "unknown"): number {
  if (!Number.isInteger(readings) || readings < (scatter === "known" ? 1 : 3)) {
    throw new RangeError("EN 1990 D.7.2 gives no value for so few readings.");
  }
  const spread = Math.sqrt(1 + 1 / readings);
  return (scatter === "known" ? FIVE_PERCENT_QUANTILE : studentQuantile(0.95, readings - 1)) * spread;
}

/**
 * Characteristic (5 %) value of readings that scatter lognormally, EN 1990:2002 D.7.2 (D.4): exp(m_y − k_n·s_y).
 * `readings` > 0 in any unit; `scatter` is σ of the logarithm when it is known, null to estimate it from the readings.
 */
export function characteristicValue(readings: readonly number[], scatter: number | null): number {
  if (readings.some((reading) => !(reading > 0))) throw new RangeError("Readings are above 0.");
  const logs = readings.map((reading) => Math.log(reading));
  const mean = logs.reduce((sum, y) => sum + y, 0) / logs.length;
  const factor = characteristicFactor(logs.length, scatter === null ? "unknown" : "known");
  const deviation = scatter ?? Math.sqrt(logs.reduce((sum, y) => sum + (y - mean) * (y - mean), 0) / (logs.length - 1));
  return Math.exp(mean - factor * deviation);
}
