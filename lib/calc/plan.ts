import { assignLexicographic } from "./assignment";
import { marginOf } from "./camp";
import { isBetter, largestWeight, scorePlan, weightedMargin } from "./plan-score";
import { backWithRocks, doubleUp, type PlanRow } from "./plan-reinforce";
import { findPlanProblems, prepareCamp, type PlanProblem, type PreparedCamp } from "./prepare-camp";
import { rigAtBestLean, strengthOf, type Rigged } from "./rig-anchor";
import { spotKey } from "./tie-out-strength";
import { twoDigits } from "./wording";
import type { AnchorSpec, CampInput, Placement, TrayAnchor } from "./types";

export interface PlanOptions {
  /** Use what is found at the camp (rocks, trees, sticks), not only what is carried. */
  readonly allowFound: boolean;
  /** Put a second stake in line where one is too weak and stakes are left over. */
  readonly allowDoubling: boolean;
}

export interface PlanProposal {
  readonly placements: readonly Placement[];
  /** What was done, in order, one sentence each. */
  readonly steps: readonly { readonly text: string }[];
  /** What could not be planned, and why. */
  readonly problems: readonly PlanProblem[];
}

/** How much work one is to set, in stakes (judgement); decides only among plans that hold the same and weigh the same. */
const WORK: Readonly<Record<AnchorSpec["class"], number>> = {
  natural: 1,
  fixed: 1,
  stake: 1,
  "screw-in": 2,
  "surface-weight": 3,
  "snow-plate": 4,
  deadman: 6,
};

/**
 * The best staking plan of a camp, by the allocation described at `assignLexicographic`: best in its worst tie-out
 * (weighted by consequence), then in its second worst, and so on; among equals the least carried mass, the least work
 * and the fewest changes. Exact over single anchors, each at its best lean, with the knot, shock cord and rock that the
 * tie-out has now. Counts, pins and grounds that can't be driven into are kept. Then, as visible steps and only where a
 * tie-out would not hold: rocks on the lip (when there are rocks and found things are allowed) and a second stake in
 * line from what is left, both in order of priority.
 *
 * Tie-outs with a gap are left as they are and reported. The plan that is there is returned unchanged when it obeys
 * the options and is at least as good.
 */
export function proposePlan(input: CampInput, options: PlanOptions): PlanProposal {
  return proposePreparedPlan(prepareCamp(input), options);
}

/** The same for a prepared camp; `placements` is the plan that is there now. */
export function proposePreparedPlan(
  prepared: PreparedCamp,
  options: PlanOptions,
  placements: readonly Placement[] = prepared.input.placements,
): PlanProposal {
  const placementAt = new Map(placements.map((one) => [spotKey(one.pitchId, one.tieOutId), one]));
  const rows: PlanRow[] = [];
  const kept: Placement[] = [];
  const problems: PlanProblem[] = [];
  for (const shelter of prepared.shelters) {
    for (const tieOut of shelter.tieOuts) {
      const { pitchId } = shelter.pitch;
      const present = placementAt.get(spotKey(pitchId, tieOut.tieOut.id)) ?? null;
      const [gap] = tieOut.gaps;
      if (gap) problems.push({ pitchId, tieOutId: tieOut.tieOut.id, message: gap.message });
      if (present && (present.pinned || gap)) kept.push(present);
      else if (!gap) rows.push({ shelter, tieOut, present });
    }
  }
  // One order whatever the order of the input, so that equal camps get equal plans.
  rows.sort(
    (a, b) =>
      compareText(a.shelter.pitch.pitchId, b.shelter.pitch.pitchId) ||
      compareText(a.tieOut.tieOut.id, b.tieOut.tieOut.id),
  );

  const left = new Map(prepared.input.tray.map((anchor) => [anchor.id, anchor.count]));
  const take = (id: string) => left.set(id, Math.max(0, (left.get(id) ?? 0) - 1));
  for (const placement of kept) {
    take(placement.anchorId);
    if (placement.tandem) take(placement.tandem.anchorId);
  }
  const kinds = prepared.input.tray
    .filter((anchor) => (options.allowFound || !anchor.found) && (left.get(anchor.id) ?? 0) > 0)
    .sort((a, b) => compareText(a.id, b.id));

  const rigged = assignRows(prepared, rows, kinds, left);
  rigged.forEach((one) => one && take(one.placement.anchorId));
  const steps: { text: string }[] = [];
  const backed =
    options.allowFound && prepared.input.rocksAvailable ? backWithRocks(prepared, rows, rigged, steps) : rigged;
  const doubled = options.allowDoubling ? doubleUp(prepared, rows, backed, kinds, left, steps) : backed;

  const proposal = [...kept, ...doubled.flatMap((one) => (one ? [one.placement] : []))];
  const empty = rows.filter((_, index) => !doubled[index]);
  for (const { shelter, tieOut } of empty) {
    problems.push({
      pitchId: shelter.pitch.pitchId,
      tieOutId: tieOut.tieOut.id,
      message: `Nothing is left in the tray that holds at tie-out ${tieOut.tieOut.number} of ${shelter.pitch.name}.`,
    });
  }
  if (
    isAllowed(prepared, placements, options) &&
    !isBetter(scorePlan(prepared, proposal), scorePlan(prepared, placements))
  ) {
    return { placements, steps: [{ text: "The plan that is there can't be bettered with this tray." }], problems };
  }
  return {
    placements: proposal,
    steps: [describePlan(prepared, proposal, rows.length - empty.length, rows.length, kept.length), ...steps],
    problems,
  };
}

const compareText = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

/** The exact step: one anchor for each row. */
function assignRows(
  prepared: PreparedCamp,
  rows: readonly PlanRow[],
  kinds: readonly TrayAnchor[],
  left: ReadonlyMap<string, number>,
): (Rigged | null)[] {
  const largest = largestWeight(prepared);
  const candidates = rows.map((row) =>
    kinds.map((kind) => rigAtBestLean(prepared, row.shelter, row.tieOut, kind, row.present)),
  );
  const kindIndex = new Map(kinds.map((kind, index) => [kind.id, index]));
  const assignment = assignLexicographic({
    values: rows.map((row, index) =>
      (candidates[index] ?? []).map((one) =>
        one ? weightedMargin(one.strength.dependableN, row.tieOut.weightN ?? 0, largest) : null,
      ),
    ),
    counts: kinds.map((kind) => left.get(kind.id) ?? 0),
    emptyValues: rows.map((row) => weightedMargin(null, row.tieOut.weightN ?? 0, largest)),
    // Tenths of a gram: finer than any scale in a pack.
    costs: kinds.map((kind) => [Math.round(kind.massKg * 10_000), WORK[kind.spec.class]]),
    present: rows.map((row) => (row.present ? (kindIndex.get(row.present.anchorId) ?? null) : null)),
  });
  return assignment.map((kind, row) => (kind === null ? null : (candidates[row]?.[kind] ?? null)));
}

function describePlan(
  prepared: PreparedCamp,
  proposal: readonly Placement[],
  filled: number,
  free: number,
  kept: number,
): { text: string } {
  const placementAt = new Map(proposal.map((one) => [spotKey(one.pitchId, one.tieOutId), one]));
  let weakest: { margin: number; text: string } | null = null;
  for (const shelter of prepared.shelters) {
    for (const tieOut of shelter.tieOuts) {
      const placement = placementAt.get(spotKey(shelter.pitch.pitchId, tieOut.tieOut.id));
      const strength = placement ? strengthOf(prepared, shelter, tieOut, placement) : null;
      if (!strength || tieOut.demandN === null) continue;
      const margin = marginOf(strength.dependableN, tieOut.demandN);
      if (weakest && weakest.margin <= margin) continue;
      const text = `tie-out ${tieOut.tieOut.number} of ${shelter.pitch.name}, margin ${twoDigits(margin)}`;
      weakest = { margin, text };
    }
  }
  const pins = kept > 0 ? ` ${kept} left as ${kept === 1 ? "it was" : "they were"}.` : "";
  const end = weakest ? ` Weakest: ${weakest.text}.` : "";
  return { text: `Gave ${filled} of ${free} tie-outs their anchor.${pins}${end}` };
}

/** Whether a plan keeps to the tray and to what the leader allows. */
function isAllowed(prepared: PreparedCamp, placements: readonly Placement[], options: PlanOptions): boolean {
  const spots = new Set(
    prepared.shelters.flatMap(({ pitch, tieOuts }) => tieOuts.map(({ tieOut }) => spotKey(pitch.pitchId, tieOut.id))),
  );
  if (findPlanProblems(placements, prepared.anchors, spots).length > 0) return false;
  return placements.every(
    (one) =>
      one.pinned ||
      ((options.allowDoubling || one.tandem === null) &&
        (options.allowFound || prepared.anchors.get(one.anchorId)?.found === false)),
  );
}
