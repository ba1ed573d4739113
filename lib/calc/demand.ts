import { itemAt } from "./indexed";
import type { ShelterAnalysis } from "./types";

/** Demand on a tie-out (by its index in the model) at any pressure: linear between the levels. */
export function demandAt(
  analysis: ShelterAnalysis,
  tieOutIndex: number,
  pressurePa: number,
): { pullN: number; lineAngleDeg: number } {
  if (!(pressurePa >= 0)) throw new RangeError("Pressure must be 0 Pa or more.");
  const { levels } = analysis;
  let upper = 1;
  while (upper < levels.length - 1 && itemAt(levels, upper).pressurePa < pressurePa) upper += 1;
  const [low, high] = [itemAt(levels, upper - 1), itemAt(levels, upper)];
  const [from, to] = [itemAt(low.tieOuts, tieOutIndex), itemAt(high.tieOuts, tieOutIndex)];
  const share = (pressurePa - low.pressurePa) / (high.pressurePa - low.pressurePa);
  const angleShare = Math.min(1, share);
  return {
    pullN: from.pullN + (to.pullN - from.pullN) * share,
    lineAngleDeg: from.lineAngleDeg + (to.lineAngleDeg - from.lineAngleDeg) * angleShare,
  };
}

/** Demands of all tie-outs at a pressure, in the model's order: between the levels linear, above the top by its slope. */
export function interpolateDemand(
  analysis: ShelterAnalysis,
  pressurePa: number,
): { tieOutId: string; pullN: number; lineAngleDeg: number }[] {
  return analysis.design.tieOuts.map(({ tieOutId }, index) => ({
    tieOutId,
    ...demandAt(analysis, index, pressurePa),
  }));
}

/** Highest level of pressure, Pa, up to which the shelter itself has a standing shape; null = at every level tried. */
export function standsToPa(analysis: ShelterAnalysis): number | null {
  const fallen = analysis.levels.findIndex((level) => !level.standing);
  if (fallen === -1) return null;
  return fallen === 0 ? 0 : itemAt(analysis.levels, fallen - 1).pressurePa;
}
