import { performance } from "node:perf_hooks";
import { anchorCapacity, bestLean, capacityNumbers, type CapacityInput } from "@/lib/calc/capacity";
import { BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import { GROUNDS } from "@/lib/calc/tables/grounds";
import type { Bench } from "./run";

const ROUNDS = 15;

/** Every stake in every ground at five line angles and four leans: what a plan asks for. */
function stakeInputs(): CapacityInput[] {
  const stakes = BUILT_IN_ANCHORS.filter((anchor) => anchor.spec.class === "stake");
  return GROUNDS.flatMap((row) =>
    stakes.flatMap((anchor) =>
      [10, 25, 40, 55, 70].flatMap((lineAngleDeg) =>
        [0, 10, 20, 30].map((leanDeg) => ({
          anchor: anchor.spec,
          ground: {
            kind: row.kind,
            wetness: "usual" as const,
            looseTopM: null,
            stoneDepthM: null,
            slopeDeg: 5,
            learned: null,
          },
          lineAngleDeg,
          rigging: {
            leanDeg,
            depthOutM: 0.01,
            tandem: null,
            rockKg: 0,
            shockCord: false,
            line: { material: "polyester" as const, diameterMm: 3 },
            knot: "bowline" as const,
          },
        })),
      ),
    ),
  );
}

function medianMicroseconds(inputs: readonly CapacityInput[], task: (input: CapacityInput) => unknown): number {
  const times: number[] = [];
  for (let round = 0; round < ROUNDS + 2; round += 1) {
    const start = performance.now();
    for (const input of inputs) task(input);
    if (round >= 2) times.push(((performance.now() - start) / inputs.length) * 1000);
  }
  return times.sort((a, b) => a - b)[Math.floor(ROUNDS / 2)] ?? 0;
}

const capacityBench: Bench = async (report) => {
  const inputs = stakeInputs();
  const show = (value: number): string => `${value.toFixed(2)} µs`;
  report({
    name: `one stake, numbers only (${inputs.length} cases)`,
    value: show(medianMicroseconds(inputs, capacityNumbers)),
    target: "≤ 20 µs",
  });
  report({ name: "one stake with its working", value: show(medianMicroseconds(inputs, anchorCapacity)) });
  const uprights = inputs.filter((input) => input.rigging.leanDeg === 0);
  report({ name: "one stake's best lean", value: show(medianMicroseconds(uprights, bestLean)) });
};

export default capacityBench;
