import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { comment } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { commentRefInput } from "@/lib/domain/comment/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";

/** One's own comment; the leader may take away any. */
export async function deleteComment({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof commentRefInput>;
}): Promise<void> {
  const { tripId, commentId } = parseInput(commentRefInput, input);
  await withTransaction(async (tx) => {
    const { role } = await requirePermission(ctx, tripId, "comment.write", tx);
    const own = and(eq(comment.id, commentId), eq(comment.tripId, tripId));
    const [row] = await tx.select().from(comment).where(own).limit(1);
    if (!row) throw new AppError("not-found", "That comment is not there any more.");
    if (role !== "leader" && row.userId !== ctx.actor.userId) {
      throw new AppError("forbidden", "Only its writer or the leader can delete a comment.");
    }
    await tx.delete(comment).where(own);
    await recordChange(tx, ctx, {
      tripId,
      action: "delete",
      entity: "comment",
      entityId: row.campId ?? row.shelterId ?? row.id,
      summary: `Comment of ${row.userName}`,
      isPrinted: false,
    });
  });
}
