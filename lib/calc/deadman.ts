import { requireInRange } from "./constants";
import type { GroundNumbers } from "./ground";
import { itemAt } from "./indexed";
import { radiansFromDegrees } from "./units";

/** Backfill over a buried body is disturbed: share of cohesive strength that it keeps (judgement). */
export const BACKFILL_STRENGTH = 0.5;
/** Ovesen & Stromann factor C_ov for loose ground (14; dense 19), from memory: the smaller is used. */
const OVESEN_LOOSE = 14;
const K_AT_REST_TENG = 0.4;
/** K_u of Meyerhof & Adams, nearly constant for φ 30–48°. */
const UPLIFT_COEFFICIENT = 0.95;

/** m and critical depth ratio of Meyerhof & Adams (1968) by φ, from memory: [φ°, m, (H/B)cr]. */
const MEYERHOF_ADAMS: readonly (readonly [number, number, number])[] = [
  [20, 0.05, 2.5],
  [25, 0.1, 3],
  [30, 0.15, 4],
  [35, 0.25, 5],
  [40, 0.35, 7],
  [45, 0.5, 9],
];

function interpolateShape(frictionAngleDeg: number): { readonly m: number; readonly criticalRatio: number } {
  const clamped = Math.min(45, Math.max(20, frictionAngleDeg));
  const upper = Math.max(
    1,
    MEYERHOF_ADAMS.findIndex(([phi]) => phi >= clamped),
  );
  const [phi0, m0, c0] = itemAt(MEYERHOF_ADAMS, upper - 1);
  const [phi1, m1, c1] = itemAt(MEYERHOF_ADAMS, upper);
  const share = (clamped - phi0) / (phi1 - phi0);
  return { m: m0 + (m1 - m0) * share, criticalRatio: c0 + (c1 - c0) * share };
}

/**
 * Breakout factor F_q of a horizontal rectangular plate drawn straight up in sand, Q = F_q·γ·A·H.
 * F_q = 1 + {[1 + 2m·H/h]·(h/B) + 1}·(H/h)·K_u·tanφ; a square is the case B = h. Below the critical depth the shape
 * term stays at its critical ratio.
 * @param depthRatio H/h, depth over the short side, ≥ 0
 * @param sideRatio h/B, short over long side, 0…1 (0 = strip)
 * Source: Meyerhof & Adams (1968), Das, Earth Anchors (constants from memory).
 */
export function breakoutFactor(frictionAngleDeg: number, depthRatio: number, sideRatio: number): number {
  const { m, criticalRatio } = interpolateShape(frictionAngleDeg);
  return breakoutFactorWith(
    m,
    UPLIFT_COEFFICIENT * Math.tan(radiansFromDegrees(frictionAngleDeg)),
    criticalRatio,
    depthRatio,
    sideRatio,
  );
}

/** The same with the shape constant m and K_u·tanφ given, for comparison with published worked values. */
export function breakoutFactorWith(
  m: number,
  upliftTan: number,
  criticalRatio: number,
  depthRatio: number,
  sideRatio: number,
): number {
  const shape = 1 + 2 * m * Math.min(depthRatio, criticalRatio);
  return 1 + (shape * sideRatio + 1) * depthRatio * upliftTan;
}

/**
 * Bearing factor of a plate in undrained ground, F = 9·r/(0.41 + 0.59·r), r = (H/h)/(H/h)_cr ≤ 1,
 * (H/h)_cr = 4.7 + 0.0029·s_u[kPa] ≤ 7; for a long plate 9·(0.825 + 0.175·h/B).
 * Source: Das, Earth Anchors, vertical square plates in clay (from memory).
 */
export function undrainedPlateFactor(shearStrengthPa: number, depthRatio: number, sideRatio: number): number {
  const critical = Math.min(7, 4.7 + 0.0029 * (shearStrengthPa / 1000));
  const r = Math.min(1, depthRatio / critical);
  return (9 * (0.825 + 0.175 * sideRatio) * r) / (0.41 + 0.59 * r);
}

/** Rankine's passive coefficient, level ground. */
export function rankinePassive(frictionAngleDeg: number): number {
  return Math.tan(Math.PI / 4 + radiansFromDegrees(frictionAngleDeg) / 2) ** 2;
}

/**
 * Teng's short buried wall, face up to the surface: B(P_p − P_a) + ⅓·K₀·γ·(√Kp + √Ka)·H³·tanφ, N.
 * Source: Teng (1962), Foundation Design (from memory).
 */
export function tengWallN(unitWeightNm3: number, frictionAngleDeg: number, widthM: number, depthM: number): number {
  const kp = rankinePassive(frictionAngleDeg);
  const ka = 1 / kp;
  const ends =
    (K_AT_REST_TENG / 3) *
    unitWeightNm3 *
    (Math.sqrt(kp) + Math.sqrt(ka)) *
    depthM ** 3 *
    Math.tan(radiansFromDegrees(frictionAngleDeg));
  return 0.5 * unitWeightNm3 * depthM * depthM * (kp - ka) * widthM + ends;
}

/** Ovesen & Stromann's reduction for a face that does not reach the surface: (C + 1)/(C + H/h) (from memory). */
export function ovesenReduction(depthRatio: number, factor = OVESEN_LOOSE): number {
  return (factor + 1) / (factor + Math.max(1, depthRatio));
}

/**
 * Ghaly's relation for vertical plates pulled sideways in sand: P = (5.4/tanφ)·(H²/A)^0.28·γ·A·H, N.
 * For comparison only. Source: Ghaly (1997), from memory.
 */
export function ghalyPlateN(unitWeightNm3: number, frictionAngleDeg: number, areaM2: number, depthM: number): number {
  return (
    (5.4 / Math.tan(radiansFromDegrees(frictionAngleDeg))) *
    (depthM ** 2 / areaM2) ** 0.28 *
    unitWeightNm3 *
    areaM2 *
    depthM
  );
}

export interface DeadmanInput {
  /** Across the pull, m. */
  readonly widthM: number;
  /** Height of its face, m; it is taken to be as thick as it is high. */
  readonly heightM: number;
  /** Ground surface to its lower edge, m. */
  readonly depthM: number;
  readonly lineAngleDeg: number;
  readonly ground: Exclude<GroundNumbers, { kind: "undriveable" }>;
  /** Multiplies the resistance of the ground (slope, pull tests, loosening). */
  readonly strengthFactor: number;
}

export interface DeadmanResistance {
  readonly horizontalN: number;
  readonly upliftN: number;
  readonly tensionN: number;
}

/**
 * What a body buried crosswise holds: Teng's wall with Ovesen's reduction (sand) or a plate factor (clay) for a level
 * pull, Meyerhof & Adams breakout through the backfill for an upward pull, and between the two by line angle
 * (cosθ/H)² + (sinθ/V)² = 1. In snow: bearing strength × face for a level pull, and through broken snow half of it upward.
 * @throws RangeError for dimensions that are not physical, or a body higher than its depth
 * Source: see the functions above; interpolation after Meyerhof (1973); snow: ISSW 2010 papers, F = σ_c·A.
 */
export function deadmanResistance(input: DeadmanInput): DeadmanResistance {
  requireInRange("anchor.widthM", input.widthM, 0.02, 10);
  requireInRange("anchor.heightM", input.heightM, 0.005, 2);
  requireInRange("anchor.depthM", input.depthM, input.heightM, 5);
  const { ground, heightM, widthM } = input;
  // A loose top layer adds no resistance: the body lies that much shallower.
  const depthM = Math.max(heightM * 0.5, input.depthM - ground.looseTopM);
  const face = widthM * heightM;
  const depthRatio = depthM / Math.min(heightM, widthM);
  const sideRatio = Math.min(heightM, widthM) / Math.max(heightM, widthM);
  let horizontalN: number;
  let upliftN: number;
  switch (ground.kind) {
    case "undrained":
      horizontalN = undrainedPlateFactor(ground.shearStrengthPa, depthRatio, sideRatio) * ground.shearStrengthPa * face;
      upliftN = horizontalN * BACKFILL_STRENGTH + ground.unitWeightNm3 * face * depthM;
      break;
    case "frictional": {
      const kp = rankinePassive(ground.frictionAngleDeg);
      const reduction = ovesenReduction(depthM / heightM);
      const cohesive = 2 * ground.cohesionPa * Math.sqrt(kp) * widthM * Math.min(depthM, heightM);
      horizontalN = reduction * tengWallN(ground.unitWeightNm3, ground.frictionAngleDeg, widthM, depthM) + cohesive;
      upliftN = breakoutFactor(ground.frictionAngleDeg, depthRatio, sideRatio) * ground.unitWeightNm3 * face * depthM;
      break;
    }
    case "snow":
      horizontalN = ground.bearingPa * face;
      upliftN = horizontalN * BACKFILL_STRENGTH;
      break;
  }
  horizontalN *= input.strengthFactor;
  upliftN *= input.strengthFactor;
  const theta = radiansFromDegrees(input.lineAngleDeg);
  const tensionN = 1 / Math.sqrt((Math.cos(theta) / horizontalN) ** 2 + (Math.sin(theta) / upliftN) ** 2);
  return { horizontalN, upliftN, tensionN };
}
