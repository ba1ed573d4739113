import { describe, expect, test } from "vitest";
import { buildShelter, defaultShelterSpec, SHELTER_KINDS } from "@/lib/calc/shelter-kinds";
import { ANCHOR_MARKS } from "@/lib/domain/drawing/anchor-marks";
import { composePlan } from "@/lib/domain/drawing/compose-plan";
import { bearingBetween } from "@/lib/domain/drawing/path";
import { planView } from "@/lib/domain/drawing/plan-view";
import { windSector } from "@/lib/domain/drawing/wind-sector";

const model = buildShelter(defaultShelterSpec("ridge-tarp"));

describe("planView", () => {
  test("a front that faces east lies to the right of a drawing with north up", () => {
    const { toPaper } = planView(model, 90);
    const [x, y] = toPaper({ x: 0, y: 1 });
    expect(x).toBeCloseTo(1, 12);
    expect(y).toBeCloseTo(0, 12);
  });

  test("the shelter's right side then points south, down the paper", () => {
    const [x, y] = planView(model, 90).toPaper({ x: 1, y: 0 });
    expect(x).toBeCloseTo(0, 12);
    expect(y).toBeCloseTo(1, 12);
  });

  test.each([0, 30, 135, 270, 359])("front up turns north to the left by the heading: %i°", (headingDeg) => {
    const view = planView(model, headingDeg, { northUp: false });
    const [x, y] = view.toPaper({ x: 0, y: 1 });
    expect(x).toBeCloseTo(0, 12);
    expect(y).toBeCloseTo(-1, 12);
    expect(view.toPaperDeg(0)).toBeCloseTo((360 - headingDeg) % 360, 12);
  });

  test("distances are kept", () => {
    const view = planView(model, 217);
    for (const { tieOut, from, to } of view.tieOuts) {
      const onPaper = Math.hypot(to[0] - from[0], to[1] - from[1]);
      const onGround = Math.hypot(tieOut.anchor.x - tieOut.point.x, tieOut.anchor.y - tieOut.point.y);
      expect(onPaper).toBeCloseTo(onGround, 9);
    }
  });
});

describe("windSector", () => {
  test("wind from the west stands on the left and blows to the right", () => {
    const [, middle] = windSector(225, 315, 10).arrows;
    expect(middle?.tail[0]).toBeLessThan(middle?.head[0] ?? -Infinity);
    expect(middle?.head[0]).toBeCloseTo(-10, 9);
    expect(middle?.head[1]).toBeCloseTo(0, 9);
  });

  test("a range over north keeps its middle", () => {
    expect(windSector(340, 40, 10).middleDeg).toBeCloseTo(10, 9);
  });

  test("wind from anywhere is a whole circle", () => {
    expect(windSector(null, null, 10)).toMatchObject({ middleDeg: null, spanDeg: 360 });
  });
});

describe("composePlan", () => {
  const sizes = { anchorRadius: 8, stateRadius: 4.8, numberRadius: 7.5, gap: 2.5 };
  const box = { width: 535, height: 300 };
  for (const { kind } of SHELTER_KINDS) {
    test.each([0, 45, 200])(`${kind} at %i° fits its box with everything round it`, (headingDeg) => {
      const view = planView(buildShelter(defaultShelterSpec(kind)), headingDeg);
      const plan = composePlan(view, {
        ...box,
        sizes,
        wind: { fromDeg: 250, toDeg: 315 },
        windArrow: 26,
        northRadius: 19,
        scaleBarMax: 90,
        maxScale: 80,
      });
      const discs = plan.tieOuts.flatMap((tie) => [
        [tie.anchor, sizes.anchorRadius] as const,
        [tie.state, sizes.stateRadius] as const,
        [tie.number, sizes.numberRadius] as const,
      ]);
      for (const [[x, y], radius] of discs) {
        expect(x - radius).toBeGreaterThanOrEqual(-0.01);
        expect(x + radius).toBeLessThanOrEqual(box.width + 0.01);
        expect(y - radius).toBeGreaterThanOrEqual(-0.01);
        expect(y + radius).toBeLessThanOrEqual(box.height + 0.01);
      }
      for (const arrow of plan.wind?.arrows ?? []) {
        expect(bearingBetween(arrow.tail, arrow.head)).toBeGreaterThan(60);
        expect(arrow.tail[0]).toBeGreaterThanOrEqual(-0.01);
      }
      const numbers = plan.tieOuts.map((tie) => tie.number);
      numbers.forEach((a, index) => {
        for (const b of numbers.slice(index + 1)) expect(Math.hypot(a[0] - b[0], a[1] - b[1])).toBeGreaterThan(10);
      });
    });
  }
});

test("every anchor mark stays inside its box of 24", () => {
  for (const { key, mark } of ANCHOR_MARKS) {
    for (const path of mark.paths) {
      // Absolute commands only; the numbers of arcs are radii and flags, all within the box as well.
      for (const number of path.d.match(/-?\d+(\.\d+)?/g) ?? []) {
        expect(Number(number), `${key}: ${path.d}`).toBeGreaterThanOrEqual(-0.5);
        if (key !== "wide") expect(Number(number), `${key}: ${path.d}`).toBeLessThanOrEqual(24.5);
      }
    }
  }
});
