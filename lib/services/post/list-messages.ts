import { and, asc, desc, eq, inArray } from "drizzle-orm";
import { z } from "zod";
import { getDb } from "@/db/client";
import { outboxAttachment, outboxMessage } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { idSchema } from "@/lib/domain/ids";
import type { MessageView } from "@/lib/domain/views";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

const listMessagesInput = z.object({ tripId: idSchema });
const MOST = 500;

/** Newest first. */
export async function listMessages({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof listMessagesInput>;
}): Promise<MessageView[]> {
  const { tripId } = parseInput(listMessagesInput, input);
  await requirePermission(ctx, tripId, "post.read");
  const rows = await getDb()
    .select()
    .from(outboxMessage)
    .where(eq(outboxMessage.tripId, tripId))
    .orderBy(desc(outboxMessage.createdAt), asc(outboxMessage.toName), asc(outboxMessage.id))
    .limit(MOST);
  const files = await getDb()
    .select({ messageId: outboxAttachment.messageId, fileName: outboxAttachment.fileName })
    .from(outboxAttachment)
    .innerJoin(outboxMessage, eq(outboxMessage.id, outboxAttachment.messageId))
    .where(
      and(
        eq(outboxMessage.tripId, tripId),
        inArray(
          outboxAttachment.messageId,
          rows.map((row) => row.id),
        ),
      ),
    )
    .orderBy(asc(outboxAttachment.position));
  return rows.map((row) => ({
    id: row.id,
    toName: row.toName,
    toAddress: row.toAddress,
    subject: row.subject,
    state: row.state,
    attempts: row.attempts,
    lastError: row.lastError,
    createdAt: row.createdAt.toISOString(),
    sentAt: row.sentAt?.toISOString() ?? null,
    nextAttemptAt: row.state === "waiting" && row.attempts > 0 ? row.nextAttemptAt.toISOString() : null,
    readAt: row.readAt?.toISOString() ?? null,
    isTest: row.kind === "test",
    files: files.filter((file) => file.messageId === row.id).map((file) => file.fileName),
  }));
}
