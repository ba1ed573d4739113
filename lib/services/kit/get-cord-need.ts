import type { z } from "zod";
import { getDb } from "@/db/client";
import { listCord } from "@/lib/calc/cord";
import type { CordView } from "@/lib/domain/kit/cord-view";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadTripState, type TripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";

export function toCordShelters(state: TripState) {
  return state.shelters.map(({ id, name }) => ({
    name,
    pitches: state.camps.flatMap(({ pitches }) => pitches.filter((one) => one.shelterId === id).map((one) => one.spec)),
  }));
}

/** Lines and shock cords that the plans need, and what the kit has of them. */
export async function getCordNeed({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<CordView> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "camp.read");
  const state = await loadTripState(getDb(), tripId);
  return {
    ...listCord(toCordShelters(state)),
    shockCordsUsed: Math.max(
      0,
      ...state.camps.map(({ placements }) => placements.filter((placement) => placement.shockCord).length),
    ),
    shockCordsOwned: state.shockCordCount,
    ownedM: state.kit.reduce(
      (sum, { details }) => sum + (details.type === "cord" ? details.lengthM * details.count : 0),
      0,
    ),
  };
}
