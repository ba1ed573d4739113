import { panelCoefficients } from "./pressure-coefficients";
import { buildShelter } from "./shelter-kinds";
import { LINE_PRETENSION_N } from "./shelters/mesh";
import { fabricRow } from "./tables/fabrics";
import { LINE_STIFFNESS_SOURCE, lineStiffnessN } from "./tables/line-stiffness";
import { compileShelter, panelPressures, solveShelterNet, type ShelterEquilibrium, type ShelterNet } from "./tension";
import type {
  LoadCase,
  ShelterAnalysis,
  ShelterResponse,
  ShelterSpec,
  TieOutConsequence,
  TieOutDemand,
  Working,
} from "./types";

/** Part of every cache key: goes up whenever any analysis could come out differently. */
export const CALC_VERSION = 1;

/** Pressures at which the response is worked out, as multiples of the design pressure. */
const LEVELS: readonly number[] = [0, 0.1, 0.25, 0.5, 0.75, 1, 1.5, 2.25, 3.5, 5];
/** Halvings of the step between two levels in which the shelter falls: a sixteenth of it remains. */
const HALVINGS = 4;
const LOAD_CASES: readonly LoadCase[] = ["pressing", "lifting"];

export interface ShelterAnalysisInput {
  readonly spec: ShelterSpec;
  /** Where the wind may come from, degrees clockwise from the shelter's front; at least one. */
  readonly relativeWindDirectionsDeg: readonly number[];
  /** Velocity pressure of the design gust at the shelter, Pa, > 0. */
  readonly pressurePa: number;
}

interface WindCase {
  readonly relativeWindDeg: number;
  readonly loadCase: LoadCase;
  /** Panel pressures at 1 Pa. */
  readonly unitPressurePa: Float64Array;
}

interface SolvedCase extends WindCase {
  readonly panelPressurePa: Float64Array;
  readonly equilibrium: ShelterEquilibrium;
}

/** Key under which an analysis may be kept: same key, same result. Rounds far below what can matter. */
export function analysisKey(
  spec: ShelterSpec,
  relativeWindDirectionsDeg: readonly number[],
  pressurePa: number,
): string {
  const sorted = (values: Readonly<Record<string, number>>) =>
    Object.keys(values)
      .sort()
      .map((key) => `${key}=${(values[key] ?? 0).toFixed(4)}`)
      .join(",");
  return [
    `v${CALC_VERSION}`,
    spec.kind,
    sorted(spec.dimensions),
    spec.fabric,
    `${spec.line.material}-${spec.line.diameterMm.toFixed(2)}`,
    sorted(spec.lineLengthsM),
    relativeWindDirectionsDeg.map((direction) => direction.toFixed(2)).join(","),
    pressurePa.toPrecision(6),
  ].join("|");
}

/**
 * What every line of a shelter pulls in a wind, what its poles carry, whether it stands, and what each tie-out's loss
 * would do.
 *
 * The design response is the envelope over all directions and both load cases. The other levels repeat only the cases
 * that govern a tie-out or leave the least head-room at the design pressure. Along the levels each pull is the largest so
 * far, so that more wind never asks less of an anchor; where a case does not settle, the pull is taken to grow in
 * proportion to the pressure (judgement).
 *
 * @throws RangeError without a direction, for a pressure that is not > 0, or for a spec that can't be built
 */
export function analyseShelter(input: ShelterAnalysisInput): ShelterAnalysis {
  const { spec, relativeWindDirectionsDeg, pressurePa } = input;
  if (relativeWindDirectionsDeg.length === 0) throw new RangeError("Give at least one wind direction.");
  if (!(pressurePa > 0 && Number.isFinite(pressurePa))) throw new RangeError("Pressure must be more than 0 Pa.");
  const shelter = compileShelter(buildShelter(spec));
  const cases = relativeWindDirectionsDeg.flatMap((relativeWindDeg) =>
    LOAD_CASES.map((loadCase): WindCase => ({
      relativeWindDeg,
      loadCase,
      unitPressurePa: panelPressures(shelter.model, { pressurePa: 1, relativeWindDeg, loadCase }),
    })),
  );
  const designCases = cases.map((one) => solveCase(shelter, one, pressurePa));
  const governing = shelter.model.tieOuts.map((_, index) => governingCase(designCases, index));
  const levels = monotoneLevels(shelter, governing, designCases, pressurePa);
  const design = levels.find((level) => level.pressurePa === pressurePa);
  if (!design) throw new RangeError("The design level is missing.");
  return {
    design,
    levels,
    consequences: shelter.model.tieOuts.map((_, index) =>
      knockOut(shelter, designCases, governing[index] ?? designCases[0], index),
    ),
    workings: describeWorkings(spec, shelter, designCases, design),
  };
}

function solveCase(shelter: ShelterNet, one: WindCase, pressurePa: number, start?: Float64Array): SolvedCase {
  const panelPressurePa = one.unitPressurePa.map((unit) => unit * pressurePa);
  return { ...one, panelPressurePa, equilibrium: solveShelterNet(shelter, panelPressurePa, { start }) };
}

/** The settled case in which a tie-out pulls most; the first case when none settles. */
function governingCase(cases: readonly SolvedCase[], tieOut: number): SolvedCase | undefined {
  let best = cases[0];
  let bestPullN = -1;
  for (const one of cases) {
    const pullN = one.equilibrium.tieOuts[tieOut]?.pullN ?? 0;
    if (!one.equilibrium.settled || pullN <= bestPullN) continue;
    best = one;
    bestPullN = pullN;
  }
  return best;
}

interface Level {
  readonly multiple: number;
  readonly cases: readonly SolvedCase[];
}

/** Responses at every level, pulls made to rise with the pressure. */
function monotoneLevels(
  shelter: ShelterNet,
  governing: readonly (SolvedCase | undefined)[],
  designCases: readonly SolvedCase[],
  pressurePa: number,
): ShelterResponse[] {
  const lowest = designCases.reduce((worst, one) =>
    one.equilibrium.headRoomShare < worst.equilibrium.headRoomShare ? one : worst,
  );
  const followed = [...new Set([...governing, lowest])].filter((one) => one !== undefined);
  // Each level starts from the shape of the next one nearer to the design pressure: it is close, so it settles soon.
  const follow = (multiples: readonly number[]): Level[] => {
    const levels: Level[] = [];
    for (const multiple of multiples) {
      const before = levels[levels.length - 1]?.cases ?? followed;
      levels.push({
        multiple,
        cases: before.map((one) => solveCase(shelter, one, multiple * pressurePa, startOf(one))),
      });
    }
    return levels;
  };
  const below = follow(LEVELS.filter((multiple) => multiple < 1).reverse()).reverse();
  const above = follow(LEVELS.filter((multiple) => multiple > 1));
  const levels = [...below, { multiple: 1, cases: designCases }, ...above];
  levels.push(...closeInOnFall(shelter, followed, levels, pressurePa));
  levels.sort((a, b) => a.multiple - b.multiple);
  const responses: ShelterResponse[] = [];
  for (const { multiple, cases } of levels)
    responses.push(envelope(shelter, cases, multiple * pressurePa, responses[responses.length - 1]));
  return responses;
}

/** Halves the step in which the shelter first loses its shape, so that its own limit is known within a few per cent. */
function closeInOnFall(
  shelter: ShelterNet,
  followed: readonly SolvedCase[],
  levels: readonly Level[],
  pressurePa: number,
): Level[] {
  const stands = ({ cases }: Level) => cases.every((one) => one.equilibrium.standing);
  const fallen = levels.findIndex((level) => !stands(level));
  const [low, high] = [levels[fallen - 1], levels[fallen]];
  if (!low || !high) return [];
  const found: Level[] = [];
  let lowMultiple = low.multiple;
  let highMultiple = high.multiple;
  for (let step = 0; step < HALVINGS; step += 1) {
    const multiple = (lowMultiple + highMultiple) / 2;
    const level = {
      multiple,
      cases: followed.map((one) => solveCase(shelter, one, multiple * pressurePa, startOf(one))),
    };
    found.push(level);
    if (stands(level)) lowMultiple = multiple;
    else highMultiple = multiple;
  }
  return found;
}

/** A shape to start from, unless the case fell down: then the drawn one. */
const startOf = (one: SolvedCase): Float64Array | undefined =>
  one.equilibrium.settled ? one.equilibrium.positions : undefined;

function envelope(
  { model }: ShelterNet,
  cases: readonly SolvedCase[],
  pressurePa: number,
  before: ShelterResponse | undefined,
): ShelterResponse {
  const settled = cases.filter((one) => one.equilibrium.settled);
  const growth = before && before.pressurePa > 0 && settled.length < cases.length ? pressurePa / before.pressurePa : 1;
  const tieOuts = model.tieOuts.map((tieOut, index): TieOutDemand => {
    const one = governingCase(cases, index) ?? cases[0];
    const now = one?.equilibrium.tieOuts[index];
    const demand: TieOutDemand = {
      tieOutId: tieOut.id,
      pullN: one?.equilibrium.settled ? (now?.pullN ?? 0) : 0,
      lineAngleDeg: now?.lineAngleDeg ?? tieOut.lineAngleDeg,
      relativeWindDeg: one?.relativeWindDeg ?? 0,
      loadCase: one?.loadCase ?? "pressing",
    };
    const earlier = before?.tieOuts[index];
    if (!earlier || earlier.pullN * growth <= demand.pullN) return demand;
    return { ...earlier, pullN: earlier.pullN * growth };
  });
  const poles = [...model.poles, ...model.hoops].map((pole, index) => ({
    poleId: pole.id,
    compressionN: Math.max(
      (before?.poles[index]?.compressionN ?? 0) * growth,
      ...settled.map((one) => one.equilibrium.poles[index]?.compressionN ?? 0),
    ),
  }));
  const withoutShape = cases
    .filter((one) => !one.equilibrium.standing)
    .map(({ relativeWindDeg, loadCase }) => ({ relativeWindDeg, loadCase }));
  return {
    pressurePa,
    tieOuts,
    poles,
    standing: withoutShape.length === 0 && (before?.standing ?? true),
    withoutShape,
    largestMovementM: Math.max(0, ...settled.map((one) => one.equilibrium.largestMovementM)),
    residualN: Math.max(0, ...settled.map((one) => one.equilibrium.residualN)),
  };
}

const largestPull = (equilibrium: ShelterEquilibrium): { index: number; pullN: number } =>
  equilibrium.tieOuts.reduce((best, { pullN }, index) => (pullN > best.pullN ? { index, pullN } : best), {
    index: 0,
    pullN: 0,
  });

/**
 * The loss of one tie-out in its governing wind. It counts as no standing shape when the shelter falls in that direction
 * in either load case: what the gust lifts it drops again.
 */
function knockOut(
  shelter: ShelterNet,
  cases: readonly SolvedCase[],
  governing: SolvedCase | undefined,
  tieOut: number,
): TieOutConsequence {
  const tieOutId = shelter.model.tieOuts[tieOut]?.id ?? "";
  const falls = (sentence: string): TieOutConsequence => ({ tieOutId, consequence: 2, standing: false, sentence });
  if (!governing) return falls("Without it: no standing shape.");
  const sameWind = cases.filter((one) => one.relativeWindDeg === governing.relativeWindDeg);
  if (sameWind.some((one) => !one.equilibrium.standing))
    return falls("No standing shape in this wind, with it or without it.");
  let left: { index: number; pullN: number } | null = null;
  for (const one of sameWind) {
    const equilibrium = solveWithout(shelter, one, tieOut);
    if (!equilibrium.standing) return falls("Without it: no standing shape.");
    if (one === governing) left = largestPull(equilibrium);
  }
  const before = largestPull(governing.equilibrium).pullN;
  const ratio = left && before > 0 ? left.pullN / before : 1;
  const consequence = Math.min(2, Math.max(1, ratio));
  const name = shelter.model.tieOuts[left?.index ?? 0]?.name ?? "";
  const lowered = name.charAt(0).toLowerCase() + name.slice(1);
  const sentence =
    consequence < 1.05
      ? "Without it the shelter stands and no other pull grows beyond the largest now."
      : `Without it the shelter stands; the largest pull, then at ${lowered}, is ${ratio.toFixed(1)} times what it was.`;
  return { tieOutId, consequence, standing: true, sentence };
}

function solveWithout(shelter: ShelterNet, one: SolvedCase, tieOut: number): ShelterEquilibrium {
  return solveShelterNet(shelter, one.panelPressurePa, { start: one.equilibrium.positions, withoutTieOut: tieOut });
}

/** Demand on a tie-out (by its index in the model) at any pressure: linear between the levels. */
export function demandAt(
  analysis: ShelterAnalysis,
  tieOutIndex: number,
  pressurePa: number,
): { pullN: number; lineAngleDeg: number } {
  const { levels } = analysis;
  let upper = 1;
  while (upper < levels.length - 1 && (levels[upper]?.pressurePa ?? 0) < pressurePa) upper += 1;
  const [low, high] = [levels[upper - 1], levels[upper]];
  const from = low?.tieOuts[tieOutIndex];
  const to = high?.tieOuts[tieOutIndex];
  if (!low || !high || !from || !to) throw new RangeError(`No tie-out ${tieOutIndex} in this analysis.`);
  if (!(pressurePa >= 0)) throw new RangeError("Pressure must be 0 Pa or more.");
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
  return analysis.levels[fallen - 1]?.pressurePa ?? 0;
}

/** "wind from the front left, lifting": a case in the shelter's own frame. */
export function describeCase(windCase: { readonly relativeWindDeg: number; readonly loadCase: LoadCase }): string {
  const sides = ["front", "front right", "right", "rear right", "rear", "rear left", "left", "front left"];
  const turned = ((windCase.relativeWindDeg % 360) + 360) % 360;
  return `wind from the ${sides[Math.round(turned / 45) % 8] ?? "front"}, ${windCase.loadCase}`;
}

function describeWorkings(
  spec: ShelterSpec,
  { model, net }: ShelterNet,
  cases: readonly SolvedCase[],
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
      value: cases.length,
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
    {
      symbol: "h",
      meaning: "Least head-room left, share of what is drawn; below two thirds it has no standing shape",
      value: Math.min(...cases.map((one) => one.equilibrium.headRoomShare)),
      unit: "",
      source: "judgement",
    },
    {
      symbol: "T",
      meaning: `Largest pull, ${model.tieOuts.find((one) => one.id === hardest.tieOutId)?.name ?? hardest.tieOutId}`,
      value: hardest.pullN,
      unit: "N",
      source: relaxation,
    },
  ];
}
