"use server";

import { revalidatePath } from "next/cache";
import { answerInput } from "@/lib/domain/answer/schema";
import { ownDetailsInput } from "@/lib/domain/details/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { action } from "@/lib/http/action";
import { saveAnswer } from "@/lib/services/answers/save-answer";
import { deleteOwnDetails } from "@/lib/services/details/delete-own-details";
import { saveOwnDetails } from "@/lib/services/details/save-own-details";

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

export const saveOwnDetailsAction = action(async ({ ctx, input }) => {
  const details = ownDetailsInput.parse(input);
  await saveOwnDetails({ ctx, input: details });
  revalidatePath(`/trips/${details.tripId}/details`);
  return { message: "Saved. The leader and the co-leaders can read it." };
});

export const deleteOwnDetailsAction = action(async ({ ctx, input }) => {
  const { tripId } = tripRefInput.parse(input);
  await deleteOwnDetails({ ctx, input: { tripId } });
  revalidatePath(`/trips/${tripId}/details`);
  return { message: "Deleted." };
});
