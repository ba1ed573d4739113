import { and, asc, eq, lte } from "drizzle-orm";
import { z } from "zod";
import { getDb } from "@/db/client";
import { planIntent } from "@/db/schema";
import type { Placement } from "@/lib/calc/types";
import { campRefInput } from "@/lib/domain/camp/schema";
import { reducePlan } from "@/lib/domain/plan/reduce";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow } from "../camps/internal";
import { parseInput } from "../trips/parse-input";

const getPlanAtVersionInput = campRefInput.extend({ version: z.number().int().min(0) });

/** The plan as it stood: every change is kept, so it is the sum of them. To bring it back, save it as a whole plan. */
export async function getPlanAtVersion({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof getPlanAtVersionInput>;
}): Promise<{ placements: readonly Placement[] }> {
  const { tripId, campId, version } = parseInput(getPlanAtVersionInput, input);
  await requirePermission(ctx, tripId, "plan.read");
  const db = getDb();
  await loadCampRow(db, tripId, campId);
  const rows = await db
    .select({ change: planIntent.change })
    .from(planIntent)
    .where(and(eq(planIntent.campId, campId), eq(planIntent.tripId, tripId), lte(planIntent.resultVersion, version)))
    .orderBy(asc(planIntent.resultVersion), asc(planIntent.createdAt));
  return { placements: rows.reduce<readonly Placement[]>((plan, row) => reducePlan(plan, row.change), []) };
}
