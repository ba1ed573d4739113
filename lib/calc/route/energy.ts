import { requireInRange } from "../constants";
import { STANDARD_GRAVITY_MS2 } from "../units";

/** Power and energy of walking with a pack, and water for it. */

export const JOULES_PER_KILOCALORIE = 4184;
/** US quart, l (exact: 231 cubic inches ÷ 4 … 57.75 in³). */
export const LITRES_PER_QUART = 0.946352946;

/**
 * Factors of the ground η in Pandolf's equation, as a range from the kinder to the harder of the grounds that a class
 * spans. Source: R. G. Soule, R. F. Goldman, J. Appl. Physiol. 32 (1972) 706 (values from memory): hard road 1.0, dirt
 * road 1.1, light brush 1.2, heavy brush 1.5, swamp 1.8, loose sand 2.1.
 */
export const TERRAIN_FACTORS = {
  path: [1.0, 1.1],
  rough: [1.2, 1.5],
  soft: [1.8, 2.1],
} as const;
export type Terrain = keyof typeof TERRAIN_FACTORS;

export interface WalkerLoad {
  readonly bodyKg: number;
  readonly packKg: number;
  /** η, 1…2.1. */
  readonly terrain: number;
}

/**
 * Power of walking with a load on the level and uphill, W:
 * M = 1.5 W + 2.0 (W + L)(L/W)² + η (W + L)(1.5 V² + 0.35 V G), W and L in kg, V in m/s, G in percent.
 * Source: K. B. Pandolf, B. Givoni, R. F. Goldman, J. Appl. Physiol. 43 (1977) 577.
 * @param speedMs 0…3 @param gradePercent 0…60
 */
export function pandolfPowerW(load: WalkerLoad, speedMs: number, gradePercent: number): number {
  requireInRange("bodyKg", load.bodyKg, 20, 200);
  requireInRange("packKg", load.packKg, 0, 80);
  requireInRange("terrain", load.terrain, 1, 2.1);
  requireInRange("speedMs", speedMs, 0, 3);
  requireInRange("gradePercent", gradePercent, 0, 60);
  const { bodyKg: body, packKg: pack } = load;
  const moving = 1.5 * speedMs ** 2 + 0.35 * speedMs * gradePercent;
  return 1.5 * body + 2 * (body + pack) * (pack / body) ** 2 + load.terrain * (body + pack) * moving;
}

/**
 * Power downhill, W: Pandolf with the negative grade, less
 * CF = η [G (W + L) V / 3.5 − (W + L)(G + 6)² / W + 25 − V²].
 * Source: W. R. Santee and others, US Army Research Institute of Environmental Medicine (2001, 2003; from memory). It
 * fits readings at −4 % to −12 %; steeper grades are taken as −12 %, and the result is never below standing still.
 * @param gradePercent −60…0
 */
export function santeePowerW(load: WalkerLoad, speedMs: number, gradePercent: number): number {
  requireInRange("gradePercent", gradePercent, -60, 0);
  const grade = Math.max(gradePercent, -12);
  const { bodyKg: body, packKg: pack, terrain } = load;
  const all = body + pack;
  const standing = pandolfPowerW(load, 0, 0);
  const level = pandolfPowerW(load, speedMs, 0) + terrain * all * 0.35 * speedMs * grade;
  const correction = terrain * ((grade * all * speedMs) / 3.5 - (all * (grade + 6) ** 2) / body + 25 - speedMs ** 2);
  return Math.max(standing, level - correction);
}

/**
 * Power on a slope, W. Between level and −4 %, below which Santee's fit begins, linear between the two relations.
 * @param slope rise ÷ run; beyond ±0.6 taken as ±0.6
 */
export function walkingPowerW(load: WalkerLoad, speedMs: number, slope: number): number {
  const grade = Math.min(60, Math.max(-60, slope * 100));
  if (grade >= 0) return pandolfPowerW(load, speedMs, grade);
  if (grade <= -4) return santeePowerW(load, speedMs, grade);
  const share = -grade / 4;
  return pandolfPowerW(load, speedMs, 0) * (1 - share) + santeePowerW(load, speedMs, -4) * share;
}

/**
 * Cost of walking on a slope, J per kg and metre, for slopes of −0.45…0.45 (steeper: as at the end).
 * Source: A. E. Minetti and others, J. Appl. Physiol. 93 (2002) 1039, the independent comparison.
 */
export function minettiCostJKgM(slope: number): number {
  const i = Math.min(0.45, Math.max(-0.45, slope));
  return 280.5 * i ** 5 - 58.7 * i ** 4 - 76.8 * i ** 3 + 51.9 * i ** 2 + 19.6 * i + 2.5;
}

/** Work against gravity alone, J: the floor under any estimate. */
export function liftingWorkJ(massKg: number, ascentM: number): number {
  return massKg * STANDARD_GRAVITY_MS2 * ascentM;
}

/** Heat as the wet-bulb globe temperature in °C at which each row of the table begins; "cool" is below the first. */
export const HEAT_ROWS = ["cool", "warm", "hot", "very-hot", "severe", "extreme"] as const;
export type Heat = (typeof HEAT_ROWS)[number];
export type Work = "easy" | "moderate" | "hard";

/**
 * Water for each hour, US quarts, by heat category 1 (78–81.9 °F) to 5 (over 90 °F).
 * Source: TB MED 507 / AFPAM 48-152, Heat Stress Control and Heat Casualty Management, table of fluid replacement.
 */
const QUARTS_PER_HOUR: Readonly<Record<Work, readonly number[]>> = {
  easy: [0.5, 0.5, 0.75, 0.75, 1],
  moderate: [0.75, 0.75, 0.75, 0.75, 1],
  hard: [0.75, 1, 1, 1, 1],
};
/** What individuals need more or less (same source), and what nobody should exceed: 1½ quarts an hour, 12 a day. */
const QUARTS_SPREAD = 0.25;
const MOST_QUARTS_PER_HOUR = 1.5;
const MOST_QUARTS_PER_DAY = 12;

/** The class of work by its power: about 250, 425 and 600 W in the same source, parted half-way. */
export function workClass(powerW: number): Work {
  if (powerW < 337.5) return "easy";
  return powerW < 512.5 ? "moderate" : "hard";
}

export interface WaterRange {
  /** Null: the source has no row for air so cool. */
  readonly lowL: number | null;
  readonly highL: number;
}

/** Water drunk while walking, litres. In cooler air than the table begins with, its first row is the upper bound. */
export function waterWhileWalkingL(powerW: number, hours: number, heat: Heat): WaterRange {
  requireInRange("hours", hours, 0, 24);
  const row = QUARTS_PER_HOUR[workClass(powerW)];
  const index = HEAT_ROWS.indexOf(heat) - 1;
  const rate = row[Math.max(0, index)] ?? MOST_QUARTS_PER_HOUR;
  const litres = (quartsPerHour: number) =>
    Math.min(Math.min(quartsPerHour, MOST_QUARTS_PER_HOUR) * hours, MOST_QUARTS_PER_DAY) * LITRES_PER_QUART;
  if (index < 0) return { lowL: null, highL: litres(rate) };
  return { lowL: litres(rate - QUARTS_SPREAD), highL: litres(rate + QUARTS_SPREAD) };
}
