"use server";

import { revalidatePath } from "next/cache";
import { messageRefInput } from "@/lib/domain/post/schema";
import { action } from "@/lib/http/action";
import { markMessageRead } from "@/lib/services/post/own-messages";

export const markMessageReadAction = action(async ({ ctx, input }) => {
  const message = messageRefInput.parse(input);
  await markMessageRead({ ctx, input: message });
  revalidatePath(`/trips/${message.tripId}`, "layout");
  return { message: "The leader sees that you have read it." };
});
