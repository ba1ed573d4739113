import { z } from "zod";
import { idSchema } from "../ids";
import { invitationTokenSchema } from "../person/schema";
import { blockText } from "../text";

export const ANSWER_VALUES = ["yes", "maybe", "no"] as const;
export type AnswerValue = (typeof ANSWER_VALUES)[number];

export const ANSWER_NAMES: Readonly<Record<AnswerValue, string>> = {
  yes: "Yes, I come",
  maybe: "Maybe",
  no: "No, I can't",
};

const answerFields = {
  value: z.enum(ANSWER_VALUES, { error: "Say yes, maybe or no." }),
  note: blockText("the note", 500).default(""),
};

export const answerInput = z.object({ tripId: idSchema, ...answerFields });
export const invitationAnswerInput = z.object({ token: invitationTokenSchema, ...answerFields });
