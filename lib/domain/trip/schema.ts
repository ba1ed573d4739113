import { z } from "zod";
import { idSchema } from "../ids";
import { blockText, lineText } from "../text";

export const MAX_NIGHTS = 60;

const timeZones: readonly string[] = [...Intl.supportedValuesOf("timeZone"), "UTC"];
export const TIME_ZONES: readonly string[] = [...new Set(timeZones)].sort();

export const timeZoneSchema = z
  .string({ error: "Choose a time zone." })
  .refine((zone) => TIME_ZONES.includes(zone), "Choose a time zone from the list.");

const FIRST_DAY = "1970-01-01";
const LAST_DAY = "2199-12-31";

/** A calendar day without a time, yyyy-mm-dd; the nights after it still have years of four digits. */
export const daySchema = z.iso
  .date({ error: "Enter a date." })
  .refine((day) => day >= FIRST_DAY && day <= LAST_DAY, "Enter a date between 1970 and 2199.");

export const contactSchema = z.object({
  name: lineText("a name", 80),
  phone: z
    .string()
    .trim()
    .regex(/^[+0-9 ()/-]{3,30}$/, "Enter a telephone number: digits, spaces and + only."),
  note: blockText("the note", 120),
});
export type Contact = z.infer<typeof contactSchema>;

export const tripCreateInput = z.object({
  name: lineText("a name for the trip", 100),
  startDate: daySchema,
  timeZone: timeZoneSchema,
  notes: blockText("the notes", 4000).default(""),
});
export type TripCreateInput = z.infer<typeof tripCreateInput>;

export const tripUpdateInput = tripCreateInput.extend({
  tripId: idSchema,
  version: z.number().int().min(1),
  contacts: z.array(contactSchema).max(12, "At most twelve contact lines.").default([]),
});
export type TripUpdateInput = z.infer<typeof tripUpdateInput>;

export const tripRefInput = z.object({ tripId: idSchema });

/** With people: names, addresses and roles come along, not yet invited, with their sleeping places and loads. */
export const tripCopyInput = z.object({
  tripId: idSchema,
  name: lineText("a name for the trip", 100),
  startDate: daySchema,
  withPeople: z.boolean().default(false),
});

export const tripDeleteInput = z.object({
  tripId: idSchema,
  /** The trip's name, typed again. */
  confirmName: z.string({ error: "Type the name of the trip." }).max(400),
});
