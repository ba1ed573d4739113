import { and, eq, inArray } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { packItem, packTick } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { packItemsSaveInput } from "@/lib/domain/pack/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { listPackItemRows, loadPerson } from "./internal";

/** One list as a whole: lines with an id are kept (with their ticks), lines without are new, the rest goes. */
export async function savePackItems({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof packItemsSaveInput>;
}): Promise<void> {
  const { tripId, personId, items } = parseInput(packItemsSaveInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "pack.edit", tx);
    const whose = personId === null ? "everybody" : (await loadPerson(tx, tripId, personId)).name;
    const before = (await listPackItemRows(tx, tripId)).filter((row) => row.personId === personId);
    const known = new Set(before.map((row) => row.id));
    const keptIds = items.flatMap((item) => item.id ?? []);
    const kept = new Set(keptIds);
    if (kept.size !== keptIds.length || keptIds.some((id) => !known.has(id))) {
      throw new AppError("conflict", "This list changed while you were editing it. Look at it again.");
    }
    const gone = before.map((row) => row.id).filter((id) => !kept.has(id));
    if (gone.length > 0) {
      await tx.delete(packItem).where(and(eq(packItem.tripId, tripId), inArray(packItem.id, gone)));
      const keys = gone.map((id) => `item:${id}`);
      await tx.delete(packTick).where(and(eq(packTick.tripId, tripId), inArray(packTick.itemKey, keys)));
    }
    for (const [position, { id, ...line }] of items.entries()) {
      if (id === null) await tx.insert(packItem).values({ id: newId(), tripId, personId, position, ...line });
      else {
        await tx
          .update(packItem)
          .set({ position, ...line })
          .where(and(eq(packItem.id, id), eq(packItem.tripId, tripId)));
      }
    }
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "pack",
      entityId: personId ?? tripId,
      summary: `Pack list of ${whose}`,
      isPrinted: true,
    });
  });
}
