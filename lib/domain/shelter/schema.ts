import { z } from "zod";
import type { ShelterSpec } from "@/lib/calc/types";
import { idSchema } from "../ids";
import { lineText, numberBetween } from "../text";

export const SHELTER_KIND_IDS = [
  "ridge-tarp",
  "poncho-lean-to",
  "diamond",
  "flying-tarp",
  "half-pyramid",
  "pyramid",
  "ridge-tent",
  "tunnel",
  "dome",
  "bell",
] as const;
/** Of one trip. */
export const MAX_SHELTERS = 60;
export const FABRIC_IDS = ["nylon-light", "polyester-light", "polyester-heavy", "cotton-canvas", "laminate"] as const;
export const LINE_MATERIAL_IDS = ["polyester", "nylon", "uhmwpe"] as const;
export const PATCHES = ["main", "second"] as const;

/** Keys of dimensions and tie-outs: short words of ours, never user text. */
const keySchema = z.string().regex(/^[a-zA-Z0-9-]{1,40}$/, "Unknown key.");
const lengthsSchema = z.record(keySchema, numberBetween("a length", 0, 30, "m"));

export const shelterSpecSchema: z.ZodType<ShelterSpec> = z.object({
  kind: z.enum(SHELTER_KIND_IDS, { error: "Choose a kind of shelter." }),
  dimensions: lengthsSchema,
  fabric: z.enum(FABRIC_IDS, { error: "Choose a fabric." }),
  line: z.object({
    material: z.enum(LINE_MATERIAL_IDS, { error: "Choose a line." }),
    diameterMm: numberBetween("the line's diameter", 1, 12, "mm"),
  }),
  lineLengthsM: lengthsSchema,
});

export const shelterDetailsSchema = z.object({
  name: lineText("a name for the shelter", 60),
  sleeps: numberBetween("the number of people it sleeps", 0, 30).int(),
  massKg: numberBetween("the mass", 0, 60, "kg").nullable(),
  spec: shelterSpecSchema,
});
export type ShelterDetails = z.infer<typeof shelterDetailsSchema>;

export const shelterCreateInput = z.object({ tripId: idSchema, details: shelterDetailsSchema });
export const shelterUpdateInput = z.object({
  tripId: idSchema,
  shelterId: idSchema,
  version: z.number().int().min(1),
  details: shelterDetailsSchema,
});

export const shelterRefInput = z.object({ tripId: idSchema, shelterId: idSchema });
export const shelterDeleteInput = shelterRefInput.extend({ confirmed: z.boolean().default(false) });

/** How a shelter stands at one camp. Its dimensions here override those of the shelter (pitch height …). */
export const pitchDetailsSchema = z.object({
  headingDeg: numberBetween("the heading", 0, 360, "°"),
  patch: z.enum(PATCHES),
  dimensions: lengthsSchema,
  lineLengthsM: lengthsSchema,
});
export type PitchDetails = z.infer<typeof pitchDetailsSchema>;

export const pitchCreateInput = z.object({ tripId: idSchema, campId: idSchema, shelterId: idSchema });
export const pitchUpdateInput = z.object({
  tripId: idSchema,
  campId: idSchema,
  pitchId: idSchema,
  version: z.number().int().min(1),
  details: pitchDetailsSchema,
});

export const pitchDeleteInput = z.object({
  tripId: idSchema,
  campId: idSchema,
  pitchId: idSchema,
  confirmed: z.boolean().default(false),
});

/** A shelter of a camp pitched as one would like it, not saved. */
export const analysePitchBody = z.object({ pitchId: idSchema, details: pitchDetailsSchema });

/** Who sleeps where at a camp: the whole intent in one save; null = sleeps outside any shelter. */
export const sleepersSaveInput = z.object({
  tripId: idSchema,
  campId: idSchema,
  sleepers: z
    .array(z.object({ personId: idSchema, pitchId: idSchema.nullable() }))
    .max(200)
    .refine((rows) => new Set(rows.map((row) => row.personId)).size === rows.length, "Somebody is placed twice."),
});
