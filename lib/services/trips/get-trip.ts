import { and, eq, sum } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { camp } from "@/db/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { TripView } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { isInLine } from "../camps/internal";
import { loadTripRow, toTripView } from "./internal";
import { parseInput } from "./parse-input";

export async function getTrip({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<TripView> {
  const { tripId } = parseInput(tripRefInput, input);
  const { role } = await requirePermission(ctx, tripId, "trip.read");
  const db = getDb();
  const row = await loadTripRow(db, tripId);
  const [total] = await db
    .select({ nights: sum(camp.nights).mapWith(Number) })
    .from(camp)
    .where(and(eq(camp.tripId, tripId), isInLine));
  return toTripView(row, role, total?.nights ?? 0);
}
