import { polar, type Point } from "@/lib/domain/drawing/path";

export interface Box {
  readonly minX: number;
  readonly minY: number;
  readonly maxX: number;
  readonly maxY: number;
}

export type Segment = readonly [Point, Point];

interface Spot {
  readonly at: Point;
  /** Paper bearing away from the shelter: the label's first choice. */
  readonly outwardDeg: number;
  /** Room kept for the mark itself. */
  readonly gap: number;
}

/** What labels should stay off: lines, and the area that the shelter covers. */
export interface Drawn {
  readonly lines: readonly Segment[];
  readonly area: readonly Point[];
}

const TURNS = [0, 25, -25, 50, -50, 80, -80, 115, -115, 150, -150, 180];
const REACHES = [0, 10, 22];

/** Finds each label a place of its own near its spot, outward where it can; in order, so the same input looks the same. */
export function placeLabels(
  spots: readonly Spot[],
  label: { readonly width: number; readonly height: number },
  sheet: { readonly width: number; readonly height: number },
  taken: readonly Box[],
  drawn: Drawn,
): readonly Point[] {
  const placed: Box[] = [];
  return spots.map((spot) => {
    let best: { at: Point; cost: number } = { at: spot.at, cost: Infinity };
    for (const turn of TURNS) {
      for (const reach of REACHES) {
        const bearing = spot.outwardDeg + turn;
        const at = polar(spot.at, spot.gap + reach + support(label, bearing), bearing);
        const cost = Math.abs(turn) * 0.5 + reach * 1.2 + costOf(boxOf(at, label), sheet, taken, placed, drawn);
        if (cost < best.cost) best = { at, cost };
      }
    }
    placed.push(boxOf(best.at, label));
    // Server and browser differ in the last digit of a sine; rounded, both draw the same.
    return [hundredths(best.at[0]), hundredths(best.at[1])];
  });
}

const hundredths = (value: number) => Math.round(value * 100) / 100;

/** Half extent of the label's box along a bearing: an ellipse, so that labels turn smoothly round a spot. */
function support({ width, height }: { width: number; height: number }, bearingDeg: number): number {
  const angle = (bearingDeg * Math.PI) / 180;
  return Math.hypot((Math.sin(angle) * width) / 2, (Math.cos(angle) * height) / 2);
}

function boxOf([x, y]: Point, { width, height }: { width: number; height: number }): Box {
  return { minX: x - width / 2, minY: y - height / 2, maxX: x + width / 2, maxY: y + height / 2 };
}

function costOf(
  box: Box,
  sheet: { readonly width: number; readonly height: number },
  taken: readonly Box[],
  placed: readonly Box[],
  { lines, area }: Drawn,
): number {
  let cost = 0;
  if (box.minX < 4 || box.minY < 4 || box.maxX > sheet.width - 4 || box.maxY > sheet.height - 4) cost += 2000;
  for (const other of taken) if (doMeet(box, other)) cost += 180;
  for (const other of placed) if (doMeet(box, other)) cost += 400;
  for (const line of lines) if (doesCross(line, box)) cost += 70;
  if (isInside([(box.minX + box.maxX) / 2, (box.minY + box.maxY) / 2], area)) cost += 60;
  return cost;
}

function doMeet(a: Box, b: Box): boolean {
  return a.minX < b.maxX && a.maxX > b.minX && a.minY < b.maxY && a.maxY > b.minY;
}

/** Liang–Barsky clip of a segment against a box. */
function doesCross([[x0, y0], [x1, y1]]: Segment, box: Box): boolean {
  let enter = 0;
  let leave = 1;
  const dx = x1 - x0;
  const dy = y1 - y0;
  for (const [p, q] of [
    [-dx, x0 - box.minX],
    [dx, box.maxX - x0],
    [-dy, y0 - box.minY],
    [dy, box.maxY - y0],
  ] as const) {
    if (p === 0) {
      if (q < 0) return false;
      continue;
    }
    const t = q / p;
    if (p < 0) enter = Math.max(enter, t);
    else leave = Math.min(leave, t);
  }
  return enter <= leave;
}

function isInside([x, y]: Point, area: readonly Point[]): boolean {
  let inside = false;
  area.forEach(([ax, ay], index) => {
    const [bx, by] = area[(index + 1) % area.length] ?? [ax, ay];
    if (ay > y !== by > y && x < ax + ((bx - ax) * (y - ay)) / (by - ay)) inside = !inside;
  });
  return inside;
}
