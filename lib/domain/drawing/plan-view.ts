import type { ShelterModel, TieOut, Vec3 } from "@/lib/calc/types";
import { bearingBetween, polar, type Point } from "./path";

export interface Bounds {
  readonly minX: number;
  readonly minY: number;
  readonly maxX: number;
  readonly maxY: number;
}

export interface PlanViewOptions {
  /** True by default. False turns the shelter's front to the top. */
  readonly northUp?: boolean;
  /** Compass bearing at the top of the paper, e.g. of the wind; goes before `northUp`. */
  readonly upDeg?: number;
}

export interface PlanTieOut {
  readonly tieOut: TieOut;
  /** Where the line leaves the fabric, and where it meets the ground. */
  readonly from: Point;
  readonly to: Point;
  /** Paper bearing of the line, outward; where the line has no length, away from the middle of the shelter. */
  readonly outwardDeg: number;
}

export interface PlanSleeper {
  readonly centre: Point;
  /** Paper bearing from feet to head. */
  readonly bearingDeg: number;
  readonly lengthM: number;
  readonly widthM: number;
}

/** A shelter in plan, in metres on the paper: x to the right, y down, origin under the shelter's centre. */
export interface PlanView {
  readonly toPaper: (point: Pick<Vec3, "x" | "y">) => Point;
  /** Paper bearing of a compass bearing. */
  readonly toPaperDeg: (compassDeg: number) => number;
  /** Compass bearing at the top of the paper. */
  readonly upDeg: number;
  /** Round everything drawn, without room for marks. */
  readonly bounds: Bounds;
  /** Middle of the outline; wind and labels are placed round it. */
  readonly middle: Point;
  /** Distance from the middle to the furthest anchor or corner, m. */
  readonly reachM: number;
  readonly outline: readonly Point[];
  readonly ridges: readonly (readonly [Point, Point])[];
  readonly seams: readonly (readonly [Point, Point])[];
  readonly poleFeet: readonly Point[];
  readonly tieOuts: readonly PlanTieOut[];
  readonly sleepers: readonly PlanSleeper[];
}

/** A grown person on a mat, drawn a little short of the bag so that neighbours do not touch. */
export const SLEEPER_LENGTH_M = 1.75;
export const SLEEPER_WIDTH_M = 0.5;

const SHORT_LINE_M = 0.05;

export function planView(model: ShelterModel, headingDeg: number, options: PlanViewOptions = {}): PlanView {
  const upDeg = options.upDeg ?? (options.northUp === false ? headingDeg : 0);
  const turn = ((headingDeg - upDeg) * Math.PI) / 180;
  const sin = Math.sin(turn);
  const cos = Math.cos(turn);
  const toPaper = ({ x, y }: Pick<Vec3, "x" | "y">): Point => [x * cos + y * sin, x * sin - y * cos];
  const toPaperDeg = (compassDeg: number) => (((compassDeg - upDeg) % 360) + 360) % 360;
  const toLine = ([a, b]: readonly [Vec3, Vec3]): readonly [Point, Point] => [toPaper(a), toPaper(b)];

  const outline = model.drawing.outline.map(toPaper);
  const middle = middleOf(outline);
  const widthM = sleeperWidthM(model.drawing.sleepingPlaces);
  const sleepers = model.drawing.sleepingPlaces.map((place) => ({
    centre: toPaper(place.centre),
    bearingDeg: toPaperDeg(place.bearingDeg + headingDeg),
    lengthM: SLEEPER_LENGTH_M,
    widthM,
  }));
  const tieOuts = model.tieOuts.map((tieOut) => {
    const from = toPaper(tieOut.point);
    const to = toPaper(tieOut.anchor);
    const isShort = Math.hypot(to[0] - from[0], to[1] - from[1]) < SHORT_LINE_M;
    return { tieOut, from, to, outwardDeg: bearingBetween(isShort ? middle : from, to) };
  });
  const drawn = [...outline, ...tieOuts.flatMap((tie) => [tie.from, tie.to])];
  return {
    toPaper,
    toPaperDeg,
    upDeg,
    bounds: boundsOf(drawn),
    middle,
    reachM: Math.max(0.5, ...drawn.map(([x, y]) => Math.hypot(x - middle[0], y - middle[1]))),
    outline,
    ridges: model.drawing.ridges.map(toLine),
    seams: model.drawing.seams.map(toLine),
    poleFeet: model.drawing.poleFeet.map(toPaper),
    tieOuts,
    sleepers,
  };
}

/** Narrower where the places are laid closer than a person is wide. */
function sleeperWidthM(places: ShelterModel["drawing"]["sleepingPlaces"]): number {
  const gaps = places.flatMap((a, i) =>
    places
      .slice(i + 1)
      .filter((b) => Math.abs(((a.bearingDeg - b.bearingDeg + 540) % 360) - 180) < 1)
      .map((b) => Math.hypot(a.centre.x - b.centre.x, a.centre.y - b.centre.y)),
  );
  return Math.max(0.3, Math.min(SLEEPER_WIDTH_M, ...gaps.map((gap) => gap * 0.86)));
}

export function boundsOf(points: readonly Point[]): Bounds {
  if (points.length === 0) return { minX: -1, minY: -1, maxX: 1, maxY: 1 };
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  return { minX: Math.min(...xs), minY: Math.min(...ys), maxX: Math.max(...xs), maxY: Math.max(...ys) };
}

function middleOf(points: readonly Point[]): Point {
  const { minX, minY, maxX, maxY } = boundsOf(points);
  return [(minX + maxX) / 2, (minY + maxY) / 2];
}

/** The drawing laid into a box of pixels or points. */
export interface Fit {
  /** Pixels per metre. */
  readonly scale: number;
  readonly place: (point: Point) => Point;
}

export interface FitBox {
  readonly width: number;
  readonly height: number;
  /** Room on each side for marks, numbers and wind. */
  readonly pad: number;
  /** Never larger than this, pixels per metre, so that a small shelter does not look huge. */
  readonly maxScale?: number;
}

export function fitPlan(bounds: Bounds, { width, height, pad, maxScale = Infinity }: FitBox): Fit {
  const spanX = Math.max(0.1, bounds.maxX - bounds.minX);
  const spanY = Math.max(0.1, bounds.maxY - bounds.minY);
  const scale = Math.min((width - 2 * pad) / spanX, (height - 2 * pad) / spanY, maxScale);
  const middleX = (bounds.minX + bounds.maxX) / 2;
  const middleY = (bounds.minY + bounds.maxY) / 2;
  return {
    scale,
    place: ([x, y]) => [width / 2 + (x - middleX) * scale, height / 2 + (y - middleY) * scale],
  };
}

export interface ScaleBar {
  readonly lengthM: number;
  /** In the units of the fitted box. */
  readonly length: number;
}

/** The longest of 0.5, 1, 2, 5 and 10 m that stays within `maxLength` of the fitted box. */
export function scaleBar(scale: number, maxLength: number): ScaleBar {
  const lengthM = [10, 5, 2, 1, 0.5].find((metres) => metres * scale <= maxLength) ?? 0.5;
  return { lengthM, length: lengthM * scale };
}

/** Capsule of a sleeping place and its head, in the units of the fitted box. */
export function sleeperShape(sleeper: PlanSleeper, fit: Fit): { body: string; headCentre: Point; headRadius: number } {
  const centre = fit.place(sleeper.centre);
  const radius = (sleeper.widthM * fit.scale) / 2;
  const half = (sleeper.lengthM * fit.scale) / 2 - radius;
  const side = sleeper.bearingDeg + 90;
  const head = polar(centre, half, sleeper.bearingDeg);
  const foot = polar(centre, -half, sleeper.bearingDeg);
  const text = (point: Point) => `${point[0].toFixed(2)} ${point[1].toFixed(2)}`;
  const r = radius.toFixed(2);
  const body =
    `M${text(polar(foot, -radius, side))}L${text(polar(head, -radius, side))}` +
    `A${r} ${r} 0 0 1 ${text(polar(head, radius, side))}` +
    `L${text(polar(foot, radius, side))}A${r} ${r} 0 0 1 ${text(polar(foot, -radius, side))}Z`;
  return { body, headCentre: head, headRadius: radius * 0.55 };
}
