import { addMinutes } from "date-fns";
import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { emergencyPlan, outboxMessage } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { emergencySendInput } from "@/lib/domain/emergency/schema";
import { renderBackSafelyMail, renderEmergencyMail } from "@/lib/email/templates/emergency-mails";
import { AppError } from "@/lib/errors";
import { addDays, formatDay, formatDayRange } from "@/lib/format/days";
import { formatPosition } from "@/lib/format/positions";
import { joinWords } from "@/lib/format/words";
import type { Context } from "@/lib/services/context/context";
import { findLastDay } from "../answers/internal";
import { listCampRows } from "../camps/internal";
import { enqueueMessage } from "../post/enqueue-message";
import { consumeQuota } from "../quota/consume-quota";
import { hasPlace, listGuests } from "../roster/internal";
import { loadTripRow, recordChange, type TripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { formatMoment, loadEmergencyPlan, toEmergencyView, type EmergencyRow } from "./internal";

async function listNights(tx: Transaction, trip: TripRow): Promise<string[]> {
  const camps = await listCampRows(tx, trip.id);
  let offset = 0;
  return camps.map((one) => {
    const first = formatDay(addDays(trip.startDate, offset));
    offset += one.nights;
    const last = formatDay(addDays(trip.startDate, offset - 1));
    const days = first === last ? first : `${first} to ${last}`;
    const place =
      one.latitude === null || one.longitude === null
        ? "position not entered"
        : formatPosition(one.latitude, one.longitude);
    return `${days}: ${one.name}, ${place}`;
  });
}

async function isQueued(tx: Transaction, requestId: string, address: string): Promise<boolean> {
  const [row] = await tx
    .select({ id: outboxMessage.id })
    .from(outboxMessage)
    .where(and(eq(outboxMessage.requestId, requestId), eq(outboxMessage.toAddress, address)));
  return row !== undefined;
}

/** Names and places, never what people wrote about their health. */
async function renderPlan(tx: Transaction, ctx: Context, trip: TripRow, plan: EmergencyRow) {
  const guests = (await listGuests(tx, trip.id)).filter(hasPlace);
  const { dueBackAt } = plan;
  if (!dueBackAt) throw new AppError("conflict", "Say first when the group is due back.");
  return renderEmergencyMail({
    name: plan.outsideName,
    leaderName: ctx.actor.name,
    tripName: trip.name,
    dates: formatDayRange(trip.startDate, await findLastDay(tx, trip)),
    version: plan.version,
    dueBack: formatMoment(dueBackAt, trip.timeZone),
    timeZone: trip.timeZone,
    people: guests.map((guest) => guest.person.name),
    groupPhone: plan.groupPhone,
    nights: await listNights(tx, trip),
    meetingPoints: plan.meetingPoints,
    wayOut: plan.wayOut,
    steps: plan.steps.map((step) => ({
      at: formatMoment(addMinutes(dueBackAt, step.afterMinutes), trip.timeZone),
      who: step.who,
      phone: step.phone,
      action: step.action,
    })),
    contacts: trip.contacts,
  });
}

type Input = z.input<typeof emergencySendInput>;

/** To the contact outside the group: when to worry, whom to call, in which order. */
export async function sendEmergencyPlan({ ctx, input }: { ctx: Context; input: Input }): Promise<{ to: string }> {
  const { tripId, requestId } = parseInput(emergencySendInput, input);
  await requirePermission(ctx, tripId, "emergency.edit");
  await consumeQuota("mail", ctx.actor.userId);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "emergency.edit", tx);
    const trip = await loadTripRow(tx, tripId);
    const plan = await loadEmergencyPlan(tx, tripId);
    const { missing } = toEmergencyView(plan, trip);
    if (missing.length > 0) {
      throw new AppError("conflict", `Nothing was sent. The plan still lacks ${joinWords(missing)}.`);
    }
    if (await isQueued(tx, requestId, plan.outsideEmail)) return { to: plan.outsideName };
    await enqueueMessage(tx, {
      kind: "emergency",
      requestId,
      tripId,
      to: { name: plan.outsideName, address: plan.outsideEmail },
      replyTo: { name: ctx.actor.name, address: ctx.actor.email },
      mail: await renderPlan(tx, ctx, trip, plan),
    });
    await tx
      .update(emergencyPlan)
      .set({ sentVersion: plan.version, sentAt: new Date(), backAt: null })
      .where(eq(emergencyPlan.tripId, tripId));
    await recordChange(tx, ctx, {
      tripId,
      action: "create",
      entity: "post",
      entityId: requestId,
      summary: `Emergency plan, version ${plan.version}, to ${plan.outsideName}`,
      isPrinted: false,
    });
    return { to: plan.outsideName };
  });
}

/** Tells the contact outside that everybody is back: nobody needs to be called. */
export async function tellBackSafely({ ctx, input }: { ctx: Context; input: Input }): Promise<{ to: string }> {
  const { tripId, requestId } = parseInput(emergencySendInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "emergency.edit", tx);
    const trip = await loadTripRow(tx, tripId);
    const plan = await loadEmergencyPlan(tx, tripId);
    if (plan.sentVersion === null || plan.outsideEmail === "") {
      throw new AppError("conflict", "The plan was sent to nobody, so nobody is waiting.");
    }
    if (await isQueued(tx, requestId, plan.outsideEmail)) return { to: plan.outsideName };
    await enqueueMessage(tx, {
      kind: "emergency",
      requestId,
      tripId,
      to: { name: plan.outsideName, address: plan.outsideEmail },
      replyTo: { name: ctx.actor.name, address: ctx.actor.email },
      mail: renderBackSafelyMail({ name: plan.outsideName, leaderName: ctx.actor.name, tripName: trip.name }),
    });
    await tx.update(emergencyPlan).set({ backAt: new Date() }).where(eq(emergencyPlan.tripId, tripId));
    return { to: plan.outsideName };
  });
}
