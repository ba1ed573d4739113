import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { trip } from "@/db/schema";
import { tripUpdateInput } from "@/lib/domain/trip/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { countNights, listCampRows } from "../camps/internal";
import { loadTripRow, recordChange, refuseStale, toTripView } from "./internal";
import { parseInput } from "./parse-input";

export async function updateTrip({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripUpdateInput>;
}): Promise<{ version: number }> {
  const { tripId, version, ...details } = parseInput(tripUpdateInput, input);
  return withTransaction(async (tx) => {
    const { role } = await requirePermission(ctx, tripId, "trip.edit", tx);
    const changed = await tx
      .update(trip)
      .set({ ...details, version: version + 1 })
      .where(and(eq(trip.id, tripId), eq(trip.version, version)))
      .returning({ version: trip.version });
    const [row] = changed;
    if (!row) {
      const current = await loadTripRow(tx, tripId);
      const nights = countNights(await listCampRows(tx, tripId));
      return refuseStale(tx, {
        trip: current,
        entityId: tripId,
        what: "this trip",
        current: toTripView(current, role, nights),
      });
    }
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "trip",
      entityId: tripId,
      summary: details.name,
      isPrinted: true,
    });
    return row;
  });
}
