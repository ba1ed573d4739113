import { and, eq, inArray } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { carry, groupThing, packTick } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { groupThingsSaveInput } from "@/lib/domain/pack/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { loadLoadSources } from "./load-pieces";

/** The group's things as a whole: lines with an id stay with whoever carries them, the rest is new or goes. */
export async function saveGroupThings({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof groupThingsSaveInput>;
}): Promise<void> {
  const { tripId, things } = parseInput(groupThingsSaveInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "pack.edit", tx);
    const before = (await loadLoadSources(tx, tripId)).things;
    const known = new Set(before.map((row) => row.id));
    const keptIds = things.flatMap((thing) => thing.id ?? []);
    const kept = new Set(keptIds);
    if (kept.size !== keptIds.length || keptIds.some((id) => !known.has(id))) {
      throw new AppError("conflict", "This list changed while you were editing it. Look at it again.");
    }
    const gone = [...known].filter((id) => !kept.has(id));
    if (gone.length > 0) {
      await tx.delete(groupThing).where(and(eq(groupThing.tripId, tripId), inArray(groupThing.id, gone)));
      await tx.delete(carry).where(and(eq(carry.tripId, tripId), inArray(carry.groupThingId, gone)));
      const keys = gone.map((id) => `thing:${id}`);
      await tx.delete(packTick).where(and(eq(packTick.tripId, tripId), inArray(packTick.itemKey, keys)));
    }
    for (const [position, { id, ...line }] of things.entries()) {
      if (id === null) await tx.insert(groupThing).values({ id: newId(), tripId, position, ...line });
      else {
        const own = and(eq(groupThing.id, id), eq(groupThing.tripId, tripId));
        await tx
          .update(groupThing)
          .set({ position, ...line })
          .where(own);
      }
    }
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "pack",
      entityId: tripId,
      summary: "Things of the group",
      isPrinted: true,
    });
  });
}
