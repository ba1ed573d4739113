import type { Point } from "../drawing/path";

/**
 * A point of a rope's middle line: to the right, down, and towards the eye. Where two ropes cross on the page the one
 * with the larger third number lies on top; an object's front is at 0, so a rope below 0 runs behind it.
 */
export type RopePoint = readonly [x: number, y: number, z: number];

/** What an end of a rope is: it takes the load, is the cut end one ties with, or just runs on out of the picture. */
export type RopeEnd = "load" | "end" | "runs-on";

export interface Rope {
  readonly points: readonly RopePoint[];
  readonly from: RopeEnd;
  readonly to: RopeEnd;
  /** A second rope is shaded, so that the two can be told apart. */
  readonly isSecond?: boolean;
}

/** What the rope is tied to. Ropes pass before or behind it. */
export type KnotObject =
  | { readonly type: "bar"; readonly from: Point; readonly to: Point }
  | { readonly type: "disc"; readonly centre: Point; readonly radius: number };

export interface KnotShape {
  readonly width: number;
  readonly height: number;
  readonly objects: readonly KnotObject[];
  readonly ropes: readonly Rope[];
}

export const ROPE_WIDTH = 10;
