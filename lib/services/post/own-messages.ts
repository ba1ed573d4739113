import { and, desc, eq, inArray, isNull } from "drizzle-orm";
import type { z } from "zod";
import { getDb, withTransaction } from "@/db/client";
import { outboxAttachment, outboxMessage } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { OwnMessageView } from "@/lib/domain/people-views";
import { messageRefInput } from "@/lib/domain/post/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

/** What the leader wrote: links that sign people in are not among it. */
const SHOWN = ["papers", "calendar", "place"];

/** What was sent to oneself on this trip, newest first. */
export async function listOwnMessages({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<OwnMessageView[]> {
  const { tripId } = parseInput(tripRefInput, input);
  const { personId } = await requirePermission(ctx, tripId, "answer.own");
  const rows = await getDb()
    .select()
    .from(outboxMessage)
    .where(
      and(
        eq(outboxMessage.tripId, tripId),
        eq(outboxMessage.personId, personId),
        inArray(outboxMessage.kind, SHOWN),
        eq(outboxMessage.state, "sent"),
      ),
    )
    .orderBy(desc(outboxMessage.createdAt))
    .limit(100);
  const files = await getDb()
    .select({ messageId: outboxAttachment.messageId, fileName: outboxAttachment.fileName })
    .from(outboxAttachment)
    .where(
      inArray(
        outboxAttachment.messageId,
        rows.map((row) => row.id),
      ),
    );
  return rows.map((row) => ({
    id: row.id,
    subject: row.subject,
    text: row.text.split("\n-- \n")[0]?.trim() ?? "",
    sentAt: (row.sentAt ?? row.createdAt).toISOString(),
    readAt: row.readAt?.toISOString() ?? null,
    files: files.filter((file) => file.messageId === row.id).map((file) => file.fileName),
  }));
}

/** Somebody says that they have read a message; nothing else ever does. */
export async function markMessageRead({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof messageRefInput>;
}): Promise<void> {
  const { tripId, messageId } = parseInput(messageRefInput, input);
  await withTransaction(async (tx) => {
    const { personId } = await requirePermission(ctx, tripId, "answer.own", tx);
    const own = and(
      eq(outboxMessage.id, messageId),
      eq(outboxMessage.tripId, tripId),
      eq(outboxMessage.personId, personId),
      inArray(outboxMessage.kind, SHOWN),
    );
    const [row] = await tx.select({ readAt: outboxMessage.readAt }).from(outboxMessage).where(own);
    if (!row) throw new AppError("not-found", "There is no such message.");
    await tx
      .update(outboxMessage)
      .set({ readAt: new Date() })
      .where(and(own, isNull(outboxMessage.readAt)));
  });
}
