"use server";

import { revalidatePath } from "next/cache";
import { action } from "@/lib/http/action";
import { retryMessage } from "@/lib/services/post/retry-message";

export const retryMessageAction = action(async ({ ctx, input }) => {
  const { tripId, messageId } = input;
  await retryMessage({ ctx, input: { tripId: String(tripId), messageId: String(messageId) } });
  revalidatePath(`/trips/${String(tripId)}/post`);
  return { message: "It is tried again now." };
});
