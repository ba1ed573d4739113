import { asc, eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { person, plannedSend } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { PlannedSendView } from "@/lib/domain/people-views";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

/** Those that wait and those that could not go; what was sent stands with the messages. */
export async function listPlannedSends({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<PlannedSendView[]> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "post.read");
  const people = await getDb()
    .select({ id: person.id, name: person.name })
    .from(person)
    .where(eq(person.tripId, tripId));
  const rows = await getDb()
    .select()
    .from(plannedSend)
    .where(eq(plannedSend.tripId, tripId))
    .orderBy(asc(plannedSend.sendAt));
  return rows
    .filter((row) => row.state === "planned" || row.state === "failed")
    .map((row) => ({
      id: row.id,
      subject: row.content.subject,
      names: row.content.personIds.flatMap((id) => people.filter((one) => one.id === id).map((one) => one.name)),
      sendAt: row.sendAt.toISOString(),
      state: row.state,
      reason: row.reason,
    }));
}
