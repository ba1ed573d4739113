import { getDb, withTransaction, type Transaction } from "@/db/client";
import type { Context } from "@/lib/services/context/context";
import { isHandedOut, recordChange } from "../trips/internal";

/** Inside the transaction in which somebody is shown them. */
export async function recordHandOut(tx: Transaction, ctx: Context, tripId: string): Promise<void> {
  if (await isHandedOut(tx, tripId)) return;
  await recordChange(tx, ctx, {
    tripId,
    action: "hand-out",
    entity: "trip",
    entityId: tripId,
    summary: "Papers as they are now",
    isPrinted: false,
  });
}

/** Before papers are put together: from here on a change makes a new version of them. Once per version is enough. */
export async function markHandedOut(ctx: Context, tripId: string): Promise<void> {
  if (await isHandedOut(getDb(), tripId)) return;
  await withTransaction((tx) => recordHandOut(tx, ctx, tripId));
}
