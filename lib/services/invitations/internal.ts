import { and, eq, gt, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { invitation, person, trip } from "@/db/schema";
import { AppError } from "@/lib/errors";
import { recordChange, type Reader } from "../trips/internal";
import type { Context } from "../context/context";
import { hashToken } from "./issue-invitation";

export async function findInvitation(reader: Reader, token: string) {
  const [row] = await reader
    .select({ invitation, person, tripName: trip.name })
    .from(invitation)
    .innerJoin(person, eq(person.id, invitation.personId))
    .innerJoin(trip, eq(trip.id, invitation.tripId))
    .where(eq(invitation.tokenHash, hashToken(token)))
    .limit(1);
  return row ?? null;
}

export type InvitationRow = NonNullable<Awaited<ReturnType<typeof findInvitation>>>;

/** The invitation while it can be used; the reason otherwise. */
export async function loadOpenInvitation(reader: Reader, token: string): Promise<InvitationRow> {
  const row = await findInvitation(reader, token);
  if (!row) {
    throw new AppError(
      "not-found",
      "This link does not work any more. A newer one may have been sent; ask the leader.",
    );
  }
  if (row.invitation.usedAt)
    throw new AppError("conflict", "This link has been used already. Sign in to see the trip.");
  if (row.invitation.expiresAt.getTime() <= Date.now()) {
    throw new AppError("conflict", "This link was good for 14 days. Ask the leader for a new one.");
  }
  return row;
}

/** Marks it used and puts the account on the trip; the second of two at once is refused. */
export async function spendInvitation(tx: Transaction, row: InvitationRow, ctx: Context): Promise<void> {
  const [used] = await tx
    .update(invitation)
    .set({ usedAt: new Date() })
    .where(and(eq(invitation.id, row.invitation.id), isNull(invitation.usedAt), gt(invitation.expiresAt, new Date())))
    .returning({ id: invitation.id });
  if (!used) throw new AppError("conflict", "This link has been used already. Sign in to see the trip.");
  const [linked] = await tx
    .update(person)
    .set({ userId: ctx.actor.userId })
    .where(and(eq(person.id, row.person.id), isNull(person.userId)))
    .returning({ id: person.id });
  if (!linked) throw new AppError("conflict", "You are on this trip already.");
  await recordChange(tx, ctx, {
    tripId: row.person.tripId,
    action: "update",
    entity: "person",
    entityId: row.person.id,
    summary: `${row.person.name}: joined`,
    isPrinted: false,
  });
}
