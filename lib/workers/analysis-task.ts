import { analyseShelter } from "@/lib/calc/analyse-shelter";
import type { AnalysisRequest } from "@/lib/calc/camp";
import type { ShelterAnalysis } from "@/lib/calc/types";

/** Pull in every line of a shelter, and what each loss costs: tens to hundreds of milliseconds of pure arithmetic. */
export function computeAnalysis(request: AnalysisRequest): ShelterAnalysis {
  return analyseShelter(request);
}
