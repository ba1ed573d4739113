import { radiansFromDegrees } from "./units";

/** Ground in front of a leaning stake. */
export interface WedgeInput {
  /** 0 for undrained ground. */
  readonly frictionAngleDeg: number;
  readonly unitWeightNm3: number;
  readonly cohesionPa: number;
  /** Length of the stake in ground that resists, m, > 0. */
  readonly lengthM: number;
  /** Lean from upright, degrees, positive when the head leans away from the pull. */
  readonly leanDeg: number;
  /** Slope of the ground falling away in front of the stake, degrees, ≥ 0. */
  readonly slopeDeg: number;
}

/** Even where the wedge gives nothing some ground is pushed aside; keeps results above zero (judgement). */
const LEAST_FACTOR = 0.02;
const GOLDEN = (Math.sqrt(5) - 1) / 2;
/** The bracket shrinks to 0.0005 rad; the minimum is flat, so the push is off by less than 10⁻⁶ of itself. */
const GOLDEN_STEPS = 16;

/**
 * Lean factor of undrained ground without weight: ψ = cos(β+ω)/(1 + sin(β+ω)); a slope ω acts like more lean.
 * Derived from the sliding wedge below by maximising sin(ρ+ω)·cos(ρ−β).
 */
export function undrainedLeanFactor(leanDeg: number, slopeDeg: number): number {
  const angle = radiansFromDegrees(leanDeg + slopeDeg);
  if (leanDeg + slopeDeg >= 90) return LEAST_FACTOR;
  return Math.max(LEAST_FACTOR, Math.cos(angle) / (1 + Math.sin(angle)));
}

/**
 * Smallest push, N per metre of width, that slides a wedge out in front of a smooth leaning face:
 * P(β) = min over ρ of [W·sin(ρ+φ) + c·ℓ·cosφ]/cos(ρ+φ−β), normal to the stake.
 * Level ground: W = ½γ·L·cosβ·(L·sinβ + L·cosβ·cotρ), ℓ = L·cosβ/sinρ; a slope cuts the top of the wedge away.
 * Source: Coulomb's wedge, equilibrium of a rigid wedge (e.g. Terzaghi 1943, ch. VI); minimum by golden section.
 */
export function wedgePushNm(input: WedgeInput): number {
  const phi = radiansFromDegrees(input.frictionAngleDeg);
  const beta = radiansFromDegrees(input.leanDeg);
  const omega = radiansFromDegrees(input.slopeDeg);
  const heightM = input.lengthM * (Math.cos(beta) - Math.sin(beta) * Math.tan(omega));
  if (heightM <= 0) return 0;
  const backM = input.lengthM * Math.sin(beta);
  const tanOmega = Math.tan(omega);
  const cohesive = input.cohesionPa * Math.cos(phi);
  const push = (rho: number): number => {
    const reachM = heightM / (Math.tan(rho) + tanOmega);
    const weightN = 0.5 * input.unitWeightNm3 * heightM * (backM + reachM);
    return (weightN * Math.sin(rho + phi) + (cohesive * reachM) / Math.cos(rho)) / Math.cos(rho + phi - beta);
  };
  // ρ must stay above the surface (−ω), within a right angle of the stake's normal, and below upright.
  let lo = Math.max(-omega, -phi) + 0.01;
  let hi = Math.min(Math.PI / 2 - 0.02, Math.PI / 2 - phi + beta - 0.01);
  if (hi <= lo) return 0;
  let a = hi - GOLDEN * (hi - lo);
  let b = lo + GOLDEN * (hi - lo);
  let fa = push(a);
  let fb = push(b);
  for (let i = 0; i < GOLDEN_STEPS; i += 1) {
    if (fa <= fb) {
      hi = b;
      b = a;
      fb = fa;
      a = hi - GOLDEN * (hi - lo);
      fa = push(a);
    } else {
      lo = a;
      a = b;
      fa = fb;
      b = lo + GOLDEN * (hi - lo);
      fb = push(b);
    }
  }
  return Math.max(0, Math.min(fa, fb));
}

/**
 * Lean factor ψ(β) on what the ground in front of a stake resists, relative to an upright stake of the same length in
 * level ground: ψ = P(β)/P(0). P(0) is Rankine's ½γL²Kp + 2cL√Kp.
 * @returns > 0; below 1 for a stake leaning back, above 1 leaning towards the pull
 * Source: wedge as above. Published trends: UFC 3-220-01A App. D; plane wedges overstate leans towards the pull beyond 15°.
 */
export function leanFactor(input: WedgeInput): number {
  if (input.frictionAngleDeg < 1) return undrainedLeanFactor(input.leanDeg, input.slopeDeg);
  if (input.leanDeg === 0 && input.slopeDeg === 0) return 1;
  const tan = Math.tan(Math.PI / 4 + radiansFromDegrees(input.frictionAngleDeg) / 2);
  const upright =
    0.5 * input.unitWeightNm3 * input.lengthM * input.lengthM * tan * tan + 2 * input.cohesionPa * input.lengthM * tan;
  return Math.max(LEAST_FACTOR, wedgePushNm(input) / upright);
}
