"use server";

import { revalidatePath } from "next/cache";
import { messageRefInput } from "@/lib/domain/post/schema";
import { action } from "@/lib/http/action";
import { retryMessage } from "@/lib/services/post/retry-message";

export const retryMessageAction = action(async ({ ctx, input }) => {
  const message = messageRefInput.parse(input);
  await retryMessage({ ctx, input: message });
  revalidatePath(`/trips/${message.tripId}/post`);
  return { message: "It is tried again now." };
});
