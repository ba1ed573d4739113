import { requireInRange } from "./constants";
import { radiansFromDegrees, STANDARD_GRAVITY_MS2 } from "./units";

/** Scatter of friction under a rock or bag (σ of the logarithm, judgement from the ranges of NAVFAC DM-7.02 Table 1). */
export const SURFACE_WEIGHT_SCATTER = 0.2;

/**
 * Tension at which a weight lying on the ground slides towards the pull: T = W(μ·cosω − sinω)/(cosθ + μ·sinθ), the pull
 * downhill. Never more than lifts it: at θ = 90° on level ground T = W.
 * @param massKg 0.1…20 000
 * @param frictionCoefficient μ 0.01…2
 * @param lineAngleDeg θ above the slope, 0…90
 * @param slopeDeg ω 0…35
 * @returns N; 0 when it slides by itself
 * Source: statics of a block; friction NAVFAC DM-7.02 Table 1 (1986).
 */
export function surfaceWeightTensionN(
  massKg: number,
  frictionCoefficient: number,
  lineAngleDeg: number,
  slopeDeg: number,
): number {
  requireInRange("anchor.massKg", massKg, 0.1, 20_000);
  requireInRange("frictionCoefficient", frictionCoefficient, 0.01, 2);
  const theta = radiansFromDegrees(lineAngleDeg);
  const omega = radiansFromDegrees(slopeDeg);
  const weightN = massKg * STANDARD_GRAVITY_MS2;
  const grip = frictionCoefficient * Math.cos(omega) - Math.sin(omega);
  return Math.max(0, (weightN * grip) / (Math.cos(theta) + frictionCoefficient * Math.sin(theta)));
}
