import { z } from "zod";
import type { GroundState } from "@/lib/calc/types";
import { GROUND_KINDS, WETNESSES } from "../camp/schema";
import { anchorSpecSchema } from "../kit/schema";
import { KNOT_IDS } from "../plan/schema";
import { LINE_MATERIAL_IDS } from "../shelter/schema";
import { numberBetween } from "../text";

export const MAX_SWEEP_STEPS = 91;

/** One angle, or a sweep from one to another. */
function angleOrSweep(what: string, min: number, max: number) {
  const one = numberBetween(what, min, max, "°");
  const sweep = z
    .object({ from: one, to: one, step: numberBetween("the step", 1, 90, "°") })
    .refine(({ from, to }) => to >= from, { path: ["to"], error: "The end has to be at or after the start." })
    .refine(({ from, to, step }) => (to - from) / step < MAX_SWEEP_STEPS, {
      path: ["step"],
      error: `At most ${MAX_SWEEP_STEPS} steps.`,
    });
  return z.union([one, sweep], { error: `Give ${what} as a number, or as { from, to, step }.` });
}

const groundStateSchema: z.ZodType<GroundState> = z.object({
  kind: z.enum(GROUND_KINDS, { error: "Choose a ground." }),
  wetness: z.enum(WETNESSES, { error: "Choose how wet the ground is." }),
  looseTopM: numberBetween("the loose top layer", 0, 0.5, "m").nullable().default(null),
  stoneDepthM: numberBetween("the depth to stones", 0.02, 2, "m").nullable().default(null),
  slopeDeg: numberBetween("the slope", 0, 35, "°").default(0),
  learned: z
    .object({ factor: numberBetween("the factor", 0.05, 20), scatter: numberBetween("the scatter", 0, 2) })
    .nullable()
    .default(null),
});

const builtInIdSchema = z.string().regex(/^[a-z0-9-]{3,64}$/, "Unknown anchor.");

const anchorSchema = z.union([builtInIdSchema, anchorSpecSchema], {
  error: "Give the id of a built-in anchor, or the anchor's measures.",
});

/** One anchor, one ground, one line. `anchor` is the id of a built-in anchor or an anchor's own measures. */
export const quickCheckInput = z.object({
  anchor: anchorSchema,
  ground: groundStateSchema,
  lineAngleDeg: angleOrSweep("the line angle", 0, 90),
  leanDeg: angleOrSweep("the lean", -10, 60).default(0),
  depthOutM: numberBetween("the length left out of the ground", 0, 1.5, "m").default(0),
  tandem: z
    .object({
      anchor: anchorSchema,
      spacingM: numberBetween("the distance in line", 0.02, 3, "m"),
    })
    .nullable()
    .default(null),
  rockKg: numberBetween("the rock", 0, 200, "kg").default(0),
  shockCord: z.boolean().default(false),
  line: z
    .object({
      material: z.enum(LINE_MATERIAL_IDS, { error: "Choose a line." }),
      diameterMm: numberBetween("the line's diameter", 1, 12, "mm"),
    })
    .default({ material: "polyester", diameterMm: 3 }),
  knot: z.enum(KNOT_IDS, { error: "Choose a knot." }).default("bowline"),
});
export type QuickCheckInput = z.infer<typeof quickCheckInput>;
