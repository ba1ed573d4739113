import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { kitItem } from "@/db/schema";
import { kitItemDeleteInput } from "@/lib/domain/kit/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { amendPlacements } from "../plan/internal";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { requireConfirmed } from "../trips/require-confirmed";
import { listKitItemDependents } from "./find-kit-item-dependents";
import { listKitRows, loadKitRow } from "./internal";
import { countShockCords } from "./to-tray";

/** With it go its placements, as a first anchor or a second one in line, and shock cords that are no longer there. */
export async function deleteKitItem({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof kitItemDeleteInput>;
}): Promise<void> {
  const { tripId, kitItemId, confirmed } = parseInput(kitItemDeleteInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "kit.edit", tx);
    const row = await loadKitRow(tx, tripId, kitItemId);
    requireConfirmed(confirmed, row.details.name, await listKitItemDependents(tx, tripId, kitItemId));
    const cordsLeft = countShockCords((await listKitRows(tx, tripId)).filter((one) => one.id !== kitItemId));
    const cordsUsed = new Map<string, number>();
    await amendPlacements(tx, ctx, tripId, (one, campId) => {
      if (one.anchorId === kitItemId) return null;
      if (one.tandem?.anchorId === kitItemId) return { ...one, tandem: null };
      if (row.details.type !== "shock-cord" || !one.shockCord) return one;
      const used = (cordsUsed.get(campId) ?? 0) + 1;
      cordsUsed.set(campId, used);
      return used > cordsLeft ? { ...one, shockCord: false } : one;
    });
    await tx.delete(kitItem).where(and(eq(kitItem.id, kitItemId), eq(kitItem.tripId, tripId)));
    await recordChange(tx, ctx, {
      tripId,
      action: "delete",
      entity: "kit",
      entityId: kitItemId,
      summary: row.details.name,
      isPrinted: true,
    });
  });
}
