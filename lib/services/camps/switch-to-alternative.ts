import { and, eq, ne } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { camp } from "@/db/schema";
import { campRefInput } from "@/lib/domain/camp/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { loadCampRow } from "./internal";

/** The alternative takes the nights; the camp that had them stands by for it, and so do its other alternatives. */
export async function switchToAlternative({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campRefInput>;
}): Promise<{ name: string; replaced: string }> {
  const { tripId, campId } = parseInput(campRefInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "camp.edit", tx);
    const next = await loadCampRow(tx, tripId, campId);
    if (next.alternativeToId === null) {
      throw new AppError("conflict", `${next.name} is in the line of nights already. Load the page again.`);
    }
    const main = await loadCampRow(tx, tripId, next.alternativeToId);
    const now = new Date();
    await tx
      .update(camp)
      .set({ alternativeToId: null, position: main.position, nights: main.nights, updatedAt: now })
      .where(and(eq(camp.id, next.id), eq(camp.tripId, tripId)));
    await tx
      .update(camp)
      .set({ alternativeToId: next.id })
      .where(and(eq(camp.tripId, tripId), eq(camp.alternativeToId, main.id), ne(camp.id, next.id)));
    await tx
      .update(camp)
      .set({ alternativeToId: next.id, updatedAt: now })
      .where(and(eq(camp.id, main.id), eq(camp.tripId, tripId)));
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "camp",
      entityId: next.id,
      summary: `${next.name} in place of ${main.name}`,
      isPrinted: true,
    });
    return { name: next.name, replaced: main.name };
  });
}
