import type { z } from "zod";
import { getDb } from "@/db/client";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { CarryPlanView } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { listCarryRows } from "./internal";

/** Who carries what of the group's gear, and what nobody carries yet. */
export async function getCarryPlan({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<CarryPlanView> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "pack.edit");
  const db = getDb();
  const state = await loadTripState(db, tripId);
  const rows = await listCarryRows(db, tripId);
  const shelters = state.shelters.map(({ id, name, massKg }) => ({
    id,
    name,
    massKg,
    carrierId: rows.find((row) => row.shelterId === id)?.personId ?? null,
  }));
  const kitItems = state.kit.map(({ id, details }) => {
    const carriers = rows.filter((row) => row.kitItemId === id).map(({ personId, count }) => ({ personId, count }));
    const carried = carriers.reduce((sum, one) => sum + one.count, 0);
    const leftCount = Math.max(0, details.count - carried);
    return { id, name: details.name, massKgEach: details.massKg, count: details.count, carriers, leftCount };
  });
  const people = state.people.map(({ id, name }) => ({
    id,
    name,
    massKg:
      shelters.reduce((sum, one) => sum + (one.carrierId === id ? (one.massKg ?? 0) : 0), 0) +
      kitItems.reduce(
        (sum, one) =>
          sum +
          one.massKgEach * one.carriers.reduce((count, each) => count + (each.personId === id ? each.count : 0), 0),
        0,
      ),
  }));
  return { people, shelters, kitItems };
}
