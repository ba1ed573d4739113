import { z } from "zod";
import { idSchema } from "../ids";
import { daySchema } from "../trip/schema";
import { blockText, emailSchema, lineText } from "../text";

const phone = z
  .string()
  .trim()
  .regex(/^[+0-9 ()/-]{3,30}$/, "Enter a telephone number: digits, spaces and + only.");
const orEmpty = <Schema extends z.ZodType<string, string>>(schema: Schema) =>
  z.union([z.literal(""), schema]).default("");

const timeSchema = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, "Enter a time, like 18:30.");

/** One step when the group is overdue: so long after the time due back, this person calls that one. */
const overdueStepSchema = z.object({
  afterMinutes: z
    .number({ error: "Say how long after the time due back." })
    .int("Say how long in whole minutes.")
    .min(0, "Not before the time due back.")
    .max(7 * 24 * 60, "At most seven days."),
  who: lineText("who is told", 80),
  phone: orEmpty(phone),
  action: lineText("what to do", 300),
});
export type OverdueStep = z.infer<typeof overdueStepSchema>;

export const MAX_STEPS = 12;

export const emergencyPlanInput = z
  .object({
    tripId: idSchema,
    version: z.number().int().min(0),
    meetingPoints: blockText("the meeting points", 2000).default(""),
    wayOut: blockText("the way out", 2000).default(""),
    groupPhone: orEmpty(phone),
    dueBackDay: z.union([z.literal(""), daySchema]).default(""),
    dueBackTime: z.union([z.literal(""), timeSchema]).default(""),
    outsideName: blockText("the name", 80).default(""),
    outsideEmail: z.union([z.literal(""), emailSchema]).default(""),
    outsidePhone: orEmpty(phone),
    steps: z.array(overdueStepSchema).max(MAX_STEPS, `At most ${MAX_STEPS} steps.`).default([]),
  })
  .refine(({ dueBackDay, dueBackTime }) => (dueBackDay === "") === (dueBackTime === ""), {
    path: ["dueBackTime"],
    message: "Enter both the day and the time, or neither.",
  });
export type EmergencyPlanInput = z.infer<typeof emergencyPlanInput>;

export const emergencySendInput = z.object({ tripId: idSchema, requestId: idSchema });
