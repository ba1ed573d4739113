import { z } from "zod";
import { idSchema } from "../ids";
import { lineText, numberBetween } from "../text";

export const MAX_PACK_ITEMS = 150;

/** The whole list at once, in order: of one person, or with null what everybody brings. */
export const packItemsSaveInput = z.object({
  tripId: idSchema,
  personId: idSchema.nullable(),
  items: z
    .array(
      z.object({
        /** Null: a new line. */
        id: idSchema.nullable(),
        name: lineText("a name for the thing", 80),
        isGroupThing: z.boolean(),
        massKg: numberBetween("the mass", 0, 40, "kg").nullable(),
      }),
    )
    .max(MAX_PACK_ITEMS, `At most ${MAX_PACK_ITEMS} lines.`),
});

export const packTickInput = z.object({
  tripId: idSchema,
  key: z.string().regex(/^(item|shelter|kit):[0-9A-Za-z]{16,64}$/, "That line is not on the list."),
  isTicked: z.boolean(),
});

/** Who carries which of the group's gear: the whole intent in one save. */
export const carrySaveInput = z.object({
  tripId: idSchema,
  carries: z
    .array(
      z.discriminatedUnion(
        "type",
        [
          z.object({ type: z.literal("shelter"), personId: idSchema, shelterId: idSchema }),
          z.object({
            type: z.literal("kit"),
            personId: idSchema,
            kitItemId: idSchema,
            count: numberBetween("the count", 1, 500).int(),
          }),
        ],
        { error: "Give a shelter or a thing of the kit." },
      ),
    )
    .max(500),
});
