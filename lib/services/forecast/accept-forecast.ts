import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { acceptedForecast, camp } from "@/db/schema";
import { windOfForecast } from "@/lib/domain/forecast/plan-wind";
import { forecastAcceptInput } from "@/lib/domain/forecast/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { findCampState, loadTripState } from "../plan/load-trip-state";
import { recordChange, refuseStale } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { loadForecastRows } from "./internal";

/** Takes the newest forecast of a camp into its plan: wind, its range and the cold. Only ever because somebody says so. */
export async function acceptForecast({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof forecastAcceptInput>;
}): Promise<{ version: number }> {
  const { tripId, campId, forecastId, version } = parseInput(forecastAcceptInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "camp.edit", tx);
    const state = await loadTripState(tx, tripId);
    const own = findCampState(state, campId);
    const latest = (await loadForecastRows(tx, tripId)).fetched.find((row) => row.campId === campId);
    if (!latest) throw new AppError("not-found", "There is no such forecast for this camp.");
    if (latest.id !== forecastId) {
      throw new AppError("conflict", "A newer forecast has come in. Look at it before you accept it.");
    }
    const said = windOfForecast(latest.content, own.camp.days, own.camp.details);
    if (!said.isComplete) throw new AppError("conflict", said.reason);
    const now = new Date();
    const [row] = await tx
      .update(camp)
      .set({ ...said.planned, version: version + 1, updatedAt: now })
      .where(and(eq(camp.id, campId), eq(camp.tripId, tripId), eq(camp.version, version)))
      .returning({ version: camp.version });
    if (!row) {
      return refuseStale(tx, {
        trip: state.trip,
        entityId: campId,
        what: own.camp.details.name,
        current: { version: own.camp.version, details: own.camp.details },
      });
    }
    const accepted = {
      tripId,
      forecastId,
      content: latest.content,
      acceptedByName: ctx.actor.name,
      acceptedAt: now,
    };
    await tx
      .insert(acceptedForecast)
      .values({ campId, ...accepted })
      .onConflictDoUpdate({ target: acceptedForecast.campId, set: accepted });
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "camp",
      entityId: campId,
      summary: `${own.camp.details.name}: wind of the forecast${latest.content.isSample ? " (sample data)" : ""}`,
      isPrinted: true,
    });
    return row;
  });
}
