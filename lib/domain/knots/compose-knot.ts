import { smoothLine } from "./curve";
import { findCrossings } from "./crossings";
import { ROPE_WIDTH, type KnotObject, type KnotShape, type Rope, type RopePoint } from "./types";

/** A stroke or a filled area, to be drawn in the order given. */
export interface KnotPath {
  readonly d: string;
  readonly look: "edge" | "rope" | "second" | "tip" | "object" | "arrow";
  /** Width of the stroke; 0 = filled. */
  readonly width: number;
}

const EDGE = 1.5;
/** Pieces reach into each other by this much, so that no seam shows. */
const OVERLAP = 1.6;
const ARROW = 9;
const TIP = 9;

const round = (value: number) => Math.round(value * 10) / 10;

function toPath(points: readonly RopePoint[]): string {
  return points.map(([x, y], index) => `${index === 0 ? "M" : "L"}${round(x)} ${round(y)}`).join("");
}

function pointAt(line: readonly RopePoint[], at: number): RopePoint {
  const index = Math.min(Math.max(Math.floor(at), 0), line.length - 2);
  const [a, b] = [line[index] ?? [0, 0, 0], line[index + 1] ?? [0, 0, 0]];
  const share = at - index;
  return [a[0] + (b[0] - a[0]) * share, a[1] + (b[1] - a[1]) * share, a[2] + (b[2] - a[2]) * share];
}

/** Moves along a line by a length on the page; stops at its ends. */
function move(line: readonly RopePoint[], at: number, by: number): number {
  const direction = Math.sign(by);
  let left = Math.abs(by);
  let here = at;
  while (left > 1e-9) {
    const stop = direction > 0 ? Math.floor(here + 1e-9) + 1 : Math.ceil(here - 1e-9) - 1;
    if (stop < 0 || stop > line.length - 1) return Math.min(Math.max(here, 0), line.length - 1);
    const [a, b] = [pointAt(line, here), pointAt(line, stop)];
    const length = Math.hypot(b[0] - a[0], b[1] - a[1]);
    if (length >= left) return here + ((stop - here) * left) / length;
    left -= length;
    here = stop;
  }
  return here;
}

/** The part of a line between two places, a little longer at both ends. */
function cut(line: readonly RopePoint[], from: number, to: number, extra: number): RopePoint[] {
  const [start, end] = [move(line, from, -extra), move(line, to, extra)];
  return [
    pointAt(line, start),
    ...line.filter((_, index) => index > start + 0.1 && index < end - 0.1),
    pointAt(line, end),
  ];
}

/** Where a rope goes from before an object to behind it, or back. */
function listPassages(line: readonly RopePoint[]): number[] {
  return line.flatMap((point, index) => {
    const next = line[index + 1];
    return next && point[2] >= 0 !== next[2] >= 0 ? [index + point[2] / (point[2] - next[2])] : [];
  });
}

interface Piece {
  readonly height: number;
  readonly paths: readonly KnotPath[];
}

/** A rope cut midway between its crossings: each piece then lies over or under one other, and can be drawn in turn. */
function cutRope(rope: Rope, line: readonly RopePoint[], crossings: readonly number[], hasObjects: boolean): Piece[] {
  const stops = [...crossings].sort((a, b) => a - b);
  const middles = stops.slice(1).map((stop, index) => (stop + (stops[index] ?? stop)) / 2);
  const passages = hasObjects ? listPassages(line) : [];
  // A passage round an object replaces the middle it is nearest to when both lie between the same two crossings.
  const free = middles.filter((middle) => {
    const before = stops.findLast((stop) => stop <= middle) ?? 0;
    const after = stops.find((stop) => stop > middle) ?? line.length;
    return !passages.some((passage) => passage > before && passage < after);
  });
  const cuts = [0, ...[...free, ...passages].sort((a, b) => a - b), line.length - 1];
  return cuts.slice(1).flatMap((to, index): Piece[] => {
    const from = cuts[index] ?? 0;
    if (to - from < 1e-6) return [];
    const own = stops.find((stop) => stop >= from && stop <= to);
    const height = pointAt(line, own ?? (from + to) / 2)[2];
    return [
      {
        height,
        paths: [
          { d: toPath(cut(line, from, to, OVERLAP / 2)), look: "edge", width: ROPE_WIDTH },
          {
            d: toPath(cut(line, from, to, OVERLAP)),
            look: rope.isSecond ? "second" : "rope",
            width: ROPE_WIDTH - 2 * EDGE,
          },
        ],
      },
    ];
  });
}

function drawObject(object: KnotObject): KnotPath[] {
  if (object.type === "bar") {
    const [[x1, y1], [x2, y2]] = [object.from, object.to];
    return [{ d: `M${x1} ${y1}H${x2}V${y2}H${x1}Z`, look: "object", width: 0 }];
  }
  const { centre, radius } = object;
  const d = `M${centre[0] - radius} ${centre[1]}a${radius} ${radius} 0 1 0 ${2 * radius} 0a${radius} ${radius} 0 1 0 ${-2 * radius} 0Z`;
  return [{ d, look: "object", width: 0 }];
}

/** A dark tip at the cut end; an arrow beyond the part that takes the load. */
function drawEnds(rope: Rope, line: readonly RopePoint[]): KnotPath[] {
  const ends = [
    { kind: rope.from, points: line },
    { kind: rope.to, points: [...line].reverse() },
  ];
  return ends.flatMap(({ kind, points }): KnotPath[] => {
    const [end, next] = points;
    if (!end || !next || kind === "runs-on") return [];
    const length = Math.hypot(end[0] - next[0], end[1] - next[1]);
    const [ux, uy] = [(end[0] - next[0]) / length, (end[1] - next[1]) / length];
    if (kind === "end") {
      const back = [end[0] - ux * TIP, end[1] - uy * TIP, end[2]] as const;
      return [{ d: toPath([back, end]), look: "tip", width: ROPE_WIDTH }];
    }
    const at = (along: number, across: number): RopePoint => [
      end[0] + ux * along - uy * across,
      end[1] + uy * along + ux * across,
      0,
    ];
    return [{ d: `${toPath([at(3, -ARROW), at(3 + ARROW * 1.3, 0), at(3, ARROW)])}Z`, look: "arrow", width: 0 }];
  });
}

/** A knot as strokes in drawing order: what lies lower comes first, so that what lies over it covers it. */
export function composeKnot(shape: KnotShape): KnotPath[] {
  const lines = shape.ropes.map((rope) => smoothLine(rope.points));
  const crossings = findCrossings(lines);
  const pieces: Piece[] = shape.ropes.flatMap((rope, index) => {
    const own = crossings.flatMap(({ over, under }) =>
      [over, under].filter((side) => side.rope === index).map((side) => side.at),
    );
    return cutRope(rope, lines[index] ?? [], own, shape.objects.length > 0);
  });
  const objects: Piece[] = shape.objects.map((object) => ({ height: -0.001, paths: drawObject(object) }));
  const ordered = [...objects, ...pieces].sort((a, b) => a.height - b.height);
  const ends = shape.ropes.flatMap((rope, index) => drawEnds(rope, lines[index] ?? []));
  return [...ordered.flatMap((piece) => piece.paths), ...ends];
}
