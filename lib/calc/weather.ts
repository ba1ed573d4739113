/** What a forecast's hours say of a night: how cold the wind makes it, and from where the wind comes. */

/** Warmest air to which the wind chill formula applies, °C. */
export const WIND_CHILL_MAX_C = 10;
/** Weakest wind to which it applies, m/s: 5 km/h. */
export const WIND_CHILL_MIN_MS = 5 / 3.6;

/**
 * Wind chill, °C: the temperature of calm air that would cool a bare face as fast as this wind does.
 *
 * Source: the index of the Meteorological Service of Canada and the US National Weather Service, in use since 1 November
 * 2001: T_wc = 13.12 + 0.6215 T − 11.37 V^0.16 + 0.3965 T V^0.16, T in °C, V in km/h at 10 m (five to ten minutes' mean).
 * It is for an adult's bare face at walking pace in the dark; it says nothing of wet skin, nor of freezing water.
 *
 * @param temperatureC air, °C, at most 10
 * @param meanMs mean wind at 10 m, m/s, at least 5 km/h
 * @returns °C, or null outside the range to which the formula applies or where an input is not finite
 */
export function windChillC(temperatureC: number, meanMs: number): number | null {
  if (!Number.isFinite(temperatureC) || !Number.isFinite(meanMs)) return null;
  if (temperatureC > WIND_CHILL_MAX_C || meanMs < WIND_CHILL_MIN_MS) return null;
  const power = (meanMs * 3.6) ** 0.16;
  return 13.12 + 0.6215 * temperatureC - 11.37 * power + 0.3965 * temperatureC * power;
}

export interface Arc {
  /** Degrees clockwise from north, 0 ≤ … < 360. */
  readonly fromDeg: number;
  /** Where the arc ends, going clockwise from `fromDeg`. */
  readonly toDeg: number;
  /** 0 … 360. */
  readonly spanDeg: number;
}

const wrap = (degrees: number) => ((degrees % 360) + 360) % 360;

/**
 * The smallest arc that holds all directions: all round the circle but for the largest gap between neighbours. Geometry.
 *
 * @param directionsDeg degrees clockwise from north, any finite number
 * @returns null for no direction at all, or when one of them is not finite
 */
export function smallestArc(directionsDeg: readonly number[]): Arc | null {
  if (directionsDeg.length === 0 || !directionsDeg.every(Number.isFinite)) return null;
  const sorted = directionsDeg.map(wrap).sort((a, b) => a - b);
  let largest = { gapDeg: -1, fromDeg: 0, toDeg: 0 };
  sorted.forEach((direction, index) => {
    const isLast = index === sorted.length - 1;
    const next = sorted[isLast ? 0 : index + 1] ?? direction;
    const gapDeg = isLast ? next + 360 - direction : next - direction;
    if (gapDeg > largest.gapDeg) largest = { gapDeg, fromDeg: next, toDeg: direction };
  });
  return { fromDeg: largest.fromDeg, toDeg: largest.toDeg, spanDeg: 360 - largest.gapDeg };
}

/**
 * The smallest arc that holds whole arcs. Each is laid down in steps of at most 5°, so the result is exact at its ends.
 *
 * @returns null when there is no arc
 */
export function joinArcs(arcs: readonly Pick<Arc, "fromDeg" | "toDeg">[]): Arc | null {
  return smallestArc(
    arcs.flatMap(({ fromDeg, toDeg }) => {
      const spanDeg = wrap(toDeg - fromDeg);
      const steps = Math.max(1, Math.ceil(spanDeg / 5));
      return Array.from({ length: steps + 1 }, (_, step) => fromDeg + (spanDeg * step) / steps);
    }),
  );
}

/**
 * An arc with so many degrees more on either side.
 *
 * @param moreDeg ≥ 0
 * @returns null when it then goes all round
 */
export function widenArc(arc: Arc, moreDeg: number): Arc | null {
  const spanDeg = arc.spanDeg + 2 * moreDeg;
  if (spanDeg >= 360) return null;
  return { fromDeg: wrap(arc.fromDeg - moreDeg), toDeg: wrap(arc.toDeg + moreDeg), spanDeg };
}
