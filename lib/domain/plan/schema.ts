import { z } from "zod";
import { idSchema } from "../ids";
import { numberBetween } from "../text";

export const KNOT_IDS = [
  "bowline",
  "two-half-hitches",
  "round-turn-two-half-hitches",
  "clove-hitch",
  "timber-hitch",
  "sheet-bend",
  "figure-eight-loop",
  "taut-line-hitch",
  "truckers-hitch",
  "anchor-bend",
] as const;

/** Things found at a camp have ids of their own, those of BUILT_IN_ANCHORS; a kit item has a random id. */
const anchorIdSchema = z.string().regex(/^[0-9a-zA-Z-]{3,64}$/, "Unknown anchor.");
const tieOutIdSchema = z.string().regex(/^[0-9a-z-]{1,40}$/, "Unknown tie-out.");

export const placementSchema = z.object({
  pitchId: idSchema,
  tieOutId: tieOutIdSchema,
  anchorId: anchorIdSchema,
  leanDeg: numberBetween("the lean", -10, 60, "°"),
  depthOutM: numberBetween("the length left out of the ground", 0, 1.5, "m"),
  tandem: z
    .object({ anchorId: anchorIdSchema, spacingM: numberBetween("the distance in line", 0.02, 3, "m") })
    .nullable(),
  rockKg: numberBetween("the rock", 0, 200, "kg"),
  shockCord: z.boolean(),
  knot: z.enum(KNOT_IDS, { error: "Choose a knot." }),
  pinned: z.boolean(),
});

const spot = { pitchId: idSchema, tieOutId: tieOutIdSchema };

/** What somebody meant to do to a staking plan. Small, so that it can be queued, repeated and replayed. */
export const planChangeSchema = z.discriminatedUnion(
  "type",
  [
    /** Put an anchor at a tie-out, with its rigging; replaces what is there. */
    z.object({ type: z.literal("place"), placement: placementSchema }),
    /** Back to the tray. */
    z.object({ type: z.literal("lift"), ...spot }),
    /** From one tie-out to another; what was there goes to the first. */
    z.object({ type: z.literal("swap"), from: z.object(spot), to: z.object(spot) }),
    /** The whole plan at once: an accepted proposal, an undo, a chosen version after a conflict. */
    z.object({ type: z.literal("replace"), placements: z.array(placementSchema).max(600) }),
  ],
  { error: "That is no change of a staking plan." },
);
export type PlanChange = z.infer<typeof planChangeSchema>;

export const planIntentInput = z.object({
  /** Made by the client; the same id is never applied twice. */
  intentId: idSchema,
  /** Version of the plan that the person saw. */
  baseVersion: z.number().int().min(0),
  change: planChangeSchema,
});
export type PlanIntent = z.infer<typeof planIntentInput>;

export const planIntentsBody = z.object({ intents: z.array(planIntentInput).min(1).max(100) });
