import "./database";
import { getDb } from "@/db/client";
import { person, trip, user } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import type { Role } from "@/lib/domain/permissions/permissions";
import type { Context } from "@/lib/services/context/context";

let count = 0;

/** An account that is verified; without a password, unless a test gives it one. */
export async function makeUser(
  overrides: Partial<typeof user.$inferInsert> = {},
): Promise<{ id: string; name: string; email: string; ctx: Context }> {
  count += 1;
  const row = {
    id: newId(),
    name: `Person ${count}`,
    email: `person-${count}@example.test`,
    emailVerified: true,
    createdAt: new Date(),
    updatedAt: new Date(),
    ...overrides,
  };
  await getDb().insert(user).values(row);
  const { id, name, email } = row;
  return { id, name, email, ctx: { actor: { userId: id, name, email }, requestId: newId() } };
}

export type TestUser = Awaited<ReturnType<typeof makeUser>>;

export async function makeTrip(overrides: Partial<typeof trip.$inferInsert> = {}): Promise<string> {
  const id = newId();
  await getDb()
    .insert(trip)
    .values({
      id,
      name: "Ridge and river",
      startDate: "2027-06-07",
      timeZone: "Europe/London",
      createdAt: new Date(),
      updatedAt: new Date(),
      ...overrides,
    });
  return id;
}

/** Puts somebody on a trip; without a user it is somebody who has no account yet. Returns the person's id. */
export async function makePerson(
  tripId: string,
  role: Role,
  who: TestUser | { readonly name: string; readonly email: string },
): Promise<string> {
  const id = newId();
  await getDb()
    .insert(person)
    .values({
      id,
      tripId,
      userId: "id" in who ? who.id : null,
      name: who.name,
      email: who.email,
      role,
      createdAt: new Date(),
    });
  return id;
}

/** A trip with one of each, a stranger, and the leader of another trip. */
export async function makeCast() {
  const leader = await makeUser();
  const coLeader = await makeUser();
  const participant = await makeUser();
  const stranger = await makeUser();
  const otherLeader = await makeUser();
  const tripId = await makeTrip();
  const otherTripId = await makeTrip({ name: "Another trip" });
  const personIds = {
    leader: await makePerson(tripId, "leader", leader),
    coLeader: await makePerson(tripId, "co-leader", coLeader),
    participant: await makePerson(tripId, "participant", participant),
  };
  const otherPersonId = await makePerson(otherTripId, "leader", otherLeader);
  return { tripId, otherTripId, leader, coLeader, participant, stranger, otherLeader, personIds, otherPersonId };
}
