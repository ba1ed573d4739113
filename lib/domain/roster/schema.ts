import { z } from "zod";
import { idSchema } from "../ids";
import { daySchema } from "../trip/schema";
import { numberBetween } from "../text";

/** When nobody has set anything else. */
export const USUAL_REMINDER_DAYS = 3;
export const USUAL_KEEP_DAYS = 30;

const whole = (what: string, min: number, max: number) =>
  numberBetween(what, min, max).int(`${what.charAt(0).toUpperCase()}${what.slice(1)} has to be a whole number.`);

export const rosterInput = z.object({
  tripId: idSchema,
  version: z.number().int().min(0),
  capacity: whole("the number of places", 1, 100).nullable(),
  answerBy: z
    .union([z.literal(""), z.null(), daySchema], { error: "Enter a date, or leave it empty." })
    .transform((day) => day || null),
  remindDaysBefore: whole("the number of days", 1, 60).nullable(),
  keepDetailsDays: whole("the number of days", 1, 365),
});
export type RosterInput = z.infer<typeof rosterInput>;
