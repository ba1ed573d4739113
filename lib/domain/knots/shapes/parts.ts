import type { KnotObject, RopePoint } from "../types";

/** A spar across the picture, which most hitches are tied to: a pole, a tree, a stake seen from the side. */
export const BAR_TOP = 34;
export const BAR_BOTTOM = 70;
const BAR_MIDDLE = (BAR_TOP + BAR_BOTTOM) / 2;

export function bar(width: number): KnotObject {
  return { type: "bar", from: [6, BAR_TOP], to: [width - 6, BAR_BOTTOM] };
}

/** Up before the bar, over its top and down behind it, from one place along it to another. */
export function upAndOver(frontX: number, backX: number, frontZ = 1): RopePoint[] {
  const middleX = (frontX + backX) / 2;
  return [
    [frontX, BAR_BOTTOM + 2, frontZ],
    [frontX, BAR_MIDDLE, frontZ],
    [middleX, BAR_TOP - 3, 0],
    [backX, BAR_MIDDLE, -1],
    [backX, BAR_BOTTOM - 2, -1],
  ];
}

/**
 * A half hitch round the standing part at `x`, coming from the right: across before it, round behind it nearer the
 * bar, and out of the loop over its own part. Ends where the next one can start.
 */
export function halfHitch(x: number, y: number): RopePoint[] {
  return [
    [x + 29, y, 0],
    [x + 25, y + 22, 0],
    [x, y + 34, 1],
    [x - 22, y + 28, 0],
    [x - 20, y + 14, -1],
    [x, y + 9, -1],
    [x + 13, y + 16, 0.5],
    [x + 14, y + 30, 2],
    [x + 20, y + 46, 1],
  ];
}
