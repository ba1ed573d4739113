import { evaluateTieOut } from "./camp";
import { prepareCamp, type PreparedCamp, type PreparedShelter, type PreparedTieOut } from "./prepare-camp";
import { isDriven, rigAtBestLean, strengthOf } from "./rig-anchor";
import { spotKey } from "./tie-out-strength";
import type { CampInput, Mend, PitchedShelter, Placement, TieOutResult } from "./types";
import { marginOf } from "./camp";

/** A tie-out of one pitched shelter. */
export interface TieOutSpot {
  readonly pitchId: string;
  readonly tieOutId: string;
}

/** A tie-out with what is there now. */
export interface MendCase {
  readonly prepared: PreparedCamp;
  readonly shelter: PreparedShelter;
  readonly tieOut: PreparedTieOut;
  readonly present: Placement | null;
  readonly now: TieOutResult;
}

/** How much work each mend is, least first (engine order: what is done on the knees before what moves the shelter). */
const ORDER_OF_WORK: readonly Mend["kind"][] = [
  "best-lean",
  "longer-line",
  "swap",
  "shock-cord",
  "rock",
  "tandem",
  "weight-or-deadman",
  "lower-pitch",
  "turn-shelter",
  "other-patch",
];

/** A gain smaller than this share is not worth kneeling down for (judgement). */
const LEAST_GAIN = 0.02;

/** The tie-out of a camp, or null when there is none or something about its pull is not known. */
export function openCase(prepared: PreparedCamp, spot: TieOutSpot): MendCase | null {
  const shelter = prepared.shelters.find((one) => one.pitch.pitchId === spot.pitchId);
  const tieOut = shelter?.tieOuts.find((one) => one.tieOut.id === spot.tieOutId);
  if (!shelter || !tieOut || tieOut.demandN === null || tieOut.gaps.length > 0) return null;
  const key = spotKey(spot.pitchId, spot.tieOutId);
  const present = prepared.input.placements.find((one) => spotKey(one.pitchId, one.tieOutId) === key) ?? null;
  return { prepared, shelter, tieOut, present, now: evaluateTieOut(prepared, shelter, tieOut, present) };
}

/** A mend as far as it is known before it is measured. */
export type MendDraft = Pick<Mend, "kind" | "title" | "detail" | "placements" | "pitchChange">;

/** The draft with its margin and gust; null when it is no better than what is there. */
export function measureMend(one: MendCase, draft: MendDraft, placement: Placement): Mend | null {
  const result = evaluateTieOut(one.prepared, one.shelter, one.tieOut, placement);
  return asMend(one.now, draft, result);
}

/** `result` is the tie-out with the mend done; null when that gains nothing by evening or by morning. */
export function asMend(now: TieOutResult, draft: MendDraft, result: TieOutResult): Mend | null {
  if (result.margin === null || result.holdsToGustMs === null) return null;
  const isStronger = result.margin > (now.margin ?? 0) * (1 + LEAST_GAIN);
  const isLasting =
    draft.kind === "shock-cord" && (result.morningMargin ?? 0) > (now.morningMargin ?? 0) * (1 + LEAST_GAIN);
  if (!isStronger && !isLasting) return null;
  return { ...draft, margin: result.margin, holdsToGustMs: result.holdsToGustMs };
}

/** Mends that reach margin 1 first, in order of work; then the others, the largest margin first. */
export function rankMends(mends: readonly Mend[]): Mend[] {
  const work = (mend: Mend) => ORDER_OF_WORK.indexOf(mend.kind);
  const isEnough = (mend: Mend) => mend.margin >= 1;
  return [...mends].sort((a, b) => {
    if (isEnough(a) !== isEnough(b)) return isEnough(a) ? -1 : 1;
    if (isEnough(a) && work(a) !== work(b)) return work(a) - work(b);
    return b.margin - a.margin || work(a) - work(b) || (a.title < b.title ? -1 : 1);
  });
}

/** The smallest margin of a shelter with these placements; null when none is known. */
function weakestMargin(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  placements: readonly Placement[],
): number | null {
  const placementAt = new Map(placements.map((one) => [spotKey(one.pitchId, one.tieOutId), one]));
  let weakest: number | null = null;
  for (const tieOut of shelter.tieOuts) {
    const placement = placementAt.get(spotKey(shelter.pitch.pitchId, tieOut.tieOut.id));
    const strength = placement ? strengthOf(prepared, shelter, tieOut, placement) : null;
    if (!strength || tieOut.demandN === null) continue;
    const margin = marginOf(strength.dependableN, tieOut.demandN);
    if (weakest === null || margin < weakest) weakest = margin;
  }
  return weakest;
}

/**
 * The shelter pitched otherwise, its single stakes leaned anew; null when that gains nothing at this tie-out, makes the
 * shelter's weakest tie-out weaker, or loses its standing shape.
 */
export function measurePitchChange(one: MendCase, pitch: PitchedShelter, draft: MendDraft): Mend | null {
  const { input } = one.prepared;
  const changed: CampInput = {
    ...input,
    shelters: input.shelters.map((other) => (other.pitchId === pitch.pitchId ? pitch : other)),
  };
  const after = openCase(prepareCamp(changed), { pitchId: pitch.pitchId, tieOutId: one.tieOut.tieOut.id });
  if (!after || (one.shelter.standing === true && after.shelter.standing !== true)) return null;
  const own = input.placements.filter((placement) => placement.pitchId === pitch.pitchId);
  const placements = own.map((placement) => leanAnew(after, placement));
  const before = weakestMargin(one.prepared, one.shelter, own);
  const then = weakestMargin(after.prepared, after.shelter, placements);
  if (before !== null && (then === null || then < before * (1 - LEAST_GAIN / 2))) return null;
  const placement = placements.find((other) => other.tieOutId === one.tieOut.tieOut.id);
  if (!placement) return null;
  const result = evaluateTieOut(after.prepared, after.shelter, after.tieOut, placement);
  const moved = placements.filter((other, index) => other !== own[index]);
  return asMend(one.now, { ...draft, placements: moved }, result);
}

function leanAnew(after: MendCase, placement: Placement): Placement {
  const tieOut = after.shelter.tieOuts.find((one) => one.tieOut.id === placement.tieOutId);
  const anchor = after.prepared.anchors.get(placement.anchorId);
  if (placement.pinned || placement.tandem || !tieOut || !anchor || !isDriven(anchor.spec)) return placement;
  const rigged = rigAtBestLean(after.prepared, after.shelter, tieOut, anchor, placement);
  if (!rigged) return placement;
  const held = strengthOf(after.prepared, after.shelter, tieOut, placement)?.dependableN ?? 0;
  return rigged.strength.dependableN > held * (1 + LEAST_GAIN) ? rigged.placement : placement;
}
