import { demandAt, standsToPa } from "./analyse-shelter";
import { describeTieOut } from "./describe-tie-out";
import { pullCyclesInNight } from "./loosening";
import { buildShelter, referenceHeightM } from "./shelter-kinds";
import { LARGEST_GUST_MS, spotKey, type AnchorsById, type Strength } from "./tie-out-strength";
import type {
  CampInput,
  Gap,
  GroundState,
  PitchedShelter,
  Placement,
  ShelterResult,
  ShelterSpec,
  TieOut,
  TieOutConsequence,
  TieOutResult,
  WindAtShelter,
} from "./types";
import { windAtShelter, windDirections } from "./wind";

/** One tie-out with all that does not depend on the anchor. */
export interface PreparedTieOut {
  readonly tieOut: TieOut;
  readonly name: string;
  readonly ground: GroundState | null;
  /** Its place in the analysis; −1 without one. */
  readonly demandIndex: number;
  readonly demandN: number | null;
  readonly lineAngleDeg: number | null;
  readonly consequence: TieOutConsequence | null;
  /** Demand × consequence, N; null with a gap. */
  readonly weightN: number | null;
  /** 0…100 within the camp. */
  readonly priority: number | null;
  readonly gaps: readonly Gap[];
  /** Results by rigging, filled while placements are evaluated. */
  readonly memo: Map<string, TieOutResult>;
  /** Strengths by rigging, filled while plans are proposed. */
  readonly strengths: Map<string, Strength | null>;
}

/** A tie-out of which everything but the anchor is known. */
export interface KnownTieOut extends PreparedTieOut {
  readonly ground: GroundState;
  readonly demandN: number;
  readonly lineAngleDeg: number;
  readonly weightN: number;
  readonly priority: number;
}

/** Without a gap all of its numbers are there. */
export const isKnownTieOut = (tieOut: PreparedTieOut): tieOut is KnownTieOut => tieOut.gaps.length === 0;

export interface PreparedShelter {
  readonly pitch: PitchedShelter;
  readonly ground: GroundState | null;
  readonly wind: WindAtShelter | null;
  /** Ranked by priority, highest first. */
  readonly tieOuts: readonly PreparedTieOut[];
  readonly gaps: readonly Gap[];
  readonly standing: boolean | null;
  /** Gust of the highest analysed level up to which there is a standing shape, m/s; null with a gap. */
  readonly standsToGustMs: number | null;
  /** True when that is simply the highest level analysed. */
  readonly isStandsToOpen: boolean;
  /** Gusts of the analysed levels, m/s, ascending. */
  readonly checkpointsMs: readonly number[];
  readonly memo: { last: ShelterResult | null };
}

/** A camp with everything that stays when anchors are moved: wind, demands, priorities, names, gaps. */
export interface PreparedCamp {
  readonly input: CampInput;
  readonly anchors: AnchorsById;
  readonly wind: WindAtShelter | null;
  readonly designGustMs: number | null;
  readonly gaps: readonly Gap[];
  /** False when a gap keeps the camp's verdict unknown. */
  readonly isComplete: boolean;
  /** Gusts that pull at the lines in the night; null when the hours of strong wind are not said. */
  readonly nightCycles: number | null;
  readonly shelters: readonly PreparedShelter[];
  /** Best leans by anchor, ground and line angle, filled while plans are proposed. */
  readonly leans: Map<string, number>;
}

/** What to hand to `analyseShelter` for a pitched shelter. */
export interface AnalysisRequest {
  readonly spec: ShelterSpec;
  readonly relativeWindDirectionsDeg: readonly number[];
  readonly pressurePa: number;
}

/**
 * Lightest wind that is analysed, Pa (a gust of about 10 m/s): below it pulls are read off between the levels, so that
 * "holds to" does not end at a breeze.
 */
const LEAST_ANALYSED_PA = 60;

const turn = (angleDeg: number): number => ((angleDeg % 360) + 360) % 360;

/** The tie-outs of a shelter, or the gap that says why there are none. */
function tieOutsOf(pitch: PitchedShelter): { readonly tieOuts: readonly TieOut[]; readonly gaps: readonly Gap[] } {
  try {
    return { tieOuts: buildShelter(pitch.spec).tieOuts, gaps: [] };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return {
      tieOuts: [],
      gaps: [{ field: "shelter.dimensions", message: `${pitch.name} can't be built: ${error.message}` }],
    };
  }
}

/**
 * The analysis that a pitched shelter needs in the camp's wind: directions relative to the shelter (compass − heading,
 * degrees clockwise) and the velocity pressure at its height, Pa, at least LEAST_ANALYSED_PA. With gaps when the wind is not known or the shelter
 * can't be built.
 */
export function designAnalysisRequest(
  camp: Pick<CampInput, "wind">,
  pitch: Pick<PitchedShelter, "name" | "spec" | "headingDeg" | "pitchId" | "patch" | "analysis">,
): AnalysisRequest | { readonly gaps: readonly Gap[] } {
  const { gaps } = tieOutsOf(pitch);
  if (gaps.length > 0) return { gaps };
  const found = windAtShelter(camp.wind, referenceHeightM(pitch.spec));
  if (found.status === "unknown") return { gaps: found.gaps };
  return {
    spec: pitch.spec,
    relativeWindDirectionsDeg: windDirections(camp.wind.fromDeg, camp.wind.toDeg).map((direction) =>
      turn(direction - pitch.headingDeg),
    ),
    pressurePa: Math.max(LEAST_ANALYSED_PA, found.wind.pressurePa),
  };
}

type Draft = Omit<PreparedShelter, "tieOuts"> & { readonly tieOuts: readonly Omit<PreparedTieOut, "priority">[] };

function draftShelter(input: CampInput, pitch: PitchedShelter): Draft {
  const built = tieOutsOf(pitch);
  const gaps: Gap[] = [...built.gaps];
  const ground = pitch.patch === "main" ? input.ground : input.secondGround;
  if (!ground) {
    gaps.push(
      pitch.patch === "main"
        ? { field: "camp.ground", message: "Choose the ground of the camp." }
        : { field: "camp.secondGround", message: "Choose the ground of the second patch." },
    );
  }
  const found = built.gaps.length > 0 ? null : windAtShelter(input.wind, referenceHeightM(pitch.spec));
  const wind = found?.status === "ok" ? found.wind : null;
  if (found?.status === "unknown") gaps.push(...found.gaps);
  const analysis = wind ? pitch.analysis : null;
  const indexOf = new Map(analysis?.design.tieOuts.map((demand, index) => [demand.tieOutId, index]));
  const fits = built.tieOuts.every((tieOut) => indexOf.has(tieOut.id));
  if (wind && (!analysis || !fits)) {
    gaps.push({ field: "shelter.analysis", message: `The pull in the lines of ${pitch.name} is not worked out yet.` });
  }
  const isKnown = analysis !== null && wind !== null && fits;
  const levelsPa = isKnown ? analysis.levels.map((level) => level.pressurePa) : [];
  const fallsAbovePa = isKnown ? standsToPa(analysis) : null;
  const gustAt = (pressurePa: number): number =>
    wind && wind.pressurePerGustSquared > 0 ? Math.sqrt(pressurePa / wind.pressurePerGustSquared) : LARGEST_GUST_MS;
  const { fromDeg, toDeg } = input.wind;
  const windRange = fromDeg === null || toDeg === null ? null : { fromDeg, toDeg };
  const tieOuts = built.tieOuts.map((tieOut) => {
    const demandIndex = isKnown ? (indexOf.get(tieOut.id) ?? -1) : -1;
    const demand = isKnown ? demandAt(analysis, demandIndex, wind.pressurePa) : null;
    const consequence = isKnown ? (analysis.consequences.find((one) => one.tieOutId === tieOut.id) ?? null) : null;
    return {
      tieOut,
      ground,
      name: describeTieOut(tieOut, pitch.headingDeg, windRange),
      demandIndex,
      demandN: demand?.pullN ?? null,
      lineAngleDeg: demand?.lineAngleDeg ?? null,
      consequence,
      weightN: demand ? demand.pullN * (consequence?.consequence ?? 2) : null,
      gaps,
      memo: new Map<string, TieOutResult>(),
      strengths: new Map<string, Strength | null>(),
    };
  });
  return {
    pitch,
    ground,
    wind,
    tieOuts,
    gaps,
    // An analysis may have been made for another pressure; a whisker of it is rounding.
    standing: isKnown ? fallsAbovePa === null || wind.pressurePa <= fallsAbovePa * (1 + 1e-9) : null,
    standsToGustMs: isKnown ? gustAt(fallsAbovePa ?? Math.max(...levelsPa)) : null,
    isStandsToOpen: isKnown && fallsAbovePa === null,
    checkpointsMs: levelsPa.map(gustAt),
    memo: { last: null },
  };
}

function uniqueGaps(gaps: readonly Gap[]): Gap[] {
  return [...new Map(gaps.map((gap) => [`${gap.field} ${gap.message}`, gap])).values()];
}

/**
 * Works out all of a camp that does not depend on which anchor is where. The result also remembers what was computed
 * for a rigging, so keep it while anchors are being moved, and make a new one when wind, ground, shelters or tray change.
 *
 * Priority of a tie-out = 100 · T·C / max over the camp(T·C): its pull in the design gust times what its loss costs
 * (judgement). The camp's wind is the one at its tallest shelter.
 */
export function prepareCamp(input: CampInput): PreparedCamp {
  const drafts = input.shelters.map((pitch) => draftShelter(input, pitch));
  const largest = Math.max(0, ...drafts.flatMap((draft) => draft.tieOuts.map((tieOut) => tieOut.weightN ?? 0)));
  const shelters = drafts.map((draft): PreparedShelter => {
    const tieOuts = draft.tieOuts.map((tieOut) => ({
      ...tieOut,
      priority: tieOut.weightN === null ? null : largest > 0 ? (100 * tieOut.weightN) / largest : 0,
    }));
    tieOuts.sort((a, b) => (b.priority ?? -1) - (a.priority ?? -1) || a.tieOut.number - b.tieOut.number);
    return { ...draft, tieOuts };
  });

  // The forecast gust does not depend on the height; 10 m is where it is given.
  const open = windAtShelter(input.wind, 10);
  let wind: WindAtShelter | null = null;
  for (const shelter of shelters) {
    if (shelter.wind && shelter.wind.pressurePa > (wind?.pressurePa ?? -1)) wind = shelter.wind;
  }
  const blocking = uniqueGaps([
    ...(open.status === "unknown" ? open.gaps : []),
    ...shelters.flatMap((shelter) => shelter.gaps),
    ...(input.shelters.length === 0
      ? [{ field: "camp.shelters", message: "Put a shelter at this camp to see what holds it." }]
      : []),
  ]);
  const night: Gap[] =
    input.strongWindHours === null
      ? [
          {
            field: "camp.strongWindHours",
            message: "Enter the hours of strong wind to see the margins in the morning.",
          },
        ]
      : [];
  return {
    input,
    anchors: new Map(input.tray.map((anchor) => [anchor.id, anchor])),
    wind,
    designGustMs: open.status === "ok" ? open.wind.openGustMs : null,
    gaps: [...blocking, ...night],
    isComplete: blocking.length === 0,
    nightCycles: input.strongWindHours === null ? null : pullCyclesInNight(input.strongWindHours),
    shelters,
    leans: new Map(),
  };
}

export interface PlanProblem {
  readonly pitchId: string;
  readonly tieOutId: string;
  readonly message: string;
}

/**
 * Why placements can't stand as they are, one sentence each: more of an anchor than there is, an anchor or a tie-out
 * that does not exist, a tie-out with two plans. Empty when they can.
 */
export function planProblems(input: CampInput): PlanProblem[] {
  const anchors = new Map(input.tray.map((anchor) => [anchor.id, anchor]));
  const spots = new Set(
    input.shelters.flatMap((pitch) => tieOutsOf(pitch).tieOuts.map((tieOut) => spotKey(pitch.pitchId, tieOut.id))),
  );
  return findPlanProblems(input.placements, anchors, spots);
}

/** The same against known anchors and tie-outs (`spotKey` of each). */
export function findPlanProblems(
  placements: readonly Placement[],
  anchors: AnchorsById,
  spots: ReadonlySet<string>,
): PlanProblem[] {
  const taken = new Set<string>();
  const used = new Map<string, number>();
  const problems: PlanProblem[] = [];
  for (const placement of placements) {
    const { pitchId, tieOutId } = placement;
    const report = (message: string) => problems.push({ pitchId, tieOutId, message });
    const spot = spotKey(pitchId, tieOutId);
    if (!spots.has(spot)) report("That tie-out is no longer at this camp.");
    else if (taken.has(spot)) report("This tie-out was given two plans; keep one.");
    taken.add(spot);
    for (const id of [placement.anchorId, ...(placement.tandem ? [placement.tandem.anchorId] : [])]) {
      const anchor = anchors.get(id);
      if (!anchor) {
        report("That anchor is no longer in the tray.");
        continue;
      }
      const count = (used.get(id) ?? 0) + 1;
      used.set(id, count);
      if (count <= anchor.count) continue;
      report(
        anchor.count === 0
          ? `No ${anchor.name} is in the tray.`
          : `All ${anchor.count} of ${anchor.name} are placed. Lift one first.`,
      );
    }
  }
  return problems;
}
