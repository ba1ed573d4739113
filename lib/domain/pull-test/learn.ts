import { groundRow } from "@/lib/calc/ground";
import {
  learnGround,
  learningCurve,
  readingInfluences,
  type LearnedGround,
  type LearnInput,
  type PullReading,
  type ReadingInfluence,
} from "@/lib/calc/learning";
import { readPull, type ReadPull } from "@/lib/calc/pull-reading";
import type { AnchorSpec, GroundKind } from "@/lib/calc/types";
import type { Preferences } from "../preferences";
import { newtonsOf, type Patch, type PullOutcome, type TestedGround } from "./schema";

/** What the learning needs of a reading, wherever it was made. */
export interface LoggedPull {
  readonly id: string;
  readonly campId: string | null;
  readonly patch: Patch | null;
  readonly ownerId: string | null;
  readonly place: string;
  readonly anchor: AnchorSpec;
  readonly ground: TestedGround;
  readonly leanDeg: number;
  readonly lineAngleDeg: number;
  readonly depthOutM: number;
  readonly force: number;
  readonly forceUnit: Preferences["forceUnit"];
  readonly outcome: PullOutcome;
  readonly isOff: boolean;
}

/** A reading held against the model; a number that the model has no answer for says nothing. */
export function readLogged(pull: LoggedPull): ReadPull {
  try {
    return readPull(pull, newtonsOf(pull), pull.outcome);
  } catch (error) {
    if (error instanceof RangeError) return { status: "says-nothing" };
    throw error;
  }
}

/** One patch of one camp, or one place of a practice field: what is learned there is learned of one ground. */
export function placeKey(pull: LoggedPull): string {
  return pull.campId !== null
    ? `camp ${pull.campId} ${pull.patch ?? "main"}`
    : `field ${pull.ownerId ?? ""} ${pull.place.toLowerCase()}`;
}

function countingReading(pull: LoggedPull): PullReading | null {
  if (pull.isOff) return null;
  const read = readLogged(pull);
  return read.status === "counts" ? read.reading : null;
}

/** Readings that count, one list per place, in the same kind of ground. */
export function groupReadings(pulls: readonly LoggedPull[], kind: GroundKind): ReadonlyMap<string, PullReading[]> {
  const places = new Map<string, PullReading[]>();
  for (const pull of pulls) {
    if (pull.ground.kind !== kind) continue;
    const reading = countingReading(pull);
    if (!reading) continue;
    const key = placeKey(pull);
    const list = places.get(key) ?? [];
    list.push(reading);
    places.set(key, list);
  }
  return places;
}

/** Where the estimate of a ground stands on; the page says it. */
export type LearnedFrom = "own" | "elsewhere" | "table";

export interface PatchLearning {
  readonly input: LearnInput;
  readonly from: LearnedFrom;
  readonly ownCount: number;
  readonly elsewhereCount: number;
  readonly placeCount: number;
  readonly result: LearnedGround;
}

/** What is known of the ground at `here`, from its own readings, then those elsewhere, then the table. */
export function learnPatch(
  places: ReadonlyMap<string, readonly PullReading[]>,
  here: string,
  kind: GroundKind,
  usesElsewhere: boolean,
): PatchLearning {
  const own = places.get(here) ?? [];
  const elsewhere = usesElsewhere ? [...places].flatMap(([key, list]) => (key === here ? [] : [list])) : [];
  const input = { tableScatter: groundRow(kind).scatter, own, elsewhere };
  return {
    input,
    from: own.length > 0 ? "own" : elsewhere.length > 0 ? "elsewhere" : "table",
    ownCount: own.length,
    elsewhereCount: elsewhere.reduce((sum, list) => sum + list.length, 0),
    placeCount: elsewhere.length,
    result: learnGround(input),
  };
}

export type CurvePoint = ReturnType<typeof learningCurve>[number];
const CURVE_POINTS = 121;

export function drawCurve({ input }: Pick<PatchLearning, "input">): readonly CurvePoint[] {
  return learningCurve(input, CURVE_POINTS);
}

/** Influence of each of `shown`, by id, among all of `pulls` at one place; only those that count have one. */
export function listInfluences(
  pulls: readonly LoggedPull[],
  shown: ReadonlySet<string>,
  learning: PatchLearning,
): ReadonlyMap<string, ReadingInfluence> {
  const counted = pulls.flatMap((pull) => {
    const reading = countingReading(pull);
    return reading ? [{ id: pull.id, reading }] : [];
  });
  const indices = counted.flatMap(({ id }, index) => (shown.has(id) ? [index] : []));
  const influences = readingInfluences({ ...learning.input, own: counted.map((one) => one.reading) }, indices);
  return new Map(
    indices.flatMap((index, i) => {
      const [id, influence] = [counted[index]?.id, influences[i]];
      return id && influence ? [[id, influence] as const] : [];
    }),
  );
}
