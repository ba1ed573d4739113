import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { person } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { personDeleteInput } from "@/lib/domain/person/schema";
import type { Context } from "@/lib/services/context/context";
import { fillPlaces } from "../roster/internal";
import { loadTripRow, recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { requireConfirmed } from "../trips/require-confirmed";
import { listPersonDependents, loadPersonRow, requireAnotherLeader } from "./internal";

/** Takes somebody off the trip, at once also for a page they have open. Their account stays. */
export async function deletePerson({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof personDeleteInput>;
}): Promise<void> {
  const { tripId, personId, confirmed } = parseInput(personDeleteInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "people.edit", tx);
    const row = await loadPersonRow(tx, tripId, personId);
    if (row.role === "leader") await requireAnotherLeader(tx, tripId, personId);
    requireConfirmed(confirmed, row.name, await listPersonDependents(tx, tripId, personId));
    await tx.delete(person).where(and(eq(person.id, personId), eq(person.tripId, tripId)));
    await recordChange(tx, ctx, {
      tripId,
      action: "delete",
      entity: "person",
      entityId: personId,
      summary: row.name,
      isPrinted: true,
    });
    await fillPlaces(tx, await loadTripRow(tx, tripId));
  });
}
