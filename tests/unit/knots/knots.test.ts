import { describe, expect, it } from "vitest";
import { KNOTS } from "@/lib/calc/tables/lines";
import { composeKnot } from "@/lib/domain/knots/compose-knot";
import { findCrossings } from "@/lib/domain/knots/crossings";
import { smoothLine } from "@/lib/domain/knots/curve";
import { findKnot, KNOT_GUIDE, type KnotKey } from "@/lib/domain/knots/knots";
import { FIGURE_EIGHT_LINE } from "@/lib/domain/knots/shapes/loops";
import type { KnotShape, RopePoint } from "@/lib/domain/knots/types";
import { crossingsOf, exactDeterminant, knotDeterminant } from "../../helpers/knot-theory";

function shapeOf(key: KnotKey): KnotShape {
  const knot = findKnot(key);
  if (!knot) throw new Error(`There is no ${key}.`);
  return knot.shape;
}

function ropeOf(key: KnotKey, index = 0): readonly RopePoint[] {
  return shapeOf(key).ropes[index]?.points ?? [];
}

const determinantOf = (points: readonly RopePoint[]) => knotDeterminant(crossingsOf(points));

/** Signed turns round the bar: over its top to the back +1, back over the top −1. */
function turnsRoundBar(key: KnotKey): number {
  const bar = shapeOf(key).objects.find((one) => one.type === "bar");
  if (!bar) throw new Error(`${key} has no bar.`);
  const middle = (bar.from[1] + bar.to[1]) / 2;
  const line = smoothLine(ropeOf(key));
  return line.reduce((sum, [, y, z], index) => {
    const next = line[index + 1];
    if (!next || y > middle || z >= 0 === next[2] >= 0) return sum;
    return sum + (z >= 0 ? 1 : -1);
  }, 0);
}

describe("the measure itself", () => {
  it("has the determinants of the knot tables: 3 for the trefoil, 5 for the figure-eight, 1 for no knot", () => {
    // A trefoil as the closed curve (sin t + 2 sin 2t, cos t − 2 cos 2t, −sin 3t), any text on knots.
    const trefoil = Array.from({ length: 61 }, (_, index): RopePoint => {
      const t = (index / 60) * 2 * Math.PI + 0.05;
      return [Math.sin(t) + 2 * Math.sin(2 * t), Math.cos(t) - 2 * Math.cos(2 * t), -Math.sin(3 * t)];
    });
    expect(knotDeterminant(findCrossings([smoothLine(trefoil)]))).toBe(3);
    const flat = Array.from({ length: 30 }, (_, index): RopePoint => [index * 7, Math.sin(index) * 20, 0]);
    expect(determinantOf(flat)).toBe(1);
  });

  it("works out a determinant exactly, rows changed where a zero is in the way", () => {
    // |0 2 1; 1 0 3; 2 1 0| = 0·(0−3) − 2·(0−6) + 1·(1−0) = 13.
    expect(
      exactDeterminant([
        [0, 2, 1],
        [1, 0, 3],
        [2, 1, 0],
      ]),
    ).toBe(13n);
    expect(
      exactDeterminant([
        [0, 1],
        [0, 2],
      ]),
    ).toBe(0n);
  });
});

describe("every knot", () => {
  it("covers what a plan can name, and at least ten in all", () => {
    expect(KNOT_GUIDE.map((knot) => knot.key)).toEqual(expect.arrayContaining(KNOTS.map((row) => row.id)));
    for (const row of KNOTS) expect(findKnot(row.id)?.name).toBe(row.name);
    expect(KNOT_GUIDE.length).toBeGreaterThanOrEqual(10);
    expect(new Set(KNOT_GUIDE.map((knot) => knot.key)).size).toBe(KNOT_GUIDE.length);
  });

  it.each(KNOT_GUIDE)(
    "$name: each crossing says plainly which rope is on top, inside the picture",
    ({ shape, steps }) => {
      for (const crossing of findCrossings(shape.ropes.map((rope) => smoothLine(rope.points)))) {
        expect(crossing.clearance).toBeGreaterThan(0.5);
        expect(crossing.x).toBeGreaterThan(0);
        expect(crossing.x).toBeLessThan(shape.width);
        expect(crossing.y).toBeGreaterThan(0);
        expect(crossing.y).toBeLessThan(shape.height);
      }
      expect(steps.length).toBeGreaterThanOrEqual(3);
    },
  );

  it.each(KNOT_GUIDE)("$name: at each crossing the last stroke drawn is the upper rope's", ({ shape }) => {
    const lines = shape.ropes.map((rope) => smoothLine(rope.points));
    const strokes = composeKnot(shape).filter(({ look }) => look === "edge");
    for (const { x, y, over } of findCrossings(lines)) {
      const last = strokes.flatMap(({ d }) => piecesNear(d, x, y)).at(-1);
      const line = lines[over.rope] ?? [];
      const [a, b] = [line[Math.floor(over.at)], line[Math.floor(over.at) + 1]];
      if (last === undefined || !a || !b) throw new Error("Nothing is drawn at a crossing.");
      const upper = Math.atan2(b[1] - a[1], b[0] - a[0]);
      expect(Math.abs(Math.sin(upper - last))).toBeLessThan(0.35);
    }
  });
});

/** Directions of the straight pieces of a path that pass within a unit of a point. */
function piecesNear(d: string, x: number, y: number): number[] {
  const points = d
    .slice(1)
    .split("L")
    .map((pair) => pair.split(" ").map(Number));
  return points.slice(1).flatMap(([bx = 0, by = 0], index) => {
    const [ax = 0, ay = 0] = points[index] ?? [];
    const [ux, uy] = [bx - ax, by - ay];
    const length = Math.hypot(ux, uy);
    if (length < 0.3) return [];
    const along = Math.min(Math.max(((x - ax) * ux + (y - ay) * uy) / length ** 2, 0), 1);
    return Math.hypot(ax + ux * along - x, ay + uy * along - y) < 1 ? [Math.atan2(uy, ux)] : [];
  });
}

describe("knots known to mathematics", () => {
  it("the figure-eight has four crossings, turn and turn about", () => {
    const crossings = findCrossings([smoothLine(FIGURE_EIGHT_LINE)]);
    expect(crossings).toHaveLength(4);
    const passes = crossings
      .flatMap(({ over, under }) => [
        { at: over.at, isOver: true },
        { at: under.at, isOver: false },
      ])
      .sort((a, b) => a.at - b.at)
      .map((pass) => pass.isOver);
    passes.forEach((isOver, index) => expect(isOver).toBe(index % 2 === 0));
    expect(determinantOf(FIGURE_EIGHT_LINE)).toBe(5);
  });

  it("two half hitches are two trefoils of one hand on the line: 3 × 3", () => {
    expect(determinantOf(ropeOf("two-half-hitches"))).toBe(9);
    expect(determinantOf(ropeOf("round-turn-two-half-hitches"))).toBe(9);
    const signs = crossingsOf(ropeOf("two-half-hitches")).map((crossing) => crossing.sign);
    expect(new Set(signs).size).toBe(1);
  });

  it("the taut-line hitch is a double overhand and a half hitch: 5 × 3, all of one hand", () => {
    // Two turns make the torus knot T(2,5), determinant 5 (knot tables); one half hitch the trefoil, 3.
    expect(determinantOf(ropeOf("taut-line-hitch"))).toBe(15);
  });

  it("the anchor bend without its ring is a double overhand and a half hitch: 5 × 3", () => {
    expect(determinantOf(ropeOf("anchor-bend"))).toBe(15);
  });

  it("what is tied with a bight is no knot: it falls open", () => {
    expect(determinantOf(ropeOf("figure-eight-loop"))).toBe(1);
    expect(determinantOf(ropeOf("slippery-half-hitch"))).toBe(1);
    expect(determinantOf(ropeOf("siberian-hitch"))).toBe(1);
    const slipLoop = ropeOf("truckers-hitch");
    const fork = slipLoop.findIndex(([x, y]) => x === 54 && y === 250);
    expect(determinantOf(slipLoop.slice(0, fork + 1))).toBe(1);
  });

  it("the Siberian hitch, its end pulled through whole, is a figure-eight", () => {
    const rope = ropeOf("siberian-hitch");
    const first = rope.findIndex(([x, y]) => x === 98 && y === 80);
    const bend = rope.findIndex(([x, y]) => x === 98 && y === 282);
    expect(determinantOf(rope.slice(first, bend + 1))).toBe(5);
  });

  it("turns round the bar: hitches go on, a lark's head and a prusik come back", () => {
    expect(turnsRoundBar("two-half-hitches")).toBe(1);
    expect(turnsRoundBar("taut-line-hitch")).toBe(1);
    expect(turnsRoundBar("round-turn-two-half-hitches")).toBe(2);
    expect(turnsRoundBar("anchor-bend")).toBe(2);
    expect(turnsRoundBar("clove-hitch")).toBe(2);
    expect(turnsRoundBar("larks-head")).toBe(0);
    expect(turnsRoundBar("prusik")).toBe(0);
  });
});

describe("bowline and sheet bend", () => {
  /** The sheet bend with its two ropes joined where the bowline has its loop. */
  function joinedSheetBend(): RopePoint[] {
    const [working, bent] = [ropeOf("sheet-bend", 0), ropeOf("sheet-bend", 1)];
    return [...working, [177.3, 151, 0], [121.7, 229, 0], [69.1, 227, 0], ...bent];
  }

  /** Either way the short end can be led out of the loop: over everything, or under it. */
  const bothWays = (points: readonly RopePoint[]) =>
    [99, -99].map((height) => knotDeterminant(crossingsOf(points, height))).sort((a, b) => a - b);

  it("are the same knot, as sailors say", () => {
    expect(bothWays(ropeOf("bowline"))).toEqual(bothWays(joinedSheetBend()));
  });

  it("the bowline is what the rule of thumb makes", () => {
    // Typed from the rule, point by point: a small loop with the part towards the end on top, up through it from
    // behind, round behind the load part, down through it again.
    const rule: RopePoint[] = [
      [100.5, 0, 0],
      [100.2, 40, 0],
      [100.1, 80, 0],
      [135, 100, 0],
      [105, 135, 0],
      [65, 110, 0],
      [75, 85, 0],
      [100, 78, 1],
      [150, 78, 1],
      [190, 150, 0],
      [150, 250, 0],
      [60, 240, 0],
      [50, 180, 0],
      [75, 128, -1],
      [90, 108, 0],
      [86, 81, 2],
      [84, 55, 1],
      [100, 41, -1],
      [120, 50, 1],
      [118, 78, 3],
      [115, 90, 3],
      [105, 105, 1],
      [100, 135, -1],
      [95, 170, 0],
    ];
    expect(bothWays(ropeOf("bowline"))).toEqual(bothWays(rule));
    expect(Math.min(...bothWays(rule))).toBeGreaterThan(1);
  });

  it("fall apart when the collar does not hold the load part", () => {
    const wrong = ropeOf("bowline").map((point, index): RopePoint => (index < 3 ? [point[0], point[1], -9] : point));
    expect(determinantOf(wrong)).toBe(1);
  });
});

describe("friction and timber", () => {
  it("the timber hitch's end winds round its own turn, over and under by turns, three times", () => {
    const crossings = findCrossings([smoothLine(ropeOf("timber-hitch"))]);
    const passes = crossings
      .map(({ over, under }) => ({ at: Math.max(over.at, under.at), isOver: over.at > under.at }))
      .sort((a, b) => a.at - b.at)
      .map((pass) => pass.isOver);
    expect(passes.length).toBe(8);
    passes.forEach((isOver, index) => expect(isOver).toBe(index % 2 === 0));
  });

  it("the prusik has four strands under its bend, the lark's head two", () => {
    const under = (key: KnotKey) => {
      const bend = ropeOf(key).findIndex(([, , z]) => z === 3) * 10;
      return findCrossings([smoothLine(ropeOf(key))]).filter(
        ({ over, clearance }) => Math.abs(over.at - bend) < 10 && clearance < 2.5,
      ).length;
    };
    expect(under("larks-head")).toBe(2);
    expect(under("prusik")).toBe(4);
  });
});
