import fc from "fast-check";
import type { CapacityInput } from "@/lib/calc/capacity";
import { BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import { GROUNDS } from "@/lib/calc/tables/grounds";
import { KNOTS, LINES } from "@/lib/calc/tables/lines";
import { MATERIALS } from "@/lib/calc/tables/materials";
import type { AnchorSpec, GroundKind, GroundState, Rigging, StakeSection, Wetness } from "@/lib/calc/types";

/** The same cases on every run; a longer search is a matter of changing this number. */
fc.configureGlobal({ seed: 20_260 });

/** Ground in its usual state, for tests that change one thing at a time. */
export function groundOf(kind: GroundKind, changes: Partial<GroundState> = {}): GroundState {
  return { kind, wetness: "usual", looseTopM: null, stoneDepthM: null, slopeDeg: 0, learned: null, ...changes };
}

/** A line far stronger than any anchor here, so that it never governs unless a test wants it to. */
export const STRONG_LINE: Rigging["line"] = { material: "uhmwpe", diameterMm: 12 };

export function riggingOf(changes: Partial<Rigging> = {}): Rigging {
  return {
    leanDeg: 0,
    depthOutM: 0,
    tandem: null,
    rockKg: 0,
    shockCord: false,
    line: STRONG_LINE,
    knot: "bowline",
    ...changes,
  };
}

const between = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });

const section: fc.Arbitrary<StakeSection> = fc.oneof(
  fc.record({
    shape: fc.constant("three-blade" as const),
    bladeM: between(0.005, 0.02),
    thicknessM: between(0.0008, 0.003),
  }),
  fc.record({ shape: fc.constant("v" as const), legM: between(0.006, 0.03), thicknessM: between(0.0006, 0.003) }),
  fc.record({ shape: fc.constant("round" as const), diameterM: between(0.003, 0.04) }),
  fc.record({ shape: fc.constant("tube" as const), diameterM: between(0.008, 0.03), wallM: between(0.0005, 0.003) }),
  fc.record({
    shape: fc.constant("wide" as const),
    widthM: between(0.02, 0.1),
    depthM: between(0.004, 0.03),
    thicknessM: between(0.0008, 0.003),
  }),
  fc.record({
    shape: fc.constant("t" as const),
    widthM: between(0.01, 0.03),
    depthM: between(0.008, 0.03),
    thicknessM: between(0.001, 0.004),
  }),
);

export const stakeSpec: fc.Arbitrary<Extract<AnchorSpec, { class: "stake" }>> = fc.record({
  class: fc.constant("stake" as const),
  section,
  lengthM: between(0.1, 0.6),
  material: fc.constantFrom(...MATERIALS.map((row) => row.id)),
  headRatingN: fc.option(between(50, 5000), { nil: null }),
});

export const anchorSpec: fc.Arbitrary<AnchorSpec> = fc.oneof(
  { weight: 4, arbitrary: stakeSpec },
  { weight: 3, arbitrary: fc.constantFrom(...BUILT_IN_ANCHORS.map((anchor) => anchor.spec)) },
  {
    weight: 1,
    arbitrary: fc.record({
      class: fc.constant("deadman" as const),
      widthM: between(0.1, 1.5),
      heightM: between(0.03, 0.19),
      depthM: between(0.2, 1),
    }),
  },
  {
    weight: 1,
    arbitrary: fc.record({ class: fc.constant("surface-weight" as const), massKg: between(1, 100) }),
  },
);

export const groundState: fc.Arbitrary<GroundState> = fc.record({
  kind: fc.constantFrom(...GROUNDS.map((row) => row.kind)),
  wetness: fc.constantFrom<Wetness>("dry", "usual", "wet", "saturated"),
  looseTopM: fc.option(between(0, 0.15), { nil: null }),
  stoneDepthM: fc.option(between(0.02, 0.6), { nil: null }),
  slopeDeg: between(0, 35),
  learned: fc.option(fc.record({ factor: between(0.2, 5), scatter: between(0, 1) }), { nil: null }),
});

export const rigging: fc.Arbitrary<Rigging> = fc.record({
  leanDeg: between(-10, 60),
  depthOutM: between(0, 0.2),
  tandem: fc.option(fc.record({ anchor: stakeSpec, spacingM: between(0, 1) }), { nil: null }),
  rockKg: fc.oneof(fc.constant(0), between(0, 60)),
  shockCord: fc.boolean(),
  line: fc.record({ material: fc.constantFrom(...LINES.map((row) => row.material)), diameterMm: between(1, 10) }),
  knot: fc.constantFrom(...KNOTS.map((row) => row.id)),
});

export const capacityInput: fc.Arbitrary<CapacityInput> = fc.record({
  anchor: anchorSpec,
  ground: groundState,
  lineAngleDeg: between(0, 90),
  rigging,
  pullCycles: between(0, 3000),
});
