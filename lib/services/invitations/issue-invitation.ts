import { and, eq } from "drizzle-orm";
import { createHash, randomBytes } from "node:crypto";
import type { Transaction } from "@/db/client";
import { camp, invitation } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { renderAddedMail, renderInvitationMail } from "@/lib/email/templates/trip-mails";
import { env } from "@/lib/env";
import { addDays, formatDayRange } from "@/lib/format/days";
import type { Context } from "@/lib/services/context/context";
import { isInLine } from "../camps/internal";
import { voidInvitations, type PersonRow } from "../people/internal";
import { enqueueMessage } from "../post/enqueue-message";
import type { TripRow } from "../trips/internal";

const INVITATION_DAYS = 14;

export function hashToken(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}

async function readMailView(tx: Transaction, ctx: Context, trip: TripRow, person: PersonRow) {
  const camps = await tx
    .select({ nights: camp.nights })
    .from(camp)
    .where(and(eq(camp.tripId, trip.id), isInLine));
  const nights = camps.reduce((sum, one) => sum + one.nights, 0);
  return {
    name: person.name,
    inviterName: ctx.actor.name,
    tripName: trip.name,
    dates: formatDayRange(trip.startDate, addDays(trip.startDate, nights)),
  };
}

/** A new link to somebody's invitation; links sent before stop working. Only the token's hash is kept. */
export async function openInvitation(tx: Transaction, person: Pick<PersonRow, "id" | "tripId">): Promise<string> {
  await voidInvitations(tx, [person.id]);
  const token = randomBytes(32).toString("base64url");
  const now = Date.now();
  await tx.insert(invitation).values({
    id: newId(),
    tripId: person.tripId,
    personId: person.id,
    tokenHash: hashToken(token),
    expiresAt: new Date(now + INVITATION_DAYS * 86_400_000),
    createdAt: new Date(now),
  });
  return token;
}

/** The invitation in the outbox. */
export async function issueInvitation(tx: Transaction, ctx: Context, trip: TripRow, person: PersonRow): Promise<void> {
  const token = await openInvitation(tx, person);
  await enqueueMessage(tx, {
    kind: "invitation",
    requestId: newId(),
    tripId: trip.id,
    personId: person.id,
    to: { name: person.name, address: person.email },
    replyTo: { name: ctx.actor.name, address: ctx.actor.email },
    mail: renderInvitationMail({
      ...(await readMailView(tx, ctx, trip, person)),
      url: `${env.appUrl}/invitation/${token}`,
    }),
  });
}

/** For people who have an account: nothing to accept, only a word that they are on the trip now. */
export async function tellAdded(tx: Transaction, ctx: Context, trip: TripRow, person: PersonRow): Promise<void> {
  await enqueueMessage(tx, {
    kind: "invitation",
    requestId: newId(),
    tripId: trip.id,
    personId: person.id,
    to: { name: person.name, address: person.email },
    replyTo: { name: ctx.actor.name, address: ctx.actor.email },
    mail: renderAddedMail({
      ...(await readMailView(tx, ctx, trip, person)),
      url: `${env.appUrl}/trips/${trip.id}`,
    }),
  });
}
