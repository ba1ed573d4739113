import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { camp } from "@/db/schema";
import { campDeleteInput } from "@/lib/domain/camp/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { requireConfirmed } from "../trips/require-confirmed";
import { listCampDependents } from "./find-camp-dependents";
import { loadCampRow } from "./internal";

export async function deleteCamp({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campDeleteInput>;
}): Promise<void> {
  const { tripId, campId, confirmed } = parseInput(campDeleteInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "camp.arrange", tx);
    const row = await loadCampRow(tx, tripId, campId);
    requireConfirmed(confirmed, row.name, await listCampDependents(tx, tripId, campId));
    await tx.delete(camp).where(and(eq(camp.id, campId), eq(camp.tripId, tripId)));
    await recordChange(tx, ctx, {
      tripId,
      action: "delete",
      entity: "camp",
      entityId: campId,
      summary: row.name,
      isPrinted: true,
    });
  });
}
