import { buildShelter, checkShelterSpec } from "./shelter-kinds";
import type { ShelterSpec } from "./types";

/** A tie-out whose line is shorter is pegged at the fabric and needs no cord, m (judgement). */
const LEAST_LINE_M = 0.15;
/** For a knot at each end and a hand to pull with, m (judgement). */
const KNOTS_M = 0.4;
/** Lines are cut to steps that can be told apart in a bag, m. */
const CUT_STEP_M = 0.5;
/** Cord carried on top, share of the total (judgement). */
export const SPARE_SHARE = 0.1;

/** One shelter with the ways it is pitched on the trip. */
export interface CordShelter {
  readonly name: string;
  readonly pitches: readonly ShelterSpec[];
}

/** Guy lines of one length. */
export interface CutLines {
  /** As cut, knots included, m. */
  readonly lengthM: number;
  readonly count: number;
  /** Numbers of the tie-outs. */
  readonly tieOuts: readonly number[];
}

export interface ShelterCord {
  readonly name: string;
  readonly diameterMm: number;
  readonly lines: readonly CutLines[];
  readonly lineCount: number;
  readonly totalM: number;
}

export interface CordNeed {
  readonly shelters: readonly ShelterCord[];
  readonly lineCount: number;
  readonly totalM: number;
  /** On top of it. */
  readonly spareM: number;
}

/** A shelter's guy lines: for each tie-out the longest that it has at any camp, with its knots, cut to half metres. */
export function listShelterCord({ name, pitches }: CordShelter): ShelterCord {
  const longest = new Map<string, { number: number; lengthM: number }>();
  // What can't be built is named where the pitch is planned; it has no lines to cut.
  for (const spec of pitches.filter((one) => checkShelterSpec(one).length === 0)) {
    for (const { id, number, lineLengthM } of buildShelter(spec).tieOuts) {
      if (lineLengthM < LEAST_LINE_M || lineLengthM <= (longest.get(id)?.lengthM ?? 0)) continue;
      longest.set(id, { number, lengthM: lineLengthM });
    }
  }
  const byLength = new Map<number, number[]>();
  for (const { number, lengthM } of longest.values()) {
    const cutM = Math.ceil((lengthM + KNOTS_M) / CUT_STEP_M - 1e-9) * CUT_STEP_M;
    byLength.set(cutM, [...(byLength.get(cutM) ?? []), number]);
  }
  const lines = [...byLength]
    .map(([lengthM, tieOuts]) => ({ lengthM, count: tieOuts.length, tieOuts: tieOuts.sort((a, b) => a - b) }))
    .sort((a, b) => b.lengthM - a.lengthM);
  return {
    name,
    diameterMm: Math.max(0, ...pitches.map((spec) => spec.line.diameterMm)),
    lines,
    lineCount: longest.size,
    totalM: lines.reduce((sum, line) => sum + line.lengthM * line.count, 0),
  };
}

/** The cord that the shelters of a trip need as they are pitched, and a tenth on top, rounded up to the metre. */
export function listCord(shelters: readonly CordShelter[]): CordNeed {
  const own = shelters.filter((shelter) => shelter.pitches.length > 0).map(listShelterCord);
  const totalM = own.reduce((sum, one) => sum + one.totalM, 0);
  return {
    shelters: own.filter((one) => one.lineCount > 0),
    lineCount: own.reduce((sum, one) => sum + one.lineCount, 0),
    totalM,
    spareM: Math.max(0, Math.ceil(totalM * SPARE_SHARE - 1e-9)),
  };
}
