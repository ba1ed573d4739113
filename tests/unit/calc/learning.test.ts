import { describe, expect, it } from "vitest";
import { PUBLISHED_LEARNING_CASES } from "../../fixtures/published-cases-learning";
import { groundMedianN } from "@/lib/calc/capacity";
import {
  BETWEEN_SHARE,
  groundPosterior,
  learnGround,
  logNormalDistribution,
  readingInfluences,
  shareBelow,
  WITHIN_SHARE,
  type PullReading,
} from "@/lib/calc/learning";
import { normalDistribution, normalQuantile } from "@/lib/calc/statistics";
import { builtInAnchor } from "@/lib/calc/tables/anchors";
import type { AnchorSpec, GroundState } from "@/lib/calc/types";
import { newtonsFromPoundsForce } from "@/lib/calc/units";

const exact = (logRatio: number): PullReading => ({ logRatio, kind: "exact" });
const held = (logRatio: number): PullReading => ({ logRatio, kind: "at-least" });
const learn = (own: readonly PullReading[], tableScatter = 0.5, elsewhere: readonly PullReading[][] = []) =>
  learnGround({ tableScatter, own, elsewhere });

/** Mulberry32: the same numbers at every run. */
function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return (((t ^ (t >>> 14)) >>> 0) + 0.5) / 4294967296;
  };
}

describe.each(PUBLISHED_LEARNING_CASES)("$what", (row) => {
  it(`is ${row.published} (${row.source})`, () => {
    expect(Math.abs(row.ours() - row.published), row.reason).toBeLessThanOrEqual(row.tolerance);
  });
});

describe("the posterior", () => {
  it("is the table's own median and scatter without readings", () => {
    const result = learn([], 0.4);
    expect(result.factor).toBeCloseTo(1, 6);
    expect(result.scatter).toBeCloseTo(0.4, 5);
  });

  it("agrees with importance sampling from the prior within 0.5 %", () => {
    const own = [exact(0.2), held(0.1), held(0.5), exact(-0.1)];
    const [between, within] = [BETWEEN_SHARE * 0.5, WITHIN_SHARE * 0.5];
    let [total, first, second] = [0, 0, 0];
    const count = 100_000;
    for (let i = 0; i < count; i++) {
      // Stratified draws of the prior: one in each of equally likely strips.
      const g = between * normalQuantile((i + 0.5) / count);
      let log = 0;
      for (const { logRatio, kind } of own) {
        const z = (logRatio - g) / within;
        log += kind === "exact" ? -0.5 * z * z : Math.log(normalDistribution(-z));
      }
      const weight = Math.exp(log);
      total += weight;
      first += weight * g;
      second += weight * g * g;
    }
    const mean = first / total;
    const result = learn(own);
    expect(result.mean / mean).toBeGreaterThan(0.995);
    expect(result.mean / mean).toBeLessThan(1.005);
    const deviation = Math.sqrt(second / total - mean * mean);
    expect(Math.abs(result.deviation / deviation - 1)).toBeLessThan(0.005);
  });

  it("stays exact where hundreds of readings make it narrow", () => {
    const result = learn(Array.from({ length: 5000 }, () => exact(0.3)));
    const precision = 1 / 0.4 ** 2 + 5000 / 0.3 ** 2;
    expect(result.deviation).toBeCloseTo(1 / Math.sqrt(precision), 6);
  });

  it("covers the truth in 88–92 % of 2,000 synthetic grounds, and 93–97 % of pulls exceed the dependable value", () => {
    const random = seeded(20261201);
    const draw = () => normalQuantile(random());
    const [between, within] = [BETWEEN_SHARE * 0.5, WITHIN_SHARE * 0.5];
    let [covered, exceeded] = [0, 0];
    for (let ground = 0; ground < 2000; ground++) {
      const truth = between * draw();
      const own = Array.from({ length: 1 + (ground % 4) }, (): PullReading => {
        const strength = truth + within * draw();
        // Every other scale ends at a load of its own.
        const end = random() < 0.5 ? 0.1 : Infinity;
        return strength > end ? held(end) : exact(strength);
      });
      const posterior = groundPosterior({ tableScatter: 0.5, own, elsewhere: [] });
      const below = shareBelow(posterior, truth, 0);
      if (below > 0.05 && below < 0.95) covered += 1;
      if (shareBelow(posterior, truth + within * draw(), within) > 0.05) exceeded += 1;
    }
    expect(covered / 2000).toBeGreaterThan(0.88);
    expect(covered / 2000).toBeLessThan(0.92);
    expect(exceeded / 2000).toBeGreaterThan(0.93);
    expect(exceeded / 2000).toBeLessThan(0.97);
  });

  it("is never lowered by a reading that still held, nor is what can be relied on", () => {
    for (const at of [-4, -1, -0.3, 0, 0.4, 2]) {
      for (const rest of [[], [exact(0.3)], [exact(-0.5), held(0.1)]]) {
        const [before, after] = [learn(rest), learn([...rest, held(at)])];
        expect(after.factor).toBeGreaterThanOrEqual(before.factor - 1e-9);
        const dependable = (one: typeof before) => one.factor * Math.exp(-1.6449 * one.scatter);
        expect(dependable(after)).toBeGreaterThanOrEqual(dependable(before) - 1e-6);
      }
    }
  });

  it("moves less by readings elsewhere than by the same ones here, and more by two places than by one", () => {
    const readings = [exact(0.5), exact(0.6)];
    const away = learn([], 0.5, [readings]).factor;
    expect(away).toBeGreaterThan(1.02);
    expect(learn(readings).factor).toBeGreaterThan(away);
    expect(learn([], 0.5, [readings, readings]).factor).toBeGreaterThan(away);
    expect(learn([exact(0)], 0.5, [readings]).factor).toBeGreaterThan(learn([exact(0)]).factor);
  });

  it("points out a reading that does not fit, and says how far each one moves the result", () => {
    const own = [exact(0), exact(0.1), exact(-0.1), exact(0.05), exact(-2.2)];
    const influences = readingInfluences({ tableScatter: 0.5, own, elsewhere: [] }, [0, 1, 2, 3, 4]);
    expect(influences.map((one) => one.isOutlier)).toEqual([false, false, false, false, true]);
    expect(influences[4]?.pull).toBeLessThan(0.8);
  });

  it("lets no reading that does not fit hide another, nor cast doubt on those that do", () => {
    const own = [exact(0), exact(0.06), exact(-0.07), exact(0.02), exact(-2.4), exact(-2.2)];
    const influences = readingInfluences({ tableScatter: 0.4, own, elsewhere: [] }, [0, 1, 2, 3, 4, 5]);
    expect(influences.map((one) => one.isOutlier)).toEqual([false, false, false, false, true, true]);
    // Where readings split into halves, nobody can say which half is right.
    const split = [exact(0), exact(0.05), exact(-2.2), exact(-2.3)];
    const both = readingInfluences({ tableScatter: 0.4, own: split, elsewhere: [] }, [0, 1, 2, 3]);
    expect(both.filter((one) => one.isOutlier).length).toBeLessThanOrEqual(1);
  });

  it("takes one reading out of the result as if it had never been there", () => {
    const own = [exact(0.4), held(0.6), exact(-0.2), held(-1)];
    const elsewhere = [[exact(0.3), held(0.2)]];
    const influences = readingInfluences({ tableScatter: 0.4, own, elsewhere }, [0, 1, 2, 3]);
    const { mean } = learnGround({ tableScatter: 0.4, own, elsewhere });
    own.forEach((reading, index) => {
      const rest = { tableScatter: 0.4, own: own.filter((_, i) => i !== index), elsewhere };
      expect(influences[index]?.pull).toBeCloseTo(Math.exp(mean - learnGround(rest).mean), 6);
      const below = shareBelow(groundPosterior(rest), reading.logRatio, WITHIN_SHARE * 0.4);
      const chance = reading.kind === "exact" ? 2 * Math.min(below, 1 - below) : 1 - below;
      expect(influences[index]?.chance).toBeCloseTo(chance, 6);
    });
    expect(() => readingInfluences({ tableScatter: 0.4, own, elsewhere }, [4])).toThrow(/no such reading/);
  });

  it("refuses a scatter or a ratio that is none", () => {
    expect(() => learn([], 0)).toThrow(/tableScatter/);
    expect(() => learn([exact(Infinity)])).toThrow(/logRatio/);
  });

  it("knows the lower tail: ln Φ(−40) = −804.608442 (Mills' ratio to three terms)", () => {
    expect(logNormalDistribution(-40)).toBeCloseTo(-804.608442, 4);
    expect(logNormalDistribution(-30.001)).toBeCloseTo(logNormalDistribution(-29.999) - 0.06007, 3);
  });
});

describe("a practitioner's readings as a log", () => {
  const trodden: GroundState = {
    kind: "hard-trodden-loam",
    wetness: "usual",
    looseTopM: null,
    stoneDepthM: null,
    slopeDeg: 0,
    learned: null,
  };
  const read = (spec: AnchorSpec, leanDeg: number, lineAngleDeg: number, pounds: number, kind: PullReading["kind"]) => {
    const rigging = {
      leanDeg,
      depthOutM: 0,
      tandem: null,
      rockKg: 0,
      shockCord: false,
      line: { material: "uhmwpe", diameterMm: 3 },
      knot: "bowline",
    } as const;
    const medianN = groundMedianN({ anchor: spec, ground: trodden, lineAngleDeg, rigging });
    if (medianN === null) throw new Error("The ground is tested here.");
    return { logRatio: Math.log(newtonsFromPoundsForce(pounds) / medianN), kind };
  };
  const t = builtInAnchor("plastic-t-230").spec;
  const blade = builtInAnchor("three-blade-150").spec;
  const gaveWay = [read(t, 45, 45, 43, "exact"), read(blade, 45, 45, 76, "exact")];
  const stillHeld = [
    read(t, 0, 45, 76, "at-least"),
    read(blade, 0, 45, 90, "at-least"),
    // It bent: the ground held at least that.
    read(builtInAnchor("round-hook-180").spec, 45, 25, 65, "at-least"),
  ];

  it("move hard-trodden ground towards what gave way, and up with each one that held", () => {
    const mean = gaveWay.reduce((sum, one) => sum + one.logRatio, 0) / gaveWay.length;
    expect(Math.sign(learn(gaveWay).mean)).toBe(Math.sign(mean));
    let before = learn(gaveWay).factor;
    const log: PullReading[] = [...gaveWay];
    for (const one of stillHeld) {
      log.push(one);
      const after = learn(log).factor;
      expect(after).toBeGreaterThanOrEqual(before);
      before = after;
    }
  });

  it("say nothing of the ground where a weight or a tree was pulled", () => {
    const rigging = { leanDeg: 0, depthOutM: 0, tandem: null, rockKg: 0, shockCord: false } as const;
    const line = { material: "uhmwpe", diameterMm: 3 } as const;
    const anchor = builtInAnchor("rock-20").spec;
    expect(
      groundMedianN({ anchor, ground: trodden, lineAngleDeg: 30, rigging: { ...rigging, line, knot: "bowline" } }),
    ).toBeNull();
  });
});
