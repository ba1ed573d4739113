import { eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { emergencyPlan } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { emergencyPlanInput } from "@/lib/domain/emergency/schema";
import { instantOf, minuteOfDay } from "@/lib/format/days";
import type { Context } from "@/lib/services/context/context";
import { loadTripRow, recordChange, refuseStale } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { loadEmergencyPlan, toEmergencyView } from "./internal";

export async function saveEmergencyPlan({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof emergencyPlanInput>;
}): Promise<void> {
  const { tripId, version, dueBackDay, dueBackTime, steps, ...texts } = parseInput(emergencyPlanInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "emergency.edit", tx);
    const trip = await loadTripRow(tx, tripId);
    const known = await loadEmergencyPlan(tx, tripId);
    if (known.version !== version) {
      const current = toEmergencyView(known, trip);
      await refuseStale(tx, { trip, entityId: `emergency ${tripId}`, what: "the emergency plan", current });
    }
    const row = {
      ...texts,
      dueBackAt: dueBackDay === "" ? null : instantOf(dueBackDay, minuteOfDay(dueBackTime), trip.timeZone),
      steps: [...steps].sort((a, b) => a.afterMinutes - b.afterMinutes),
      version: version + 1,
      backAt: null,
      updatedAt: new Date(),
    };
    await tx
      .insert(emergencyPlan)
      .values({ tripId, ...row })
      .onConflictDoUpdate({ target: emergencyPlan.tripId, set: row, setWhere: eq(emergencyPlan.version, version) });
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "trip",
      entityId: `emergency ${tripId}`,
      summary: "emergency plan",
      isPrinted: false,
    });
  });
}
