import { z } from "zod";
import { MOST_KINDS, MOST_SPARES } from "@/lib/calc/kit/types";
import { idSchema } from "../ids";
import { numberBetween } from "../text";

/** Where a kind of anchor comes from: the trip's kit, somebody's own gear, or the built-in library. */
export const KIND_SOURCES = ["kit", "gear", "library"] as const;

const kindChoiceSchema = z.object({
  source: z.enum(KIND_SOURCES),
  id: z.string().regex(/^[0-9a-zA-Z-]{3,64}$/, "That anchor is not known."),
  /** Null: as many as are needed. */
  most: numberBetween("how many there are", 0, 500).int("Enter a whole number.").nullable(),
});

export const kitSearchSettingsSchema = z.object({
  kinds: z
    .array(kindChoiceSchema)
    .min(1, "Choose at least one kind of anchor.")
    .max(MOST_KINDS, `Choose at most ${MOST_KINDS} kinds of anchors.`),
  campIds: z.array(idSchema).min(1, "Choose at least one camp.").max(100),
  /** Camps where things found there may be used. */
  foundCampIds: z.array(idSchema).max(100),
  spares: numberBetween("the spares", 0, MOST_SPARES).int("Enter a whole number of spares."),
  workPriceKg: numberBetween("the price of work", 0, 5, "kg"),
  allowDoubling: z.boolean(),
});
export type KitSearchSettings = z.infer<typeof kitSearchSettingsSchema>;

export const kitSearchStartInput = z.object({ tripId: idSchema, settings: kitSearchSettingsSchema });

/** Carry up to so much rather than do the work of setting one stake, until the leader says otherwise. */
export const USUAL_WORK_PRICE_KG = 0.02;
