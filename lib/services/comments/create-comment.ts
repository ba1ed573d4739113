import { eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { comment } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { findMentions } from "@/lib/domain/comment/find-mentions";
import { createCommentInput } from "@/lib/domain/comment/schema";
import { renderMentionMail } from "@/lib/email/templates/comment-mails";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { enqueueMessage } from "../post/enqueue-message";
import { loadTripRow, recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { listReaders, loadSubject } from "./internal";

/** Writes a comment and mails those it calls by name. The same comment again has no second effect. */
export async function createComment({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof createCommentInput>;
}): Promise<{ mentionCount: number }> {
  const { tripId, commentId, subject, body } = parseInput(createCommentInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "comment.write", tx);
    const trip = await loadTripRow(tx, tripId);
    const about = await loadSubject(tx, tripId, subject);
    const [known] = await tx.select().from(comment).where(eq(comment.id, commentId)).limit(1);
    if (known) {
      if (known.tripId !== tripId || known.userId !== ctx.actor.userId) {
        throw new AppError(
          "conflict",
          "That comment was written elsewhere already. Reload the page and write it anew.",
        );
      }
      return { mentionCount: known.mentions.length };
    }
    const others = (await listReaders(tx, tripId)).filter((one) => one.userId !== ctx.actor.userId);
    const mentions = findMentions(body, others);
    await tx.insert(comment).values({
      id: commentId,
      tripId,
      campId: subject.about === "camp" ? subject.campId : null,
      shelterId: subject.about === "shelter" ? subject.shelterId : null,
      userId: ctx.actor.userId,
      userName: ctx.actor.name,
      body,
      mentions,
      createdAt: new Date(),
    });
    for (const one of others.filter(({ id }) => mentions.some((mention) => mention.personId === id))) {
      await enqueueMessage(tx, {
        kind: "comment",
        requestId: commentId,
        tripId,
        personId: one.id,
        to: { name: one.name, address: one.email },
        replyTo: { name: ctx.actor.name, address: ctx.actor.email },
        mail: renderMentionMail({
          name: one.name,
          byName: ctx.actor.name,
          tripName: trip.name,
          about: about.name,
          body,
          url: `${env.appUrl}${about.path}`,
        }),
      });
    }
    await recordChange(tx, ctx, {
      tripId,
      action: "create",
      entity: "comment",
      entityId: subject.about === "camp" ? subject.campId : subject.shelterId,
      summary: `Comment on ${about.name}`,
      isPrinted: false,
    });
    return { mentionCount: mentions.length };
  });
}
