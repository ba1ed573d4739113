import { z } from "zod";
import { idSchema } from "../ids";
import { invitationTokenSchema } from "../person/schema";
import { blockText } from "../text";
import { ANSWER_VALUES } from "./names";

export { ANSWER_NAMES, ANSWER_VALUES, type AnswerValue } from "./names";

const answerFields = {
  value: z.enum(ANSWER_VALUES, { error: "Say yes, maybe or no." }),
  note: blockText("the note", 500).default(""),
};

export const answerInput = z.object({ tripId: idSchema, ...answerFields });
export const invitationAnswerInput = z.object({ token: invitationTokenSchema, ...answerFields });
