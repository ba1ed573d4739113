import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { packTick } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { packTickInput } from "@/lib/domain/pack/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { listCarryRows, listPackItemRows } from "./internal";
import { loadLoadSources, toShares } from "./load-pieces";

/** On one's own list only. Ticking twice is ticking once. */
export async function tickPackItem({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof packTickInput>;
}): Promise<void> {
  const { tripId, key, isTicked } = parseInput(packTickInput, input);
  await withTransaction(async (tx) => {
    const { personId } = await requirePermission(ctx, tripId, "pack.tick", tx);
    const items = (await listPackItemRows(tx, tripId)).filter(
      (row) => row.personId === null || row.personId === personId,
    );
    const carries = (await listCarryRows(tx, tripId)).filter((row) => row.personId === personId);
    const { splits } = await loadLoadSources(tx, tripId);
    const keys = new Set([
      ...items.map((row) => `item:${row.id}`),
      ...carries.flatMap((row) => toShares(row, splits)).map((share) => share.key),
    ]);
    if (!keys.has(key)) throw new AppError("not-found", "That line is not on your list.");
    const own = and(eq(packTick.personId, personId), eq(packTick.tripId, tripId), eq(packTick.itemKey, key));
    if (!isTicked) await tx.delete(packTick).where(own);
    else {
      await tx
        .insert(packTick)
        .values({ id: newId(), tripId, personId, itemKey: key, tickedAt: new Date() })
        .onConflictDoNothing();
    }
  });
}
