import { requireInRange } from "./constants";
import { radiansFromDegrees } from "./units";

/** Tension of a line that takes a horizontal force: T = H/cosθ, N. @param lineAngleDeg 0…89 */
export function lineTensionN(horizontalN: number, lineAngleDeg: number): number {
  requireInRange("lineAngleDeg", lineAngleDeg, 0, 89);
  return horizontalN / Math.cos(radiansFromDegrees(lineAngleDeg));
}

/** Vertical pull on the anchor, and press on the pole: V = H·tanθ, N. @param lineAngleDeg 0…89 */
export function lineVerticalN(horizontalN: number, lineAngleDeg: number): number {
  requireInRange("lineAngleDeg", lineAngleDeg, 0, 89);
  return horizontalN * Math.tan(radiansFromDegrees(lineAngleDeg));
}

/** Tension of each of two lines at plan angles ±ψ to the load: T = H/(2·cosθ·cosψ), N. */
export function pairedLineTensionN(horizontalN: number, lineAngleDeg: number, planAngleDeg: number): number {
  requireInRange("planAngleDeg", planAngleDeg, 0, 89);
  return lineTensionN(horizontalN, lineAngleDeg) / (2 * Math.cos(radiansFromDegrees(planAngleDeg)));
}

/**
 * A line's tension in the frame of a stake: axial = T·sin(θ−β), positive drawing it out; normal = T·cos(θ−β).
 * @param tensionN ≥ 0
 * @param lineAngleDeg θ above the ground
 * @param leanDeg β from upright, positive when the head leans away from the pull
 */
export function stakeComponents(
  tensionN: number,
  lineAngleDeg: number,
  leanDeg: number,
): { readonly axialN: number; readonly normalN: number } {
  const angle = radiansFromDegrees(lineAngleDeg - leanDeg);
  return { axialN: tensionN * Math.sin(angle), normalN: tensionN * Math.cos(angle) };
}

/**
 * Two opposite lines of equal stiffness, pre-tension T0, under a sideways force H:
 * T1 = T0 + H/(2cosθ), T2 = T0 − H/(2cosθ) until the lee line is slack, then T1 = H/cosθ.
 */
export function opposedLinesN(
  pretensionN: number,
  horizontalN: number,
  lineAngleDeg: number,
): { readonly windwardN: number; readonly leeN: number } {
  const share = lineTensionN(horizontalN, lineAngleDeg) / 2;
  return share >= pretensionN
    ? { windwardN: 2 * share, leeN: 0 }
    : { windwardN: pretensionN + share, leeN: pretensionN - share };
}

/**
 * Dynamic load factor of a ramp load on an undamped system: DLF = 1 + |sin(πr)|/(πr), r = rise time ÷ natural period.
 * Source: Biggs (1964), Clough & Penzien (form from memory). At r = 0 it is 2.
 */
export function rampLoadFactor(riseToPeriod: number): number {
  requireInRange("riseToPeriod", riseToPeriod, 0, 1e6);
  if (riseToPeriod === 0) return 2;
  const x = Math.PI * riseToPeriod;
  return 1 + Math.abs(Math.sin(x)) / x;
}

/** Stiffness of a line and an elastic cord in series: 1/k = 1/k₁ + 1/k₂, N/m, both > 0. */
export function seriesStiffnessNm(lineNm: number, cordNm: number): number {
  return 1 / (1 / lineNm + 1 / cordNm);
}
