import { z } from "zod";
import type { GroundState } from "@/lib/calc/types";
import { NEWTONS_PER_KILOGRAM_FORCE, NEWTONS_PER_POUND_FORCE } from "@/lib/calc/units";
import { GROUND_KINDS, WETNESSES } from "../camp/schema";
import { idSchema } from "../ids";
import { FORCE_UNITS } from "../preferences";
import { blockText, lineText, numberBetween } from "../text";

export const PATCHES = ["main", "second"] as const;
export type Patch = (typeof PATCHES)[number];

/** What happened at the force that was read. */
export const PULL_OUTCOMES = ["came-out", "bent", "line-failed", "still-holding"] as const;
export type PullOutcome = (typeof PULL_OUTCOMES)[number];

export const OUTCOME_NAMES: Readonly<Record<PullOutcome, string>> = {
  "came-out": "Came out",
  bent: "Bent or broke",
  "line-failed": "Line or loop failed",
  "still-holding": "Still holding",
};

/** The ground as it was when it was pulled. */
export type TestedGround = Pick<GroundState, "kind" | "wetness" | "looseTopM" | "stoneDepthM" | "slopeDeg">;

export const testedGroundSchema: z.ZodType<TestedGround> = z.object({
  kind: z.enum(GROUND_KINDS, { error: "Choose a ground." }),
  wetness: z.enum(WETNESSES, { error: "Choose how wet the ground was." }),
  looseTopM: numberBetween("the loose top layer", 0, 0.5, "m").nullable(),
  stoneDepthM: numberBetween("the depth to stones", 0.02, 2, "m").nullable(),
  slopeDeg: numberBetween("the slope", 0, 35, "°"),
});

const NEWTONS: Readonly<Record<(typeof FORCE_UNITS)[number], number>> = {
  N: 1,
  kgf: NEWTONS_PER_KILOGRAM_FORCE,
  lbf: NEWTONS_PER_POUND_FORCE,
};
export const MAX_FORCE_N = 20_000;
/** Below this a reading says nothing of an anchor: the scale's own weight is more. */
export const MIN_FORCE_N = 1;

export function newtonsOf(reading: {
  readonly force: number;
  readonly forceUnit: (typeof FORCE_UNITS)[number];
}): number {
  return reading.force * NEWTONS[reading.forceUnit];
}

/** A built-in anchor's id, or the id of a thing in the trip's kit or the person's own gear. */
export const anchorIdSchema = z
  .string({ error: "Choose an anchor." })
  .regex(/^([a-z0-9-]{3,64}|[0-9A-Za-z]{16,64})$/, "Choose an anchor from the list.");

/** An instant as text, so that parsing twice is the same as once. */
const pulledAtSchema = z
  .string({ error: "Enter day and time of the pull." })
  .pipe(z.iso.datetime({ offset: true, error: "Day and time have to look like 2027-06-12T18:20:00Z." }))
  .refine((text) => /^(19[7-9]\d|20\d\d|21\d\d)-/.test(text), "The year has to be between 1970 and 2199.");

/** What is read off the scale and the stake; the same for the form and for each row of a table. */
const readingFields = {
  leanDeg: numberBetween("the lean", -10, 60, "°"),
  lineAngleDeg: numberBetween("the line angle", 0, 90, "°"),
  depthOutM: numberBetween("the length left out", 0, 1.5, "m"),
  force: z
    .number({ error: "Enter the force that the scale showed." })
    .positive("The force has to be above 0.")
    .max(1e6, "The force can be at most 20 kN."),
  forceUnit: z.enum(FORCE_UNITS, { error: "Choose N, kgf or lbf." }),
  outcome: z.enum(PULL_OUTCOMES, { error: "Choose what happened." }),
  wetness: z.enum(WETNESSES, { error: "Choose how wet the ground was." }),
  note: blockText("the note", 500).default(""),
  pulledAt: pulledAtSchema.nullable().default(null),
};

function refuseForce(reading: { force: number; forceUnit: (typeof FORCE_UNITS)[number] }, ctx: z.RefinementCtx) {
  const newtons = newtonsOf(reading);
  if (newtons >= MIN_FORCE_N && newtons <= MAX_FORCE_N) return;
  const message = newtons < MIN_FORCE_N ? "The force has to be at least 1 N." : "The force can be at most 20 kN.";
  ctx.addIssue({ code: "custom", path: ["force"], message });
}

export const campReadingSchema = z
  .object({ ...readingFields, patch: z.enum(PATCHES, { error: "Choose the patch of ground." }) })
  .superRefine(refuseForce);
export type CampReading = z.output<typeof campReadingSchema>;

/** In the practice field the ground is said with each reading, and the place has a name. */
export const practiceReadingSchema = z
  .object({
    ...readingFields,
    place: lineText("a name for the place", 60),
    kind: z.enum(GROUND_KINDS, { error: "Choose a ground." }),
    looseTopM: numberBetween("the loose top layer", 0, 0.5, "m").nullable().default(null),
    stoneDepthM: numberBetween("the depth to stones", 0.02, 2, "m").nullable().default(null),
  })
  .superRefine(refuseForce);
export type PracticeReading = z.output<typeof practiceReadingSchema>;

/** Made by the browser, so that a form that is sent twice makes one reading. */
const newPullTestId = idSchema;

export const campPullCreateInput = z.object({
  tripId: idSchema,
  campId: idSchema,
  pullTestId: newPullTestId,
  anchorId: anchorIdSchema,
  reading: campReadingSchema,
});
export const practicePullCreateInput = z.object({
  pullTestId: newPullTestId,
  anchorId: anchorIdSchema,
  reading: practiceReadingSchema,
});

/** "as-logged" keeps the anchor that the reading has. */
const anchorChoiceSchema = z.union([z.literal("as-logged"), anchorIdSchema], { error: "Choose an anchor." });
const versionSchema = z.number().int().min(1);

export const campPullUpdateInput = z.object({
  tripId: idSchema,
  campId: idSchema,
  pullTestId: idSchema,
  version: versionSchema,
  anchorId: anchorChoiceSchema,
  reading: campReadingSchema,
});
export const practicePullUpdateInput = z.object({
  pullTestId: idSchema,
  version: versionSchema,
  anchorId: anchorChoiceSchema,
  reading: practiceReadingSchema,
});

export const pullTestRefInput = z.object({ pullTestId: idSchema });
export const pullTestSwitchInput = pullTestRefInput.extend({ isOff: z.boolean({ error: "Say on or off." }) });

export const patchRefInput = z.object({
  tripId: idSchema,
  campId: idSchema,
  patch: z.enum(PATCHES, { error: "Choose the patch of ground." }),
});
export const elsewhereInput = patchRefInput.extend({ usesElsewhere: z.boolean({ error: "Say yes or no." }) });

/** Readings at one camp, or in one person's practice field. */
export const MAX_READINGS = 40_000;
