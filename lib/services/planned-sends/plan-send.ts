import { and, eq, inArray } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { person, plannedSend } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { planSendInput } from "@/lib/domain/post/schema";
import { AppError } from "@/lib/errors";
import { addDays, instantOf, minuteOfDay } from "@/lib/format/days";
import type { Context } from "@/lib/services/context/context";
import { findLastDay } from "../answers/internal";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";

/** A message for later, by the trip's clock. The same request again plans nothing more. */
export async function planSend({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof planSendInput>;
}): Promise<{ sendAt: Date }> {
  const { tripId, requestId, sendDay, sendTime, ...content } = parseInput(planSendInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "post.send", tx);
    const trip = await loadTripRow(tx, tripId);
    const sendAt = instantOf(sendDay, minuteOfDay(sendTime), trip.timeZone);
    const refuse = (field: string, sentence: string): never => {
      throw new AppError("bad-input", sentence, { fieldErrors: { [field]: [sentence] } });
    };
    if (sendAt.getTime() <= Date.now()) refuse("sendDay", "That time is over. Choose a later one, or send now.");
    if (sendDay > addDays(await findLastDay(tx, trip), 60)) {
      refuse("sendDay", "Choose a day not later than 60 days after the trip.");
    }
    const rows = await tx
      .select({ id: person.id })
      .from(person)
      .where(and(eq(person.tripId, tripId), inArray(person.id, content.personIds)));
    if (rows.length !== content.personIds.length) {
      throw new AppError("not-found", "Somebody you chose is not on this trip any more. Nothing was planned.");
    }
    const [known] = await tx.select().from(plannedSend).where(eq(plannedSend.id, requestId));
    if (known && known.tripId !== tripId) throw new AppError("conflict", "That was planned for another trip.");
    if (known) return { sendAt: known.sendAt };
    await tx.insert(plannedSend).values({
      id: requestId,
      tripId,
      byUserId: ctx.actor.userId,
      content,
      sendAt,
      createdAt: new Date(),
    });
    return { sendAt };
  });
}
