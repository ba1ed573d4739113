import { asc, eq } from "drizzle-orm";
import { z } from "zod";
import { getDb } from "@/db/client";
import { person } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { idSchema } from "@/lib/domain/ids";
import { ROLES } from "@/lib/domain/permissions/permissions";
import type { PersonView } from "@/lib/domain/views";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { findPeopleStates, toPersonView } from "./internal";

const listPeopleInput = z.object({ tripId: idSchema });

/** Leaders first, then by name. */
export async function listPeople({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof listPeopleInput>;
}): Promise<PersonView[]> {
  const { tripId } = parseInput(listPeopleInput, input);
  await requirePermission(ctx, tripId, "people.read");
  const rows = await getDb().select().from(person).where(eq(person.tripId, tripId)).orderBy(asc(person.createdAt));
  const states = await findPeopleStates(getDb(), tripId);
  return rows
    .map((row) => toPersonView(row, ctx.actor.userId, states))
    .sort((a, b) => ROLES.indexOf(a.role) - ROLES.indexOf(b.role) || a.name.localeCompare(b.name, "en"));
}
