import { and, asc, eq, isNull } from "drizzle-orm";
import { getDb, withTransaction } from "@/db/client";
import { notice, outboxMessage, person } from "@/db/schema";
import { renderDigestMail } from "@/lib/email/templates/people-mails";
import { env } from "@/lib/env";
import { dayOf } from "@/lib/format/days";
import { findLastDay } from "../answers/internal";
import { enqueueMessage } from "../post/enqueue-message";
import { loadTripRow } from "../trips/internal";

/** News rests this long, so that what happens together is told together. */
const REST_MS = 60 * 60_000;
/** At most one digest in this time for one person and trip. */
const PAUSE_MS = 20 * 60 * 60_000;
const MOST_LINES = 40;

async function sendOne(personId: string, now: Date): Promise<number> {
  return withTransaction(async (tx) => {
    const rows = await tx
      .select()
      .from(notice)
      .where(and(eq(notice.personId, personId), isNull(notice.sentAt)))
      .orderBy(asc(notice.createdAt), asc(notice.id));
    const [first] = rows;
    const [who] = await tx.select().from(person).where(eq(person.id, personId));
    if (!first || !who || now.getTime() - first.createdAt.getTime() < REST_MS) return 0;
    const digests = await tx
      .select({ createdAt: outboxMessage.createdAt })
      .from(outboxMessage)
      .where(and(eq(outboxMessage.personId, personId), eq(outboxMessage.kind, "digest")));
    if (digests.some(({ createdAt }) => now.getTime() - createdAt.getTime() < PAUSE_MS)) return 0;
    const trip = await loadTripRow(tx, first.tripId);
    await tx
      .update(notice)
      .set({ sentAt: now })
      .where(and(eq(notice.personId, personId), isNull(notice.sentAt)));
    // After the trip nobody wants news of it.
    if (dayOf(now, trip.timeZone) > (await findLastDay(tx, trip))) return 0;
    const lines = rows.slice(0, MOST_LINES).map((row) => row.sentence);
    if (rows.length > MOST_LINES) lines.push(`And ${rows.length - MOST_LINES} more.`);
    await enqueueMessage(tx, {
      kind: "digest",
      requestId: `digest ${first.id}`,
      tripId: trip.id,
      personId,
      to: { name: who.name, address: who.email },
      mail: renderDigestMail({
        name: who.name,
        tripName: trip.name,
        lines,
        url: `${env.appUrl}/trips/${trip.id}`,
      }),
      createdAt: now,
    });
    return 1;
  });
}

/** One mail a day with what happened, instead of one for each thing. */
export async function sendDigests(now: Date): Promise<number> {
  const people = await getDb().selectDistinct({ personId: notice.personId }).from(notice).where(isNull(notice.sentAt));
  let count = 0;
  for (const { personId } of people) count += await sendOne(personId, now);
  return count;
}
