import { requireInRange } from "./constants";
import { breakoutFactor } from "./deadman";
import type { GroundNumbers } from "./ground";

/** Turning the screw in disturbs the ground above the helix (judgement). */
export const SCREW_DISTURBANCE = 0.7;

/**
 * Upward resistance of a single helix, N.
 * Undrained: N_c·s_u·A, N_c rising with depth to 9 at five diameters (N_c = 9·min(1, H/5D), judgement between the
 * published deep value and none at the surface). Sand: Meyerhof & Adams breakout of a round plate. Snow: bearing × area.
 * @throws RangeError for dimensions that are not physical
 * Source: N_c = 9, Q = Σ A_h(c·N_c + q'·N_q) (helical pile practice); Meyerhof & Adams (1968).
 */
export function helixUpliftN(
  helixDiameterM: number,
  depthM: number,
  ground: Exclude<GroundNumbers, { kind: "undriveable" }>,
): number {
  requireInRange("anchor.helixDiameterM", helixDiameterM, 0.01, 0.6);
  const areaM2 = (Math.PI / 4) * helixDiameterM * helixDiameterM;
  switch (ground.kind) {
    case "undrained":
      return 9 * Math.min(1, depthM / (5 * helixDiameterM)) * ground.shearStrengthPa * areaM2;
    case "frictional":
      return (
        breakoutFactor(ground.frictionAngleDeg, depthM / helixDiameterM, 1) * ground.unitWeightNm3 * areaM2 * depthM
      );
    case "snow":
      return ground.bearingPa * areaM2;
  }
}
