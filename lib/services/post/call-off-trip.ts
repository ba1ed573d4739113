import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { outboxMessage } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { callOffInput } from "@/lib/domain/post/schema";
import { renderCallOffMail } from "@/lib/email/templates/people-mails";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { formatDayRange } from "@/lib/format/days";
import type { Context } from "@/lib/services/context/context";
import { findLastDay } from "../answers/internal";
import { consumeQuota } from "../quota/consume-quota";
import { isCalledOff, listGuests } from "../roster/internal";
import { loadTripRow, recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { makeCalendarFile } from "./calendar";
import { enqueueMessage } from "./enqueue-message";

/**
 * Calls the trip off, or says that it takes place after all: a mail to everybody who has not said no, with a calendar
 * file that takes the entry out or puts it back. Reminders and planned messages stop while it is off.
 */
export async function callOffTrip({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof callOffInput>;
}): Promise<{ count: number }> {
  const { tripId, requestId, isOff, message } = parseInput(callOffInput, input);
  await requirePermission(ctx, tripId, "post.send");
  await consumeQuota("mail", ctx.actor.userId);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "post.send", tx);
    const trip = await loadTripRow(tx, tripId);
    const done = await tx
      .select({ id: outboxMessage.id })
      .from(outboxMessage)
      .where(and(eq(outboxMessage.requestId, requestId), eq(outboxMessage.tripId, tripId)));
    if (done.length > 0) return { count: done.length };
    if ((await isCalledOff(tx, tripId)) === isOff) {
      throw new AppError("conflict", isOff ? "The trip is called off already." : "The trip is not called off.");
    }
    const file = await makeCalendarFile(tx, trip, isOff);
    const guests = (await listGuests(tx, tripId)).filter((guest) => guest.value !== "no");
    const dates = formatDayRange(trip.startDate, await findLastDay(tx, trip));
    for (const { person } of guests) {
      await enqueueMessage(tx, {
        kind: "calendar",
        requestId,
        tripId,
        personId: person.id,
        to: { name: person.name, address: person.email },
        replyTo: { name: ctx.actor.name, address: ctx.actor.email },
        mail: renderCallOffMail({
          name: person.name,
          leaderName: ctx.actor.name,
          tripName: trip.name,
          dates,
          isOff,
          message,
          url: `${env.appUrl}/trips/${tripId}`,
        }),
        files: [file],
      });
    }
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "trip",
      entityId: tripId,
      summary: isOff ? "called off" : "takes place after all",
      isPrinted: false,
    });
    return { count: guests.length };
  });
}
