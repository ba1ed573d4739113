import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { camp } from "@/db/schema";
import { campReorderInput } from "@/lib/domain/camp/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { listCampRows } from "./internal";

/** The new order names every camp of the trip exactly once, so that none can get lost. */
export async function reorderCamps({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campReorderInput>;
}): Promise<void> {
  const { tripId, campIds } = parseInput(campReorderInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "camp.arrange", tx);
    const camps = await listCampRows(tx, tripId);
    const own = new Set(camps.map((one) => one.id));
    const isComplete =
      campIds.length === own.size && new Set(campIds).size === own.size && campIds.every((id) => own.has(id));
    if (!isComplete) {
      throw new AppError("conflict", "The camps changed while you were ordering them. Look at them again.", {
        details: { current: camps.map((one) => one.id) },
      });
    }
    for (const [position, id] of campIds.entries()) {
      await tx
        .update(camp)
        .set({ position })
        .where(and(eq(camp.id, id), eq(camp.tripId, tripId)));
    }
    await recordChange(tx, ctx, {
      tripId,
      action: "reorder",
      entity: "trip",
      entityId: tripId,
      summary: "Order of the camps",
      isPrinted: true,
    });
  });
}
