import { z } from "zod";
import { ROLES } from "../permissions/permissions";
import { idSchema } from "../ids";
import { emailSchema, lineText } from "../text";

export const personNameSchema = lineText("a name", 80);

export const personCreateInput = z.object({
  tripId: idSchema,
  name: personNameSchema,
  email: emailSchema,
  role: z.enum(ROLES, { error: "Choose a role." }),
});
export const personUpdateInput = z.object({
  tripId: idSchema,
  personId: idSchema,
  name: personNameSchema,
  role: z.enum(ROLES, { error: "Choose a role." }),
  version: z.number().int().min(1),
});
export const personRefInput = z.object({ tripId: idSchema, personId: idSchema });
export const personDeleteInput = personRefInput.extend({ confirmed: z.boolean().default(false) });

/** The secret part of an invitation link: 256 random bits. */
export const invitationTokenSchema = z.string().regex(/^[A-Za-z0-9_-]{43}$/, "This is not a link of an invitation.");

const MAX_CSV = 100_000;
export const peopleImportInput = z.object({
  tripId: idSchema,
  csv: z
    .string({ error: "Choose a file, or paste its lines." })
    .max(MAX_CSV, "That is too much: at most 100 kB.")
    .refine((text) => text.trim() !== "", "Choose a file, or paste its lines."),
  isTrial: z.boolean().default(false),
});
