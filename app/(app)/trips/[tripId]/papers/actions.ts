"use server";

import { revalidatePath } from "next/cache";
import { sendInput } from "@/lib/domain/post/schema";
import { plural } from "@/lib/format/words";
import { action } from "@/lib/http/action";
import { sendPapers } from "@/lib/services/post/send-papers";

export const sendPapersAction = action(async ({ ctx, input }) => {
  const { messageCount } = await sendPapers({ ctx, input: sendInput.parse(input) });
  revalidatePath(`/trips/${String(input.tripId)}`, "layout");
  return { message: `${plural(messageCount, "message is", "messages are")} on the way. Post shows how they fare.` };
});
