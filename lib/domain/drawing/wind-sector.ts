import { arcPath, circlePath, linePath, polar, type Point } from "./path";

export interface WindSector {
  /** Arc on the side that the wind comes from; a whole circle when it may come from anywhere. */
  readonly arc: string;
  readonly arrows: readonly { readonly tail: Point; readonly head: Point; readonly d: string }[];
  /** Paper bearing of the middle of the range, null when it may come from anywhere. */
  readonly middleDeg: number | null;
  readonly spanDeg: number;
}

export interface WindSectorOptions {
  readonly centre?: Point;
  /** Compass bearing at the top of the paper. */
  readonly upDeg?: number;
  readonly arrowLength?: number;
  readonly arrowHead?: number;
}

/** The narrowest arc that can still be seen, degrees. */
const MIN_SPAN_DEG = 20;

/** Wind range as a drawn sector: arc at `radius` round the centre, arrows blowing in. Directions are where wind comes from. */
export function windSector(
  fromDeg: number | null,
  toDeg: number | null,
  radius: number,
  { centre = [0, 0], upDeg = 0, arrowLength = radius * 0.2, arrowHead = arrowLength * 0.28 }: WindSectorOptions = {},
): WindSector {
  const arrowAt = (bearing: number) => {
    const tail = polar(centre, radius + arrowLength, bearing);
    const head = polar(centre, radius, bearing);
    const left = polar(head, arrowHead, bearing - 28);
    const right = polar(head, arrowHead, bearing + 28);
    return { tail, head, d: `${linePath([tail, head])}${linePath([left, head, right])}` };
  };
  if (fromDeg === null || toDeg === null) {
    return {
      arc: circlePath(centre[0], centre[1], radius),
      arrows: [0, 45, 90, 135, 180, 225, 270, 315].map(arrowAt),
      middleDeg: null,
      spanDeg: 360,
    };
  }
  const spanDeg = (((toDeg - fromDeg) % 360) + 360) % 360;
  const start = fromDeg - upDeg;
  const middleDeg = (((start + spanDeg / 2) % 360) + 360) % 360;
  const drawnSpan = Math.max(spanDeg, MIN_SPAN_DEG);
  const first = middleDeg - drawnSpan / 2;
  const count = spanDeg < MIN_SPAN_DEG ? 1 : spanDeg <= 120 ? 3 : Math.round(spanDeg / 45);
  const bearings =
    count === 1
      ? [middleDeg]
      : Array.from({ length: count }, (_, i) => first + (drawnSpan * (i + 0.08)) / (count - 0.84));
  return { arc: arcPath(centre, radius, first, first + drawnSpan), arrows: bearings.map(arrowAt), middleDeg, spanDeg };
}

/** North arrow in a box of 24 × 24, pointing up; turn it by −upDeg. The letter N stands above it. */
export const NORTH_ARROW: readonly { readonly d: string; readonly fill: boolean }[] = [
  { d: circlePath(12, 12, 11), fill: false },
  { d: "M12 20V5M8.6 9L12 4.6L15.4 9", fill: false },
];
