import { analyseShelter } from "./analyse-shelter";
import { rankMends, type TieOutSpot } from "./mend-measure";
import { pitchMends } from "./pitch-mends";
import type { AnalysisRequest } from "./prepare-camp";
import { quickMends } from "./quick-mends";
import type { CampInput, Mend, ShelterAnalysis } from "./types";

export type { TieOutSpot } from "./mend-measure";
export { pitchMends } from "./pitch-mends";
export { quickMends } from "./quick-mends";

/** All that would mend a tie-out, quick ones and those that pitch the shelter otherwise, in one ranking. */
export function mendTieOut(
  camp: CampInput,
  spot: TieOutSpot,
  analyse: (request: AnalysisRequest) => ShelterAnalysis = analyseShelter,
): Mend[] {
  return rankMends([...quickMends(camp, spot), ...pitchMends(camp, spot, analyse)]);
}
