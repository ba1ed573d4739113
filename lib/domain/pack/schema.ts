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
  key: z.string().regex(/^(item|shelter|fly|poles|kit|thing):[0-9A-Za-z]{16,64}$/, "That line is not on the list."),
  isTicked: z.boolean(),
});

export const SHELTER_PARTS = ["fly", "poles"] as const;
/** Sharing out leaves it where it is. */
const isFixed = z.boolean().default(false);

/** Who carries which of the group's gear: the whole intent in one save. */
export const carrySaveInput = z.object({
  tripId: idSchema,
  carries: z
    .array(
      z.discriminatedUnion(
        "type",
        [
          z.object({
            type: z.literal("shelter"),
            personId: idSchema,
            shelterId: idSchema,
            /** Null: all of it. */
            part: z.enum(SHELTER_PARTS).nullable().default(null),
            isFixed,
          }),
          z.object({ type: z.literal("thing"), personId: idSchema, thingId: idSchema, isFixed }),
          z.object({
            type: z.literal("kit"),
            personId: idSchema,
            kitItemId: idSchema,
            count: numberBetween("the count", 1, 500).int(),
            isFixed,
          }),
        ],
        { error: "Give a shelter, a thing of the kit or a thing of the group's." },
      ),
    )
    .max(1000),
});

/** How a shelter is taken apart. */
export const shelterSplitSaveInput = z.object({
  tripId: idSchema,
  shelterId: idSchema,
  polesMassKg: numberBetween("the mass of the poles", 0.01, 40, "kg").nullable(),
  staysWithSleepers: z.boolean(),
});

export const MAX_GROUP_THINGS = 60;

/** The group's own things that are neither shelter nor kit, as a whole list. */
export const groupThingsSaveInput = z.object({
  tripId: idSchema,
  things: z
    .array(
      z.object({
        /** Null: a new line. */
        id: idSchema.nullable(),
        name: lineText("a name for the thing", 80),
        massKg: numberBetween("the mass", 0, 40, "kg"),
      }),
    )
    .max(MAX_GROUP_THINGS, `At most ${MAX_GROUP_THINGS} things.`),
});

const baseMassKg = numberBetween("the mass of own things", 0, 60, "kg").nullable();
const limitKg = numberBetween("the limit", 1, 80, "kg").nullable();

/** What somebody says of themselves: own things, and a limit as a share of body mass or plain. */
export const ownLoadSaveInput = z.object({
  tripId: idSchema,
  baseMassKg,
  bodyMassKg: numberBetween("the body mass", 20, 250, "kg").nullable(),
  limitShare: numberBetween("the share", 0.05, 0.6).nullable(),
  limitKg,
});

/** What a leader enters for somebody: never a body mass. */
export const limitSaveInput = z.object({ tripId: idSchema, personId: idSchema, baseMassKg, limitKg });

/** What a person can carry, kg, own things included: a plain limit goes before a share of the body mass. */
export function effectiveLimitKg(load: {
  readonly bodyMassKg: number | null;
  readonly limitShare: number | null;
  readonly limitKg: number | null;
}): number | null {
  if (load.limitKg !== null) return load.limitKg;
  return load.bodyMassKg !== null && load.limitShare !== null ? load.bodyMassKg * load.limitShare : null;
}
