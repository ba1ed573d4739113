import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { kitItem } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { kitItemCreateInput, MAX_KIT_ITEMS } from "@/lib/domain/kit/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { listKitRows } from "./internal";

/** From a built-in anchor, from somebody's own gear or from scratch: the details say it all. */
export async function createKitItem({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof kitItemCreateInput>;
}): Promise<{ kitItemId: string }> {
  const { tripId, details } = parseInput(kitItemCreateInput, input);
  const kitItemId = newId();
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "kit.edit", tx);
    const items = await listKitRows(tx, tripId);
    if (items.length >= MAX_KIT_ITEMS) {
      throw new AppError("bad-input", `A kit can have at most ${MAX_KIT_ITEMS} kinds of things.`);
    }
    const now = new Date();
    const position = Math.max(-1, ...items.map((one) => one.position)) + 1;
    await tx.insert(kitItem).values({ id: kitItemId, tripId, position, details, createdAt: now, updatedAt: now });
    await recordChange(tx, ctx, {
      tripId,
      action: "create",
      entity: "kit",
      entityId: kitItemId,
      summary: details.name,
      isPrinted: true,
    });
  });
  return { kitItemId };
}
