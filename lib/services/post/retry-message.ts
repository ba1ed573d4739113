import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { outboxMessage } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { messageRefInput } from "@/lib/domain/post/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

/** Tries a message again now: one that failed, or one that waits for its next turn. */
export async function retryMessage({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof messageRefInput>;
}): Promise<void> {
  const { tripId, messageId } = parseInput(messageRefInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "post.send", tx);
    const scope = and(eq(outboxMessage.id, messageId), eq(outboxMessage.tripId, tripId));
    const [row] = await tx.select({ state: outboxMessage.state }).from(outboxMessage).where(scope);
    if (!row) throw new AppError("not-found", "There is no such message.");
    if (row.state === "sent") throw new AppError("conflict", "This message has been sent already.");
    if (row.state === "sending") return;
    await tx.update(outboxMessage).set({ state: "waiting", attempts: 0, nextAttemptAt: new Date() }).where(scope);
  });
}
