import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { answer, camp, changeLog } from "@/db/schema";
import { ANSWER_NAMES, type AnswerValue } from "@/lib/domain/answer/schema";
import { newId } from "@/lib/domain/ids";
import type { OwnAnswerView } from "@/lib/domain/people-views";
import { AppError } from "@/lib/errors";
import { addDays, dayOf, formatDayLong } from "@/lib/format/days";
import { isInLine } from "../camps/internal";
import { addNotice } from "../notices/add-notice";
import type { PersonRow } from "../people/internal";
import { fillPlaces, hasPlace, isCalledOff, listGuests, loadRosterSettings, type Guest } from "../roster/internal";
import type { Reader, TripRow } from "../trips/internal";

/** The morning after the last night, yyyy-mm-dd. */
export async function findLastDay(reader: Reader, trip: TripRow): Promise<string> {
  const rows = await reader
    .select({ nights: camp.nights })
    .from(camp)
    .where(and(eq(camp.tripId, trip.id), isInLine));
  return addDays(
    trip.startDate,
    rows.reduce((sum, row) => sum + row.nights, 0),
  );
}

interface Standing {
  readonly guests: readonly Guest[];
  readonly answerBy: string | null;
  readonly capacity: number | null;
  readonly isOver: boolean;
  readonly isLate: boolean;
  readonly isOff: boolean;
}

async function loadStanding(reader: Reader, trip: TripRow): Promise<Standing> {
  const { answerBy, capacity } = await loadRosterSettings(reader, trip.id);
  const today = dayOf(new Date(), trip.timeZone);
  return {
    guests: await listGuests(reader, trip.id),
    answerBy,
    capacity,
    isOver: today > (await findLastDay(reader, trip)),
    isLate: answerBy !== null && today > answerBy,
    isOff: await isCalledOff(reader, trip.id),
  };
}

const isFullFor = ({ guests, capacity }: Standing, personId: string): boolean =>
  capacity !== null && guests.filter((guest) => guest.person.id !== personId && hasPlace(guest)).length >= capacity;

export async function toOwnAnswer(reader: Reader, trip: TripRow, row: PersonRow): Promise<OwnAnswerView> {
  const standing = await loadStanding(reader, trip);
  const own = standing.guests.find((guest) => guest.person.id === row.id);
  const place = standing.guests.filter((guest) => guest.isWaiting).findIndex((guest) => guest.person.id === row.id);
  return {
    role: row.role,
    answer:
      own?.value && own.answeredAt
        ? { value: own.value, note: own.note, isWaiting: own.isWaiting, answeredAt: own.answeredAt.toISOString() }
        : null,
    answerBy: standing.answerBy,
    isClosed: standing.isOver || standing.isLate,
    isCalledOff: standing.isOff,
    isFull: isFullFor(standing, row.id),
    waitingPlace: place < 0 ? null : place + 1,
  };
}

/** A no is always taken; a yes or a maybe until the last day for an answer, and until the trip is over. */
function requireOpen({ isOver, isLate, isOff, answerBy }: Standing, value: AnswerValue): void {
  if (isOver) throw new AppError("conflict", "This trip is over.");
  if (isOff) throw new AppError("conflict", "This trip has been called off.");
  if (!isLate || value === "no") return;
  const day = answerBy ? formatDayLong(answerBy) : "";
  throw new AppError("conflict", `The last day for an answer was ${day}. Ask the leader to add you.`);
}

interface Given {
  readonly trip: TripRow;
  readonly person: PersonRow;
  readonly value: AnswerValue;
  readonly note: string;
  /** Null for who answers by the link of an invitation. */
  readonly userId: string | null;
}

/** Keeps an answer: on the waiting list when there is no place, and whoever waits moves up when one gets free. */
export async function keepAnswer(tx: Transaction, given: Given): Promise<void> {
  const { trip, person, value, note, userId } = given;
  const standing = await loadStanding(tx, trip);
  requireOpen(standing, value);
  const before = standing.guests.find((guest) => guest.person.id === person.id);
  const isSame = before?.value === value;
  if (isSame && before.note === note) return;
  const isWaiting = value === "yes" && (isSame ? before.isWaiting : isFullFor(standing, person.id));
  const answeredAt = (isSame && before.answeredAt) || new Date();
  const row = { value, note, isWaiting, answeredAt };
  await tx
    .insert(answer)
    .values({ personId: person.id, tripId: trip.id, ...row })
    .onConflictDoUpdate({ target: answer.personId, set: row });
  const said = isWaiting ? "yes, on the waiting list" : ANSWER_NAMES[value].toLowerCase();
  await tx.insert(changeLog).values({
    id: newId(),
    tripId: trip.id,
    userId,
    userName: person.name,
    action: "update",
    entity: "person",
    entityId: person.id,
    summary: `${person.name}: ${said}`,
    createdAt: new Date(),
  });
  if (!isSame)
    await addNotice(tx, trip.id, { toRoles: ["leader"], exceptPersonId: person.id }, `${person.name}: ${said}.`);
  await fillPlaces(tx, trip);
}
