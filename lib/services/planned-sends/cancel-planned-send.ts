import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { plannedSend } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { plannedSendRefInput } from "@/lib/domain/post/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

export async function cancelPlannedSend({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof plannedSendRefInput>;
}): Promise<void> {
  const { tripId, plannedSendId } = parseInput(plannedSendRefInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "post.send", tx);
    const scope = and(eq(plannedSend.id, plannedSendId), eq(plannedSend.tripId, tripId));
    const [row] = await tx.select({ state: plannedSend.state }).from(plannedSend).where(scope);
    if (!row) throw new AppError("not-found", "There is no such message.");
    if (row.state !== "planned") throw new AppError("conflict", "It is not waiting any more.");
    await tx.update(plannedSend).set({ state: "cancelled" }).where(scope);
  });
}
