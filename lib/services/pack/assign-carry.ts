import { eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { carry } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { carrySaveInput } from "@/lib/domain/pack/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadTripState, type TripState } from "../plan/load-trip-state";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";

export type Load = z.output<typeof carrySaveInput>["carries"][number];

function refuse(message: string): never {
  throw new AppError("bad-input", message, { fieldErrors: { carries: [message] } });
}

/** Nothing is carried twice, and no more of a thing than there is. */
function requireFits(state: TripState, loads: readonly Load[]): void {
  const people = new Set(state.people.map((one) => one.id));
  if (loads.some((load) => !people.has(load.personId))) refuse("Somebody here is not on this trip.");
  const shelterIds = loads.flatMap((load) => (load.type === "shelter" ? load.shelterId : []));
  if (new Set(shelterIds).size !== shelterIds.length) refuse("A shelter is given to two people.");
  if (shelterIds.some((id) => !state.shelters.some((one) => one.id === id)))
    refuse("A shelter here is not on this trip.");
  const counts = new Map<string, number>();
  for (const load of loads) {
    if (load.type === "kit") counts.set(load.kitItemId, (counts.get(load.kitItemId) ?? 0) + load.count);
  }
  for (const [id, count] of counts) {
    const item = state.kit.find((one) => one.id === id);
    if (!item) refuse("A thing here is not in this trip's kit.");
    if (count > item.details.count) {
      refuse(`There are only ${item.details.count} of ${item.details.name}; ${count} are given out.`);
    }
  }
}

export async function writeLoads(
  tx: Transaction,
  ctx: Context,
  state: TripState,
  loads: readonly Load[],
): Promise<void> {
  requireFits(state, loads);
  const tripId = state.trip.id;
  await tx.delete(carry).where(eq(carry.tripId, tripId));
  if (loads.length > 0) {
    await tx.insert(carry).values(
      loads.map((load) => ({
        id: newId(),
        tripId,
        personId: load.personId,
        shelterId: load.type === "shelter" ? load.shelterId : null,
        kitItemId: load.type === "kit" ? load.kitItemId : null,
        count: load.type === "kit" ? load.count : 1,
      })),
    );
  }
  await recordChange(tx, ctx, {
    tripId,
    action: "update",
    entity: "pack",
    entityId: tripId,
    summary: "Who carries what",
    isPrinted: true,
  });
}

/** Who carries which of the group's gear, all at once. */
export async function assignCarry({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof carrySaveInput>;
}): Promise<void> {
  const { tripId, carries } = parseInput(carrySaveInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "pack.edit", tx);
    await writeLoads(tx, ctx, await loadTripState(tx, tripId), carries);
  });
}
