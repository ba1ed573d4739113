import { requireInRange } from "./constants";
import { radiansFromDegrees } from "./units";

/** Share of the bearing strength left for a pull straight up, out of a trench filled with broken snow (judgement). */
const LEAST_ANGLE_SHARE = 0.25;

/**
 * What a plate or wide stake buried in snow and pulled from its middle holds: bearing strength × face × cosθ, at least a
 * quarter for steep pulls.
 * @param widthM, lengthM of the plate, 0.02…1 m
 * @param bearingPa bearing strength of the snow
 * @param lineAngleDeg 0…90
 * Source: F = σ_c·A, Bogie & Fortini (ISSW 2010); the fall with line angle is judgement.
 */
export function snowPlateTensionN(widthM: number, lengthM: number, bearingPa: number, lineAngleDeg: number): number {
  requireInRange("anchor.widthM", widthM, 0.02, 1);
  requireInRange("anchor.lengthM", lengthM, 0.02, 1);
  return bearingPa * widthM * lengthM * Math.max(LEAST_ANGLE_SHARE, Math.cos(radiansFromDegrees(lineAngleDeg)));
}
