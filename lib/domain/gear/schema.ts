import { z } from "zod";
import { idSchema } from "../ids";
import { kitItemDetailsSchema } from "../kit/schema";
import { shelterDetailsSchema } from "../shelter/schema";

/** A person's own shelter, anchor or cord, outside any trip. */
export const gearDetailsSchema = z.discriminatedUnion(
  "type",
  [
    z.object({ type: z.literal("shelter"), shelter: shelterDetailsSchema }),
    z.object({ type: z.literal("anchor"), anchor: kitItemDetailsSchema }),
  ],
  { error: "Choose a shelter or an anchor." },
);
export type GearDetails = z.infer<typeof gearDetailsSchema>;

export const gearCreateInput = z.object({ details: gearDetailsSchema });
export const gearUpdateInput = z.object({
  gearId: idSchema,
  version: z.number().int().min(1),
  details: gearDetailsSchema,
});
export const gearDeleteInput = z.object({ gearId: idSchema });
/** Things in one person's gear. */
export const MAX_GEAR = 200;
