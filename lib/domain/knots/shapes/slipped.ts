import type { KnotShape, RopePoint } from "../types";
import { bar, BAR_BOTTOM, halfHitch, upAndOver } from "./parts";

/** A slipped loop in the line; the end goes round the anchor, up through the loop, and is made fast below it. */
export const TRUCKERS_HITCH: KnotShape = {
  width: 230,
  height: 336,
  objects: [{ type: "bar", from: [6, 286], to: [224, 318] }],
  ropes: [
    {
      from: "load",
      to: "end",
      points: [
        [92, 18, 0],
        [92, 34, -1],
        [92, 58, 1],
        [92, 78, 1],
        [106, 94, 0],
        [128, 84, -1],
        [130, 58, -1],
        [114, 40, 0],
        [92, 34, 1],
        [62, 36, 0],
        [54, 48, 0],
        [66, 56, 0],
        [92, 56, -1],
        [128, 56, 1],
        [164, 54, 0],
        [188, 70, 0],
        [184, 98, 0],
        [162, 100, 0],
        [130, 82, 1],
        [92, 72, -1],
        [66, 76, 0],
        [54, 104, 0],
        [54, 250, 0],
        [56, 284, 1],
        [62, 302, 1],
        [72, 322, 0],
        [96, 302, -1],
        [130, 288, -1],
        [152, 268, 0],
        [156, 240, 0],
        [156, 120, 0],
        [158, 98, -1],
        [166, 78, 0],
        [188, 74, 2],
        [200, 92, 0],
        ...halfHitch(156, 122).slice(1),
        ...halfHitch(156, 176),
        [176, 250, 1],
      ],
    },
  ],
};

/** The end passes over the standing part and comes back under it as a bight, into a loop twisted as a figure-eight. */
export const SIBERIAN_HITCH: KnotShape = {
  width: 210,
  height: 330,
  objects: [bar(210)],
  ropes: [
    {
      from: "load",
      to: "end",
      points: [
        [172, 310, 2],
        [172, 240, 2],
        [170, 196, 2],
        [158, 168, 2],
        [142, 148, 2],
        [126, 124, 0],
        [121, 104, -3],
        [120, 84, 0],
        ...upAndOver(120, 98),
        [98, BAR_BOTTOM + 10, 0],
        [100, 100, 1],
        [96, 134, 0],
        [76, 166, -1],
        [46, 196, 0],
        [52, 234, 0],
        [100, 248, 1],
        [148, 234, 0],
        [150, 204, 0],
        [124, 176, -1],
        [100, 170, 0],
        [76, 164, 1],
        [52, 142, 0],
        [58, 112, 0],
        [100, 100, -1],
        [144, 110, 0],
        [150, 136, 0],
        [126, 174, 1],
        [106, 208, 0],
        [100, 246, -1],
        [98, 282, 0],
        [107, 296, 0],
        [116, 282, 0],
        [116, 246, -1],
        [121, 214, 0],
        [142, 194, 1],
        [168, 184, 0],
        [198, 176, 0],
      ],
    },
  ],
};

const LOG: { readonly centre: readonly [number, number]; readonly radius: number } = { centre: [92, 84], radius: 46 };
/** Seen along the log nothing runs behind it. */
const FRONT = 2;
const ROPE_RADIUS = LOG.radius + 6;

function onLog(angleDeg: number, radius: number, z: number): RopePoint {
  const angle = (angleDeg * Math.PI) / 180;
  return [LOG.centre[0] + radius * Math.cos(angle), LOG.centre[1] + radius * Math.sin(angle), z + FRONT];
}

/** The end winds round the rope's own turn, against it, three times: outside, over, inside, under. */
function twistBack(): RopePoint[] {
  const turns = 3;
  const points: RopePoint[] = [];
  for (let quarter = 0; quarter <= turns * 4; quarter += 1) {
    const angle = 20 - quarter * 11;
    const phase = quarter % 4;
    const side = phase === 0 ? -1 : phase === 2 ? 1 : 0;
    const z = phase === 1 ? 1 : phase === 3 ? -1 : 0;
    points.push(onLog(angle, ROPE_RADIUS + side * 9, z));
  }
  return points;
}

/** Seen along the log. */
export const TIMBER_HITCH: KnotShape = {
  width: 230,
  height: 180,
  objects: [{ type: "disc", centre: LOG.centre, radius: LOG.radius }],
  ropes: [
    {
      from: "load",
      to: "end",
      points: [
        [214, 140, 2],
        [150, 138, 2],
        [112, 136, 2],
        ...[100, 130, 160, 190, 220, 250, 280, 310, 340].map((angle) => onLog(angle, ROPE_RADIUS, 0)),
        onLog(5, ROPE_RADIUS, 0),
        [148, 112, 2.5],
        [152, 139, 3],
        [146, 156, 2],
        [132, 152, 2],
        [128, 137, 1],
        [134, 118, 2],
        ...twistBack(),
      ],
    },
  ],
};
