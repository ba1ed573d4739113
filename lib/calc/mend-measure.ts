import { evaluatePlacements, evaluateTieOut, marginOf } from "./camp";
import { isKnownTieOut, prepareCamp, type KnownTieOut, type PreparedCamp, type PreparedShelter } from "./prepare-camp";
import { isDriven, readPlan, rigAtBestLean } from "./rig-anchor";
import { spotKey } from "./tie-out-strength";
import type { CampInput, Mend, PitchedShelter, Placement, TieOutResult, TrayAnchor } from "./types";

/** A tie-out of one pitched shelter. */
export interface TieOutSpot {
  readonly pitchId: string;
  readonly tieOutId: string;
}

/** A tie-out with what is there now. */
export interface MendCase {
  readonly prepared: PreparedCamp;
  readonly shelter: PreparedShelter;
  readonly tieOut: KnownTieOut;
  readonly present: Placement | null;
  /** The anchor that is there; null when none is, or one that left the tray. */
  readonly anchor: TrayAnchor | null;
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
  if (!shelter || !tieOut || !isKnownTieOut(tieOut)) return null;
  const key = spotKey(spot.pitchId, spot.tieOutId);
  const present = prepared.input.placements.find((one) => spotKey(one.pitchId, one.tieOutId) === key) ?? null;
  const anchor = (present && prepared.anchors.get(present.anchorId)) ?? null;
  return { prepared, shelter, tieOut, present, anchor, now: evaluateTieOut(prepared, shelter, tieOut, present) };
}

/** A mend as far as it is known before it is measured. */
export type MendDraft = Pick<Mend, "kind" | "title" | "detail" | "placements" | "pitchChange">;

/** The draft with its margin and gust; null when it is no better than what is there. */
export function measureMend(one: MendCase, draft: MendDraft, placement: Placement): Mend | null {
  const result = evaluateTieOut(one.prepared, one.shelter, one.tieOut, placement);
  return asMend(one.now, draft, result);
}

/** `result` is the tie-out with the mend done; null when that gains nothing by evening or, for shock cord, by morning. */
export function asMend(now: TieOutResult, draft: MendDraft, result: TieOutResult): Mend | null {
  const { margin, holdsToGustMs } = result;
  if (margin === null || holdsToGustMs === null) return null;
  const gains = (before: number | null, after: number | null) => (after ?? 0) > (before ?? 0) * (1 + LEAST_GAIN);
  const isGain =
    gains(now.margin, margin) || (draft.kind === "shock-cord" && gains(now.morningMargin, result.morningMargin));
  return isGain ? { ...draft, margin, holdsToGustMs } : null;
}

/** Mends that reach margin 1 first, in order of work; then the others, the largest margin first. */
export function rankMends(mends: readonly Mend[]): Mend[] {
  const work = (mend: Mend) => ORDER_OF_WORK.indexOf(mend.kind);
  const enough = mends.filter((mend) => mend.margin >= 1).sort((a, b) => work(a) - work(b) || b.margin - a.margin);
  const rest = mends.filter((mend) => mend.margin < 1).sort((a, b) => b.margin - a.margin || work(a) - work(b));
  return [...enough, ...rest];
}

/** The smallest margin of a shelter with these placements; Infinity when none is known. */
function weakestMargin(prepared: PreparedCamp, pitchId: string, placements: readonly Placement[]): number {
  return readPlan(prepared, placements)
    .filter(({ shelter }) => shelter.pitch.pitchId === pitchId)
    .reduce(
      (weakest, { tieOut, strength }) =>
        strength ? Math.min(weakest, marginOf(strength.dependableN, tieOut.demandN)) : weakest,
      Infinity,
    );
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
  const moved = leanAnew(after);
  const movedAt = new Map(moved.map((placement) => [placement.tieOutId, placement]));
  const placements = own.map((placement) => movedAt.get(placement.tieOutId) ?? placement);
  const before = weakestMargin(one.prepared, pitch.pitchId, own);
  const then = weakestMargin(after.prepared, pitch.pitchId, placements);
  if (then < before * (1 - LEAST_GAIN / 2)) return null;
  const placement = placements.find((other) => other.tieOutId === one.tieOut.tieOut.id) ?? null;
  const result = evaluateTieOut(after.prepared, after.shelter, after.tieOut, placement);
  const mend = asMend(one.now, { ...draft, placements: moved }, result);
  if (!mend) return null;
  // Every tie-out of the shelter pulls otherwise now: what the whole shelter holds to is what counts.
  const others = input.placements.filter((other) => other.pitchId !== pitch.pitchId);
  const whole = evaluatePlacements(after.prepared, [...others, ...placements]).shelters.find(
    (shelter) => shelter.pitchId === pitch.pitchId,
  );
  return { ...mend, holdsToGustMs: Math.min(mend.holdsToGustMs, whole?.holdsToGustMs ?? mend.holdsToGustMs) };
}

/** The single stakes of the shelter that another lean now makes better; pins stay. */
function leanAnew({ prepared, shelter }: MendCase): Placement[] {
  return readPlan(prepared, prepared.input.placements).flatMap((planned) => {
    const { placement, tieOut, strength } = planned;
    const anchor = placement && prepared.anchors.get(placement.anchorId);
    if (planned.shelter !== shelter || !anchor || !isDriven(anchor.spec) || placement.pinned || placement.tandem)
      return [];
    const rigged = rigAtBestLean(prepared, shelter, tieOut, anchor, placement);
    if (!rigged || rigged.strength.dependableN <= (strength?.dependableN ?? 0) * (1 + LEAST_GAIN)) return [];
    return [rigged.placement];
  });
}
