import { and, eq, sql } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { person } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { personUpdateInput } from "@/lib/domain/person/schema";
import type { PersonView } from "@/lib/domain/views";
import type { Context } from "@/lib/services/context/context";
import { fillPlaces } from "../roster/internal";
import { loadTripRow, recordChange, refuseStale } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { findPeopleStates, loadPersonRow, requireAnotherLeader, toPersonView } from "./internal";

export async function updatePerson({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof personUpdateInput>;
}): Promise<PersonView> {
  const { tripId, personId, name, role, version } = parseInput(personUpdateInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "people.edit", tx);
    const row = await loadPersonRow(tx, tripId, personId);
    const states = await findPeopleStates(tx, tripId);
    if (row.version !== version) {
      const trip = await loadTripRow(tx, tripId);
      const current = toPersonView(row, ctx.actor.userId, states);
      await refuseStale(tx, { trip, entityId: personId, what: row.name, current });
    }
    if (row.role === "leader" && role !== "leader") await requireAnotherLeader(tx, tripId, personId);
    await tx
      .update(person)
      .set({ name, role, version: sql`${person.version} + 1` })
      .where(and(eq(person.id, personId), eq(person.tripId, tripId)));
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "person",
      entityId: personId,
      summary: role === row.role ? name : `${name}: ${role}`,
      isPrinted: name !== row.name,
    });
    if (role !== row.role) await fillPlaces(tx, await loadTripRow(tx, tripId));
    return toPersonView({ ...row, name, role, version: row.version + 1 }, ctx.actor.userId, states);
  });
}
