import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { messageTemplate } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { templateRefInput } from "@/lib/domain/post/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

export async function deleteTemplate({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof templateRefInput>;
}): Promise<void> {
  const { tripId, templateId } = parseInput(templateRefInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "post.send", tx);
    const gone = await tx
      .delete(messageTemplate)
      .where(and(eq(messageTemplate.id, templateId), eq(messageTemplate.tripId, tripId)))
      .returning({ id: messageTemplate.id });
    if (gone.length === 0) throw new AppError("not-found", "There is no such template.");
  });
}
