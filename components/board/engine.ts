/** The calculation as the board uses it: loaded after the page is there, so that the page is there sooner. */
export { analysisKey } from "@/lib/calc/analyse-shelter";
export { evaluatePlacements } from "@/lib/calc/camp";
export { tandemSpacingM } from "@/lib/calc/plan-reinforce";
export { designAnalysisRequest, isKnownTieOut, prepareCamp } from "@/lib/calc/prepare-camp";
export { plainPlacement, rigAtBestLean } from "@/lib/calc/rig-anchor";
export { buildShelter } from "@/lib/calc/shelter-kinds";
