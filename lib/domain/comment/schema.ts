import { z } from "zod";
import { idSchema } from "../ids";
import { blockText } from "../text";

export const MAX_COMMENT = 2000;

/** Whom a comment calls by name. The name stays as it was written. */
export interface CommentMention {
  readonly personId: string;
  readonly name: string;
}

/** What a comment is about: a camp or a shelter, never both. */
export const commentSubjectSchema = z.discriminatedUnion(
  "about",
  [
    z.object({ about: z.literal("camp"), campId: idSchema }),
    z.object({ about: z.literal("shelter"), shelterId: idSchema }),
  ],
  { error: "Say what the comment is about: a camp or a shelter." },
);
export type CommentSubject = z.infer<typeof commentSubjectSchema>;

export const listCommentsInput = z.object({ tripId: idSchema, subject: commentSubjectSchema });

export const createCommentInput = z.object({
  tripId: idSchema,
  /** Made by the form: the same comment sent twice is written once. */
  commentId: idSchema,
  subject: commentSubjectSchema,
  body: blockText("the comment", MAX_COMMENT).pipe(z.string().min(1, "Write the comment first.")),
});

export const commentRefInput = z.object({ tripId: idSchema, commentId: idSchema });
