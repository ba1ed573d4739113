import { and, eq, isNotNull } from "drizzle-orm";
import type { z } from "zod";
import { getDb, withTransaction, type Transaction } from "@/db/client";
import { outboxMessage, roster, trip } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { requestInput } from "@/lib/domain/post/schema";
import { renderReminderMail } from "@/lib/email/templates/people-mails";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { addDays, dayOf, formatDayLong, formatDayRange } from "@/lib/format/days";
import type { Context } from "@/lib/services/context/context";
import { openInvitation } from "../invitations/issue-invitation";
import { enqueueMessage, type MailAddress } from "../post/enqueue-message";
import { consumeQuota } from "../quota/consume-quota";
import { findLeader, isCalledOff, listGuests, loadRosterSettings, type Guest } from "../roster/internal";
import { loadTripRow, type TripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { findLastDay } from "./internal";

/** Who leads needs no reminder; who said maybe gets one as well. */
const isOpen = ({ person, value }: Guest) => person.role === "participant" && (value === null || value === "maybe");

async function remindOne(
  tx: Transaction,
  given: { trip: TripRow; lastDay: string; guest: Guest; requestId: string; replyTo: MailAddress | null },
): Promise<boolean> {
  const { trip: row, lastDay, guest, requestId, replyTo } = given;
  const { person } = guest;
  const [known] = await tx
    .select({ id: outboxMessage.id })
    .from(outboxMessage)
    .where(and(eq(outboxMessage.requestId, requestId), eq(outboxMessage.toAddress, person.email)));
  if (known) return false;
  const { answerBy } = await loadRosterSettings(tx, row.id);
  const url = person.userId
    ? `${env.appUrl}/trips/${row.id}/details`
    : `${env.appUrl}/invitation/${await openInvitation(tx, person)}`;
  await enqueueMessage(tx, {
    kind: "reminder",
    requestId,
    tripId: row.id,
    personId: person.id,
    to: { name: person.name, address: person.email },
    ...(replyTo ? { replyTo } : {}),
    mail: renderReminderMail({
      name: person.name,
      tripName: row.name,
      dates: formatDayRange(row.startDate, lastDay),
      answerBy: answerBy && formatDayLong(answerBy),
      isNewLink: person.userId === null,
      url,
    }),
  });
  return true;
}

/** The leader asks again by hand. The same request again asks nobody twice. */
export async function remindNow({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof requestInput>;
}): Promise<{ count: number }> {
  const { tripId, requestId } = parseInput(requestInput, input);
  await requirePermission(ctx, tripId, "people.edit");
  const open = (await listGuests(getDb(), tripId)).filter(isOpen);
  if (open.length > 0) await consumeQuota("invitation", ctx.actor.userId, open.length);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "people.edit", tx);
    const row = await loadTripRow(tx, tripId);
    const lastDay = await findLastDay(tx, row);
    if (dayOf(new Date(), row.timeZone) > lastDay) throw new AppError("conflict", "This trip is over.");
    if (await isCalledOff(tx, tripId)) throw new AppError("conflict", "This trip has been called off.");
    const guests = (await listGuests(tx, tripId)).filter(isOpen);
    if (guests.length === 0) throw new AppError("conflict", "Everybody has answered. Nothing was sent.");
    const replyTo = { name: ctx.actor.name, address: ctx.actor.email };
    for (const guest of guests) await remindOne(tx, { trip: row, lastDay, guest, requestId, replyTo });
    return { count: guests.length };
  });
}

/** Every day's reminders; each goes once for a deadline, never after the trip has begun or is called off. */
export async function remindDue(now: Date): Promise<number> {
  const rows = await getDb()
    .select({ tripId: roster.tripId })
    .from(roster)
    .innerJoin(trip, eq(trip.id, roster.tripId))
    .where(and(isNotNull(roster.answerBy), isNotNull(roster.remindDaysBefore)));
  let count = 0;
  for (const { tripId } of rows) {
    count += await withTransaction(async (tx) => {
      const { answerBy, remindDaysBefore } = await loadRosterSettings(tx, tripId);
      const row = await loadTripRow(tx, tripId);
      const today = dayOf(now, row.timeZone);
      if (answerBy === null || remindDaysBefore === null) return 0;
      if (today < addDays(answerBy, -remindDaysBefore) || today > answerBy || today >= row.startDate) return 0;
      if (await isCalledOff(tx, tripId)) return 0;
      const lastDay = await findLastDay(tx, row);
      const leader = await findLeader(tx, tripId);
      const replyTo = leader && { name: leader.name, address: leader.email };
      let sent = 0;
      for (const guest of (await listGuests(tx, tripId)).filter(isOpen)) {
        const requestId = `reminder ${guest.person.id} ${answerBy}`;
        if (await remindOne(tx, { trip: row, lastDay, guest, requestId, replyTo })) sent += 1;
      }
      return sent;
    });
  }
  return count;
}
