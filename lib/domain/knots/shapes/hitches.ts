import type { KnotShape } from "../types";
import { bar, BAR_BOTTOM, BAR_TOP, halfHitch, upAndOver } from "./parts";

const MIDDLE = (BAR_TOP + BAR_BOTTOM) / 2;

/** Both ends lie under the turn that runs across them, side by side, one up and one down. */
export const CLOVE_HITCH: KnotShape = {
  width: 180,
  height: 150,
  objects: [bar(180)],
  ropes: [
    {
      from: "load",
      to: "end",
      points: [
        [83, 138, 1],
        [83, 100, 1],
        ...upAndOver(83, 58),
        [58, BAR_BOTTOM + 4, 0],
        [66, BAR_BOTTOM - 4, 2],
        [90, MIDDLE, 3],
        [116, BAR_TOP + 3, 2],
        [122, BAR_TOP - 3, 0],
        [122, MIDDLE, -1],
        [112, BAR_BOTTOM - 2, -1],
        [103, BAR_BOTTOM + 4, 0],
        [97, BAR_BOTTOM - 2, 1],
        [97, MIDDLE, 1],
        [97, BAR_TOP - 4, 1],
        [99, 12, 1],
      ],
    },
  ],
};

export const TWO_HALF_HITCHES: KnotShape = {
  width: 180,
  height: 240,
  objects: [bar(180)],
  ropes: [
    {
      from: "load",
      to: "end",
      points: [
        [86, 222, 0],
        [86, 90, 0],
        ...upAndOver(86, 112),
        [114, BAR_BOTTOM + 8, 0],
        ...halfHitch(86, 92),
        ...halfHitch(86, 146),
        [104, 212, 1],
      ],
    },
  ],
};

export const ROUND_TURN_TWO_HALF_HITCHES: KnotShape = {
  width: 180,
  height: 240,
  objects: [bar(180)],
  ropes: [
    {
      from: "load",
      to: "end",
      points: [
        [80, 222, 0],
        [80, 90, 0],
        ...upAndOver(80, 92),
        [94, BAR_BOTTOM + 5, 0],
        ...upAndOver(98, 112).slice(1),
        [112, BAR_BOTTOM + 8, 0],
        ...halfHitch(80, 92),
        ...halfHitch(80, 146),
        [98, 212, 1],
      ],
    },
  ],
};

/** Two turns inside the loop, towards the bar, then a half hitch outside it. */
export const TAUT_LINE_HITCH: KnotShape = {
  width: 180,
  height: 270,
  objects: [bar(180)],
  ropes: [
    {
      from: "load",
      to: "end",
      points: [
        [80, 252, 0],
        [80, 90, 0],
        ...upAndOver(80, 120),
        [124, BAR_BOTTOM + 12, 0],
        [124, 120, 0],
        [112, 152, 0.5],
        [80, 164, 1],
        [58, 158, 0],
        [60, 146, -1],
        [80, 142, -1],
        [98, 141, 0],
        [98, 134, 0.5],
        [80, 138, 1],
        [58, 136, 0],
        [60, 124, -1],
        [80, 119, -1],
        [98, 112, 0.5],
        [108, 122, 1],
        [104, 152, 2],
        [106, 178, 0.5],
        [104, 194, 0.5],
        [80, 206, 1],
        [58, 200, 0],
        [60, 187, -1],
        [80, 182, -1],
        [93, 188, 0.5],
        [95, 203, 2],
        [98, 240, 1],
      ],
    },
  ],
};

/** The end goes round the standing part, then under both turns on the bar, then a half hitch. */
export const ANCHOR_BEND: KnotShape = {
  width: 190,
  height: 220,
  objects: [bar(190)],
  ropes: [
    {
      from: "load",
      to: "end",
      points: [
        [84, 204, 0],
        [84, 100, 0],
        [84, BAR_BOTTOM + 2, 2],
        ...upAndOver(84, 96, 2).slice(1),
        [99, BAR_BOTTOM + 5, 0],
        ...upAndOver(104, 120, 2).slice(1),
        [120, BAR_BOTTOM + 6, 0],
        [110, 92, 1],
        [84, 98, 1],
        [60, 88, 1],
        [58, 66, 1],
        [84, MIDDLE + 3, 1],
        [104, MIDDLE + 2, 1],
        [130, MIDDLE + 6, 1],
        [136, 88, 1],
        ...halfHitch(84, 118).slice(1),
        [100, 188, 1],
      ],
    },
  ],
};
