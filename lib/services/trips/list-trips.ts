import { and, asc, count, desc, eq, inArray, sum } from "drizzle-orm";
import { getDb } from "@/db/client";
import { camp, person, trip } from "@/db/schema";
import type { TripListItem } from "@/lib/domain/views";
import { addDays } from "@/lib/format/days";
import type { Context } from "@/lib/services/context/context";
import { isInLine } from "../camps/internal";

const MAX_LISTED = 200;

/** Trips that the person is on, latest first. */
export async function listTrips({ ctx }: { ctx: Context }): Promise<TripListItem[]> {
  const db = getDb();
  const rows = await db
    .select({ id: trip.id, name: trip.name, startDate: trip.startDate, role: person.role })
    .from(person)
    .innerJoin(trip, eq(trip.id, person.tripId))
    .where(eq(person.userId, ctx.actor.userId))
    .orderBy(desc(trip.startDate), asc(trip.id))
    .limit(MAX_LISTED);
  if (rows.length === 0) return [];
  const ids = rows.map((row) => row.id);
  const camps = await db
    .select({ tripId: camp.tripId, campCount: count(), nights: sum(camp.nights).mapWith(Number) })
    .from(camp)
    .where(and(inArray(camp.tripId, ids), isInLine))
    .groupBy(camp.tripId);
  const people = await db
    .select({ tripId: person.tripId, peopleCount: count() })
    .from(person)
    .where(inArray(person.tripId, ids))
    .groupBy(person.tripId);
  return rows.map((row) => {
    const own = camps.find((one) => one.tripId === row.id);
    const nights = own?.nights ?? 0;
    return {
      ...row,
      nights,
      endDate: addDays(row.startDate, nights),
      campCount: own?.campCount ?? 0,
      peopleCount: people.find((one) => one.tripId === row.id)?.peopleCount ?? 0,
    };
  });
}
