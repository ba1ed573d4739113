import { FIVE_PERCENT_QUANTILE } from "@/lib/calc/constants";
import { groundRow } from "@/lib/calc/ground";
import type { ReadingInfluence } from "@/lib/calc/learning";
import type { GroundKind } from "@/lib/calc/types";
import { drawCurve, readLogged, type PatchLearning } from "@/lib/domain/pull-test/learn";
import { newtonsOf } from "@/lib/domain/pull-test/schema";
import type { GroundLearningView, PullFit, PullTestView } from "@/lib/domain/pull-test/views";
import type { PullTestRow } from "./internal";

/** Readings on one page; the rest is in the table that can be taken out. */
export const PAGE_SIZE = 100;

export function toFit(row: PullTestRow, hereKind: GroundKind | null, influence: ReadingInfluence | undefined): PullFit {
  const kind = row.outcome === "came-out" ? "exact" : "at-least";
  const read = readLogged(row);
  if (row.isOff) {
    const ratio = read.status === "says-nothing" ? null : newtonsOf(row) / read.prediction.groundMedianN;
    return { status: "off", ratio, kind };
  }
  if (row.ground.kind !== hereKind) return { status: "other-ground", groundName: groundRow(row.ground.kind).name };
  if (read.status === "says-nothing") return { status: "says-nothing" };
  const { groundMedianN } = read.prediction;
  const ratio = newtonsOf(row) / groundMedianN;
  if (read.status === "implausible" || !influence) return { status: "implausible", groundMedianN, ratio };
  return { status: "counts", kind, groundMedianN, ratio, ...influence };
}

export function toPullTestView(row: PullTestRow, fit: PullFit, hasPhoto: boolean): PullTestView {
  return {
    id: row.id,
    patch: row.patch,
    place: row.place,
    anchorName: row.anchorName,
    anchor: row.anchor,
    ground: row.ground,
    groundName: groundRow(row.ground.kind).name,
    leanDeg: row.leanDeg,
    lineAngleDeg: row.lineAngleDeg,
    depthOutM: row.depthOutM,
    force: row.force,
    forceUnit: row.forceUnit,
    forceN: newtonsOf(row),
    outcome: row.outcome,
    note: row.note,
    isOff: row.isOff,
    pulledAt: row.pulledAt.toISOString(),
    loggedByName: row.loggedByName,
    version: row.version,
    hasPhoto,
    fit,
  };
}

export function toGroundLearningView(kind: GroundKind, learning: PatchLearning): GroundLearningView {
  const { result, input } = learning;
  const dependable = (factor: number, scatter: number) => factor * Math.exp(-FIVE_PERCENT_QUANTILE * scatter);
  return {
    kind,
    groundName: groundRow(kind).name,
    from: learning.from,
    ownCount: learning.ownCount,
    elsewhereCount: learning.elsewhereCount,
    placeCount: learning.placeCount,
    factor: result.factor,
    lowFactor: result.from,
    highFactor: result.to,
    dependableFactor: dependable(result.factor, result.scatter) / dependable(1, input.tableScatter),
    scatter: result.scatter,
    tableScatter: input.tableScatter,
    curve: drawCurve(learning),
  };
}
