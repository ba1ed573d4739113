import type { Crossing } from "@/lib/domain/knots/crossings";
import { findCrossings } from "@/lib/domain/knots/crossings";
import { smoothLine } from "@/lib/domain/knots/curve";
import type { RopePoint } from "@/lib/domain/knots/types";

/** Determinant of a square matrix of whole numbers, exactly (Bareiss 1968). */
export function exactDeterminant(matrix: readonly (readonly number[])[]): bigint {
  const rows = matrix.map((row) => row.map(BigInt));
  let sign = 1n;
  let previous = 1n;
  for (let k = 0; k < rows.length - 1; k += 1) {
    const pivot = rows.findIndex((row, index) => index >= k && row[k] !== 0n);
    if (pivot < 0) return 0n;
    if (pivot !== k) {
      [rows[k], rows[pivot]] = [rows[pivot] ?? [], rows[k] ?? []];
      sign = -sign;
    }
    const top = rows[k] ?? [];
    for (const row of rows.slice(k + 1)) {
      const lead = row[k] ?? 0n;
      for (let j = k + 1; j < row.length; j += 1) {
        row[j] = ((row[j] ?? 0n) * (top[k] ?? 0n) - lead * (top[j] ?? 0n)) / previous;
      }
      row[k] = 0n;
    }
    previous = top[k] ?? 1n;
  }
  return sign * (rows.at(-1)?.at(-1) ?? 1n);
}

/**
 * The determinant of the knot that one closed line makes: each arc between two underpasses gets a number, and at each
 * crossing the two under arcs add up to twice the one over them (Fox's colourings). 1 for a rope without a knot.
 */
export function knotDeterminant(crossings: readonly Crossing[]): number {
  if (crossings.length < 2) return 1;
  const unders = crossings.map((crossing) => crossing.under.at).sort((a, b) => a - b);
  const count = unders.length;
  const arcAt = (at: number) => unders.filter((under) => under < at).length % count;
  const rows = crossings.map(({ over, under }) => {
    const row = new Array<number>(count).fill(0);
    const into = unders.indexOf(under.at);
    const add = (arc: number, value: number) => (row[arc] = (row[arc] ?? 0) + value);
    add(arcAt(over.at), 2);
    add(into, -1);
    add((into + 1) % count, -1);
    return row;
  });
  const minor = rows.slice(1).map((row) => row.slice(1));
  const value = exactDeterminant(minor);
  return Number(value < 0n ? -value : value);
}

/** The two ends joined by a straight way far above everything (or, with a negative height, far below). */
export function closeLine(points: readonly RopePoint[], height = 99): RopePoint[] {
  const line = smoothLine(points);
  const first = line[0];
  const last = line.at(-1);
  if (!first || !last) throw new Error("An empty line has no ends.");
  const lift = (point: RopePoint, x: number, y: number): RopePoint => [point[0] + x, point[1] + y, height];
  return [...line, lift(last, 0.011, 0.013), lift(first, -0.012, 0.017), first];
}

export const crossingsOf = (points: readonly RopePoint[], height = 99) => findCrossings([closeLine(points, height)]);
