"use server";

import { revalidatePath } from "next/cache";
import { commentRefInput, createCommentInput } from "@/lib/domain/comment/schema";
import { plural } from "@/lib/format/words";
import { action } from "@/lib/http/action";
import { createComment } from "@/lib/services/comments/create-comment";
import { deleteComment } from "@/lib/services/comments/delete-comment";

export const createCommentAction = action(async ({ ctx, input }) => {
  const { mentionCount } = await createComment({ ctx, input: createCommentInput.parse(input) });
  revalidatePath(`/trips/${String(input.tripId)}`, "layout");
  return {
    message: mentionCount > 0 ? `Written. ${plural(mentionCount, "mail is", "mails are")} on the way.` : "Written.",
  };
});

export const deleteCommentAction = action(async ({ ctx, input }) => {
  await deleteComment({ ctx, input: commentRefInput.parse(input) });
  revalidatePath(`/trips/${String(input.tripId)}`, "layout");
  return { message: "Deleted." };
});
