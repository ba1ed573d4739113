import { and, count, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { pitch, placement, sleeper } from "@/db/schema";
import { pitchDeleteInput } from "@/lib/domain/shelter/schema";
import { plural } from "@/lib/format/words";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow } from "../camps/internal";
import { amendPlacements } from "../plan/internal";
import { loadShelterRow } from "../shelters/internal";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { requireConfirmed } from "../trips/require-confirmed";
import { loadPitchRow } from "./internal";

async function listPitchDependents(tx: Transaction, tripId: string, pitchId: string): Promise<string[]> {
  const [placed] = await tx
    .select({ count: count() })
    .from(placement)
    .where(and(eq(placement.tripId, tripId), eq(placement.pitchId, pitchId)));
  const [sleeping] = await tx
    .select({ count: count() })
    .from(sleeper)
    .where(and(eq(sleeper.tripId, tripId), eq(sleeper.pitchId, pitchId)));
  const sentences: string[] = [];
  if (placed && placed.count > 0) sentences.push(`Its staking plan has ${plural(placed.count, "anchor")} set.`);
  if (sleeping && sleeping.count > 0) {
    sentences.push(`${plural(sleeping.count, "person sleeps", "people sleep")} in it.`);
  }
  return sentences;
}

/** Takes a shelter down at one camp; its anchors go back to the tray and its sleepers have no place. */
export async function deletePitch({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof pitchDeleteInput>;
}): Promise<void> {
  const { tripId, campId, pitchId, confirmed } = parseInput(pitchDeleteInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "shelter.pitch", tx);
    const row = await loadPitchRow(tx, { tripId, campId, pitchId });
    const shelter = await loadShelterRow(tx, tripId, row.shelterId);
    const camp = await loadCampRow(tx, tripId, campId);
    requireConfirmed(confirmed, shelter.name, await listPitchDependents(tx, tripId, pitchId));
    await amendPlacements(tx, ctx, tripId, (one) => (one.pitchId === pitchId ? null : one));
    await tx.delete(pitch).where(and(eq(pitch.id, pitchId), eq(pitch.tripId, tripId), eq(pitch.campId, campId)));
    await recordChange(tx, ctx, {
      tripId,
      action: "delete",
      entity: "pitch",
      entityId: pitchId,
      summary: `${shelter.name} at ${camp.name}`,
      isPrinted: true,
    });
  });
}
