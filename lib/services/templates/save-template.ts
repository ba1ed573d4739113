import { count, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { messageTemplate } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { newId } from "@/lib/domain/ids";
import { templateInput } from "@/lib/domain/post/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

const MOST = 30;

/** Keeps words for this trip; the same name again takes the place of the old ones. */
export async function saveTemplate({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof templateInput>;
}): Promise<void> {
  const { tripId, name, subject, body } = parseInput(templateInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "post.send", tx);
    const rows = await tx.select().from(messageTemplate).where(eq(messageTemplate.tripId, tripId));
    const now = new Date();
    const known = rows.find((row) => row.name.toLowerCase() === name.toLowerCase());
    if (known) {
      const change = { name, subject, body, updatedAt: now };
      await tx.update(messageTemplate).set(change).where(eq(messageTemplate.id, known.id));
      return;
    }
    const [total] = await tx.select({ count: count() }).from(messageTemplate).where(eq(messageTemplate.tripId, tripId));
    if ((total?.count ?? 0) >= MOST) {
      throw new AppError("conflict", `A trip keeps at most ${MOST} templates. Delete one first.`);
    }
    await tx
      .insert(messageTemplate)
      .values({ id: newId(), tripId, name, subject, body, createdAt: now, updatedAt: now });
  });
}
