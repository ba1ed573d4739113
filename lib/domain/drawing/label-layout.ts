import { polar, type Point } from "./path";
import type { PlanTieOut, PlanView } from "./plan-view";

/** Sizes of what is drawn round an anchor, in the units of the drawing. */
export interface LabelSizes {
  readonly anchorRadius: number;
  readonly stateRadius: number;
  readonly numberRadius: number;
  /** Smallest clear space between two things. */
  readonly gap: number;
}

export interface PlacedTieOut {
  readonly tie: PlanTieOut;
  /** Where the line leaves the shelter, and the middle of the anchor's mark. */
  readonly from: Point;
  readonly anchor: Point;
  readonly state: Point;
  readonly number: Point;
}

export interface Disc {
  readonly centre: Point;
  readonly radius: number;
}

const TURNS_DEG = [0, 18, -18, 36, -36, 54, -54, 75, -75, 100, -100, 130, -130];
const TWISTS_DEG = [0, 50, -50, 85, -85];

/**
 * Marks and numbers round the anchors so that they cover each other, the lines and the shelter as little as can be.
 * Greedy from tie-out 1 on: with a handful of places tried for each it is quick enough to follow a moving finger.
 */
export function placeLabels(
  view: PlanView,
  place: (point: Point) => Point,
  sizes: LabelSizes,
): readonly PlacedTieOut[] {
  const shortest = sizes.anchorRadius + sizes.gap;
  const ties = view.tieOuts.map((tie) => {
    const from = place(tie.from);
    const to = place(tie.to);
    const isShort = Math.hypot(to[0] - from[0], to[1] - from[1]) < shortest;
    return { tie, from, anchor: isShort ? polar(from, shortest, tie.outwardDeg) : to };
  });
  const outline = view.outline.map(place);
  const segments: (readonly [Point, Point])[] = [
    ...outline.map((point, index) => [point, outline[(index + 1) % outline.length] ?? point] as const),
    ...ties.map((tie) => [tie.from, tie.anchor] as const),
  ];
  const discs: Disc[] = ties.map((tie) => ({ centre: tie.anchor, radius: sizes.anchorRadius }));
  return ties.map((tie) => {
    const { state, number } = bestPlace(tie.anchor, tie.tie.outwardDeg, sizes, discs, segments);
    discs.push({ centre: state, radius: sizes.stateRadius }, { centre: number, radius: sizes.numberRadius });
    return { ...tie, state, number };
  });
}

function bestPlace(
  anchor: Point,
  outwardDeg: number,
  sizes: LabelSizes,
  discs: readonly Disc[],
  segments: readonly (readonly [Point, Point])[],
): { state: Point; number: Point } {
  const toState = sizes.anchorRadius + sizes.gap + sizes.stateRadius;
  const toNumber = sizes.stateRadius + sizes.gap + sizes.numberRadius;
  let best = { state: anchor, number: anchor, cost: Infinity };
  for (const turn of TURNS_DEG) {
    if (Math.abs(turn) / 60 >= best.cost) continue;
    const state = polar(anchor, toState, outwardDeg + turn);
    const stateCost = overlap(state, sizes.stateRadius, discs, segments, sizes.gap);
    for (const twist of TWISTS_DEG) {
      const known = stateCost + (Math.abs(turn) + Math.abs(twist) * 0.6) / 60;
      if (known >= best.cost) continue;
      const number = polar(state, toNumber, outwardDeg + turn + twist);
      const cost = known + overlap(number, sizes.numberRadius, discs, segments, sizes.gap);
      if (cost < best.cost) best = { state, number, cost };
    }
  }
  return best;
}

/** How far a disc lies over others and over lines, in the units of the drawing. */
export function overlap(
  centre: Point,
  radius: number,
  discs: readonly Disc[],
  segments: readonly (readonly [Point, Point])[],
  gap: number,
): number {
  let sum = 0;
  for (const disc of discs) {
    const distance = Math.hypot(centre[0] - disc.centre[0], centre[1] - disc.centre[1]);
    sum += 2 * Math.max(0, radius + disc.radius + gap - distance);
  }
  for (const segment of segments) sum += Math.max(0, radius + gap - distanceToSegment(centre, segment));
  return sum;
}

function distanceToSegment([x, y]: Point, [a, b]: readonly [Point, Point]): number {
  const dx = b[0] - a[0];
  const dy = b[1] - a[1];
  const lengthSquared = dx * dx + dy * dy;
  const along = lengthSquared === 0 ? 0 : ((x - a[0]) * dx + (y - a[1]) * dy) / lengthSquared;
  const t = Math.min(1, Math.max(0, along));
  return Math.hypot(x - a[0] - t * dx, y - a[1] - t * dy);
}
