import { and, asc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { answer, person, roster, tripCalendar } from "@/db/schema";
import type { AnswerValue } from "@/lib/domain/answer/schema";
import { USUAL_KEEP_DAYS, USUAL_REMINDER_DAYS } from "@/lib/domain/roster/schema";
import type { RosterView } from "@/lib/domain/people-views";
import { renderPlaceMail } from "@/lib/email/templates/people-mails";
import { env } from "@/lib/env";
import { newId } from "@/lib/domain/ids";
import type { PersonRow } from "../people/internal";
import { enqueueMessage } from "../post/enqueue-message";
import type { Reader, TripRow } from "../trips/internal";

export type RosterSettings = Pick<
  RosterView,
  "capacity" | "answerBy" | "remindDaysBefore" | "keepDetailsDays" | "version"
>;

/** Version 0 while nobody has set anything. */
export async function loadRosterSettings(reader: Reader, tripId: string): Promise<RosterSettings> {
  const [row] = await reader.select().from(roster).where(eq(roster.tripId, tripId));
  if (!row) {
    return {
      capacity: null,
      answerBy: null,
      remindDaysBefore: USUAL_REMINDER_DAYS,
      keepDetailsDays: USUAL_KEEP_DAYS,
      version: 0,
    };
  }
  const { capacity, answerBy, remindDaysBefore, keepDetailsDays, version } = row;
  return { capacity, answerBy, remindDaysBefore, keepDetailsDays, version };
}

export interface Guest {
  readonly person: PersonRow;
  readonly value: AnswerValue | null;
  readonly note: string;
  readonly isWaiting: boolean;
  readonly answeredAt: Date | null;
}

/** Everybody on the trip with their answer, in the order of the answers. */
export async function listGuests(reader: Reader, tripId: string): Promise<Guest[]> {
  const rows = await reader
    .select({ person, answer })
    .from(person)
    .leftJoin(answer, and(eq(answer.personId, person.id), eq(answer.tripId, tripId)))
    .where(eq(person.tripId, tripId))
    .orderBy(asc(answer.answeredAt), asc(person.createdAt), asc(person.id));
  return rows.map((row) => ({
    person: row.person,
    value: row.answer?.value ?? null,
    note: row.answer?.note ?? "",
    isWaiting: row.answer?.isWaiting ?? false,
    answeredAt: row.answer?.answeredAt ?? null,
  }));
}

/** Who leads comes unless they say no; everybody else when they have said yes and there was a place. */
export function hasPlace({ person: { role }, value, isWaiting }: Guest): boolean {
  return value === "yes" ? !isWaiting : role !== "participant" && value === null;
}

export function countRoster(guests: readonly Guest[]): RosterView["counts"] {
  const count = (test: (guest: Guest) => boolean) => guests.filter(test).length;
  return {
    coming: count(hasPlace),
    waiting: count((guest) => guest.isWaiting),
    maybe: count((guest) => guest.value === "maybe"),
    no: count((guest) => guest.value === "no"),
    open: count((guest) => guest.value === null && !hasPlace(guest)),
  };
}

export async function isCalledOff(reader: Reader, tripId: string): Promise<boolean> {
  const [row] = await reader
    .select({ at: tripCalendar.calledOffAt })
    .from(tripCalendar)
    .where(eq(tripCalendar.tripId, tripId));
  return row !== undefined && row.at !== null;
}

/** Somebody who leads and can sign in: answers to mails that nobody sent by hand go to them. */
export async function findLeader(reader: Reader, tripId: string): Promise<PersonRow | null> {
  const rows = await reader
    .select()
    .from(person)
    .where(and(eq(person.tripId, tripId), eq(person.role, "leader")))
    .orderBy(asc(person.createdAt));
  return rows.find((row) => row.userId !== null) ?? rows[0] ?? null;
}

/** Gives free places to those who wait, in their order, and tells them. Call after whatever may have freed one. */
export async function fillPlaces(tx: Transaction, trip: TripRow): Promise<void> {
  const { capacity } = await loadRosterSettings(tx, trip.id);
  const guests = await listGuests(tx, trip.id);
  const free = capacity === null ? Number.POSITIVE_INFINITY : capacity - guests.filter(hasPlace).length;
  const leader = await findLeader(tx, trip.id);
  for (const { person: row } of guests.filter((guest) => guest.isWaiting).slice(0, Math.max(0, free))) {
    await tx.update(answer).set({ isWaiting: false }).where(eq(answer.personId, row.id));
    await enqueueMessage(tx, {
      kind: "place",
      requestId: newId(),
      tripId: trip.id,
      personId: row.id,
      to: { name: row.name, address: row.email },
      ...(leader ? { replyTo: { name: leader.name, address: leader.email } } : {}),
      mail: renderPlaceMail({ name: row.name, tripName: trip.name, url: `${env.appUrl}/trips/${trip.id}/details` }),
    });
  }
}
