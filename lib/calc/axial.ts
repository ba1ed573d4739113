import type { GroundNumbers } from "./ground";
import { radiansFromDegrees } from "./units";

/** Share of the ground's strength where soil shears on soil disturbed by driving, between blades (judgement). */
export const BLADE_DISTURBANCE = 0.5;
/**
 * Adhesion of a smooth short shaft as a share of s_u. API RP 2A gives 0.22–0.28 at the stress of stake depth
 * (α = 0.5·ψ^−0.25 with ψ = s_u/σ'_v of 10–25); 0.25 is used.
 */
export const SMOOTH_ADHESION = 0.25;
/** Earth pressure coefficient along a driven displacement pile in tension (NAVFAC DM-7.2: 0.6–1.0, from memory). */
export const TENSION_PRESSURE_COEFFICIENT = 0.8;
/** Friction angle of soil on smooth metal and plastic, degrees (NAVFAC DM-7.2: steel 20°, from memory). */
const SMOOTH_FRICTION_DEG = 20;
/** Timber: ¾φ (NAVFAC DM-7.2, from memory). */
const WOOD_FRICTION_SHARE = 0.75;
/** Over the depth of rotation the back of the stake leaves the ground: friction counts on half the outline (judgement). */
const GAP_SHARE = 0.5;

export interface ShaftInput {
  readonly ground: Exclude<GroundNumbers, { kind: "undriveable" }>;
  readonly perimeterM: number;
  /** Length in ground that resists, m. */
  readonly lengthM: number;
  readonly rotationDepthM: number;
  readonly leanDeg: number;
  readonly isBladed: boolean;
  readonly isWood: boolean;
  /** Multiplies the resistance (pull tests, loosening). */
  readonly strengthFactor: number;
}

export interface ShaftResistance {
  /** Resistance to being drawn out along its own axis, without any sideways force, N. */
  readonly axialN: number;
  /** What each newton of sideways force adds to it in frictional ground. */
  readonly frictionCoefficient: number;
  /** Friction per area that was counted, Pa (mean along the stake). */
  readonly shearPa: number;
}

/** API RP 2A adhesion factor: α = 0.5·ψ^−0.5 (ψ ≤ 1) or 0.5·ψ^−0.25 (ψ > 1), at most 1; ψ = s_u/σ'_v > 0. */
export function apiAdhesionFactor(strengthRatio: number): number {
  return Math.min(1, 0.5 * strengthRatio ** (strengthRatio <= 1 ? -0.5 : -0.25));
}

/**
 * Skin friction of a stake drawn along its axis: α·s_u in undrained ground, (c_a + K·σ'_v·tanδ) in frictional ground,
 * over the outline of the enclosing shape. Between blades soil shears on soil at half its strength.
 * Source: α-method, API RP 2A; K and δ NAVFAC DM-7.2 ch. 5 (from memory); disturbance and gap are judgement.
 */
export function shaftResistance(input: ShaftInput): ShaftResistance {
  const { ground, lengthM } = input;
  const gapM = GAP_SHARE * input.rotationDepthM;
  switch (ground.kind) {
    case "undrained": {
      const shearPa = (input.isBladed ? BLADE_DISTURBANCE : SMOOTH_ADHESION) * ground.shearStrengthPa;
      const axialN = shearPa * input.perimeterM * (lengthM - gapM) * input.strengthFactor;
      return { axialN, frictionCoefficient: 0, shearPa };
    }
    case "frictional": {
      const phi = radiansFromDegrees(ground.frictionAngleDeg);
      const share = input.isBladed ? BLADE_DISTURBANCE : SMOOTH_ADHESION;
      const frictionCoefficient = shaftFriction(phi, input.isBladed, input.isWood);
      const meanStressPa =
        ground.unitWeightNm3 * (ground.looseTopM + (lengthM / 2) * Math.cos(radiansFromDegrees(input.leanDeg)));
      const shearPa = share * ground.cohesionPa + TENSION_PRESSURE_COEFFICIENT * meanStressPa * frictionCoefficient;
      return { axialN: shearPa * input.perimeterM * lengthM * input.strengthFactor, frictionCoefficient, shearPa };
    }
    case "snow": {
      const axialN = ground.shaftAdhesionPa * input.perimeterM * lengthM * input.strengthFactor;
      return { axialN, frictionCoefficient: 0, shearPa: ground.shaftAdhesionPa };
    }
  }
}

function shaftFriction(phi: number, isBladed: boolean, isWood: boolean): number {
  if (isBladed) return BLADE_DISTURBANCE * Math.tan(phi);
  if (isWood) return Math.tan(WOOD_FRICTION_SHARE * phi);
  return Math.tan(Math.min(phi, radiansFromDegrees(SMOOTH_FRICTION_DEG)));
}

/**
 * Tension at which a combination of axial and normal pull fails the ground.
 * Undrained and snow: (axial/V)² + (normal/H)² = 1. Frictional: (axial − tanδ·normal)⁺/V + (normal/H)² = 1, the more
 * cautious linear-square form. A stake that is pushed in counts no axial part; never more than the larger of H and V.
 * @param angleDeg between the line and the stake's normal, degrees: line angle − lean; positive draws the stake out
 * @param normalN H, > 0
 * @param shaft V and tanδ
 * Source: Meyerhof & Yalcin (1984) for clay; Meyerhof (1973) "The uplift capacity of foundations under oblique loads"
 * for sand (forms from memory).
 */
export function obliqueTensionN(
  angleDeg: number,
  normalN: number,
  shaft: { readonly axialN: number; readonly frictionCoefficient: number },
  form: "quadratic" | "linear-square",
): number {
  const sin = Math.sin(radiansFromDegrees(angleDeg));
  const cos = Math.abs(Math.cos(radiansFromDegrees(angleDeg)));
  if (angleDeg <= 0) return normalN;
  const axial = Math.max(0, sin - shaft.frictionCoefficient * cos) / shaft.axialN;
  const normal = cos / normalN;
  const tensionN =
    form === "quadratic"
      ? 1 / Math.sqrt(axial * axial + normal * normal)
      : 2 / (axial + Math.sqrt(axial * axial + 4 * normal * normal));
  return Math.min(tensionN, Math.max(normalN, shaft.axialN));
}
