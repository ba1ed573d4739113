import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { sleeper } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { sleepersSaveInput } from "@/lib/domain/shelter/schema";
import { AppError } from "@/lib/errors";
import { plural } from "@/lib/format/words";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { findCampState, loadTripState } from "../plan/load-trip-state";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";

/** Who sleeps where at a camp, all at once; whoever isn't named has no place yet. */
export async function saveSleepers({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof sleepersSaveInput>;
}): Promise<void> {
  const { tripId, campId, sleepers } = parseInput(sleepersSaveInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "shelter.pitch", tx);
    const state = await loadTripState(tx, tripId);
    const { camp, pitches } = findCampState(state, campId);
    const people = new Set(state.people.map((one) => one.id));
    if (sleepers.some((one) => !people.has(one.personId))) {
      throw new AppError("bad-input", "Somebody here is not on this trip.", {
        fieldErrors: { sleepers: ["Somebody here is not on this trip. Load the page again."] },
      });
    }
    const pitchIds = new Set(pitches.map((one) => one.id));
    if (sleepers.some((one) => one.pitchId !== null && !pitchIds.has(one.pitchId))) {
      throw new AppError("bad-input", "A shelter here is not pitched at this camp.", {
        fieldErrors: { sleepers: ["A shelter here is not pitched at this camp. Load the page again."] },
      });
    }
    for (const pitch of pitches) {
      const count = sleepers.filter((one) => one.pitchId === pitch.id).length;
      if (count <= pitch.sleeps) continue;
      const message = `${pitch.name} sleeps ${plural(pitch.sleeps, "person", "people")}; ${count} are placed there.`;
      throw new AppError("bad-input", message, { fieldErrors: { sleepers: [message] } });
    }
    await tx.delete(sleeper).where(and(eq(sleeper.campId, campId), eq(sleeper.tripId, tripId)));
    if (sleepers.length > 0) {
      await tx.insert(sleeper).values(sleepers.map((one) => ({ id: newId(), tripId, campId, ...one })));
    }
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "sleepers",
      entityId: campId,
      summary: `${camp.details.name}: who sleeps where`,
      isPrinted: true,
    });
  });
}
