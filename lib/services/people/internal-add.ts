import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { person, user } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import type { Role } from "@/lib/domain/permissions/permissions";
import type { Context } from "@/lib/services/context/context";
import { issueInvitation, tellAdded } from "../invitations/issue-invitation";
import { recordChange, type TripRow } from "../trips/internal";
import type { PersonRow } from "./internal";

/** Puts somebody on the trip and writes to them. Who has an account with that address is on it at once. */
export async function addPerson(
  tx: Transaction,
  ctx: Context,
  trip: TripRow,
  { name, email, role }: { readonly name: string; readonly email: string; readonly role: Role },
): Promise<{ personId: string; state: "joined" | "invited" }> {
  const [account] = await tx
    .select({ id: user.id })
    .from(user)
    .where(and(eq(user.email, email), eq(user.emailVerified, true)));
  const row: PersonRow = {
    id: newId(),
    tripId: trip.id,
    userId: account?.id ?? null,
    name,
    email,
    role,
    version: 1,
    createdAt: new Date(),
  };
  await tx.insert(person).values(row);
  if (account) await tellAdded(tx, ctx, trip, row);
  else await issueInvitation(tx, ctx, trip, row);
  await recordChange(tx, ctx, {
    tripId: trip.id,
    action: "create",
    entity: "person",
    entityId: row.id,
    summary: name,
    isPrinted: false,
  });
  return { personId: row.id, state: account ? "joined" : "invited" };
}
