import { assignLexicographic } from "../assignment";
import { marginOf } from "../camp";
import { itemAt } from "../indexed";
import { morningValue, type ReadCamp } from "./read-camp";
import type { KitProblem } from "./types";

/** A kit of as many pieces, all of one kind. */
export interface AlikeKit {
  readonly kind: number;
  readonly count: number;
  readonly massUnits: number;
  readonly campsHeld: number;
  /** Smallest morning margin of the route; 0 where a tie-out stays empty. */
  readonly weakest: number;
  /** The camp of that margin. */
  readonly campName: string | null;
}

/** What a camp's weakest tie-out is worth in the morning with `count` pieces of one kind, best used. */
function weakestWith(read: ReadCamp, kind: number, count: number): number {
  const free = read.tieOuts.filter((choice) => !choice.isPinned);
  const values = free.map(({ byKind, tieOut }) => {
    const one = byKind[kind];
    return one ? morningValue(read.prepared, tieOut, one.morningN) : null;
  });
  const assignment = assignLexicographic({
    values: values.map((value) => [value]),
    counts: [count],
    emptyValues: free.map(({ tieOut }) => morningValue(read.prepared, tieOut, null)),
  });
  const margins = free.map(({ byKind, tieOut }, at) => {
    const one = assignment[at] === 0 ? byKind[kind] : null;
    return one ? marginOf(one.morningN, tieOut.demandN) : 0;
  });
  return Math.min(...margins, Infinity);
}

/**
 * Kits of equal number with only one kind, best first: the most camps held, then the largest weakest margin, then the
 * lightest. Two in line count as one tie-out served by a pair. Nothing found is used; pinned tie-outs stay out of it.
 */
export function listAlike(problem: KitProblem, reads: readonly ReadCamp[], counts: readonly number[]): AlikeKit[] {
  const count = counts.reduce((sum, one) => sum + one, 0);
  if (count === 0) return [];
  return problem.kinds
    .map((kind, at): AlikeKit => {
      const margins = reads.map((read) => {
        const pieces = Math.max(1, ...read.tieOuts.filter((one) => !one.isPinned).map((one) => one.pieces));
        return weakestWith(read, at, Math.floor(count / pieces));
      });
      const weakest = Math.min(...margins, Infinity);
      const weakestAt = margins.indexOf(weakest);
      return {
        kind: at,
        count,
        massUnits: kind.massUnits * count,
        campsHeld: margins.filter((margin) => margin >= 1).length,
        weakest: Number.isFinite(weakest) ? weakest : 0,
        campName: weakestAt >= 0 ? itemAt(reads, weakestAt).camp.name : null,
      };
    })
    .sort((a, b) => b.campsHeld - a.campsHeld || b.weakest - a.weakest || a.massUnits - b.massUnits);
}
