import type { ShelterModel } from "@/lib/calc/types";
import { polar, type Point } from "@/lib/domain/drawing/path";
import { fitPlan, planView, scaleBar, type Fit, type PlanView } from "@/lib/domain/drawing/plan-view";
import { placeLabels, type Box, type Segment } from "./label-placement";
import { layoutWind, withRoomForWind } from "./plan-wind";

export interface PlanLayoutInput {
  readonly model: ShelterModel;
  readonly headingDeg: number;
  /** Compass bearing at the top of the drawing. */
  readonly upDeg: number;
  readonly width: number;
  readonly height: number;
  /** Tie-outs with a second stake in line, which needs room behind the first. */
  readonly doubled?: ReadonlySet<string>;
  /** Null where nothing is drawn of the wind; both ends null where it may come from anywhere. */
  readonly wind: { readonly fromDeg: number | null; readonly toDeg: number | null } | null;
}

export interface TieOutOnPlan {
  readonly tieOutId: string;
  readonly number: number;
  readonly from: Point;
  readonly anchor: Point;
  /** Where the drawn line stops short of the anchor's mark. */
  readonly lineEnd: Point;
  /** Paper bearing from the anchor along its pull. */
  readonly pullDeg: number;
  readonly state: Point;
  readonly numberAt: Point;
  /** Where the length and angle of the line are written. */
  readonly noteAt: Point;
}

export interface PlanLayout {
  readonly view: PlanView;
  readonly fit: Fit;
  readonly markSize: number;
  readonly tieOuts: readonly TieOutOnPlan[];
  readonly north: Point;
  readonly scale: { readonly at: Point; readonly length: number; readonly lengthM: number };
  readonly windArrows: readonly { readonly tail: Point; readonly head: Point }[];
  /** Arc through the heads of the arrows; null for wind from anywhere. */
  readonly windArc: {
    readonly radius: number;
    readonly from: Point;
    readonly to: Point;
    readonly isLarge: boolean;
  } | null;
}

const NUMBER_SIZE = 15;
const STATE_SIZE = 15;

/** Everything on a plan in the pixels of its box, so that the drawing and what is laid over it agree. */
export function layoutPlan(input: PlanLayoutInput): PlanLayout {
  const { width, height } = input;
  const isSmall = width < 520;
  const markSize = isSmall ? 21 : 26;
  const pad = isSmall ? 46 : 64;
  const view = planView(input.model, input.headingDeg, { upDeg: input.upDeg });
  const windRoom = isSmall ? 46 : 76;
  const box = { width, height, pad, maxScale: isSmall ? 90 : 150 };
  const first = fitPlan(view.bounds, box);
  const bounds = input.wind ? withRoomForWind(view, input.wind, windRoom / first.scale) : view.bounds;
  const fit = fitPlan(bounds, box);

  const points = view.tieOuts.map(({ tieOut, from, to, outwardDeg }) => {
    const anchor = fit.place(to);
    const start = fit.place(from);
    const lengthPx = Math.hypot(anchor[0] - start[0], anchor[1] - start[1]);
    const lineEnd = lengthPx > markSize * 0.62 ? polar(anchor, -markSize * 0.6, outwardDeg) : anchor;
    return { tieOutId: tieOut.id, number: tieOut.number, from: start, anchor, lineEnd, outwardDeg };
  });
  const lines: Segment[] = points.map((point) => [point.from, point.anchor]);
  const outline = view.outline.map(fit.place);
  const edges: Segment[] = outline.map((corner, index) => [corner, outline[(index + 1) % outline.length] ?? corner]);
  const wind = input.wind
    ? layoutWind({ width, height, wind: input.wind }, view, fit, isSmall)
    : { arrows: [], arc: null };
  const taken: Box[] = [
    ...points.map(({ anchor: [x, y] }) => boxAt(x, y, markSize * 0.92, markSize * 0.92)),
    ...wind.arrows.map(({ tail, head }) => boxAround(tail, head)),
  ];
  const labels = placeLabels(
    points.map((point) => ({
      at: point.anchor,
      outwardDeg: point.outwardDeg,
      gap: markSize * (input.doubled?.has(point.tieOutId) ? 1.15 : 0.86),
    })),
    { width: STATE_SIZE + 3, height: STATE_SIZE + NUMBER_SIZE + 3 },
    { width, height },
    taken,
    { lines: [...lines, ...edges], area: outline },
  );
  const labelBoxes = labels.map(([x, y]) => boxAt(x, y, STATE_SIZE + 6, STATE_SIZE + NUMBER_SIZE + 6));
  const cloth = boxAroundAll(outline);
  const tieOuts = points.map((point, index) => {
    const [x, y] = labels[index] ?? point.anchor;
    const isAbove = y < point.anchor[1] - markSize;
    const middle: Point = [(point.from[0] + point.anchor[0]) / 2, (point.from[1] + point.anchor[1]) / 2];
    return {
      tieOutId: point.tieOutId,
      number: point.number,
      from: point.from,
      anchor: point.anchor,
      lineEnd: point.lineEnd,
      pullDeg: point.outwardDeg + 180,
      state: [x, isAbove ? y + NUMBER_SIZE / 2 : y - NUMBER_SIZE / 2] as Point,
      numberAt: [x, isAbove ? y - STATE_SIZE / 2 : y + STATE_SIZE / 2 + 1] as Point,
      noteAt: noteBeside(middle, point.anchor, point.outwardDeg, [...labelBoxes, ...taken], cloth, width, height),
    };
  });
  const bar = scaleBar(fit.scale, isSmall ? 80 : 110);
  const busy = [...taken, ...labelBoxes, cloth];
  const north = freestCorner(width, height, { width: 44, height: 62 }, busy, ["right top", "left top"]);
  const barAt = freestCorner(width, height, { width: bar.length + 16, height: 34 }, busy, [
    "right bottom",
    "left bottom",
  ]);
  return {
    view,
    fit,
    markSize,
    tieOuts,
    north,
    scale: { at: barAt, length: bar.length, lengthM: bar.lengthM },
    windArrows: wind.arrows,
    windArc: wind.arc,
  };
}

function noteBeside(
  middle: Point,
  anchor: Point,
  outwardDeg: number,
  marks: readonly Box[],
  cloth: Box,
  width: number,
  height: number,
): Point {
  const options: Point[] = [90, -90].flatMap((side) =>
    [38, 54, 70].map((distance) => polar(middle, distance, outwardDeg + side)),
  );
  for (const [x, y] of [
    [76, 0],
    [-76, 0],
    [60, 24],
    [-60, 24],
    [60, -24],
    [-60, -24],
  ] as const)
    options.push([anchor[0] + x, anchor[1] + y]);
  const cost = ([x, y]: Point) => {
    const box = boxAt(x, y, 92, 20);
    const outside = x < 50 || x > width - 50 || y < 14 || y > height - 14 ? 1000 : 0;
    // A mark must stay readable; on the cloth the note only looks worse.
    const onMarks = marks.reduce((sum, other) => sum + overlap(box, other), 0);
    return outside + 4 * onMarks + 0.2 * overlap(box, cloth);
  };
  return options.reduce((best, option) => (cost(option) < cost(best) ? option : best));
}

type Corner = "right top" | "left top" | "right bottom" | "left bottom";

function freestCorner(
  width: number,
  height: number,
  size: { readonly width: number; readonly height: number },
  busy: readonly Box[],
  corners: readonly Corner[],
): Point {
  const inset = 12;
  const centreOf = (corner: Corner): Point => [
    corner.startsWith("right") ? width - inset - size.width / 2 : inset + size.width / 2,
    corner.endsWith("top") ? inset + size.height / 2 : height - inset - size.height / 2,
  ];
  const cost = (corner: Corner) => {
    const [x, y] = centreOf(corner);
    const box = boxAt(x, y, size.width, size.height);
    return busy.reduce((sum, other) => sum + overlap(box, other), 0);
  };
  return centreOf(corners.reduce((best, corner) => (cost(corner) < cost(best) ? corner : best)));
}

function boxAt(x: number, y: number, width: number, height: number): Box {
  return { minX: x - width / 2, minY: y - height / 2, maxX: x + width / 2, maxY: y + height / 2 };
}

function boxAround(a: Point, b: Point): Box {
  return boxAroundAll([a, b]);
}

function boxAroundAll(points: readonly Point[]): Box {
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  return {
    minX: Math.min(...xs) - 4,
    minY: Math.min(...ys) - 4,
    maxX: Math.max(...xs) + 4,
    maxY: Math.max(...ys) + 4,
  };
}

function overlap(a: Box, b: Box): number {
  const x = Math.min(a.maxX, b.maxX) - Math.max(a.minX, b.minX);
  const y = Math.min(a.maxY, b.maxY) - Math.max(a.minY, b.minY);
  return x > 0 && y > 0 ? x * y : 0;
}
