import { createHash } from "node:crypto";
import { eq } from "drizzle-orm";
import ical, { ICalCalendarMethod, ICalEventStatus } from "ical-generator";
import { getDb, type Transaction } from "@/db/client";
import { tripCalendar } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { env } from "@/lib/env";
import { addDays } from "@/lib/format/days";
import type { Context } from "@/lib/services/context/context";
import type { z } from "zod";
import { findLastDay } from "../answers/internal";
import { loadTripRow, type TripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import type { MailFile } from "./enqueue-message";

type CalendarRow = typeof tripCalendar.$inferSelect;

const utcDay = (day: string) => new Date(`${day}T00:00:00Z`);

async function loadCalendar(tx: Pick<Transaction, "select">, tripId: string): Promise<CalendarRow | null> {
  const [row] = await tx.select().from(tripCalendar).where(eq(tripCalendar.tripId, tripId));
  return row ?? null;
}

interface Entry {
  readonly trip: TripRow;
  readonly lastDay: string;
  readonly uid: string;
  readonly sequence: number;
  readonly isOff: boolean;
  readonly stamp: Date;
}

function writeFile({ trip, lastDay, uid, sequence, isOff, stamp }: Entry): string {
  const calendar = ical({
    prodId: { company: "Leestead", product: "Trips", language: "EN" },
    method: isOff ? ICalCalendarMethod.CANCEL : ICalCalendarMethod.PUBLISH,
  });
  calendar.createEvent({
    id: uid,
    sequence,
    stamp,
    allDay: true,
    start: utcDay(trip.startDate),
    // Exclusive: the day after the last.
    end: utcDay(addDays(lastDay, 1)),
    summary: trip.name,
    description: `Programme and your pages: ${env.appUrl}/trips/${trip.id}`,
    url: `${env.appUrl}/trips/${trip.id}`,
    status: isOff ? ICalEventStatus.CANCELLED : ICalEventStatus.CONFIRMED,
  });
  return calendar.toString();
}

function fingerprintOf(trip: TripRow, lastDay: string, isOff: boolean): string {
  return createHash("sha256")
    .update(JSON.stringify([trip.name, trip.startDate, lastDay, isOff]))
    .digest("hex");
}

/** The entry as it is to be now: the same UID for ever, the sequence one higher when it says something else. */
export async function keepCalendar(tx: Transaction, trip: TripRow, isOff: boolean): Promise<CalendarRow> {
  const known = await loadCalendar(tx, trip.id);
  const fingerprint = fingerprintOf(trip, await findLastDay(tx, trip), isOff);
  const now = new Date();
  if (!known) {
    const row = {
      tripId: trip.id,
      uid: `${trip.id}@${new URL(env.appUrl).hostname}`,
      sequence: 0,
      fingerprint,
      calledOffAt: isOff ? now : null,
      updatedAt: now,
    };
    await tx.insert(tripCalendar).values(row);
    return row;
  }
  if (known.fingerprint === fingerprint) return known;
  const change = {
    fingerprint,
    sequence: known.sequence + 1,
    calledOffAt: isOff ? (known.calledOffAt ?? now) : null,
    updatedAt: now,
  };
  await tx.update(tripCalendar).set(change).where(eq(tripCalendar.tripId, trip.id));
  return { ...known, ...change };
}

export async function makeCalendarFile(tx: Transaction, trip: TripRow, isOff: boolean): Promise<MailFile> {
  const { uid, sequence, updatedAt } = await keepCalendar(tx, trip, isOff);
  const lastDay = await findLastDay(tx, trip);
  const text = writeFile({ trip, lastDay, uid, sequence, isOff, stamp: updatedAt });
  return {
    fileName: "Trip.ics",
    contentType: `text/calendar; method=${isOff ? "CANCEL" : "PUBLISH"}`,
    content: Buffer.from(text, "utf8"),
  };
}

/** For whoever is on the trip, to take into their own calendar. Asking changes nothing. */
export async function getCalendarFile({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<{ fileName: string; content: string }> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "trip.read");
  const trip = await loadTripRow(getDb(), tripId);
  const known = await loadCalendar(getDb(), tripId);
  const lastDay = await findLastDay(getDb(), trip);
  const isOff = known !== null && known.calledOffAt !== null;
  const isChanged = known !== null && known.fingerprint !== fingerprintOf(trip, lastDay, isOff);
  const content = writeFile({
    trip,
    lastDay,
    uid: known?.uid ?? `${trip.id}@${new URL(env.appUrl).hostname}`,
    sequence: (known?.sequence ?? 0) + (isChanged ? 1 : 0),
    isOff,
    stamp: isChanged || !known ? trip.updatedAt : known.updatedAt,
  });
  return { fileName: `${trip.name}.ics`, content };
}
