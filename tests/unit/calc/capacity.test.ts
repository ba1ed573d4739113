import { describe, expect, it } from "vitest";
import { anchorCapacity, bestLean, capacityNumbers, capacitySentence, type CapacityInput } from "@/lib/calc/capacity";
import { groundRow, groundStrength } from "@/lib/calc/ground";
import { knotEfficiency, lineStrengthN } from "@/lib/calc/line";
import { looseningFactor, pullCyclesInNight } from "@/lib/calc/loosening";
import { anchorSectionName, BUILT_IN_ANCHORS, builtInAnchor } from "@/lib/calc/tables/anchors";
import { GROUNDS } from "@/lib/calc/tables/grounds";
import type { AnchorSpec, Capacity, GroundState, Rigging } from "@/lib/calc/types";
import { newtonsFromPoundsForce } from "@/lib/calc/units";
import { groundOf, riggingOf } from "./anchor-arbitraries";

const BLADE = builtInAnchor("three-blade-150").spec;

function input(
  anchor: AnchorSpec,
  ground: GroundState,
  lineAngleDeg: number,
  rigging: Partial<Rigging> = {},
): CapacityInput {
  return { anchor, ground, lineAngleDeg, rigging: riggingOf(rigging) };
}

function ok(capacity: Capacity): Extract<Capacity, { status: "ok" }> {
  if (capacity.status !== "ok") throw new Error(`expected a number, got ${JSON.stringify(capacity)}`);
  return capacity;
}

const hold = (...args: Parameters<typeof input>) => ok(anchorCapacity(input(...args)));

/*
 * Readings of one practitioner's hanging scale (common practice, no source; the needle jumps, highest reading noted).
 * Sizes were not all known; the ones chosen are plausible for their kind. Where the anchor failed the median must be
 * within a factor of 1.6; where it still held, the median must not be below 0.8 of the load.
 */
describe("a practitioner's scale readings", () => {
  const trodden = groundOf("hard-trodden-loam");
  const flat = groundOf("moist-sandy-flat");
  const plasticT = builtInAnchor("plastic-t-230").spec;
  /** A 9-inch plain aluminium hook, 6 mm. */
  const hook: AnchorSpec = {
    class: "stake",
    section: { shape: "round", diameterM: 0.006 },
    lengthM: 0.23,
    material: "aluminium-6061",
    headRatingN: null,
  };
  const failed = (medianN: number, pounds: number) => {
    expect(medianN).toBeGreaterThan(newtonsFromPoundsForce(pounds) / 1.6);
    expect(medianN).toBeLessThan(newtonsFromPoundsForce(pounds) * 1.6);
  };
  const held = (medianN: number, pounds: number) =>
    expect(medianN).toBeGreaterThan(newtonsFromPoundsForce(pounds) * 0.8);

  it("plastic T, trodden ground, pull at 45°: gives between 34 and 43 lbf leaning 45°, holds 76 lbf upright", () => {
    failed(hold(plasticT, trodden, 45, { leanDeg: 45 }).medianN, 34);
    failed(hold(plasticT, trodden, 45, { leanDeg: 45 }).medianN, 43);
    held(hold(plasticT, trodden, 45).medianN, 76);
  });
  it("slim three-blade, the same ground and pull: out above 75 lbf leaning 45°, holds 90 lbf upright", () => {
    failed(hold(BLADE, trodden, 45, { leanDeg: 45 }).medianN, 75);
    held(hold(BLADE, trodden, 45).medianN, 90);
  });
  it("round hook leaning 45°, line at 25°: bends rather than comes out, at about 65 lbf", () => {
    const result = hold(hook, trodden, 25, { leanDeg: 45 });
    failed(result.medianN, 65);
    expect(result.mode).toBe("bends");
    expect(result.sentence).toBe("The stake bends.");
  });
  it("wide sand stake leaning 20° in a moist sandy flat, pull at 45°: holds 90 lbf", () => {
    held(hold(builtInAnchor("wide-sand-300").spec, flat, 45, { leanDeg: 20 }).medianN, 90);
  });
  it("bundle of sticks buried 12–18 in, the same flat and pull: holds 70 lbf", () => {
    const sticks = (depthM: number): AnchorSpec => ({ class: "deadman", widthM: 0.4, heightM: 0.1, depthM });
    held(hold(sticks(0.305), flat, 45).medianN, 70);
    held(hold(sticks(0.457), flat, 45).medianN, 70);
  });
  it("has them in the right order", () => {
    const t45 = hold(plasticT, trodden, 45, { leanDeg: 45 }).medianN;
    const blade45 = hold(BLADE, trodden, 45, { leanDeg: 45 }).medianN;
    expect(t45).toBeLessThan(blade45);
    expect(hold(plasticT, trodden, 45).medianN).toBeGreaterThan(1.5 * t45);
    expect(hold(BLADE, trodden, 45).medianN).toBeGreaterThan(1.1 * blade45);
  });
  it("two stakes in line, 4–5 in apart, hold about twice one, the longer in front", () => {
    const one = hold(BLADE, trodden, 45).medianN;
    const two = hold(BLADE, trodden, 45, { tandem: { anchor: BLADE, spacingM: 0.115 } }).medianN;
    expect(two / one).toBeCloseTo(2, 6);
    const long = builtInAnchor("three-blade-200").spec;
    const longFirst = hold(long, trodden, 45, { tandem: { anchor: BLADE, spacingM: 0.115 } }).medianN;
    const shortFirst = hold(BLADE, trodden, 45, { tandem: { anchor: long, spacingM: 0.115 } }).medianN;
    expect(longFirst).toBeGreaterThan(shortFirst);
  });
  it("a heavy rock on the front lip helps in soft ground, more than in hard", () => {
    const gain = (ground: GroundState) =>
      hold(BLADE, ground, 40, { rockKg: 15 }).medianN / hold(BLADE, ground, 40).medianN;
    expect(gain(groundOf("soft-wet-clay"))).toBeGreaterThan(1.5);
    expect(gain(groundOf("soft-wet-clay"))).toBeGreaterThan(2 * (gain(trodden) - 1) + 1);
  });
  it("a leaning stake can be got away with under a low line, not under a steep one", () => {
    const leaning = (angle: number) => hold(BLADE, groundOf("firm-moist-loam"), angle, { leanDeg: 20 }).medianN;
    expect(leaning(20)).toBeGreaterThan(leaning(60));
  });
  it("a steep line needs depth: half as long again, an upright rod under 60° holds more than half as much again", () => {
    const steep = (id: string) => hold(builtInAnchor(id).spec, groundOf("firm-moist-loam"), 60).medianN;
    expect(steep("steel-pin-450") / steep("steel-rod-300")).toBeGreaterThan(1.5);
    // The steeper the line, the more of the pull is along the stake: only skin friction is left of a smooth one.
    const along = (angle: number) => hold(builtInAnchor("steel-pin-450").spec, groundOf("firm-moist-loam"), angle);
    expect(along(60).mode).toBe("pulls-out");
    expect(along(10).mode).toBe("tips-over");
  });
  it("a night of gusts works a stake loose, and elastic cord stops most of it", () => {
    const loam = groundOf("firm-moist-loam");
    const pullCycles = pullCyclesInNight(8);
    const evening = hold(BLADE, loam, 40).medianN;
    const morning = ok(anchorCapacity({ ...input(BLADE, loam, 40), pullCycles })).medianN;
    const withCord = ok(anchorCapacity({ ...input(BLADE, loam, 40, { shockCord: true }), pullCycles })).medianN;
    expect(morning / evening).toBeCloseTo(96 ** -0.17, 6);
    expect(withCord / evening).toBeCloseTo(96 ** -0.085, 6);
  });
  it("plastic and plain aluminium hooks are for soft ground: in hard ground they bend well before the ground gives", () => {
    for (const anchor of [plasticT, hook]) {
      const share = (ground: GroundState) => {
        const { workings } = hold(anchor, ground, 20, { leanDeg: 15 });
        const at = (symbol: string) => Number(workings.find((step) => step.symbol === symbol)?.value ?? Number.NaN);
        return Number.isNaN(at("T_b")) ? 1 : at("T_b") / at("T_g");
      };
      expect(hold(anchor, trodden, 20, { leanDeg: 15 }).mode).toBe("bends");
      expect(share(trodden)).toBeLessThan(0.85);
      expect(share(groundOf("soft-wet-clay"))).toBeGreaterThan(1.2 * share(trodden));
    }
  });
});

describe("published orders of size", () => {
  it("a 1 in × 36 in steel stake in an average lawn holds about 1000 lb (4.4 kN) within a factor of 2.5", () => {
    // Tent-stake study of the industrial-fabrics association, as quoted in its magazine; angle of pull not quoted: 45°.
    // Ground: twice firm loam, s_u 72 kPa, the "average cohesive" of the USACE picket table (1500 psf).
    const stake: AnchorSpec = {
      class: "stake",
      section: { shape: "round", diameterM: 0.0254 },
      lengthM: 0.9144,
      material: "mild-steel",
      headRatingN: null,
    };
    const lawn = groundOf("firm-moist-loam", { learned: { factor: 2, scatter: 0.4 } });
    const best = bestLean({
      anchor: stake,
      ground: lawn,
      lineAngleDeg: 45,
      rigging: riggingOf(),
    });
    const ratio = ok(best.capacity).medianN / newtonsFromPoundsForce(1000);
    expect(ratio).toBeGreaterThan(1 / 2.5);
    expect(ratio).toBeLessThan(2.5);
  });
  it("saturated ground holds about half, dry sand less where its little cohesion counted", () => {
    for (const kind of ["firm-moist-loam", "dry-loose-sand", "soft-wet-clay"] as const) {
      const ratio =
        hold(BLADE, groundOf(kind, { wetness: "saturated" }), 30).medianN / hold(BLADE, groundOf(kind), 30).medianN;
      expect(ratio).toBeGreaterThan(0.25);
      expect(ratio).toBeLessThan(0.65);
    }
  });
  it("a single 3 in × 5 ft picket, 15° back, driven 4 ft in loam holds the manual's 700 lbf one to six times", () => {
    const picket: AnchorSpec = {
      class: "stake",
      section: { shape: "round", diameterM: 0.0762 },
      lengthM: 1.524,
      material: "hardwood",
      headRatingN: null,
    };
    const result = hold(picket, groundOf("firm-moist-loam"), 20, { leanDeg: 15, depthOutM: 0.305 });
    // The manual's figure is a working load (a quarter to a half of what breaks ground).
    expect(result.medianN).toBeGreaterThan(newtonsFromPoundsForce(700));
    expect(result.medianN).toBeLessThan(newtonsFromPoundsForce(700) * 6);
  });
});

describe("saturated ground", () => {
  it("weighs less by the water in sand (18.5 − 9.807 kN/m³) and loses its cohesion; clay halves", () => {
    const sand = groundStrength(groundOf("dry-loose-sand", { wetness: "saturated" }));
    expect(sand.unitWeightNm3).toBeCloseTo(18_500 - 9_806.65, 9);
    expect(sand.kind === "frictional" && sand.cohesionPa).toBe(0);
    const loam = groundStrength(groundOf("firm-moist-loam", { wetness: "saturated" }));
    expect(loam.kind === "undrained" && loam.shearStrengthPa).toBe(18_000);
  });
});

describe("what can't be used, and what is not known", () => {
  it.each(["frozen-or-ice", "rock-slab", "deck"] as const)("says what to use instead of a stake on %s", (kind) => {
    for (const id of ["three-blade-150", "screw-in-200", "sticks-buried"]) {
      const result = anchorCapacity(input(builtInAnchor(id).spec, groundOf(kind), 30));
      expect(result.status).toBe("unusable");
      if (result.status === "unusable") {
        expect(result.reason).not.toBe("");
        expect(result.instead.length).toBeGreaterThan(0);
      }
    }
    expect(anchorCapacity(input(builtInAnchor("rock-40").spec, groundOf(kind), 30)).status).toBe("ok");
  });
  it("keeps plastic and thin tubes out of baked clay, and screws out of gravel", () => {
    expect(anchorCapacity(input(builtInAnchor("plastic-t-230").spec, groundOf("baked-clay"), 30)).status).toBe(
      "unusable",
    );
    expect(anchorCapacity(input(builtInAnchor("tube-peg-230").spec, groundOf("shingle"), 30)).status).toBe("unusable");
    expect(anchorCapacity(input(builtInAnchor("screw-in-200").spec, groundOf("dense-sand-gravel"), 30)).status).toBe(
      "unusable",
    );
    expect(anchorCapacity(input(builtInAnchor("long-nail-230").spec, groundOf("baked-clay"), 30)).status).toBe("ok");
  });
  it("keeps a snow plate in snow", () => {
    const plate = builtInAnchor("snow-plate-200").spec;
    expect(anchorCapacity(input(plate, groundOf("firm-moist-loam"), 30)).status).toBe("unusable");
    // σ_c · A · cos 30°
    expect(hold(plate, groundOf("settled-snow"), 30).medianN).toBeCloseTo(10_000 * 0.028 * Math.cos(Math.PI / 6), 6);
    expect(hold(plate, groundOf("settled-snow"), 90).medianN).toBeCloseTo(10_000 * 0.028 * 0.25, 6);
    expect(hold(plate, groundOf("settled-snow"), 90).sentence).toBe("Comes up out of the ground.");
  });
  it("asks for the check of a tree or boulder and the rating of a fixing", () => {
    for (const [id, field] of [
      ["tree", "anchor.checked"],
      ["boulder", "anchor.checked"],
      ["fixing", "anchor.ratingN"],
    ] as const) {
      const result = anchorCapacity(input(builtInAnchor(id).spec, groundOf("rock-slab"), 30));
      expect(result.status).toBe("unknown");
      if (result.status === "unknown") expect(result.gaps.map((gap) => gap.field)).toEqual([field]);
      expect(capacityNumbers(input(builtInAnchor(id).spec, groundOf("rock-slab"), 30))).toBeNull();
    }
  });
  it("lets the line decide at a checked tree, and the rating at a fixing", () => {
    const cord: Partial<Rigging> = { line: { material: "polyester", diameterMm: 3 }, knot: "bowline" };
    const tree = hold({ class: "natural", kind: "tree", checked: true }, groundOf("peat"), 30, cord);
    expect(tree.mode).toBe("line-breaks");
    expect(tree.medianN).toBeCloseTo(200 * 9 * 0.6, 9);
    const ring = hold({ class: "fixed", ratingN: 800 }, groundOf("rock-slab"), 30, cord);
    expect([ring.mode, ring.medianN]).toEqual(["rated", 800]);
    expect(ring.sentence).toBe("Reaches the rating of the fixing.");
  });
  it("refuses a stake that stones or litter leave too little of", () => {
    expect(anchorCapacity(input(BLADE, groundOf("firm-moist-loam", { stoneDepthM: 0.02 }), 30)).status).toBe(
      "unusable",
    );
    expect(anchorCapacity(input(BLADE, groundOf("firm-moist-loam", { looseTopM: 0.14 }), 30)).status).toBe("unusable");
    expect(anchorCapacity(input(BLADE, groundOf("firm-moist-loam"), 30, { depthOutM: 1 })).status).toBe("unusable");
    const screw = builtInAnchor("screw-in-200").spec;
    expect(anchorCapacity(input(screw, groundOf("firm-moist-loam", { looseTopM: 0.19 }), 30)).status).toBe("unusable");
    const sticks = builtInAnchor("sticks-buried").spec;
    expect(anchorCapacity(input(sticks, groundOf("firm-moist-loam", { stoneDepthM: 0.2 }), 30)).status).toBe(
      "unusable",
    );
  });
  it("refuses a rock that slides down the slope by itself", () => {
    const slope = groundOf("firm-moist-loam", { slopeDeg: 25 });
    expect(anchorCapacity(input(builtInAnchor("rock-40").spec, slope, 30)).status).toBe("unusable");
  });
  it("passes on what is wrong with a second anchor", () => {
    const tandem = { anchor: { class: "fixed", ratingN: null } as const, spacingM: 0.2 };
    expect(anchorCapacity(input(BLADE, groundOf("firm-moist-loam"), 30, { tandem })).status).toBe("unknown");
  });
});

describe("details that change what it holds", () => {
  const loam = groundOf("firm-moist-loam");
  it("a stake standing out pulls higher up and is shorter in the ground", () => {
    expect(hold(BLADE, loam, 20, { depthOutM: 0.03 }).medianN).toBeLessThan(0.75 * hold(BLADE, loam, 20).medianN);
  });
  it("stones that stop it leave it standing out", () => {
    const stopped = hold(BLADE, groundOf("firm-moist-loam", { stoneDepthM: 0.12 }), 20).medianN;
    expect(stopped).toBeCloseTo(hold(BLADE, loam, 20, { depthOutM: 0.03 }).medianN, 9);
  });
  it("a weak head, a thin line and a weak knot govern when they are the weakest, and are named", () => {
    const weakHead: AnchorSpec = BLADE.class === "stake" ? { ...BLADE, headRatingN: 40 } : BLADE;
    expect(hold(weakHead, loam, 20).mode).toBe("head-gives");
    const thin = hold(builtInAnchor("wide-sand-300").spec, groundOf("hard-trodden-loam"), 20, {
      line: { material: "nylon", diameterMm: 1.5 },
      knot: "figure-eight-loop",
    });
    expect(thin.mode).toBe("line-breaks");
    // 200·1.5² wet 0.87, knot 0.48
    expect(thin.medianN).toBeCloseTo(450 * 0.87 * 0.48, 9);
  });
  it("a second stake does not help the head or the line", () => {
    const weakHead: AnchorSpec = BLADE.class === "stake" ? { ...BLADE, headRatingN: 40 } : BLADE;
    expect(hold(weakHead, loam, 20, { tandem: { anchor: BLADE, spacingM: 0.2 } }).medianN).toBe(40);
    const line = { material: "polyester", diameterMm: 1 } as const;
    expect(
      hold(BLADE, groundOf("hard-trodden-loam"), 20, { line, tandem: { anchor: BLADE, spacingM: 0.2 } }).medianN,
    ).toBe(120);
  });
  it("a second stake too close counts in proportion", () => {
    const one = hold(BLADE, loam, 40).medianN;
    const near = hold(BLADE, loam, 40, { tandem: { anchor: BLADE, spacingM: 0.0375 } }).medianN;
    expect(near / one).toBeCloseTo(1.5, 9);
    expect(hold(BLADE, loam, 40, { tandem: { anchor: BLADE, spacingM: 0 } }).medianN).toBeCloseTo(one, 9);
  });
  it("a learned factor and scatter take the place of the table's", () => {
    const learned = { factor: 1.3, scatter: 0.25 };
    const result = hold(BLADE, groundOf("firm-moist-loam", { learned }), 40);
    expect(result.medianN / hold(BLADE, loam, 40).medianN).toBeCloseTo(1.3, 9);
    expect(result.scatter).toBeCloseTo(0.25, 12);
    expect(result.workings.some((step) => step.source === "pull tests" && step.value === 1.3)).toBe(true);
  });
  it("sliding follows μW/(cosθ + μ sinθ) and is worded by the line's angle", () => {
    const rock = builtInAnchor("rock-20").spec;
    const w = 20 * 9.80665;
    const t = (0.35 * w) / (Math.cos(Math.PI / 6) + 0.35 * 0.5);
    expect(hold(rock, loam, 30).medianN).toBeCloseTo(t, 9);
    expect(hold(rock, loam, 30).sentence).toBe("Slides towards the pull.");
    expect(hold(rock, loam, 90).medianN).toBeCloseTo(w, 6);
    expect(hold(rock, loam, 90).sentence).toBe("Lifts off the ground.");
  });
  it("a screw holds mostly by its helix under a steep line: 9·(H/5D)·s_u·A·0.7", () => {
    const screw = builtInAnchor("screw-in-200").spec;
    const expected = 9 * (0.2 / 0.25) * 36_000 * (Math.PI / 4) * 0.0025 * 0.7;
    expect(hold(screw, loam, 90).medianN).toBeCloseTo(expected, 6);
    expect(hold(screw, loam, 90).mode).toBe("pulls-out");
    expect(hold(screw, loam, 10).mode).toBe("tips-over");
    expect(hold(screw, groundOf("moist-sandy-flat"), 60).medianN).toBeGreaterThan(0);
    expect(hold(screw, groundOf("settled-snow"), 60).medianN).toBeGreaterThan(0);
  });
  it("a thin screw in hard ground bends", () => {
    const screw: AnchorSpec = {
      class: "screw-in",
      helixDiameterM: 0.1,
      depthM: 0.4,
      shaftDiameterM: 0.006,
      material: "mild-steel",
    };
    expect(hold(screw, groundOf("hard-trodden-loam"), 5).mode).toBe("bends");
  });
  it("a deadman comes up under a steep line and shears forward under a flat one", () => {
    const log = builtInAnchor("log-buried").spec;
    expect(hold(log, groundOf("settled-snow"), 80).mode).toBe("pulls-out");
    expect(hold(log, groundOf("settled-snow"), 80).sentence).toBe("Comes up out of the ground.");
    expect(hold(log, groundOf("settled-snow"), 5).sentence).toBe("Shears forward through the ground.");
  });
  it("works in every ground on a slope", () => {
    for (const row of GROUNDS) {
      const result = anchorCapacity(input(BLADE, groundOf(row.kind, { slopeDeg: 35 }), 40));
      if (result.status === "ok") expect(result.medianN).toBeGreaterThan(0);
    }
  });
});

describe("the best lean", () => {
  it("is not beaten by any whole degree from −10 to 45 (beyond 0.2 %)", () => {
    for (const kind of ["firm-moist-loam", "hard-trodden-loam", "moist-sandy-flat", "dry-loose-sand"] as const) {
      for (const id of ["three-blade-150", "round-hook-180", "wide-sand-300", "plastic-t-230"]) {
        for (const angle of [15, 40, 70]) {
          const base = input(builtInAnchor(id).spec, groundOf(kind), angle);
          const best = bestLean(base);
          const bestN = ok(best.capacity).dependableN;
          for (let leanDeg = -10; leanDeg <= 45; leanDeg += 1) {
            const other = capacityNumbers({ ...base, rigging: { ...base.rigging, leanDeg } });
            expect(other?.dependableN ?? 0).toBeLessThanOrEqual(bestN * 1.002);
          }
        }
      }
    }
  });
  it("is 0 for what is not driven, and for a stake that can't be used", () => {
    expect(bestLean(input(builtInAnchor("rock-20").spec, groundOf("peat"), 30)).leanDeg).toBe(0);
    const onRock = bestLean(input(BLADE, groundOf("rock-slab"), 30));
    expect(onRock.leanDeg).toBe(0);
    expect(onRock.capacity.status).toBe("unusable");
  });
});

describe("inputs out of range", () => {
  const loam = groundOf("firm-moist-loam");
  it.each([
    [/lineAngleDeg/, input(BLADE, loam, 91)],
    [/lineAngleDeg/, input(BLADE, loam, Number.NaN)],
    [/leanDeg/, input(BLADE, loam, 30, { leanDeg: 61 })],
    [/depthOutM/, input(BLADE, loam, 30, { depthOutM: -0.01 })],
    [/rockKg/, input(BLADE, loam, 30, { rockKg: 201 })],
    [/spacingM/, input(BLADE, loam, 30, { tandem: { anchor: BLADE, spacingM: 6 } })],
    [/diameterMm/, input(BLADE, loam, 30, { line: { material: "nylon", diameterMm: 0 } })],
    [/line\.material/, input(BLADE, loam, 30, { line: { material: "wire" as unknown as "nylon", diameterMm: 3 } })],
    [/knot/, input(BLADE, loam, 30, { knot: "granny" as unknown as "bowline" })],
    [/pullCycles/, { ...input(BLADE, loam, 30), pullCycles: -1 }],
    [/slopeDeg/, input(BLADE, groundOf("peat", { slopeDeg: 36 }), 30)],
    [/looseTopM/, input(BLADE, groundOf("peat", { looseTopM: 2 }), 30)],
    [/stoneDepthM/, input(BLADE, groundOf("peat", { stoneDepthM: -1 }), 30)],
    [/learned\.factor/, input(BLADE, groundOf("peat", { learned: { factor: 0, scatter: 0.3 } }), 30)],
    [/learned\.scatter/, input(BLADE, groundOf("peat", { learned: { factor: 1, scatter: -0.3 } }), 30)],
    [/wetness/, input(BLADE, groundOf("peat", { wetness: "damp" as unknown as "wet" }), 30)],
    [/ground\.kind/, input(BLADE, groundOf("lava" as unknown as "peat"), 30)],
    [/massKg/, input({ class: "surface-weight", massKg: 0 }, loam, 30)],
    [/ratingN/, input({ class: "fixed", ratingN: 0 }, loam, 30)],
    [/widthM/, input({ class: "deadman", widthM: 0, heightM: 0.1, depthM: 0.3 }, loam, 30)],
  ] as const)("throws a RangeError naming %s", (message, each) => {
    expect(() => anchorCapacity(each)).toThrow(RangeError);
    expect(() => anchorCapacity(each)).toThrow(message);
  });
});

describe("tables", () => {
  it("name every ground with signs, a source and a median inside its published class", () => {
    expect(GROUNDS).toHaveLength(15);
    for (const row of GROUNDS) {
      expect(row.signs.thumb && row.signs.heel && row.signs.rod && row.source).toBeTruthy();
      expect(groundStrength(groundOf(row.kind)).workings.length).toBeGreaterThan(3);
    }
    // TM 5-818-1 Table 2-2: soft 12–24, medium 24–48, very stiff 96–192 kPa.
    const su = (kind: "soft-wet-clay" | "firm-moist-loam" | "hard-trodden-loam" | "baked-clay") => {
      const { model } = groundRow(kind);
      return model.kind === "undrained" ? model.shearStrengthPa : 0;
    };
    expect(su("soft-wet-clay")).toBeGreaterThan(12e3);
    expect(su("soft-wet-clay")).toBeLessThan(24e3);
    expect(su("firm-moist-loam")).toBeGreaterThan(24e3);
    expect(su("firm-moist-loam")).toBeLessThan(48e3);
    expect(su("hard-trodden-loam")).toBeGreaterThan(96e3);
    expect(su("baked-clay")).toBeLessThan(192e3);
  });
  it("have at least fifteen carried anchors, each once, with a mass, and found ones without", () => {
    expect(BUILT_IN_ANCHORS.filter((anchor) => !anchor.found).length).toBeGreaterThanOrEqual(15);
    expect(new Set(BUILT_IN_ANCHORS.map((anchor) => anchor.id)).size).toBe(BUILT_IN_ANCHORS.length);
    for (const anchor of BUILT_IN_ANCHORS) {
      if (anchor.found) expect(anchor.massKg).toBe(0);
      else expect(anchor.massKg).toBeGreaterThan(0.005);
      expect(anchor.massKg).toBeLessThan(0.7);
      expect(anchorSectionName(anchor.spec)).not.toBe("");
    }
    expect(() => builtInAnchor("nothing")).toThrow(RangeError);
    // Mass of the long nail: π/4·8²·230 mm³ · 7850 kg/m³ · 1.15
    expect(builtInAnchor("long-nail-230").massKg).toBeCloseTo((Math.PI / 4) * 64e-6 * 0.23 * 7850 * 1.15, 2);
  });
  it("cap a knot by its material", () => {
    expect(knotEfficiency("two-half-hitches", "polyester")).toBe(0.6);
    expect(knotEfficiency("bowline", "uhmwpe")).toBe(0.35);
    expect(lineStrengthN("uhmwpe", 2, "bowline")).toBeCloseTo(850 * 4 * 0.35, 9);
  });
  it("word every way of giving", () => {
    expect(capacitySentence("bends", builtInAnchor("hardwood-250").spec)).toBe("The stake breaks.");
    expect(capacitySentence("head-gives", BLADE)).toBe("The head or hook gives.");
    expect(capacitySentence("pulls-out", BLADE)).toBe("Pulls out of the ground.");
    expect(capacitySentence("tips-over", BLADE)).toBe("The ground in front of it gives.");
    expect(capacitySentence("line-breaks", BLADE)).toBe("The line breaks at the knot.");
  });
  it("count twelve strong pulls an hour, and none or one as no loosening", () => {
    expect(pullCyclesInNight(8)).toBe(96);
    expect(pullCyclesInNight(0)).toBe(0);
    expect(() => pullCyclesInNight(25)).toThrow(/strongWindHours/);
    const base = { ground: "firm-moist-loam", hasShockCord: false, installation: "driven" } as const;
    expect(looseningFactor({ ...base, cycles: 0 })).toBe(1);
    expect(looseningFactor({ ...base, cycles: 1 })).toBe(1);
    expect(looseningFactor({ ...base, cycles: 2, installation: "drilled" })).toBeCloseTo(2 ** -0.221, 12);
  });
});

describe("the working", () => {
  it("of a stake with everything shows each step once", () => {
    const result = ok(
      anchorCapacity({
        ...input(
          builtInAnchor("plastic-t-230").spec,
          groundOf("hard-trodden-loam", {
            slopeDeg: 5,
            looseTopM: 0.01,
            stoneDepthM: 0.3,
            learned: { factor: 1.1, scatter: 0.3 },
          }),
          30,
          {
            leanDeg: 10,
            rockKg: 5,
            tandem: { anchor: BLADE, spacingM: 0.2 },
          },
        ),
        pullCycles: 50,
      }),
    );
    const symbols = result.workings.map((step) => step.symbol).filter((symbol) => symbol !== "");
    for (const symbol of [
      "s_u",
      "γ",
      "f",
      "t",
      "z_s",
      "ω",
      "θ",
      "β",
      "N^−t",
      "H",
      "H_b",
      "M_u",
      "V",
      "ΔH",
      "T_g",
      "T_b",
      "T_2",
      "F·η",
      "R_50",
      "R_05",
    ]) {
      expect(
        symbols.filter((each) => each === symbol),
        symbol,
      ).toHaveLength(1);
    }
    expect(result.workings.find((step) => step.symbol === "R_50")?.value).toBe(result.medianN);
  });
  it("of every built-in anchor in every ground is complete", () => {
    for (const row of GROUNDS) {
      for (const anchor of BUILT_IN_ANCHORS) {
        const result = anchorCapacity(input(anchor.spec, groundOf(row.kind, { wetness: "wet" }), 35));
        if (result.status !== "ok") continue;
        expect(result.workings.at(-1)?.value).toBe(result.dependableN);
        for (const step of result.workings) expect(step.meaning).not.toBe("");
      }
    }
  });
});
