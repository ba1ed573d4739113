import { radiansFromDegrees } from "./units";

/**
 * What is left of the resistance in front of a stake that leans, in ground that may slope, relative to an upright stake
 * of the same length in level ground; one factor for the part from the ground's weight, one for the part from cohesion.
 */
export interface LeanFactors {
  readonly weight: number;
  readonly cohesion: number;
}

/** Even where the wedge gives nothing some ground is pushed aside; keeps results above zero (judgement). */
const LEAST_FACTOR = 0.02;

/**
 * Lean factors from the wedge that a smooth leaning face slides out, pushed square to the stake:
 * P(β) = min over ρ of [W·sin(ρ+φ) + c·ℓ·cosφ]/cos(ρ+φ−β), the minimum taken for each part by itself. Their sum is then
 * never more than the minimum of both together, and neither depends on the stake's length.
 * - cohesion: cos(β+ω)·(1 − sinφ)/(1 + sin(β+ω−φ)); for φ = 0 this is cosβ/(1 + sinβ): a slope acts like more lean;
 * - weight: Coulomb's passive coefficient for a smooth leaning face and falling ground, over Rankine's,
 *   (1+r)²·cos²(β+ω)·cosβ/cos²(β+ω−φ) ÷ Kp, r = √(sinφ·sin(φ−ω)/(cosβ·cos(β+ω))).
 * @param frictionAngleDeg φ 0…50°; 0 for undrained ground
 * @param leanDeg β −10…60°, positive when the head leans away from the pull
 * @param slopeDeg ω 0…35°, ground falling away in front; below φ in frictional ground
 * @returns > 0; below 1 for a stake leaning back, above 1 leaning towards the pull
 * Source: Coulomb's wedge (e.g. Terzaghi 1943, ch. VI; passive coefficient as in NAVFAC DM-7.2). Published trends: UFC
 * 3-220-01A App. D; plane wedges overstate leans towards the pull beyond 15°.
 */
export function leanFactors(frictionAngleDeg: number, leanDeg: number, slopeDeg: number): LeanFactors {
  const phi = radiansFromDegrees(frictionAngleDeg);
  const beta = radiansFromDegrees(leanDeg);
  const omega = radiansFromDegrees(slopeDeg);
  const cosFall = Math.cos(beta + omega);
  if (cosFall <= 0) return { weight: LEAST_FACTOR, cohesion: LEAST_FACTOR };
  const sinPhi = Math.sin(phi);
  const cosBeta = Math.cos(beta);
  const cohesion = (cosFall * (1 - sinPhi)) / (1 + Math.sin(beta + omega - phi));
  const root = Math.sqrt((sinPhi * Math.max(0, Math.sin(phi - omega))) / (cosBeta * cosFall));
  const leaning = ((1 + root) * cosFall) / Math.cos(beta + omega - phi);
  const upright = (1 + sinPhi) / (1 - sinPhi);
  return {
    weight: Math.max(LEAST_FACTOR, (leaning * leaning * cosBeta) / upright),
    cohesion: Math.max(LEAST_FACTOR, cohesion),
  };
}
