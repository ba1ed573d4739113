import { analyseShelter } from "@/lib/calc/analyse-shelter";
import { buildShelter, defaultShelterSpec, SHELTER_KINDS } from "@/lib/calc/shelter-kinds";
import { compileShelter, panelPressures, solveShelterNet } from "@/lib/calc/tension";

/** Times of the tension structure, ms. Limits: median of a 60-node shelter 5 ms; all design cases and knock-outs 500 ms. */
export interface TensionFigures {
  readonly kind: string;
  readonly nodes: number;
  readonly tieOuts: number;
  readonly medianCaseMs: number;
  readonly designAndKnockOutsMs: number;
  readonly wholeAnalysisMs: number;
}

const DIRECTIONS = Array.from({ length: 24 }, (_, index) => index * 15);
const PRESSURE_PA = 200;

const median = (values: readonly number[]): number =>
  [...values].sort((a, b) => a - b)[values.length >> 1] ?? Number.NaN;

export function benchTension(): TensionFigures[] {
  return SHELTER_KINDS.map(({ kind }) => {
    const spec = defaultShelterSpec(kind);
    const model = buildShelter(spec);
    const shelter = compileShelter(model);
    const round = () => {
      const caseMs: number[] = [];
      const start = performance.now();
      for (const relativeWindDeg of DIRECTIONS) {
        for (const loadCase of ["pressing", "lifting"] as const) {
          const from = performance.now();
          const pressures = panelPressures(model, { pressurePa: PRESSURE_PA, relativeWindDeg, loadCase });
          const solved = solveShelterNet(shelter, pressures, {});
          caseMs.push(performance.now() - from);
          if (relativeWindDeg < model.tieOuts.length * 15)
            solveShelterNet(shelter, pressures, { start: solved.positions, withoutTieOut: relativeWindDeg / 15 });
        }
      }
      return { caseMs, totalMs: performance.now() - start };
    };
    round();
    const rounds = [round(), round(), round()];
    const from = performance.now();
    analyseShelter({ spec, relativeWindDirectionsDeg: DIRECTIONS, pressurePa: PRESSURE_PA });
    return {
      kind,
      nodes: model.nodes.length,
      tieOuts: model.tieOuts.length,
      medianCaseMs: median(rounds.flatMap((one) => one.caseMs)),
      designAndKnockOutsMs: median(rounds.map((one) => one.totalMs)),
      wholeAnalysisMs: performance.now() - from,
    };
  });
}

export default async function bench(report: (row: { name: string; value: string; target?: string }) => void) {
  const figures = benchTension();
  for (const { kind, nodes, tieOuts, medianCaseMs, designAndKnockOutsMs, wholeAnalysisMs } of figures) {
    report({
      name: `${kind}, ${nodes} nodes: one case, median`,
      value: `${medianCaseMs.toFixed(2)} ms`,
      target: "≤ 5 ms",
    });
    report({
      name: `${kind}, ${tieOuts} tie-outs: all cases and knock-outs`,
      value: `${designAndKnockOutsMs.toFixed(0)} ms`,
      target: "≤ 500 ms",
    });
    report({ name: `${kind}: whole analysis with levels`, value: `${wholeAnalysisMs.toFixed(0)} ms` });
  }
}
