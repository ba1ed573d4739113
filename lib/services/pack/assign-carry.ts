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
import { listPieces, loadLoadSources, toShares, type LoadSources } from "./load-pieces";

export type Load = z.output<typeof carrySaveInput>["carries"][number];

function refuse(message: string): never {
  throw new AppError("bad-input", message, { fieldErrors: { carries: [message] } });
}

type CarryValues = Omit<typeof carry.$inferSelect, "id" | "tripId">;

function toRow(load: Load): CarryValues {
  const { personId, isFixed } = load;
  const none = { personId, isFixed, shelterId: null, part: null, kitItemId: null, groupThingId: null, count: 1 };
  switch (load.type) {
    case "shelter":
      return { ...none, shelterId: load.shelterId, part: load.part };
    case "kit":
      return { ...none, kitItemId: load.kitItemId, count: load.count };
    case "thing":
      return { ...none, groupThingId: load.thingId };
  }
}

const MISSING: Readonly<Record<Load["type"], string>> = {
  shelter: "A shelter here, or a part of it, is not on this trip.",
  kit: "A thing here is not in this trip's kit.",
  thing: "A thing here is not among the group's things.",
};

/** Nothing is carried twice, and no more of a thing than there is. */
function requireFits(state: TripState, sources: LoadSources, loads: readonly Load[]): void {
  const people = new Set(state.people.map((one) => one.id));
  const pieces = new Map(listPieces(state, sources).map((piece) => [piece.key, piece]));
  const given = new Map<string, number>();
  for (const load of loads) {
    if (!people.has(load.personId)) refuse("Somebody here is not on this trip.");
    const shares = toShares({ ...toRow(load), id: "", tripId: state.trip.id }, sources.splits);
    if (shares.length === 0) refuse(MISSING[load.type]);
    for (const { key, count } of shares) {
      if (!pieces.has(key)) refuse(MISSING[load.type]);
      given.set(key, (given.get(key) ?? 0) + count);
    }
  }
  for (const [key, count] of given) {
    const piece = pieces.get(key);
    if (!piece || count <= piece.count) continue;
    refuse(
      piece.count === 1
        ? `${piece.name} is given to two people.`
        : `There are only ${piece.count} of ${piece.name}; ${count} are given out.`,
    );
  }
}

export async function writeLoads(
  tx: Transaction,
  ctx: Context,
  state: TripState,
  loads: readonly Load[],
): Promise<void> {
  const tripId = state.trip.id;
  requireFits(state, await loadLoadSources(tx, tripId), loads);
  await tx.delete(carry).where(eq(carry.tripId, tripId));
  if (loads.length > 0) {
    await tx.insert(carry).values(loads.map((load) => ({ ...toRow(load), id: newId(), tripId })));
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
