import { besideLine, fromBehind, smoothLine } from "../curve";
import type { KnotShape, RopePoint } from "../types";

/** The load part comes out of the collar, makes the small loop round both of its legs, and runs on as the large loop. */
const BOWLINE_FROM_BEHIND: readonly RopePoint[] = [
  [90, 18, 1],
  [90, 52, -1],
  [90, 92, 3],
  [100, 118, 3],
  [112, 128, 2],
  [134, 132, 0],
  [138, 146, -1],
  [112, 150, -2],
  [68, 150, -2],
  [42, 144, -1],
  [42, 116, 1],
  [68, 98, 2],
  [92, 92, 1],
  [112, 88, 2],
  [150, 86, 1],
  [176, 112, 0],
  [182, 180, 0],
  [156, 240, 0],
  [104, 258, 0],
  [58, 238, 0],
  [50, 200, 0],
  [64, 172, 0],
  [68, 148, 0],
  [68, 96, 0],
  [70, 66, 0],
  [90, 52, 1],
  [110, 66, 0],
  [112, 96, 0],
  [112, 150, 0],
  [112, 184, 0],
  [100, 208, 0],
];

export const BOWLINE: KnotShape = {
  width: 210,
  height: 272,
  objects: [],
  ropes: [{ from: "load", to: "end", points: fromBehind(BOWLINE_FROM_BEHIND, 210) }],
};

/** The shaded rope is bent back; the other comes up through the bend, round behind it and under its own part. */
export const SHEET_BEND: KnotShape = {
  width: 180,
  height: 230,
  objects: [],
  ropes: [
    {
      from: "load",
      to: "end",
      points: [
        [90, 18, 1],
        [90, 52, -1],
        [90, 92, 3],
        [100, 118, 3],
        [112, 128, 2],
        [134, 132, 0],
        [138, 146, -1],
        [112, 150, -2],
        [68, 150, -2],
        [42, 144, -1],
        [42, 116, 1],
        [68, 98, 2],
        [92, 92, 1],
        [112, 88, 2],
        [158, 80, 1],
      ],
    },
    {
      from: "load",
      to: "end",
      isSecond: true,
      points: [
        [68, 212, 0],
        [68, 150, 0],
        [68, 96, 0],
        [70, 66, 0],
        [90, 52, 1],
        [110, 66, 0],
        [112, 96, 0],
        [112, 150, 0],
        [112, 190, 0],
      ],
    },
  ],
};

/** A figure-eight, from its upper end to its lower one: each crossing turns the other way from the one before. */
export const FIGURE_EIGHT_LINE: readonly RopePoint[] = [
  [100, 0, 0],
  [100, 36, 1],
  [96, 68, 0],
  [76, 100, -1],
  [46, 128, 0],
  [52, 166, 0],
  [100, 180, 1],
  [148, 166, 0],
  [150, 136, 0],
  [124, 108, -1],
  [100, 102, 0],
  [76, 96, 1],
  [48, 72, 0],
  [56, 42, 0],
  [100, 32, -1],
  [144, 42, 0],
  [150, 70, 0],
  [126, 106, 1],
  [104, 140, 0],
  [100, 176, -1],
  [100, 204, 0],
];

/** Both strands side by side through the whole knot, joined in a loop below. */
function doubleFigureEight(): RopePoint[] {
  const line = smoothLine(FIGURE_EIGHT_LINE).filter((_, index) => index % 5 === 0);
  const spread = 6;
  const loop: RopePoint[] = [
    [120, 232, 0],
    [122, 262, 0],
    [100, 278, 0],
    [78, 262, 0],
    [80, 232, 0],
  ];
  const both = [...besideLine(line, spread), ...loop, ...besideLine(line, -spread).reverse()];
  return both.map(([x, y, z]) => [x, y + 18, z]);
}

export const FIGURE_EIGHT_LOOP: KnotShape = {
  width: 200,
  height: 306,
  objects: [],
  ropes: [{ from: "load", to: "end", points: doubleFigureEight() }],
};
