import { and, desc, eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { planIntent } from "@/db/schema";
import { campRefInput } from "@/lib/domain/camp/schema";
import type { PlanHistoryEntry } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { describePlanChange } from "./describe-plan-change";
import { findCampState, loadTripState } from "./load-trip-state";

const MAX_ENTRIES = 100;

/** The last changes of a camp's plan, newest first. */
export async function listPlanHistory({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campRefInput>;
}): Promise<PlanHistoryEntry[]> {
  const { tripId, campId } = parseInput(campRefInput, input);
  await requirePermission(ctx, tripId, "plan.read");
  const db = getDb();
  const camp = findCampState(await loadTripState(db, tripId), campId);
  const rows = await db
    .select()
    .from(planIntent)
    .where(and(eq(planIntent.campId, campId), eq(planIntent.tripId, tripId)))
    .orderBy(desc(planIntent.resultVersion), desc(planIntent.createdAt))
    .limit(MAX_ENTRIES);
  return rows.map((row) => ({
    intentId: row.id,
    planVersion: row.resultVersion,
    byName: row.userName,
    at: row.createdAt.toISOString(),
    sentence: describePlanChange(row.change, camp),
  }));
}
