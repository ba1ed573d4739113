import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { anchorCapacity, capacityNumbers, type CapacityInput } from "@/lib/calc/capacity";
import { drivenDetail } from "@/lib/calc/stake-limits";
import { groundNumbers } from "@/lib/calc/ground";
import type { AnchorSpec, GroundState, StakeSection, Wetness } from "@/lib/calc/types";
import { capacityInput, groundState, rigging, stakeSpec } from "./anchor-arbitraries";

/** Room for the golden-section minimum (10⁻⁶) and for rounding. */
const SLACK = 1 + 1e-5;

function expectNeverLess(less: CapacityInput, more: CapacityInput): void {
  const a = capacityNumbers(less);
  const b = capacityNumbers(more);
  if (a === null) return;
  expect(b).not.toBeNull();
  if (b === null) return;
  expect(b.medianN * SLACK).toBeGreaterThanOrEqual(a.medianN);
  expect(b.dependableN * SLACK).toBeGreaterThanOrEqual(a.dependableN);
}

function scaled(section: StakeSection, factor: number): StakeSection {
  switch (section.shape) {
    case "three-blade":
      return { ...section, bladeM: section.bladeM * factor };
    case "v":
      return { ...section, legM: section.legM * factor };
    case "round":
      return { ...section, diameterM: section.diameterM * factor };
    case "tube":
      return { ...section, diameterM: section.diameterM * factor };
    case "wide":
    case "t":
      return { ...section, widthM: section.widthM * factor };
  }
}

describe("what an anchor holds, for any input", () => {
  it("is finite, positive, ordered and the same twice", () => {
    fc.assert(
      fc.property(capacityInput, (input) => {
        const result = anchorCapacity(input);
        expect(anchorCapacity(input)).toEqual(result);
        if (result.status !== "ok") return;
        expect(Number.isFinite(result.medianN) && result.medianN > 0).toBe(true);
        expect(Number.isFinite(result.scatter) && result.scatter >= 0).toBe(true);
        expect(result.dependableN).toBeLessThanOrEqual(result.medianN);
        expect(result.dependableN).toBeGreaterThan(0);
        expect(result.medianN * Math.exp(-1.6448536269514722 * result.scatter)).toBeCloseTo(result.dependableN, 6);
        for (const step of result.workings) {
          if (typeof step.value === "number") expect(Number.isFinite(step.value), step.meaning).toBe(true);
          expect(step.source).not.toBe("");
        }
      }),
      { numRuns: 600 },
    );
  });

  it("is the same with and without the working", () => {
    fc.assert(
      fc.property(capacityInput, (input) => {
        const full = anchorCapacity(input);
        const numbers = capacityNumbers(input);
        if (full.status !== "ok") expect(numbers).toBeNull();
        else {
          const { medianN, scatter, dependableN, mode } = full;
          expect(numbers).toEqual({ medianN, scatter, dependableN, mode });
        }
      }),
      { numRuns: 300 },
    );
  });

  it("never falls when a stake is driven deeper", () => {
    fc.assert(
      fc.property(capacityInput, stakeSpec, fc.double({ min: 0, max: 1, noNaN: true }), (input, anchor, share) => {
        const { depthOutM } = input.rigging;
        expectNeverLess(
          { ...input, anchor },
          { ...input, anchor, rigging: { ...input.rigging, depthOutM: depthOutM * share } },
        );
      }),
      { numRuns: 400 },
    );
  });

  it("never falls when a stake is longer and goes in with it", () => {
    fc.assert(
      fc.property(capacityInput, stakeSpec, fc.double({ min: 1, max: 2, noNaN: true }), (input, anchor, factor) => {
        const ground: GroundState = { ...input.ground, stoneDepthM: null };
        const base: CapacityInput = { ...input, ground, rigging: { ...input.rigging, tandem: null } };
        expectNeverLess({ ...base, anchor }, { ...base, anchor: { ...anchor, lengthM: anchor.lengthM * factor } });
      }),
      { numRuns: 400 },
    );
  });

  it("never falls when a stake is wider", () => {
    fc.assert(
      fc.property(capacityInput, stakeSpec, fc.double({ min: 1, max: 2, noNaN: true }), (input, anchor, factor) => {
        const base: CapacityInput = { ...input, rigging: { ...input.rigging, tandem: null } };
        const wider: AnchorSpec = { ...anchor, section: scaled(anchor.section, factor) };
        const a = groundOnly(base, anchor);
        const b = groundOnly(base, wider);
        if (a === null || b === null) return;
        expect(b.normalN * SLACK).toBeGreaterThanOrEqual(a.normalN);
        expect(b.axialN * SLACK).toBeGreaterThanOrEqual(a.axialN);
        expect(b.tensionN * SLACK).toBeGreaterThanOrEqual(a.tensionN);
      }),
      { numRuns: 400 },
    );
  });

  it("never falls in stronger ground", () => {
    fc.assert(
      fc.property(capacityInput, fc.double({ min: 1, max: 4, noNaN: true }), (input, factor) => {
        const learned = { factor: 1, scatter: 0.4 };
        expectNeverLess(
          { ...input, ground: { ...input.ground, learned } },
          { ...input, ground: { ...input.ground, learned: { ...learned, factor } } },
        );
      }),
      { numRuns: 400 },
    );
  });

  it("never rises when the ground gets wetter", () => {
    const order: readonly Wetness[] = ["saturated", "wet", "usual", "dry"];
    fc.assert(
      fc.property(capacityInput, (input) => {
        for (let i = 1; i < order.length; i += 1) {
          expectNeverLess(
            { ...input, ground: { ...input.ground, wetness: order[i - 1] ?? "usual" } },
            { ...input, ground: { ...input.ground, wetness: order[i] ?? "usual" } },
          );
        }
      }),
      { numRuns: 300 },
    );
  });

  it("never falls with a rock, a second stake or fewer gusts, and never rises with slope or a looser top", () => {
    fc.assert(
      fc.property(capacityInput, stakeSpec, rigging, (input, anchor, other) => {
        const bare: CapacityInput = { ...input, anchor, rigging: { ...input.rigging, tandem: null, rockKg: 0 } };
        const rocky: CapacityInput = { ...bare, rigging: { ...bare.rigging, rockKg: other.rockKg } };
        expectNeverLess(bare, rocky);
        if (other.tandem !== null) {
          const paired: CapacityInput = { ...bare, rigging: { ...bare.rigging, tandem: other.tandem } };
          if (anchorCapacity(paired).status === "ok") expectNeverLess(bare, paired);
        }
        expectNeverLess({ ...bare, pullCycles: 500 }, { ...bare, pullCycles: 20 });
        expectNeverLess(
          { ...bare, pullCycles: 500 },
          { ...bare, pullCycles: 500, rigging: { ...bare.rigging, shockCord: true } },
        );
        expectNeverLess(bare, { ...bare, ground: { ...bare.ground, slopeDeg: bare.ground.slopeDeg / 2 } });
        expectNeverLess(bare, { ...bare, ground: { ...bare.ground, looseTopM: 0 } });
      }),
      { numRuns: 300 },
    );
  });

  it("never rises with a steeper line on an upright stake whose axial resistance is the smaller", () => {
    fc.assert(
      fc.property(capacityInput, stakeSpec, fc.double({ min: 0, max: 89, noNaN: true }), (input, anchor, angle) => {
        const ground: GroundState = { ...input.ground, slopeDeg: 0 };
        const base: CapacityInput = {
          ...input,
          anchor,
          ground,
          pullCycles: 0,
          rigging: { ...input.rigging, leanDeg: 0, tandem: null, rockKg: 0 },
        };
        const parts = groundOnly(base, anchor);
        if (parts === null) return;
        if (parts.axialN > Math.min(parts.normalN, parts.bendingNormalN ?? Infinity) / 2) return;
        expectNeverLess({ ...base, lineAngleDeg: angle + (89 - angle) / 3 }, { ...base, lineAngleDeg: angle });
      }),
      { numRuns: 600 },
    );
  });
});

interface Parts {
  readonly normalN: number;
  readonly axialN: number;
  readonly tensionN: number;
  readonly bendingNormalN: number | null;
}

/** The ground's part alone: a wider stake of the same material can bend earlier where its wall stays as thin. */
function groundOnly(input: CapacityInput, anchor: AnchorSpec): Parts | null {
  const ground = groundNumbers(input.ground);
  if (ground.kind === "undriveable" || anchor.class !== "stake") return null;
  const driven = drivenDetail({
    section: anchor.section,
    material: anchor.material,
    lengthM: anchor.lengthM,
    depthOutM: Math.min(input.rigging.depthOutM, anchor.lengthM),
    leanDeg: input.rigging.leanDeg,
    lineAngleDeg: input.lineAngleDeg,
    rockKg: input.rigging.rockKg,
    ground,
    strengthFactor: ground.strengthFactor,
  });
  return driven === null
    ? null
    : {
        normalN: driven.normalN,
        axialN: driven.shaft.axialN,
        tensionN: driven.groundTensionN,
        bendingNormalN: driven.bendingNormalN,
      };
}

describe("ground", () => {
  it("always gives finite numbers, and only undriveable ground has no strength", () => {
    fc.assert(
      fc.property(groundState, (state) => {
        const numbers = groundNumbers(state);
        expect(numbers.unitWeightNm3).toBeGreaterThan(0);
        expect(numbers.surfaceFriction).toBeGreaterThan(0);
        expect(numbers.scatter).toBeGreaterThanOrEqual(0);
      }),
    );
  });
});
