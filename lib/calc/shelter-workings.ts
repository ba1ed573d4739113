import { itemAt } from "./indexed";
import { panelCoefficients } from "./pressure-coefficients";
import { LINE_PRETENSION_N } from "./shelters/mesh";
import { fabricRow } from "./tables/fabrics";
import { LINE_STIFFNESS_SOURCE, lineStiffnessN } from "./tables/line-stiffness";
import type { ShelterEquilibrium, ShelterNet } from "./tension";
import type { LoadCase, ShelterResponse, ShelterSpec, Working } from "./types";

/** "wind from the front left, lifting": a case in the shelter's own frame. */
export function describeCase(windCase: { readonly relativeWindDeg: number; readonly loadCase: LoadCase }): string {
  const sides = ["front", "front right", "right", "rear right", "rear", "rear left", "left", "front left"];
  const turned = ((windCase.relativeWindDeg % 360) + 360) % 360;
  return `wind from the ${itemAt(sides, Math.round(turned / 45) % 8)}, ${windCase.loadCase}`;
}

/**
 * Factor on what a guy of a tent on hoops pulls: the working mesh is too stiff against swaying. On a mesh twice as fine
 * the guys of dome and tunnel pull up to 1.55 times as much and their hems up to 15 % less (own runs over sizes and
 * pressures; judgement).
 */
export const HOOP_GUY_ALLOWANCE = 1.4;

const hoopAllowance: Working = {
  symbol: "k_g",
  meaning: "Factor on the pull of guys of bent poles, for the size of the mesh",
  value: HOOP_GUY_ALLOWANCE,
  unit: "",
  source: "runs on a finer mesh; judgement",
};

/** The steps from the pressure to the hardest pull, each with its source. */
export function describeShelterWorkings(
  spec: ShelterSpec,
  { model, net }: ShelterNet,
  equilibria: readonly ShelterEquilibrium[],
  design: ShelterResponse,
): Working[] {
  const hardest = design.tieOuts.reduce((best, one) => (one.pullN > best.pullN ? one : best));
  const zones = new Map<string, { sum: number; count: number; source: string }>();
  for (const one of panelCoefficients(model, hardest.relativeWindDeg, hardest.loadCase)) {
    const zone = zones.get(one.zone) ?? { sum: 0, count: 0, source: one.source };
    zones.set(one.zone, { ...zone, sum: zone.sum + one.net, count: zone.count + 1 });
  }
  const fabric = fabricRow(spec.fabric);
  const relaxation = "dynamic relaxation with kinetic damping: Day 1965; Barnes 1999; Lewis 2003";
  return [
    { symbol: "q", meaning: "Velocity pressure at the shelter", value: design.pressurePa, unit: "Pa", source: "wind" },
    {
      symbol: "n",
      meaning: "Wind cases: directions, each pressing and lifting",
      value: equilibria.length,
      unit: "",
      source: "EN 1991-1-4 §7.3(4): both the largest and the smallest load on every canopy",
    },
    {
      symbol: "case",
      meaning: "Case in which a line pulls hardest",
      value: describeCase(hardest),
      unit: "",
      source: "envelope over all cases",
    },
    ...[...zones].map(([zone, { sum, count, source }]): Working => ({
      symbol: "c_p",
      meaning: `Net pressure coefficient in that case, ${zone.replace("-", " ")} (+ presses inward)`,
      value: sum / count,
      unit: "",
      source,
    })),
    {
      symbol: "k",
      meaning: `Stiffness of the cloth, ${fabric.name.toLowerCase()}`,
      value: fabric.stiffnessNPerM,
      unit: "N/m",
      source: fabric.source,
    },
    {
      symbol: "EA",
      meaning: "Stiffness of the lines",
      value: lineStiffnessN(spec.line.material, spec.line.diameterMm),
      unit: "N",
      source: LINE_STIFFNESS_SOURCE,
    },
    {
      symbol: "T₀",
      meaning: "Tension put into each line by hand; the cloth gives, so less remains",
      value: LINE_PRETENSION_N,
      unit: "N",
      source: "judgement",
    },
    { symbol: "N", meaning: "Nodes of the net", value: net.nodeCount, unit: "", source: relaxation },
    {
      symbol: "R",
      meaning: "Largest force left out of balance",
      value: design.residualN,
      unit: "N",
      source: relaxation,
    },
    ...(model.hoops.length > 0 ? [hoopAllowance] : []),
    {
      symbol: "h",
      meaning: "Least head-room left, share of what is drawn; below two thirds it has no standing shape",
      value: Math.min(...equilibria.map((one) => one.headRoomShare)),
      unit: "",
      source: "judgement",
    },
    {
      symbol: "T",
      meaning: `Largest pull, ${itemAt(model.tieOuts, design.tieOuts.indexOf(hardest)).name}`,
      value: hardest.pullN,
      unit: "N",
      source: relaxation,
    },
  ];
}
