import { overlap, placeLabels, type Disc, type LabelSizes, type PlacedTieOut } from "./label-layout";
import { bearingBetween, type Point } from "./path";
import { boundsOf, scaleBar, type Bounds, type Fit, type PlanView, type ScaleBar } from "./plan-view";
import { windSector, type WindSector } from "./wind-sector";

export interface ComposeOptions {
  readonly width: number;
  readonly height: number;
  readonly sizes: LabelSizes;
  /** Null draws no wind; a range of nulls is wind from anywhere. */
  readonly wind: { readonly fromDeg: number | null; readonly toDeg: number | null } | null;
  readonly windArrow: number;
  /** Radius of the north arrow's disc, with its letter. */
  readonly northRadius: number;
  /** Longest scale bar; 0 draws none. */
  readonly scaleBarMax: number;
  readonly maxScale: number;
}

/** A shelter laid out on a piece of paper or a screen: everything that has a place, in the units of the box. */
export interface ComposedPlan {
  readonly fit: Fit;
  readonly tieOuts: readonly PlacedTieOut[];
  readonly wind: WindSector | null;
  readonly north: Point;
  readonly scaleBar: (ScaleBar & { readonly left: number; readonly y: number }) | null;
}

const SMALLEST_SCALE = 2;
const STEPS = 9;

/** The largest scale at which the shelter, its labels and the wind fit into the box, with free corners for north and scale. */
export function composePlan(view: PlanView, options: ComposeOptions): ComposedPlan {
  let low = SMALLEST_SCALE;
  let high = options.maxScale;
  for (let step = 0; step < STEPS; step += 1) {
    const scale = step === 0 ? high : (low + high) / 2;
    const { bounds } = layAt(view, scale, options);
    const fits = bounds.maxX - bounds.minX <= options.width && bounds.maxY - bounds.minY <= options.height;
    if (fits) low = scale;
    else high = scale;
    if (fits && step === 0) break;
  }
  let best = furnish(view, low, options);
  for (let i = 1; i <= 4 && best.cost > 0; i += 1) {
    const smaller = furnish(view, low * (1 - 0.05 * i), options);
    if (smaller.cost < best.cost) best = smaller;
  }
  return best.plan;
}

interface Layout {
  readonly place: (point: Point) => Point;
  readonly tieOuts: readonly PlacedTieOut[];
  readonly wind: WindSector | null;
  readonly bounds: Bounds;
}

/** At a scale, with the shelter's middle at the given point. */
function layAt(view: PlanView, scale: number, options: ComposeOptions, middle: Point = [0, 0]): Layout {
  const { sizes } = options;
  const place = ([x, y]: Point): Point => [
    middle[0] + (x - view.middle[0]) * scale,
    middle[1] + (y - view.middle[1]) * scale,
  ];
  const tieOuts = placeLabels(view, place, sizes);
  const corners = view.outline.map(place);
  const discs = discsOf(tieOuts, sizes);
  const wind = options.wind && layWind(view, options, middle, corners, discs);
  const windPoints = wind === null ? [] : wind.arrows.flatMap((arrow) => [arrow.tail, arrow.head]);
  const bounds = boundsOf([...corners, ...discs.flatMap(edgePoints), ...windPoints]);
  return { place, tieOuts, wind, bounds };
}

function discsOf(tieOuts: readonly PlacedTieOut[], sizes: LabelSizes): Disc[] {
  return tieOuts.flatMap((tie) => [
    { centre: tie.anchor, radius: sizes.anchorRadius },
    { centre: tie.state, radius: sizes.stateRadius },
    { centre: tie.number, radius: sizes.numberRadius },
  ]);
}

function edgePoints({ centre: [x, y], radius }: Disc): Point[] {
  return [
    [x - radius, y - radius],
    [x + radius, y + radius],
  ];
}

/** Just outside of whatever lies on the wind's side. */
function layWind(
  view: PlanView,
  { wind, windArrow, sizes }: ComposeOptions,
  middle: Point,
  corners: readonly Point[],
  discs: readonly Disc[],
): WindSector {
  const range = wind ?? { fromDeg: null, toDeg: null };
  const probe = windSector(range.fromDeg, range.toDeg, 1, { upDeg: view.upDeg });
  const isInTheWay = (point: Point) => {
    if (probe.middleDeg === null) return true;
    const off = Math.abs(((bearingBetween(middle, point) - probe.middleDeg + 540) % 360) - 180);
    return off <= Math.max(probe.spanDeg, 20) / 2 + 14;
  };
  const reach = [...corners.map((centre) => ({ centre, radius: 0 })), ...discs]
    .filter((disc) => isInTheWay(disc.centre))
    .map((disc) => Math.hypot(disc.centre[0] - middle[0], disc.centre[1] - middle[1]) + disc.radius);
  const radius = Math.max(windArrow, ...reach) + 2 * sizes.gap + windArrow * 0.15;
  return windSector(range.fromDeg, range.toDeg, radius, {
    centre: middle,
    upDeg: view.upDeg,
    arrowLength: windArrow,
    arrowHead: windArrow * 0.26,
  });
}

function furnish(view: PlanView, scale: number, options: ComposeOptions): { plan: ComposedPlan; cost: number } {
  const { width, height, sizes, northRadius } = options;
  const { bounds } = layAt(view, scale, options);
  const middle: Point = [width / 2 - (bounds.minX + bounds.maxX) / 2, height / 2 - (bounds.minY + bounds.maxY) / 2];
  const { place, tieOuts, wind } = layAt(view, scale, options, middle);
  const discs = discsOf(tieOuts, sizes);
  const outline = view.outline.map(place);
  const segments: (readonly [Point, Point])[] = [
    ...outline.map((point, index) => [point, outline[(index + 1) % outline.length] ?? point] as const),
    ...tieOuts.map((tie) => [tie.from, tie.anchor] as const),
    ...(wind?.arrows ?? []).map((arrow) => [arrow.tail, arrow.head] as const),
  ];

  const edge = northRadius;
  const northSpots: Point[] = [
    [width - edge, edge],
    [edge, edge],
    [width - edge, height - edge],
    [edge, height - edge],
  ];
  const north = cheapest(northSpots, (spot) => overlap(spot, northRadius, discs, segments, sizes.gap));
  let cost = north.cost;
  let bar: ComposedPlan["scaleBar"] = null;
  if (options.scaleBarMax > 0) {
    const size = scaleBar(scale, options.scaleBarMax);
    const low = height - 6;
    const lefts = [width - size.length - 8, 8, width / 2 - size.length / 2];
    const taken: Disc[] = [...discs, { centre: north.spot, radius: northRadius }];
    const spots: Point[] = lefts.flatMap((left): Point[] => [
      [left, low],
      [left, 18],
    ]);
    const best = cheapest(spots, ([left, y]) =>
      [0, 0.25, 0.5, 0.75, 1]
        .map((share) => overlap([left + share * size.length, y - 6], 9, taken, segments, sizes.gap))
        .reduce((a, b) => a + b, 0),
    );
    cost += best.cost;
    bar = { ...size, left: best.spot[0], y: best.spot[1] };
  }
  return { plan: { fit: { scale, place }, tieOuts, wind, north: north.spot, scaleBar: bar }, cost };
}

function cheapest(spots: readonly Point[], costOf: (spot: Point) => number): { spot: Point; cost: number } {
  let best = { spot: spots[0] ?? ([0, 0] as const), cost: Infinity };
  for (const spot of spots) {
    const cost = costOf(spot);
    if (cost < best.cost) best = { spot, cost };
  }
  return best;
}
