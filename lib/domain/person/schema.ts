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
