import type { RopePoint } from "./types";

const STEPS = 10;

function between(a: RopePoint, b: RopePoint, share: number): RopePoint {
  return [a[0] + (b[0] - a[0]) * share, a[1] + (b[1] - a[1]) * share, a[2] + (b[2] - a[2]) * share];
}

const distance = (a: RopePoint, b: RopePoint) => Math.hypot(b[0] - a[0], b[1] - a[1]);

/** One span of a centripetal Catmull–Rom curve (Barry and Goldman's pyramid), which makes no loops of its own. */
function spanPoint(p: readonly [RopePoint, RopePoint, RopePoint, RopePoint], share: number): RopePoint {
  const knot = [0, 0, 0, 0];
  for (let i = 1; i < 4; i += 1) {
    const length = Math.max(distance(p[i - 1] ?? p[0], p[i] ?? p[0]), 1e-6);
    knot[i] = (knot[i - 1] ?? 0) + Math.sqrt(length);
  }
  const [t0 = 0, t1 = 1, t2 = 2, t3 = 3] = knot;
  const t = t1 + (t2 - t1) * share;
  const a1 = between(p[0], p[1], (t - t0) / (t1 - t0));
  const a2 = between(p[1], p[2], (t - t1) / (t2 - t1));
  const a3 = between(p[2], p[3], (t - t2) / (t3 - t2));
  const b1 = between(a1, a2, (t - t0) / (t2 - t0));
  const b2 = between(a2, a3, (t - t1) / (t3 - t1));
  const [x, y] = between(b1, b2, (t - t1) / (t2 - t1));
  // Heights go straight from point to point: a height that swings past its two ends would turn a crossing over.
  return [x, y, between(p[1], p[2], share)[2]];
}

function mirror(end: RopePoint, next: RopePoint): RopePoint {
  return [2 * end[0] - next[0], 2 * end[1] - next[1], end[2]];
}

/** A smooth line through the points, as a row of short straight pieces. */
export function smoothLine(points: readonly RopePoint[]): RopePoint[] {
  const [first, second] = points;
  const last = points.at(-1);
  const before = points.at(-2);
  if (!first || !second || !last || !before) throw new Error("A rope needs two points at least.");
  const all = [mirror(first, second), ...points, mirror(last, before)];
  const line: RopePoint[] = [];
  for (let i = 1; i < all.length - 2; i += 1) {
    const [p0, p1, p2, p3] = [all[i - 1], all[i], all[i + 1], all[i + 2]];
    if (!p0 || !p1 || !p2 || !p3) continue;
    for (let step = 0; step < STEPS; step += 1) line.push(spanPoint([p0, p1, p2, p3], step / STEPS));
  }
  return [...line, last];
}

/** The line beside a line, to its left in the direction of travel; heights stay. */
export function besideLine(points: readonly RopePoint[], offset: number): RopePoint[] {
  return points.map((point, index) => {
    const before = points[Math.max(0, index - 1)] ?? point;
    const after = points[Math.min(points.length - 1, index + 1)] ?? point;
    const length = Math.max(distance(before, after), 1e-6);
    const x = (after[1] - before[1]) / length;
    const y = -(after[0] - before[0]) / length;
    return [point[0] + x * offset, point[1] + y * offset, point[2]];
  });
}

/** The same rope looked at from behind, in a picture of the given width. */
export function fromBehind(points: readonly RopePoint[], width: number): RopePoint[] {
  return points.map(([x, y, z]) => [width - x, y, -z]);
}
