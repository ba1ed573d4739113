import { assignLexicographic } from "./assignment";
import { marginOf } from "./camp";
import { backWithRocks, doubleUp, type Filled, type PlanRow, type PlanStep } from "./plan-reinforce";
import { isBetter, largestWeight, massUnits, scorePlan, weightedMargin } from "./plan-score";
import { findPlanProblems, isKnownTieOut, prepareCamp, type PlanProblem, type PreparedCamp } from "./prepare-camp";
import { readPlan, rigAtBestLean } from "./rig-anchor";
import { Stock } from "./stock";
import { spotKey } from "./tie-out-strength";
import type { AnchorSpec, CampInput, Placement, TrayAnchor } from "./types";
import { twoDigits } from "./wording";

export interface PlanOptions {
  /** Use what is found at the camp (rocks, trees, sticks), not only what is carried. */
  readonly allowFound: boolean;
  /** Put a second stake in line where one is too weak and stakes are left over. */
  readonly allowDoubling: boolean;
}

export interface PlanProposal {
  readonly placements: readonly Placement[];
  /** What was done, in order, one sentence each. */
  readonly steps: readonly PlanStep[];
  /** What could not be planned, and why. */
  readonly problems: readonly PlanProblem[];
}

/** How much work one is to set, in stakes (judgement); decides only among plans that hold the same and weigh the same. */
export const WORK: Readonly<Record<AnchorSpec["class"], number>> = {
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
  const { tray, rocksAvailable } = prepared.input;
  const { rows, kept, problems } = sortOut(prepared, placements);
  const stock = new Stock(tray, kept);
  const kinds = tray
    .filter((anchor) => (options.allowFound || !anchor.found) && stock.left(anchor.id) > 0)
    .sort((a, b) => compareText(a.id, b.id));

  const steps: PlanStep[] = [];
  const single = assignRows(prepared, rows, kinds, stock);
  const backed = options.allowFound && rocksAvailable ? backWithRocks(prepared, single, steps) : single;
  const filled = options.allowDoubling ? doubleUp(prepared, backed, kinds, stock, steps) : backed;
  const proposal = [...kept, ...[...filled.values()].map((one) => one.placement)];
  for (const { shelter, tieOut } of rows.filter((row) => !filled.has(row))) {
    problems.push({
      pitchId: shelter.pitch.pitchId,
      tieOutId: tieOut.tieOut.id,
      message: `Nothing is left in the tray that holds at tie-out ${tieOut.tieOut.number} of ${shelter.pitch.name}.`,
    });
  }
  const isWorthIt = isBetter(scorePlan(prepared, proposal), scorePlan(prepared, placements));
  if (!isWorthIt && isAllowed(prepared, placements, options)) {
    return { placements, steps: [{ text: "The plan that is there can't be bettered with this tray." }], problems };
  }
  const outcome = describePlan(prepared, proposal, filled.size, rows.length, kept.length);
  return { placements: proposal, steps: [outcome, ...steps], problems };
}

const compareText = (a: string, b: string): number => Number(a > b) - Number(a < b);

/** Tie-outs that are free to fill, placements that stay, and the gaps that keep a tie-out from being planned. */
function sortOut(prepared: PreparedCamp, placements: readonly Placement[]) {
  const placementAt = new Map(placements.map((one) => [spotKey(one.pitchId, one.tieOutId), one]));
  const rows: PlanRow[] = [];
  const kept: Placement[] = [];
  const problems: PlanProblem[] = [];
  for (const shelter of prepared.shelters) {
    const { pitchId } = shelter.pitch;
    for (const tieOut of shelter.tieOuts) {
      const present = placementAt.get(spotKey(pitchId, tieOut.tieOut.id)) ?? null;
      if (!isKnownTieOut(tieOut)) {
        if (present) kept.push(present);
        tieOut.gaps
          .slice(0, 1)
          .forEach(({ message }) => problems.push({ pitchId, tieOutId: tieOut.tieOut.id, message }));
      } else if (present?.pinned) kept.push(present);
      else rows.push({ shelter, tieOut, present });
    }
  }
  // One order whatever the order of the input, so that equal camps get equal plans.
  const nameOf = ({ shelter, tieOut }: PlanRow) => spotKey(shelter.pitch.pitchId, tieOut.tieOut.id);
  rows.sort((a, b) => compareText(nameOf(a), nameOf(b)));
  return { rows, kept, problems };
}

/** The exact step: one anchor for each row, taken from `stock`. */
function assignRows(
  prepared: PreparedCamp,
  rows: readonly PlanRow[],
  kinds: readonly TrayAnchor[],
  stock: Stock,
): Filled {
  const largest = largestWeight(prepared);
  const candidates = rows.map((row) => ({
    row,
    rigged: kinds.map((kind) => rigAtBestLean(prepared, row.shelter, row.tieOut, kind, row.present)),
  }));
  const assignment = assignLexicographic({
    values: candidates.map(({ row, rigged }) =>
      rigged.map((one) => one && weightedMargin(one.strength.dependableN, row.tieOut.weightN, largest)),
    ),
    counts: kinds.map((kind) => stock.left(kind.id)),
    emptyValues: rows.map((row) => weightedMargin(null, row.tieOut.weightN, largest)),
    costs: kinds.map((kind) => [massUnits(kind.massKg), WORK[kind.spec.class]]),
    present: rows.map((row) => kinds.findIndex((kind) => kind.id === row.present?.anchorId)),
  });
  const filled = new Map(
    candidates.flatMap(({ row, rigged }, index) => {
      const one = rigged[assignment[index] ?? -1];
      return one ? [[row, one] as const] : [];
    }),
  );
  for (const { placement } of filled.values()) stock.take(placement.anchorId);
  return filled;
}

function describePlan(
  prepared: PreparedCamp,
  proposal: readonly Placement[],
  filled: number,
  free: number,
  kept: number,
): PlanStep {
  const [weakest] = readPlan(prepared, proposal)
    .flatMap(({ shelter, tieOut, strength }) =>
      strength
        ? [
            {
              margin: marginOf(strength.dependableN, tieOut.demandN),
              at: `${tieOut.tieOut.number} of ${shelter.pitch.name}`,
            },
          ]
        : [],
    )
    .sort((a, b) => a.margin - b.margin);
  const pins = kept > 0 ? ` ${kept} left as ${kept === 1 ? "it was" : "they were"}.` : "";
  const end = weakest ? ` Weakest: tie-out ${weakest.at}, margin ${twoDigits(weakest.margin)}.` : "";
  return { text: `Gave ${filled} of ${free} tie-outs their anchor.${pins}${end}` };
}

/** Whether a plan keeps to the tray and to what the leader allows. */
function isAllowed(prepared: PreparedCamp, placements: readonly Placement[], options: PlanOptions): boolean {
  const spots = new Set(
    prepared.shelters.flatMap(({ pitch, tieOuts }) => tieOuts.map(({ tieOut }) => spotKey(pitch.pitchId, tieOut.id))),
  );
  if (findPlanProblems(placements, prepared.anchors, spots).length > 0) return false;
  const isOfTheGroup = (id: string) => prepared.anchors.get(id)?.found === false;
  return placements.every(
    ({ pinned, tandem, anchorId }) =>
      pinned || ((options.allowDoubling || tandem === null) && (options.allowFound || isOfTheGroup(anchorId))),
  );
}
