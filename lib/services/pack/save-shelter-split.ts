import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { shelterSplit } from "@/db/schema";
import { shelterSplitSaveInput } from "@/lib/domain/pack/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadShelterRow } from "../shelters/internal";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";

/** How a shelter is taken apart for carrying, and whether its sleepers carry it. */
export async function saveShelterSplit({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof shelterSplitSaveInput>;
}): Promise<void> {
  const { tripId, shelterId, ...values } = parseInput(shelterSplitSaveInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "pack.edit", tx);
    const { name, massKg } = await loadShelterRow(tx, tripId, shelterId);
    if (values.polesMassKg !== null && massKg !== null && values.polesMassKg >= massKg) {
      const message = `The poles can't weigh as much as all of ${name}.`;
      throw new AppError("bad-input", message, { fieldErrors: { polesMassKg: [message] } });
    }
    await tx
      .insert(shelterSplit)
      .values({ tripId, shelterId, ...values })
      .onConflictDoUpdate({ target: shelterSplit.shelterId, set: values });
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "pack",
      entityId: shelterId,
      summary: `How ${name} is carried`,
      isPrinted: true,
    });
  });
}
