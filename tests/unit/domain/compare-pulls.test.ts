import { describe, expect, it } from "vitest";
import { predictPull } from "@/lib/calc/pull-reading";
import { builtInAnchor } from "@/lib/calc/tables/anchors";
import { comparePulls } from "@/lib/domain/pull-test/compare";
import type { PullOutcome } from "@/lib/domain/pull-test/schema";
import { describeComparison } from "@/lib/format/pull-tests";

const ground = {
  kind: "firm-moist-loam",
  wetness: "usual",
  looseTopM: null,
  stoneDepthM: null,
  slopeDeg: 0,
} as const;
const setUp = { anchor: builtInAnchor("three-blade-200").spec, ground, leanDeg: 0, lineAngleDeg: 45, depthOutM: 0 };
const predictedN = predictPull(setUp)?.medianN ?? 0;

const pull = (ratio: number, outcome: PullOutcome = "came-out", over: object = {}) => ({
  id: `${ratio}${outcome}`,
  campId: "camp",
  patch: "main" as const,
  ownerId: null,
  place: "",
  anchorName: "Three-blade, 200 mm",
  ...setUp,
  force: ratio * predictedN,
  forceUnit: "N" as const,
  outcome,
  isOff: false,
  ...over,
});

describe("readings against the model", () => {
  it("have the median and scatter that were put in", () => {
    // ln ratios 0.3 ± 0.2: mean 0.3, σ 0.2 by maximum likelihood.
    const { overall, pulls } = comparePulls([pull(Math.exp(0.5)), pull(Math.exp(0.1))]);
    expect(pulls[0]?.predictedN).toBe(predictedN);
    expect(overall.ratio?.median).toBeCloseTo(Math.exp(0.3), 6);
    expect(overall.ratio?.scatter).toBeCloseTo(0.2, 6);
    expect(describeComparison(overall)).toBe(
      "Anchors held 35\u2009% more than the model says, by only 2 that gave way",
    );
  });

  it("count what only held as more than that: it never lowers the ratio", () => {
    const gaveWay = [0.9, 1, 1.1, 1.2, 0.95].map((ratio) => pull(ratio));
    const before = comparePulls(gaveWay).overall;
    const after = comparePulls([...gaveWay, pull(0.3, "still-holding"), pull(1.3, "line-failed")]).overall;
    expect(after.ratio?.median).toBeGreaterThanOrEqual((before.ratio?.median ?? 9) - 1e-9);
    expect(after).toMatchObject({ count: 7, gaveWayCount: 5 });
    expect(comparePulls([pull(1.1, "bent")]).pulls[0]?.kind).toBe("exact");
  });

  it("leave out what is switched off, and say how many the model has no number for", () => {
    const rock = pull(1, "came-out", { anchor: builtInAnchor("rock-20").spec });
    const comparison = comparePulls([pull(1), pull(1.2, "came-out", { isOff: true }), rock]);
    expect(comparison.pulls).toHaveLength(1);
    expect(comparison.leftOut).toBe(1);
    expect(comparison.overall.ratio).toBeNull();
  });

  it("stand in groups by anchor, ground, lean and line", () => {
    const leaning = pull(1, "came-out", { id: "lean", leanDeg: 40, lineAngleDeg: 60 });
    const { groups } = comparePulls([pull(1), pull(1.1), leaning]);
    expect(groups.map(({ title, rows }) => [title, rows.map((row) => [row.name, row.count])])).toEqual([
      ["Anchor", [["Three-blade, 200 mm", 3]]],
      ["Ground", [["Firm moist loam", 3]]],
      [
        "Lean",
        [
          ["upright", 2],
          ["26–60° back", 1],
        ],
      ],
      [
        "Line above ground",
        [
          ["30–45°", 2],
          ["above 45°", 1],
        ],
      ],
    ]);
  });
});
