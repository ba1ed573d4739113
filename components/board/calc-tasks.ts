import { analyseShelter } from "@/lib/calc/analyse-shelter";
import type { AnalysisRequest } from "@/lib/calc/camp";
import { pitchMends, quickMends } from "@/lib/calc/mend";
import { proposePlan, type PlanOptions, type PlanProposal } from "@/lib/calc/plan";
import type { CampInput, Mend, ShelterAnalysis } from "@/lib/calc/types";
import type { Spot } from "./plan-change";

/** Work that takes longer than a frame: done in a worker where there is one. */
export interface CalcTasks {
  analyse: { input: AnalysisRequest; output: ShelterAnalysis };
  propose: { input: { camp: CampInput; options: PlanOptions }; output: PlanProposal };
  "quick-mends": { input: { camp: CampInput; spot: Spot }; output: readonly Mend[] };
  "pitch-mends": { input: { camp: CampInput; spot: Spot }; output: readonly Mend[] };
}

export type CalcTaskName = keyof CalcTasks;

export const CALC_TASKS: { [Name in CalcTaskName]: (input: CalcTasks[Name]["input"]) => CalcTasks[Name]["output"] } = {
  analyse: (request) => analyseShelter(request),
  propose: ({ camp, options }) => proposePlan(camp, options),
  "quick-mends": ({ camp, spot }) => quickMends(camp, spot),
  "pitch-mends": ({ camp, spot }) => pitchMends(camp, spot, analyseShelter),
};

export interface CalcMessage<Name extends CalcTaskName = CalcTaskName> {
  readonly id: number;
  readonly name: Name;
  readonly input: CalcTasks[Name]["input"];
}

export type CalcAnswer =
  { readonly id: number; readonly output: unknown } | { readonly id: number; readonly error: string };

export function runTask<Name extends CalcTaskName>(name: Name, input: CalcTasks[Name]["input"]) {
  return CALC_TASKS[name](input);
}
