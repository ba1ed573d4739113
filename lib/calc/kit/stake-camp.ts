import { assignLexicographic } from "../assignment";
import { marginOf } from "../camp";
import { itemAt } from "../indexed";
import { WORK } from "../plan";
import { rigInLine } from "../plan-reinforce";
import { massUnits } from "../plan-score";
import type { Placement } from "../types";
import { morningOf, morningValue, type KindAtTieOut, type ReadCamp, type TieOutChoice } from "./read-camp";

export interface StakedCamp {
  readonly placements: readonly Placement[];
  /** Smallest of what holds ÷ what pulls after the windy night; null when a tie-out stays empty or is pinned. */
  readonly weakest: { readonly margin: number; readonly label: string } | null;
}

/**
 * The best staking plan of a camp with a kit in which every need can be met: only anchors that hold in the morning, then
 * best in its worst tie-out, second worst and so on, among equals the lightest and the least work. `counts` by bit:
 * the kit, then what of the found things may be used.
 */
export function stakeCamp(read: ReadCamp, counts: readonly number[]): StakedCamp {
  const left = [...counts];
  const pinned = read.tieOuts.filter((choice) => choice.isPinned);
  for (const { present } of pinned) {
    for (const id of [present?.anchorId, present?.tandem?.anchorId]) {
      const at = read.anchors.findIndex((anchor) => anchor.id === id);
      if (at >= 0) left[at] = Math.max(0, itemAt(left, at) - 1);
    }
  }
  const rows = read.tieOuts
    .filter((choice) => !choice.isPinned)
    .flatMap((choice) => Array.from({ length: choice.pieces }, () => choice));
  const assignment = assignLexicographic({
    values: rows.map(({ byKind, kinds, tieOut }) =>
      byKind.map((one, kind) =>
        one && (kinds & (1 << kind)) !== 0 ? morningValue(read.prepared, tieOut, one.morningN) : null,
      ),
    ),
    counts: left,
    emptyValues: rows.map(({ tieOut }) => morningValue(read.prepared, tieOut, null)),
    costs: read.anchors.map((anchor) => [massUnits(anchor.massKg), WORK[anchor.spec.class]]),
    present: rows.map(({ present }) => read.anchors.findIndex((anchor) => anchor.id === present?.anchorId)),
  });
  const given = new Map<TieOutChoice, number[]>();
  rows.forEach((choice, at) => {
    const kind = assignment[at] ?? null;
    if (kind !== null) given.set(choice, [...(given.get(choice) ?? []), kind]);
  });
  const placed = [...given].flatMap(([choice, kinds]) => rig(read, choice, kinds));
  const isWhole = placed.length === read.tieOuts.length - pinned.length;
  const [weakest] = placed.map(({ margin, label }) => ({ margin, label })).sort((a, b) => a.margin - b.margin);
  return {
    placements: [...pinned.flatMap((choice) => choice.present ?? []), ...placed.map((one) => one.placement)],
    weakest: isWhole ? (weakest ?? null) : null,
  };
}

/** The placement of one tie-out with its one or two pieces, and its margin in the morning; none when a piece is missing. */
function rig(read: ReadCamp, choice: TieOutChoice, kinds: readonly number[]) {
  const { shelter, tieOut, label, byKind, pieces } = choice;
  const [first, second] = kinds.map((kind) => byKind[kind] ?? null);
  if (!first || kinds.length < pieces) return [];
  const isAlike = !second || kinds[0] === kinds[1];
  const rigged = isAlike ? first.rigged : pairOf(read, choice, first, second);
  const morningN = rigged && morningOf(read.prepared, shelter, tieOut, rigged.placement);
  return rigged && morningN !== null
    ? [{ placement: rigged.placement, margin: marginOf(morningN, tieOut.demandN), label }]
    : [];
}

/** Two different kinds in line; both come as pairs of their own kind, of which the front one is taken. */
function pairOf(read: ReadCamp, { shelter, tieOut }: TieOutChoice, first: KindAtTieOut, second: KindAtTieOut) {
  const { anchor, placement } = first.rigged;
  const single = { anchor, placement: { ...placement, anchorId: anchor.id, tandem: null } };
  return rigInLine(read.prepared, shelter, tieOut, single, second.rigged.anchor);
}
