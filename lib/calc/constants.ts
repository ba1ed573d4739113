/** Physical constants and judgement factors that more than one part of the calculation uses, each with its source. */

/** Unit weight of water, N/m³ (1000 kg/m³ × standard gravity). */
export const WATER_UNIT_WEIGHT_NM3 = 9806.65;

/** Standard normal quantile of the 5 % fractile (NIST/SEMATECH e-Handbook, table 1.3.6.7.1: 1.645). */
export const FIVE_PERCENT_QUANTILE = 1.6448536269514722;

/**
 * Dependable value (5 % fractile) of a lognormal strength.
 * @param medianN median, N, > 0
 * @param scatter σ of the natural logarithm, ≥ 0
 * @returns N. Source: lognormal fractile x₀.₀₅ = median·e^(−1.645σ) (EN 1990:2002 Annex D.7, form for known scatter and n → ∞).
 */
export function dependableFromMedian(medianN: number, scatter: number): number {
  return medianN * Math.exp(-FIVE_PERCENT_QUANTILE * scatter);
}

/** Throws RangeError naming the parameter unless the value is a finite number from min to max. */
export function requireInRange(name: string, value: number, min: number, max: number): void {
  if (!(value >= min && value <= max)) throw new RangeError(`${name} must be from ${min} to ${max}, got ${value}`);
}
