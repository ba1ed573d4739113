import { describe, expect, it } from "vitest";
import { designPulls, informationShare, type DesignInput } from "@/lib/calc/pull-design";
import { predictPull } from "@/lib/calc/pull-reading";
import { normalDensity, normalDistribution } from "@/lib/calc/statistics";
import { builtInAnchor } from "@/lib/calc/tables/anchors";

const ground = {
  kind: "firm-moist-loam",
  wetness: "usual",
  looseTopM: null,
  stoneDepthM: null,
  slopeDeg: 0,
} as const;
const candidate = (id: string, leanDeg: number, lineAngleDeg: number) => ({
  anchor: builtInAnchor(id).spec,
  ground,
  leanDeg,
  lineAngleDeg,
  depthOutM: 0,
});
const CANDIDATES = ["three-blade-200", "v-160", "wide-sand-300"].flatMap((id) =>
  [0, 20, 40].flatMap((lean) => [20, 45].map((line) => candidate(id, lean, line))),
);
const design = (over: Partial<DesignInput> = {}) =>
  designPulls({
    candidates: CANDIDATES,
    mean: 0,
    deviation: 0.32,
    within: 0.24,
    scaleEndN: null,
    count: 12,
    ...over,
  });

describe("the information that is left when a scale ends", () => {
  it.each([-2, -1, 0, 0.7, 2])("at %f σ is that of the score squared, by quadrature", (z) => {
    // Fisher information of a location: ∫ u² φ(u) du up to z, and above it the squared hazard of the rest.
    const steps = 20_000;
    const width = (z + 9) / steps;
    let exact = 0;
    for (let i = 0; i < steps; i++) {
      const u = -9 + (i + 0.5) * width;
      exact += u * u * normalDensity(u) * width;
    }
    const rest = 1 - normalDistribution(z);
    const hazard = normalDensity(z) / rest;
    expect(informationShare(z)).toBeCloseTo(exact + rest * hazard * hazard, 6);
  });

  it("is nothing when it ends far too early, all when it never ends, and never falls as it reaches further", () => {
    expect(informationShare(-9)).toBe(0);
    expect(informationShare(9)).toBe(1);
    // Uncensored from the middle down: ½ + φ(0)²/½ = ½ + 1/π.
    expect(informationShare(0)).toBeCloseTo(0.5 + 1 / Math.PI, 12);
    for (let z = -8; z < 8; z += 0.25) {
      expect(informationShare(z + 0.25)).toBeGreaterThanOrEqual(informationShare(z) - 1e-12);
    }
  });
});

describe("a designed training day", () => {
  it("teaches less with each pull, and spreads over anchors, leans and lines before it repeats any", () => {
    const pulls = design();
    const gains = pulls.map((one) => one.gainBits);
    expect(gains).toEqual([...gains].sort((a, b) => b - a));
    expect(new Set(pulls.map((one) => one.index)).size).toBe(12);
    const firstFour = pulls.slice(0, 4).map((one) => CANDIDATES[one.index]);
    expect(new Set(firstFour.map((one) => JSON.stringify(one?.anchor))).size).toBe(3);
    expect(pulls).toEqual(design());
  });

  it("begins with what is told by the first pull alone: ½·log2(1 + variance ÷ noise)", () => {
    const [first] = design({ candidates: CANDIDATES.slice(0, 1), count: 1 });
    const expected = 0.5 * Math.log2(1 + (0.32 ** 2 + 0.5 * 0.24 ** 2) / (0.5 * 0.24 ** 2));
    expect(first?.gainBits).toBeCloseTo(expected, 9);
    expect(first?.expectedN).toBeCloseTo(
      predictPull(CANDIDATES[0] ?? candidate("v-160", 0, 45))?.groundMedianN ?? 0,
      9,
    );
  });

  it("chooses what a short scale can still show", () => {
    const open = design({ count: 1 })[0];
    const short = design({ scaleEndN: 160 });
    const strongest = (index: number) =>
      predictPull(CANDIDATES[index] ?? candidate("v-160", 0, 45))?.groundMedianN ?? 0;
    expect(open).toBeDefined();
    const firstShort = short[0];
    expect(firstShort && strongest(firstShort.index)).toBeLessThan(200);
    expect(firstShort?.chanceExact).toBeGreaterThan(0.4);
    expect(firstShort?.gainBits).toBeLessThanOrEqual(open?.gainBits ?? 0);
  });

  it("gains less where more is known already", () => {
    const total = (deviation: number) => design({ deviation }).reduce((sum, one) => sum + one.gainBits, 0);
    expect(total(0.1)).toBeLessThan(total(0.32));
  });

  it("has nothing to say of trees, and refuses numbers out of range", () => {
    expect(design({ candidates: [candidate("tree", 0, 45)] })).toEqual([]);
    expect(() => design({ count: 0 })).toThrow(/count/);
    expect(() => design({ deviation: 0 })).toThrow(/deviation/);
    expect(() => design({ scaleEndN: 0 })).toThrow(/scaleEndN/);
  });
});
