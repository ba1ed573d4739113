import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { kitItem } from "@/db/schema";
import { kitItemUpdateInput, type KitItemDetails } from "@/lib/domain/kit/schema";
import { AppError } from "@/lib/errors";
import { plural } from "@/lib/format/words";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { nameCamps } from "../camps/internal";
import { listPlacementRows } from "../plan/internal";
import { loadTripRow, recordChange, refuseStale } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { countShockCordUses, countUses } from "./count-uses";
import { listKitRows, loadKitRow, type KitRow } from "./internal";
import { countShockCords } from "./to-tray";

function refuseField(field: string, message: string): never {
  throw new AppError("bad-input", message, { fieldErrors: { [field]: [message] } });
}

/** A count can't fall below what a plan has placed already. */
async function requireEnough(tx: Transaction, tripId: string, before: KitRow, details: KitItemDetails): Promise<void> {
  const placements = await listPlacementRows(tx, tripId);
  const names = await nameCamps(tx, tripId);
  for (const use of countUses(placements, before.id)) {
    const place = names.get(use.campId) ?? "a camp";
    if (details.type !== "anchor") {
      refuseField(
        "details.type",
        `${plural(use.pieces, "piece is", "pieces are")} placed at ${place}. Lift them first.`,
      );
    }
    if (details.count < use.pieces) {
      refuseField("details.count", `${use.pieces} of them are placed at ${place}. Lift some first.`);
    }
  }
  if (before.details.type !== "shock-cord") return;
  const others = (await listKitRows(tx, tripId)).filter((row) => row.id !== before.id);
  const left = countShockCords(others) + (details.type === "shock-cord" ? details.count : 0);
  for (const [campId, used] of countShockCordUses(placements)) {
    if (used > left)
      refuseField("details.count", `${used} shock cords are in use at ${names.get(campId) ?? "a camp"}.`);
  }
}

export async function updateKitItem({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof kitItemUpdateInput>;
}): Promise<{ version: number }> {
  const { tripId, kitItemId, version, details } = parseInput(kitItemUpdateInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "kit.edit", tx);
    const before = await loadKitRow(tx, tripId, kitItemId);
    await requireEnough(tx, tripId, before, details);
    const [row] = await tx
      .update(kitItem)
      .set({ details, version: version + 1, updatedAt: new Date() })
      .where(and(eq(kitItem.id, kitItemId), eq(kitItem.tripId, tripId), eq(kitItem.version, version)))
      .returning({ version: kitItem.version });
    if (!row) {
      return refuseStale(tx, {
        trip: await loadTripRow(tx, tripId),
        entityId: kitItemId,
        what: before.details.name,
        current: { version: before.version, details: before.details },
      });
    }
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "kit",
      entityId: kitItemId,
      summary: details.name,
      isPrinted: true,
    });
    return row;
  });
}
