import { eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { roster } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { rosterInput } from "@/lib/domain/roster/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { loadTripRow, recordChange, refuseStale } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { fillPlaces, loadRosterSettings } from "./internal";

/** Places, the last day for an answer, reminders, and how long details are kept. New places go to who waits. */
export async function updateRoster({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof rosterInput>;
}): Promise<void> {
  const { tripId, version, ...settings } = parseInput(rosterInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "people.edit", tx);
    const trip = await loadTripRow(tx, tripId);
    const current = await loadRosterSettings(tx, tripId);
    if (current.version !== version) {
      await refuseStale(tx, { trip, entityId: `roster ${tripId}`, what: "the answers and places", current });
    }
    if (settings.answerBy !== null && settings.answerBy > trip.startDate) {
      const sentence = "The last day for an answer can't be after the trip begins.";
      throw new AppError("bad-input", sentence, { fieldErrors: { answerBy: [sentence] } });
    }
    const row = { ...settings, version: version + 1, updatedAt: new Date() };
    await tx
      .insert(roster)
      .values({ tripId, ...row })
      .onConflictDoUpdate({ target: roster.tripId, set: row, setWhere: eq(roster.version, version) });
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "person",
      entityId: `roster ${tripId}`,
      summary: "answers and places",
      isPrinted: false,
    });
    await fillPlaces(tx, trip);
  });
}
