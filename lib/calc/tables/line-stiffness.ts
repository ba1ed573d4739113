import type { LineMaterialId } from "../types";

/**
 * Secant stiffness of small braided cord per square millimetre of its nominal cross-section, N/mm²: breaking load divided
 * by elongation at break (polyester ≈ 15 %, nylon ≈ 27 %, UHMWPE ≈ 4 % plus what the braid gives). Judgement, rounded.
 */
const STIFFNESS_N_PER_MM2: Readonly<Record<LineMaterialId, number>> = {
  polyester: 2_400,
  nylon: 1_200,
  uhmwpe: 12_000,
};

export const LINE_STIFFNESS_SOURCE = "judgement (breaking load ÷ elongation at break of braided cord)";

/**
 * Axial stiffness EA of a cord, N: the table's value times π·d²/4.
 *
 * @param material what the cord is made of
 * @param diameterMm nominal diameter, mm, 0.5…20
 * @throws RangeError when the diameter is outside its range
 */
export function lineStiffnessN(material: LineMaterialId, diameterMm: number): number {
  if (!(diameterMm >= 0.5 && diameterMm <= 20)) throw new RangeError("Line diameter must be 0.5 to 20 mm.");
  return STIFFNESS_N_PER_MM2[material] * ((Math.PI * diameterMm * diameterMm) / 4);
}
