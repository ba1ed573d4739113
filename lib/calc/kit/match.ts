import { itemAt } from "../indexed";
import type { KindSet, KitCamp, KitNeed } from "./types";

/** Needs that the same kinds can meet, counted. */
export interface NeedClass {
  readonly kinds: KindSet;
  readonly count: number;
}

export function groupNeeds(needs: readonly KitNeed[]): NeedClass[] {
  const counts = new Map<KindSet, number>();
  for (const { kinds } of needs) counts.set(kinds, (counts.get(kinds) ?? 0) + 1);
  return [...counts].map(([kinds, count]) => ({ kinds, count }));
}

export const isWithin = (part: KindSet, whole: KindSet): boolean => (part & ~whole) === 0;

/** The places of the bits that are set, ascending. */
export function listKinds(set: KindSet): number[] {
  const places: number[] = [];
  for (let rest = set; rest !== 0; rest &= rest - 1) places.push(31 - Math.clz32(rest & -rest));
  return places;
}

/** How many needs can only be met by these kinds. */
export const countWithin = (classes: readonly NeedClass[], set: KindSet): number =>
  classes.reduce((sum, one) => sum + (isWithin(one.kinds, set) ? one.count : 0), 0);

/** What there is of a set of kinds together. */
export const supplyOf = (set: KindSet, supply: readonly number[]): number =>
  listKinds(set).reduce((sum, kind) => sum + itemAt(supply, kind), 0);

export interface Match {
  /** By class, then by kind: how many of its needs the kind meets. */
  readonly given: readonly (readonly number[])[];
  /**
   * Null when every need is met. Else a set of kinds with more needs that only they can meet than there are pieces
   * (P. Hall, "On representatives of subsets", J. London Math. Soc. 10 (1935): there is one exactly then; from memory).
   */
  readonly short: KindSet | null;
}

/**
 * Meets as many needs as can be met: a flow from classes of needs to kinds, made larger along shortest paths until
 * there is none (Edmonds & Karp 1972, from memory). `supply` is how many there are of each kind, by its bit.
 */
export function matchNeeds(classes: readonly NeedClass[], supply: readonly number[]): Match {
  const given = classes.map(() => supply.map(() => 0));
  const left = [...supply];
  let short: KindSet | null = null;
  classes.forEach((one, start) => {
    for (let open = one.count; open > 0 && short === null;) {
      const path = findPath(classes, given, left, start);
      if (path.steps === null) {
        short = path.reached;
        return;
      }
      const end = itemAt(path.steps, path.steps.length - 1);
      const amount = Math.min(open, itemAt(left, end.kind), ...path.steps.slice(1).map((step) => step.room));
      path.steps.forEach(({ needClass, kind, from }) => {
        const row = itemAt(given, needClass);
        row[kind] = itemAt(row, kind) + amount;
        if (from !== null) row[from] = itemAt(row, from) - amount;
      });
      left[end.kind] = itemAt(left, end.kind) - amount;
      open -= amount;
    }
  });
  return { given, short };
}

interface Step {
  readonly needClass: number;
  readonly kind: number;
  /** The kind that this class gives up for it; null for the class that still needs some. */
  readonly from: number | null;
  /** How many it can give up. */
  readonly room: number;
}

/** The shortest way to a kind that has pieces left, or every kind that was reached in vain. */
function findPath(
  classes: readonly NeedClass[],
  given: readonly (readonly number[])[],
  left: readonly number[],
  start: number,
): { readonly steps: readonly Step[] | null; readonly reached: KindSet } {
  const cameBy = new Map<number, Step>();
  const queue: { needClass: number; from: number | null; room: number }[] = [
    { needClass: start, from: null, room: Infinity },
  ];
  for (const { needClass, from, room } of queue) {
    for (const kind of listKinds(itemAt(classes, needClass).kinds)) {
      if (cameBy.has(kind)) continue;
      cameBy.set(kind, { needClass, kind, from, room });
      if (itemAt(left, kind) > 0) return { steps: traceBack(cameBy, kind), reached: 0 };
      given.forEach((row, other) => {
        const has = itemAt(row, kind);
        if (has > 0) queue.push({ needClass: other, from: kind, room: has });
      });
    }
  }
  return { steps: null, reached: [...cameBy.keys()].reduce((set, kind) => set | (1 << kind), 0) };
}

function traceBack(cameBy: ReadonlyMap<number, Step>, end: number): Step[] {
  const steps: Step[] = [];
  for (let kind: number | null = end; kind !== null;) {
    const step = cameBy.get(kind);
    if (!step) break;
    steps.unshift(step);
    kind = step.from;
  }
  return steps;
}

/** Pieces by bit at one camp: the kit's, then what is found there. */
export const supplyAt = (counts: readonly number[], found: readonly number[]): number[] => [...counts, ...found];

/** Null when the camp can be staked with these pieces; else the kinds there are too few of. */
export function findShort(camp: KitCamp, counts: readonly number[], found: readonly number[]): KindSet | null {
  return matchNeeds(groupNeeds(camp.needs), supplyAt(counts, found)).short;
}
