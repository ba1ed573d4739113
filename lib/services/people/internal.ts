import { and, asc, count, eq, inArray, isNotNull, isNull, ne } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { answer, camp, carry, invitation, person, pitch, sleeper } from "@/db/schema";
import type { AnswerView } from "@/lib/domain/people-views";
import type { PersonView } from "@/lib/domain/views";
import { AppError } from "@/lib/errors";
import { plural } from "@/lib/format/words";
import { isInLine } from "../camps/internal";
import type { Reader } from "../trips/internal";

export type PersonRow = typeof person.$inferSelect;

export async function loadPersonRow(reader: Reader, tripId: string, personId: string): Promise<PersonRow> {
  const [row] = await reader
    .select()
    .from(person)
    .where(and(eq(person.id, personId), eq(person.tripId, tripId)))
    .limit(1);
  if (!row) throw new AppError("not-found", "There is no such person on this trip.");
  return row;
}

/** Which people have a link that still works, and which had one. */
async function findInvitationStates(
  reader: Reader,
  tripId: string,
): Promise<ReadonlyMap<string, "invited" | "expired">> {
  const rows = await reader
    .select({ personId: invitation.personId, expiresAt: invitation.expiresAt })
    .from(invitation)
    .where(and(eq(invitation.tripId, tripId), isNull(invitation.usedAt)))
    .orderBy(asc(invitation.expiresAt));
  const now = Date.now();
  return new Map(rows.map((row) => [row.personId, row.expiresAt.getTime() > now ? "invited" : "expired"]));
}

type Answers = ReadonlyMap<string, AnswerView>;

async function findAnswers(reader: Reader, tripId: string): Promise<Answers> {
  const rows = await reader.select().from(answer).where(eq(answer.tripId, tripId));
  return new Map(
    rows.map(({ personId, value, note, isWaiting, answeredAt }) => [
      personId,
      { value, note, isWaiting, answeredAt: answeredAt.toISOString() },
    ]),
  );
}

export interface PeopleStates {
  readonly invitations: ReadonlyMap<string, "invited" | "expired">;
  readonly answers: Answers;
}

export async function findPeopleStates(reader: Reader, tripId: string): Promise<PeopleStates> {
  return {
    invitations: await findInvitationStates(reader, tripId),
    answers: await findAnswers(reader, tripId),
  };
}

export function toPersonView(row: PersonRow, selfUserId: string, states: PeopleStates): PersonView {
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    role: row.role,
    version: row.version,
    state: row.userId ? "joined" : (states.invitations.get(row.id) ?? "none"),
    isSelf: row.userId === selfUserId,
    answer: states.answers.get(row.id) ?? null,
  };
}

/** A trip keeps somebody who leads it and can sign in. Call inside the transaction that takes a leader away. */
export async function requireAnotherLeader(tx: Transaction, tripId: string, personId: string): Promise<void> {
  const [others] = await tx
    .select({ count: count() })
    .from(person)
    .where(
      and(eq(person.tripId, tripId), eq(person.role, "leader"), ne(person.id, personId), isNotNull(person.userId)),
    );
  if ((others?.count ?? 0) > 0) return;
  throw new AppError("in-use", "A trip needs a leader. Make somebody else leader first, somebody who has joined.");
}

/** What goes with a person, one sentence each. */
export async function listPersonDependents(reader: Reader, tripId: string, personId: string): Promise<string[]> {
  const [places] = await reader
    .select({ count: count() })
    .from(sleeper)
    .innerJoin(pitch, eq(pitch.id, sleeper.pitchId))
    .innerJoin(camp, eq(camp.id, sleeper.campId))
    .where(and(eq(sleeper.tripId, tripId), eq(sleeper.personId, personId), isInLine));
  const carried = await reader
    .select({ count: carry.count })
    .from(carry)
    .where(and(eq(carry.tripId, tripId), eq(carry.personId, personId)));
  const pieces = carried.reduce((sum, one) => sum + one.count, 0);
  const sentences: string[] = [];
  const nights = places?.count ?? 0;
  if (nights > 0) sentences.push(`They have a sleeping place at ${plural(nights, "camp")}.`);
  if (pieces > 0) sentences.push(`They carry ${plural(pieces, "piece")} of the group's gear.`);
  return sentences;
}

export async function voidInvitations(tx: Transaction, personIds: readonly string[]): Promise<void> {
  if (personIds.length === 0) return;
  await tx.delete(invitation).where(and(inArray(invitation.personId, personIds), isNull(invitation.usedAt)));
}
