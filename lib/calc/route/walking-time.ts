import { requireInRange } from "../constants";
import { itemAt } from "../indexed";
import { TRANTER, TRANTER_NAISMITH_H, type TranterFitness } from "../tables/tranter";

/** Rules for the time of a walk. Hours of walking without breaks; distances are level (map) distances. */

const METRES_PER_KM = 1000;
/** Naismith's speed, m/h, and rate of climb, m/h, in their metric form: 5 km/h, and one hour for 600 m. */
const NAISMITH_MH = 5000;
const NAISMITH_CLIMB_MH = 600;
/** Langmuir: minutes off or on for each 300 m of descent. */
const LANGMUIR_MIN = 10;
const LANGMUIR_PER_M = 300;

/**
 * Hours by Naismith's rule.
 * Source: W. W. Naismith, Scottish Mountaineering Club Journal 2 (1892) 136, in its metric form (5 km/h, 1 h per 600 m).
 * @param distanceM ≥ 0 @param ascentM ≥ 0
 */
export function naismithH(distanceM: number, ascentM: number): number {
  requireInRange("distanceM", distanceM, 0, 1e7);
  requireInRange("ascentM", ascentM, 0, 1e6);
  return distanceM / NAISMITH_MH + ascentM / NAISMITH_CLIMB_MH;
}

/**
 * Hours by Naismith's rule with Langmuir's corrections for descents: 10 min off per 300 m on slopes of 5° to 12°,
 * 10 min on per 300 m on steeper ones.
 * Source: E. Langmuir, Mountaincraft and Leadership (1984).
 */
export function langmuirH(distanceM: number, ascentM: number, gentleDescentM: number, steepDescentM: number): number {
  requireInRange("gentleDescentM", gentleDescentM, 0, 1e6);
  requireInRange("steepDescentM", steepDescentM, 0, 1e6);
  const minutes = ((steepDescentM - gentleDescentM) * LANGMUIR_MIN) / LANGMUIR_PER_M;
  return naismithH(distanceM, ascentM) + minutes / 60;
}

/**
 * Speed on a path, m/s: v = 6·e^(−3.5·|s + 0.05|) km/h.
 * Source: W. Tobler, Three Presentations on Geographical Analysis and Modeling, NCGIA Technical Report 93-1 (1993).
 * @param slope rise ÷ run
 */
export function toblerSpeedMs(slope: number): number {
  return (6 * Math.exp(-3.5 * Math.abs(slope + 0.05)) * METRES_PER_KM) / 3600;
}

/** Steeper than 45° nobody walks: such pieces are faults of heights, and count as 45°. Our choice. */
export function walkedSlope(slope: number): number {
  return Math.min(1, Math.max(-1, slope));
}

/** Off the path Tobler takes six tenths of the speed (same source). */
export const TOBLER_OFF_PATH = 0.6;

/**
 * Hours by DIN 33466 (Wegweiser für Wanderwege): 4 km/h, 300 m/h up, 500 m/h down; the longer of the level and the
 * vertical time and half the shorter. It is meant for a leg as a whole: cut in two, it never gives less, mostly more.
 */
export function din33466H(distanceM: number, ascentM: number, descentM: number): number {
  requireInRange("distanceM", distanceM, 0, 1e7);
  requireInRange("ascentM", ascentM, 0, 1e6);
  requireInRange("descentM", descentM, 0, 1e6);
  const levelH = distanceM / 4000;
  const verticalH = ascentM / 300 + descentM / 500;
  return Math.max(levelH, verticalH) + Math.min(levelH, verticalH) / 2;
}

/**
 * Naismith's hours corrected for fitness and tiring by Tranter's table, linear between its columns and from nothing to
 * its first. Null beyond the last column of that fitness: the table says such a day is too much.
 * @param fitness minutes that somebody takes for 1000 ft of ascent in half a mile
 */
export function tranterH(naismithHours: number, fitness: TranterFitness): number | null {
  requireInRange("naismithHours", naismithHours, 0, 1e5);
  const row = TRANTER[fitness];
  let beforeX = 0;
  let beforeY = 0;
  for (const [index, actual] of row.entries()) {
    const x = itemAt(TRANTER_NAISMITH_H, index);
    if (naismithHours <= x) return beforeY + ((actual - beforeY) * (naismithHours - beforeX)) / (x - beforeX);
    beforeX = x;
    beforeY = actual;
  }
  return null;
}

/** Hours with breaks of so many minutes in each hour of walking. @param minutesPerHour 0…60 */
export function withBreaksH(walkingH: number, minutesPerHour: number): number {
  requireInRange("minutesPerHour", minutesPerHour, 0, 60);
  return walkingH * (1 + minutesPerHour / 60);
}
