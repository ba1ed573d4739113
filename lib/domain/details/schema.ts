import { z } from "zod";
import { idSchema } from "../ids";
import { PAPER_SIZES } from "../paper/schema";
import { blockText, lineText } from "../text";

export const MAX_EMERGENCY_CONTACTS = 3;

const phoneSchema = z
  .string()
  .trim()
  .regex(/^[+0-9 ()/-]{3,30}$/, "Enter a telephone number: digits, spaces and + only.");

const emergencyContactSchema = z.object({
  name: lineText("a name", 80),
  phone: phoneSchema,
  relation: blockText("who they are", 80).default(""),
});

/** Lines that were left empty are no contacts. */
function dropEmpty(value: unknown): unknown {
  if (!Array.isArray(value)) return value;
  return value.filter((one: unknown) => {
    if (typeof one !== "object" || one === null) return true;
    return Object.values(one).some((text) => typeof text !== "string" || text.trim() !== "");
  });
}

export const personalDetailsSchema = z.object({
  phone: z.union([z.literal(""), phoneSchema]).default(""),
  emergencyContacts: z.preprocess(
    dropEmpty,
    z
      .array(emergencyContactSchema)
      .max(MAX_EMERGENCY_CONTACTS, `At most ${MAX_EMERGENCY_CONTACTS} emergency contacts.`)
      .default([]),
  ),
  health: blockText("the health notes", 2000).default(""),
  diet: blockText("the notes on food", 500).default(""),
});
export type PersonalDetails = z.output<typeof personalDetailsSchema>;

export const ownDetailsInput = personalDetailsSchema.extend({
  tripId: idSchema,
  version: z.number().int().min(0),
  hasConsent: z.literal(true, { error: "Tick that you agree, or leave these details out." }),
});

/** What somebody agrees to when they write their details; kept with the time. */
export function writeConsent(keepDays: number): string {
  return (
    "I agree that my contact, emergency contacts, health and diet notes are kept for this trip. " +
    "The leader and the co-leaders can read them, nobody else. " +
    `They are stored encrypted, and deleted ${keepDays} days after the trip or when I say so.`
  );
}

export const contactSheetPaperInput = z.object({ tripId: idSchema, size: z.enum(PAPER_SIZES).optional() });
