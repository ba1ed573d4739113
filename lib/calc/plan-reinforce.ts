import { marginOf } from "./camp";
import type { KnownTieOut, PreparedCamp, PreparedShelter } from "./prepare-camp";
import { isDriven, rigAtBestLean, stakeLengthM, strengthOf, type Rigged } from "./rig-anchor";
import type { Stock } from "./stock";
import type { AnchorSpec, Placement, TrayAnchor } from "./types";
import { inSentence, twoDigits } from "./wording";

/** One tie-out that the proposal is free to fill. */
export interface PlanRow {
  readonly shelter: PreparedShelter;
  readonly tieOut: KnownTieOut;
  readonly present: Placement | null;
}

/** What the proposal puts where; a row that is not in it stays empty. */
export type Filled = ReadonlyMap<PlanRow, Rigged>;

export interface PlanStep {
  readonly text: string;
}

/** A rock that one person carries a few steps, kg (judgement). */
export const USUAL_ROCK_KG = 10;

const marginAt = (row: PlanRow, { strength }: Rigged): number => marginOf(strength.dependableN, row.tieOut.demandN);

/** Rows that have something but would not hold, most important first. */
function weakRows(filled: Filled): [PlanRow, Rigged][] {
  return [...filled]
    .filter(([row, rigged]) => marginAt(row, rigged) < 1)
    .sort(([a], [b]) => b.tieOut.priority - a.tieOut.priority);
}

/**
 * A rock on the lip of each driven anchor that would not hold without, in order of priority, where it helps. Adds one
 * sentence per rock to `steps`.
 */
export function backWithRocks(prepared: PreparedCamp, filled: Filled, steps: PlanStep[]): Filled {
  const next = new Map(filled);
  for (const [row, rigged] of weakRows(filled)) {
    const { anchor, placement, strength } = rigged;
    if (!isDriven(anchor.spec) || placement.rockKg >= USUAL_ROCK_KG) continue;
    const better = rigAtBestLean(prepared, row.shelter, row.tieOut, anchor, { ...placement, rockKg: USUAL_ROCK_KG });
    if (!better || better.strength.dependableN <= strength.dependableN) continue;
    next.set(row, better);
    const gain = describeGain(row, rigged, better);
    steps.push({ text: `Backed ${nameRow(row)} with a rock of ${USUAL_ROCK_KG}\u2009kg on the lip: ${gain}.` });
  }
  return next;
}

/**
 * Distance in line that two driven anchors need, m: half of what the longer has in the ground, to the next 5 cm, at least
 * 10 cm.
 */
export function tandemSpacingM(front: AnchorSpec, second: AnchorSpec): number {
  return Math.max(0.1, Math.ceil(Math.max(stakeLengthM(front), stakeLengthM(second)) * 10 - 1e-9) / 20);
}

/**
 * Two driven anchors in line at the best lean of the front one: the order that holds more, among equals the longer in
 * front. `present` is what is there now, `second` what is added. Null when it can't be.
 */
export function rigInLine(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  tieOut: KnownTieOut,
  present: { readonly anchor: TrayAnchor; readonly placement: Placement },
  second: TrayAnchor,
): Rigged | null {
  const first = present.anchor;
  if (!isDriven(first.spec) || !isDriven(second.spec) || present.placement.tandem) return null;
  const spacingM = tandemSpacingM(first.spec, second.spec);
  const orders = [
    { front: first, rear: second },
    { front: second, rear: first },
  ].sort((a, b) => stakeLengthM(b.front.spec) - stakeLengthM(a.front.spec));
  let best: Rigged | null = null;
  for (const { front, rear } of orders) {
    const base = rigAtBestLean(prepared, shelter, tieOut, front, present.placement);
    if (!base) continue;
    const placement: Placement = { ...base.placement, tandem: { anchorId: rear.id, spacingM } };
    const strength = strengthOf(prepared, shelter, tieOut, placement);
    if (!strength || (best && strength.dependableN <= best.strength.dependableN)) continue;
    best = { anchor: front, placement, strength };
  }
  return best;
}

/**
 * A second stake in line, from what is left in `stock`, at each driven anchor that would not hold alone, in order of
 * priority: the lightest that makes it hold, else the strongest. Adds one sentence per pair to `steps`.
 */
export function doubleUp(
  prepared: PreparedCamp,
  filled: Filled,
  kinds: readonly TrayAnchor[],
  stock: Stock,
  steps: PlanStep[],
): Filled {
  const next = new Map(filled);
  for (const [row, rigged] of weakRows(filled)) {
    const pairs = kinds
      .filter((second) => stock.left(second.id) > 0)
      .flatMap((second) => {
        const pair = rigInLine(prepared, row.shelter, row.tieOut, rigged, second);
        return pair && pair.strength.dependableN > rigged.strength.dependableN ? [{ pair, second }] : [];
      });
    const holding = pairs
      .filter(({ pair }) => marginAt(row, pair) >= 1)
      .sort((a, b) => a.second.massKg - b.second.massKg);
    const strongest = [...pairs].sort((a, b) => b.pair.strength.dependableN - a.pair.strength.dependableN);
    const [best] = [...holding, ...strongest];
    if (!best) continue;
    stock.take(best.second.id);
    next.set(row, best.pair);
    const gain = describeGain(row, rigged, best.pair);
    steps.push({ text: `Doubled ${nameRow(row)} (${inSentence(best.second.name)}, in line): ${gain}.` });
  }
  return next;
}

const nameRow = (row: PlanRow): string => `tie-out ${row.tieOut.tieOut.number} of ${row.shelter.pitch.name}`;

const describeGain = (row: PlanRow, before: Rigged, after: Rigged): string =>
  `margin ${twoDigits(marginAt(row, before))} to ${twoDigits(marginAt(row, after))}`;
