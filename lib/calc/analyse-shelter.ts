import { itemAt } from "./indexed";
import { buildShelter } from "./shelter-kinds";
import { describeShelterWorkings, HOOP_GUY_ALLOWANCE } from "./shelter-workings";
import { compileShelter, panelPressures, solveShelterNet, type ShelterEquilibrium, type ShelterNet } from "./tension";
import type {
  LoadCase,
  ShelterAnalysis,
  ShelterModel,
  ShelterResponse,
  ShelterSpec,
  TieOut,
  TieOutConsequence,
  TieOutDemand,
} from "./types";

export { demandAt, interpolateDemand, standsToPa } from "./demand";
export { describeCase } from "./shelter-workings";

/** Part of every cache key: goes up whenever any analysis could come out differently. */
export const CALC_VERSION = 2;

/** Pressures at which the response is worked out, as multiples of the design pressure. */
const LEVELS: readonly number[] = [0, 0.1, 0.25, 0.5, 0.75, 1, 1.5, 2.25, 3.5, 5];
/** Halvings of the step between two levels in which the shelter falls: a sixteenth of it remains. */
const HALVINGS = 4;
/** Steps after which a shelter that has lost a tie-out counts as not settled. */
const KNOCK_OUT_LIMIT = 2_000;
/** Steps allowed from the shape of a neighbouring pressure. */
const NEAR_LIMIT = 1_200;
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

const meshAllowance = ({ hoops }: ShelterModel, { kind }: TieOut): number =>
  hoops.length > 0 && kind === "guy" ? HOOP_GUY_ALLOWANCE : 1;

/** Key under which an analysis may be kept: same key, same result. Rounds far below what can matter. */
export function analysisKey(
  spec: ShelterSpec,
  relativeWindDirectionsDeg: readonly number[],
  pressurePa: number,
): string {
  const sorted = (values: Readonly<Record<string, number>>) =>
    Object.entries(values)
      .map(([key, value]) => `${key}=${value.toFixed(4)}`)
      .sort()
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
 * that govern a tie-out or leave the least head-room at the design pressure, and end with the first at which the shelter
 * falls. Along the levels each pull is the largest so far, so that more wind never asks less of an anchor; where a case
 * does not settle, the pull is taken to grow in proportion to the pressure (judgement).
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
  const design = itemAt(
    levels,
    levels.findIndex((level) => level.pressurePa === pressurePa),
  );
  return {
    design,
    levels,
    consequences: shelter.model.tieOuts.map((_, index) =>
      knockOut(shelter, designCases, itemAt(governing, index), index),
    ),
    workings: describeShelterWorkings(
      spec,
      shelter,
      designCases.map((one) => one.equilibrium),
      design,
    ),
  };
}

/** One case; a shape from which it does not settle soon is given up for the drawn one. */
function solveCase(shelter: ShelterNet, one: WindCase, pressurePa: number, start?: Float64Array): SolvedCase {
  const panelPressurePa = one.unitPressurePa.map((unit) => unit * pressurePa);
  const near = start && solveShelterNet(shelter, panelPressurePa, { start, iterationLimit: NEAR_LIMIT });
  return { ...one, panelPressurePa, equilibrium: near?.settled ? near : solveShelterNet(shelter, panelPressurePa, {}) };
}

/** The settled case in which a tie-out pulls most; the first case when none settles. */
function governingCase(cases: readonly SolvedCase[], tieOut: number): SolvedCase {
  let best = itemAt(cases, 0);
  let bestPullN = -1;
  for (const one of cases) {
    const pullN = itemAt(one.equilibrium.tieOuts, tieOut).pullN;
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

const stands = (cases: readonly SolvedCase[]): boolean => cases.every((one) => one.equilibrium.standing);

/** Responses at every level up to the first at which the shelter falls, pulls made to rise with the pressure. */
function monotoneLevels(
  shelter: ShelterNet,
  governing: readonly SolvedCase[],
  designCases: readonly SolvedCase[],
  pressurePa: number,
): ShelterResponse[] {
  const lowest = designCases.reduce((worst, one) =>
    one.equilibrium.headRoomShare < worst.equilibrium.headRoomShare ? one : worst,
  );
  const followed = [...new Set([...governing, lowest])];
  // Each level starts from the shape of the next one nearer to the design pressure: it is close, so it settles soon.
  const follow = (multiples: readonly number[]): Level[] => {
    const levels: Level[] = [];
    for (const multiple of multiples) {
      const last = levels[levels.length - 1];
      if (multiple > 1 && !(last ? stands(last.cases) : stands(designCases))) break;
      const before = last ? last.cases : followed;
      levels.push({
        multiple,
        cases: before.map((one) =>
          solveCase(shelter, one, multiple * pressurePa, multiple > 0 ? startOf(one) : undefined),
        ),
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
  const fallen = levels.findIndex((level) => !stands(level.cases));
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
    if (stands(level.cases)) lowMultiple = multiple;
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
    const one = governingCase(cases, index);
    const now = itemAt(one.equilibrium.tieOuts, index);
    const demand: TieOutDemand = {
      tieOutId: tieOut.id,
      pullN: one.equilibrium.settled ? now.pullN * meshAllowance(model, tieOut) : 0,
      lineAngleDeg: now.lineAngleDeg,
      relativeWindDeg: one.relativeWindDeg,
      loadCase: one.loadCase,
    };
    if (!before) return demand;
    const earlier = itemAt(before.tieOuts, index);
    if (earlier.pullN * growth <= demand.pullN) return demand;
    return { ...earlier, pullN: earlier.pullN * growth };
  });
  const poles = [...model.poles, ...model.hoops].map((pole, index) => ({
    poleId: pole.id,
    compressionN: Math.max(
      before ? itemAt(before.poles, index).compressionN * growth : 0,
      ...settled.map((one) => itemAt(one.equilibrium.poles, index).compressionN),
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
  governing: SolvedCase,
  tieOut: number,
): TieOutConsequence {
  const tieOutId = itemAt(shelter.model.tieOuts, tieOut).id;
  const falls = (sentence: string): TieOutConsequence => ({ tieOutId, consequence: 2, standing: false, sentence });
  const sameWind = cases.filter((one) => one.relativeWindDeg === governing.relativeWindDeg);
  if (sameWind.some((one) => !one.equilibrium.standing))
    return falls("No standing shape in this wind, with it or without it.");
  let left = { index: 0, pullN: 0 };
  for (const one of sameWind) {
    const { panelPressurePa, equilibrium } = one;
    const options = { start: equilibrium.positions, withoutTieOut: tieOut, iterationLimit: KNOCK_OUT_LIMIT };
    const solved = solveShelterNet(shelter, panelPressurePa, options);
    if (!solved.standing) return falls("Without it: no standing shape.");
    if (one === governing) left = largestPull(solved);
  }
  const before = largestPull(governing.equilibrium).pullN;
  const ratio = before > 0 ? left.pullN / before : 1;
  const consequence = Math.min(2, Math.max(1, ratio));
  const { name } = itemAt(shelter.model.tieOuts, left.index);
  const lowered = name.charAt(0).toLowerCase() + name.slice(1);
  const sentence =
    consequence < 1.05
      ? "Without it the shelter stands and no other pull grows beyond the largest now."
      : `Without it the shelter stands; the largest pull, then at ${lowered}, is ${ratio.toFixed(1)} times what it was.`;
  return { tieOutId, consequence, standing: true, sentence };
}
