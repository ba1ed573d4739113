import { itemAt } from "../indexed";

/**
 * Indices of the points that keep a line's shape within a tolerance, first and last included.
 * Source: D. H. Douglas, T. K. Peucker, Cartographica 10 (1973) 112; with a stack instead of recursion.
 * @param x, y plane coordinates, m @param toleranceM ≥ 0
 */
export function simplifyIndices(x: ArrayLike<number>, y: ArrayLike<number>, toleranceM: number): number[] {
  const last = x.length - 1;
  if (last < 1) return last === 0 ? [0] : [];
  const keep = new Uint8Array(x.length);
  keep[0] = keep[last] = 1;
  const open: [number, number][] = [[0, last]];
  for (let span = open.pop(); span; span = open.pop()) {
    const [from, to] = span;
    const far = farthest(x, y, from, to);
    if (far.index < 0 || far.distanceM <= toleranceM) continue;
    keep[far.index] = 1;
    open.push([from, far.index], [far.index, to]);
  }
  const kept: number[] = [];
  keep.forEach((flag, index) => flag === 1 && kept.push(index));
  return kept;
}

function farthest(x: ArrayLike<number>, y: ArrayLike<number>, from: number, to: number) {
  const ax = itemAt(x, from);
  const ay = itemAt(y, from);
  const dx = itemAt(x, to) - ax;
  const dy = itemAt(y, to) - ay;
  const square = dx * dx + dy * dy;
  let best = { index: -1, distanceM: -1 };
  for (let index = from + 1; index < to; index += 1) {
    const px = itemAt(x, index) - ax;
    const py = itemAt(y, index) - ay;
    const along = square > 0 ? Math.min(1, Math.max(0, (px * dx + py * dy) / square)) : 0;
    const distanceM = Math.hypot(px - along * dx, py - along * dy);
    if (distanceM > best.distanceM) best = { index, distanceM };
  }
  return best;
}

/**
 * The finest simplification that leaves at most so many points: the tolerance starts at `startM` and doubles. Bounded:
 * beyond the size of the line only its ends are left.
 */
export function simplifyToCount(
  x: ArrayLike<number>,
  y: ArrayLike<number>,
  maxPoints: number,
  startM = 2,
): { readonly indices: number[]; readonly toleranceM: number } {
  let toleranceM = startM;
  let indices = simplifyIndices(x, y, toleranceM);
  for (let round = 0; round < 40 && indices.length > maxPoints; round += 1) {
    toleranceM *= 2;
    indices = simplifyIndices(x, y, toleranceM);
  }
  return { indices, toleranceM };
}
