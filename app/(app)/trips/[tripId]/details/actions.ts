"use server";

import { revalidatePath } from "next/cache";
import { answerInput } from "@/lib/domain/answer/schema";
import { action } from "@/lib/http/action";
import { saveAnswer } from "@/lib/services/answers/save-answer";

export const saveAnswerAction = action(async ({ ctx, input }) => {
  const answer = answerInput.parse(input);
  const own = await saveAnswer({ ctx, input: answer });
  revalidatePath(`/trips/${answer.tripId}`, "layout");
  return {
    message:
      own.waitingPlace === null
        ? "Thank you. The leader sees your answer."
        : `Every place is taken: you are number ${own.waitingPlace} on the waiting list.`,
  };
});
