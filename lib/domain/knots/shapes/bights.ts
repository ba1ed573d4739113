import type { KnotShape, RopePoint } from "../types";
import { bar, BAR_BOTTOM, BAR_TOP, upAndOver } from "./parts";

const MIDDLE = (BAR_TOP + BAR_BOTTOM) / 2;

/** A half hitch finished with a bight instead of the end: pull the end and it falls open. */
export const SLIPPERY_HALF_HITCH: KnotShape = {
  width: 180,
  height: 220,
  objects: [bar(180)],
  ropes: [
    {
      from: "load",
      to: "end",
      points: [
        [90, 204, 0],
        [90, 90, 0],
        ...upAndOver(90, 118),
        [120, BAR_BOTTOM + 8, 0],
        [122, 104, 0],
        [118, 136, 0],
        [90, 146, 1],
        [66, 140, 0],
        [68, 124, -1],
        [90, 119, -1],
        [103, 128, 0.5],
        [104, 146, 2],
        [103, 172, 1],
        [110, 184, 1],
        [117, 172, 1],
        [116, 142, 2],
        [112, 116, 0.5],
        [90, 102, -1],
        [62, 98, -1],
        [28, 112, -1],
      ],
    },
  ],
};

/** The middle of the rope lies across both parts that come out beneath it. */
export const LARKS_HEAD: KnotShape = {
  width: 180,
  height: 150,
  objects: [bar(180)],
  ropes: [
    {
      from: "load",
      to: "load",
      points: [
        [82, 136, 1],
        [82, 100, 1],
        ...upAndOver(82, 62),
        [54, BAR_BOTTOM + 4, 0],
        [62, BAR_BOTTOM - 8, 2],
        [90, MIDDLE + 4, 3],
        [118, BAR_BOTTOM - 8, 2],
        [126, BAR_BOTTOM + 4, 0],
        ...upAndOver(98, 118).reverse(),
        [98, 100, 1],
        [98, 136, 1],
      ],
    },
  ],
};

function prusikSide(side: 1 | -1): RopePoint[] {
  const x = (offset: number) => 110 + side * offset;
  return [
    [x(8), 146, 1],
    [x(8), 104, 1],
    ...upAndOver(x(8), x(14)),
    [x(20), BAR_BOTTOM + 4, 0],
    ...upAndOver(x(26), x(36)).slice(1),
    [x(46), BAR_BOTTOM + 4, 0],
    [x(40), BAR_BOTTOM - 10, 2],
  ];
}

/** A lark's head with each half taken round once more. */
export const PRUSIK: KnotShape = {
  width: 220,
  height: 160,
  objects: [bar(220)],
  ropes: [
    {
      from: "load",
      to: "load",
      points: [...prusikSide(-1), [110, MIDDLE + 4, 3], ...prusikSide(1).reverse()],
    },
  ],
};
