import type { RopePoint } from "./types";

/** Where two lines cross on the page. `at` counts pieces from the start of a line, with a fraction within the piece. */
export interface Crossing {
  readonly over: { readonly rope: number; readonly at: number };
  readonly under: { readonly rope: number; readonly at: number };
  readonly x: number;
  readonly y: number;
  /** How much higher the upper rope lies. */
  readonly clearance: number;
  /** +1 where the upper rope has to turn left (against the clock, as seen) to lie along the lower one, else −1. */
  readonly sign: 1 | -1;
}

interface Meeting {
  readonly s: number;
  readonly t: number;
}

/** Where two straight pieces meet, as shares of their lengths; half-open, so that a joint counts once. */
function meet(a: RopePoint, b: RopePoint, c: RopePoint, d: RopePoint): Meeting | null {
  const [rx, ry] = [b[0] - a[0], b[1] - a[1]];
  const [sx, sy] = [d[0] - c[0], d[1] - c[1]];
  const cross = rx * sy - ry * sx;
  if (Math.abs(cross) < 1e-12) return null;
  const s = ((c[0] - a[0]) * sy - (c[1] - a[1]) * sx) / cross;
  const t = ((c[0] - a[0]) * ry - (c[1] - a[1]) * rx) / cross;
  return s >= 0 && s < 1 && t >= 0 && t < 1 ? { s, t } : null;
}

/** All crossings of lines with themselves and with each other. */
export function findCrossings(lines: readonly (readonly RopePoint[])[]): Crossing[] {
  const pieces = lines.flatMap((line, rope) =>
    line.slice(0, -1).flatMap((a, index) => {
      const b = line[index + 1];
      return b ? [{ rope, index, a, b }] : [];
    }),
  );
  const found: Crossing[] = [];
  pieces.forEach((one, i) => {
    for (const other of pieces.slice(i + 1)) {
      if (one.rope === other.rope && other.index - one.index < 2) continue;
      const meeting = meet(one.a, one.b, other.a, other.b);
      if (!meeting) continue;
      const { s, t } = meeting;
      const high = one.a[2] + (one.b[2] - one.a[2]) * s;
      const low = other.a[2] + (other.b[2] - other.a[2]) * t;
      const first = { rope: one.rope, at: one.index + s };
      const second = { rope: other.rope, at: other.index + t };
      const [top, bottom] = high > low ? [one, other] : [other, one];
      // The page's y runs down, so the turn is taken with its sign reversed.
      const turn =
        (top.b[1] - top.a[1]) * (bottom.b[0] - bottom.a[0]) - (top.b[0] - top.a[0]) * (bottom.b[1] - bottom.a[1]);
      found.push({
        over: high > low ? first : second,
        under: high > low ? second : first,
        x: one.a[0] + (one.b[0] - one.a[0]) * s,
        y: one.a[1] + (one.b[1] - one.a[1]) * s,
        clearance: Math.abs(high - low),
        sign: turn > 0 ? 1 : -1,
      });
    }
  });
  // Two lines that meet at a joint of both are found once for each piece there.
  return found.filter(
    (one, index) => !found.slice(0, index).some((other) => Math.hypot(one.x - other.x, one.y - other.y) < 0.01),
  );
}
