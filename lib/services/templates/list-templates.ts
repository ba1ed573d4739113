import { asc, eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { messageTemplate } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { OUR_TEMPLATES, type TemplateView } from "@/lib/domain/post/fill-template";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

/** The trip's own, then ours. */
export async function listTemplates({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<TemplateView[]> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "post.send");
  const rows = await getDb()
    .select()
    .from(messageTemplate)
    .where(eq(messageTemplate.tripId, tripId))
    .orderBy(asc(messageTemplate.name));
  return [...rows.map(({ id, name, subject, body }) => ({ id, name, subject, body })), ...OUR_TEMPLATES];
}
