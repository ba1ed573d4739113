import { marginOf } from "./camp";
import type { PreparedCamp, PreparedShelter, PreparedTieOut } from "./prepare-camp";
import { isDriven, rigAtBestLean, strengthOf, type Rigged } from "./rig-anchor";
import { inSentence, twoDigits } from "./wording";
import type { AnchorSpec, Placement, TrayAnchor } from "./types";

/** One tie-out that the proposal is free to fill. */
export interface PlanRow {
  readonly shelter: PreparedShelter;
  readonly tieOut: PreparedTieOut;
  readonly present: Placement | null;
}

/** Rows that have something but would not hold, most important first. */
function weakRows(rows: readonly PlanRow[], rigged: readonly (Rigged | null)[]): number[] {
  return rows
    .map((row, index) => ({ row, index, one: rigged[index] }))
    .filter(({ row, one }) => one && marginOf(one.strength.dependableN, row.tieOut.demandN ?? 0) < 1)
    .sort((a, b) => (b.row.tieOut.priority ?? 0) - (a.row.tieOut.priority ?? 0) || a.index - b.index)
    .map(({ index }) => index);
}

/** A rock that one person carries a few steps, kg (judgement). */
export const USUAL_ROCK_KG = 10;

/**
 * A rock on the lip of each driven anchor that would not hold without, in order of priority, where it helps.
 * `rigged` has one entry per row; a new array comes back and one sentence per rock is added to `steps`.
 */
export function backWithRocks(
  prepared: PreparedCamp,
  rows: readonly PlanRow[],
  rigged: readonly (Rigged | null)[],
  steps: { text: string }[],
): (Rigged | null)[] {
  const next = [...rigged];
  for (const index of weakRows(rows, rigged)) {
    const row = rows[index];
    const one = next[index];
    const anchor = one && prepared.anchors.get(one.placement.anchorId);
    if (!row || !one || !anchor || !isDriven(anchor.spec) || one.placement.rockKg >= USUAL_ROCK_KG) continue;
    const better = rigAtBestLean(prepared, row.shelter, row.tieOut, anchor, {
      ...one.placement,
      rockKg: USUAL_ROCK_KG,
    });
    if (!better || better.strength.dependableN <= one.strength.dependableN) continue;
    next[index] = better;
    steps.push({
      text: `Backed ${nameRow(row)} with a rock of ${USUAL_ROCK_KG}\u2009kg on the lip: ${describeGain(row, one, better)}.`,
    });
  }
  return next;
}

/** Distance in line that two stakes need, m: half of what the longer has in the ground, to the next 5 cm. */
export function tandemSpacingM(front: AnchorSpec, second: AnchorSpec): number {
  const lengthOf = (spec: AnchorSpec) => (spec.class === "stake" ? spec.lengthM : 0);
  return Math.max(0.1, Math.ceil(Math.max(lengthOf(front), lengthOf(second)) * 10) / 20);
}

/**
 * Two driven anchors in line, each at the best lean of the front one: the order that holds more, among equals the longer in
 * front. Null when it can't be.
 */
export function rigInLine(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  tieOut: PreparedTieOut,
  present: Placement,
  second: TrayAnchor,
): Rigged | null {
  const first = prepared.anchors.get(present.anchorId);
  if (!first || !isDriven(first.spec) || !isDriven(second.spec) || present.tandem) return null;
  const lengthOf = (anchor: TrayAnchor) => (anchor.spec.class === "stake" ? anchor.spec.lengthM : 0);
  const longerFirst = lengthOf(second) > lengthOf(first) ? [second, first] : [first, second];
  const spacingM = tandemSpacingM(first.spec, second.spec);
  let best: Rigged | null = null;
  for (const [front, rear] of [longerFirst, [...longerFirst].reverse()]) {
    const base = front && rigAtBestLean(prepared, shelter, tieOut, front, present);
    if (!base || !rear) continue;
    const placement: Placement = { ...base.placement, tandem: { anchorId: rear.id, spacingM } };
    const strength = strengthOf(prepared, shelter, tieOut, placement);
    if (!strength || strength.dependableN <= (best?.strength.dependableN ?? 0)) continue;
    best = { placement, strength };
  }
  return best;
}

/**
 * A second stake in line, from what is `left` (counted down), at each driven anchor that would not hold alone, in order of
 * priority: the lightest that makes it hold, else the strongest.
 */
export function doubleUp(
  prepared: PreparedCamp,
  rows: readonly PlanRow[],
  rigged: readonly (Rigged | null)[],
  kinds: readonly TrayAnchor[],
  left: Map<string, number>,
  steps: { text: string }[],
): (Rigged | null)[] {
  const next = [...rigged];
  for (const index of weakRows(rows, rigged)) {
    const row = rows[index];
    const one = next[index];
    if (!row || !one) continue;
    let best: { rigged: Rigged; second: TrayAnchor } | null = null;
    for (const second of kinds) {
      if ((left.get(second.id) ?? 0) <= 0) continue;
      const pair = rigInLine(prepared, row.shelter, row.tieOut, one.placement, second);
      if (!pair || pair.strength.dependableN <= one.strength.dependableN) continue;
      if (!best || isBetterPair(row, pair, second, best)) best = { rigged: pair, second };
    }
    if (!best) continue;
    left.set(best.second.id, (left.get(best.second.id) ?? 0) - 1);
    next[index] = best.rigged;
    const gain = describeGain(row, one, best.rigged);
    steps.push({ text: `Doubled ${nameRow(row)} (${inSentence(best.second.name)}, in line): ${gain}.` });
  }
  return next;
}

/** The lighter of two that hold, else the stronger. */
function isBetterPair(
  row: PlanRow,
  pair: Rigged,
  second: TrayAnchor,
  best: { rigged: Rigged; second: TrayAnchor },
): boolean {
  const demand = row.tieOut.demandN ?? 0;
  const holds = pair.strength.dependableN >= demand;
  const bestHolds = best.rigged.strength.dependableN >= demand;
  if (holds && bestHolds && second.massKg !== best.second.massKg) return second.massKg < best.second.massKg;
  return pair.strength.dependableN > best.rigged.strength.dependableN;
}

const nameRow = (row: PlanRow): string => `tie-out ${row.tieOut.tieOut.number} of ${row.shelter.pitch.name}`;
function describeGain(row: PlanRow, before: Rigged, after: Rigged): string {
  const demand = row.tieOut.demandN ?? 0;
  const from = marginOf(before.strength.dependableN, demand);
  const to = marginOf(after.strength.dependableN, demand);
  return `margin ${twoDigits(from)} to ${twoDigits(to)}`;
}
