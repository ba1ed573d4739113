import { desc, eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { pullTest } from "@/db/schema";
import { comparePulls, type Comparison } from "@/lib/domain/pull-test/compare";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { listPullRows } from "./internal";

/** The newest readings: more than so many tell nothing more in one picture. */
const MAX_COMPARED = 2000;

/** All readings of a trip against the model. */
export async function compareTripPulls({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<Comparison> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "pull-test.read");
  const rows = await getDb()
    .select()
    .from(pullTest)
    .where(eq(pullTest.tripId, tripId))
    .orderBy(desc(pullTest.pulledAt), desc(pullTest.id))
    .limit(MAX_COMPARED);
  return comparePulls(rows);
}

/** The person's own practice readings against the model. */
export async function comparePracticePulls({ ctx }: { ctx: Context }): Promise<Comparison> {
  const rows = await listPullRows(getDb(), { kind: "practice", ownerId: ctx.actor.userId });
  return comparePulls(rows.slice(0, MAX_COMPARED));
}
