import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { pitch, shelter } from "@/db/schema";
import { shelterDeleteInput } from "@/lib/domain/shelter/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { amendPlacements } from "../plan/internal";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { requireConfirmed } from "../trips/require-confirmed";
import { listShelterDependents } from "./find-shelter-dependents";
import { loadShelterRow } from "./internal";

export async function deleteShelter({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof shelterDeleteInput>;
}): Promise<void> {
  const { tripId, shelterId, confirmed } = parseInput(shelterDeleteInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "shelter.edit", tx);
    const row = await loadShelterRow(tx, tripId, shelterId);
    requireConfirmed(confirmed, row.name, await listShelterDependents(tx, tripId, shelterId));
    const pitches = await tx
      .select({ id: pitch.id })
      .from(pitch)
      .where(and(eq(pitch.tripId, tripId), eq(pitch.shelterId, shelterId)));
    const gone = new Set(pitches.map((one) => one.id));
    await amendPlacements(tx, ctx, tripId, (placement) => (gone.has(placement.pitchId) ? null : placement));
    await tx.delete(shelter).where(and(eq(shelter.id, shelterId), eq(shelter.tripId, tripId)));
    await recordChange(tx, ctx, {
      tripId,
      action: "delete",
      entity: "shelter",
      entityId: shelterId,
      summary: row.name,
      isPrinted: true,
    });
  });
}
