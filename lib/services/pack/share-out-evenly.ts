import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { shareOutByMass } from "@/lib/domain/pack/share-out";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { writeLoads, type Load } from "./assign-carry";

/** All shelters and the whole kit among everybody on the trip, by mass; a shelter of unknown mass counts as none. */
export async function shareOutEvenly({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<void> {
  const { tripId } = parseInput(tripRefInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "pack.edit", tx);
    const state = await loadTripState(tx, tripId);
    const shelters = new Set(state.shelters.map((one) => one.id));
    const things = [
      ...state.shelters.map(({ id, massKg }) => ({ id, massKg: massKg ?? 0, count: 1 })),
      ...state.kit.map(({ id, details }) => ({ id, massKg: details.massKg, count: details.count })),
    ];
    const people = state.people.map((one) => one.id);
    const loads = shareOutByMass(people, things).map(({ personId, thingId, count }): Load =>
      shelters.has(thingId)
        ? { type: "shelter", personId, shelterId: thingId }
        : { type: "kit", personId, kitItemId: thingId, count },
    );
    await writeLoads(tx, ctx, state, loads);
  });
}
