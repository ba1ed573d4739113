import { and, eq, inArray, max } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { invitation, outboxMessage, person } from "@/db/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { TripOverview } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { workOutCamp } from "../analysis/work-out-camp";
import { countNights } from "../camps/internal";
import { summariseCamp } from "../camps/summarise-camp";
import type { KitRow } from "../kit/internal";
import { loadTripState } from "../plan/load-trip-state";
import { getPreferences } from "../preferences/get-preferences";
import { toTripView, type Reader, type TripRow } from "./internal";
import { listTodo, type OverviewCamp, type PeopleStanding } from "./list-todo";
import { writeHeadline, writeSubline } from "./overview-words";
import { parseInput } from "./parse-input";

async function countPeople(reader: Reader, tripId: string): Promise<PeopleStanding> {
  const rows = await reader
    .select({ id: person.id, userId: person.userId, invitedId: max(invitation.id) })
    .from(person)
    .leftJoin(invitation, eq(invitation.personId, person.id))
    .where(eq(person.tripId, tripId))
    .groupBy(person.id);
  const waiting = rows.filter((row) => row.userId === null);
  const unanswered = waiting.filter((row) => row.invitedId !== null).length;
  return { total: rows.length, unanswered, uninvited: waiting.length - unanswered };
}

/** Whose latest papers are the ones that would be printed now: sent since something on them last changed. */
async function countPapers(reader: Reader, trip: TripRow, peopleCount: number): Promise<TripOverview["papers"]> {
  const rows = await reader
    .select({ personId: outboxMessage.personId, latestAt: max(outboxMessage.createdAt) })
    .from(outboxMessage)
    .innerJoin(person, eq(person.id, outboxMessage.personId))
    .where(
      and(
        eq(outboxMessage.tripId, trip.id),
        eq(outboxMessage.kind, "papers"),
        inArray(outboxMessage.state, ["waiting", "sending", "sent"]),
      ),
    )
    .groupBy(outboxMessage.personId);
  const current = rows.filter((row) => row.latestAt !== null && row.latestAt >= trip.updatedAt).length;
  return {
    version: trip.paperVersion,
    current,
    outdated: rows.length - current,
    never: Math.max(0, peopleCount - rows.length),
  };
}

function weighKit(kit: readonly KitRow[]): TripOverview["kit"] {
  const massKg = kit.reduce((sum, { details }) => sum + details.massKg * details.count, 0);
  const anchorCount = kit.reduce((sum, { details }) => sum + (details.type === "anchor" ? details.count : 0), 0);
  return { massKg, anchorCount };
}

/** The trip at a glance: each night's verdict, what is wrong in words, what to do next. */
export async function getTripOverview({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<TripOverview> {
  const { tripId } = parseInput(tripRefInput, input);
  const { role } = await requirePermission(ctx, tripId, "camp.read");
  const db = getDb();
  const state = await loadTripState(db, tripId);
  const { speedUnit } = await getPreferences({ ctx });
  const camps = await Promise.all(
    state.camps.map(async (camp): Promise<OverviewCamp> => {
      const worked = await workOutCamp(camp);
      return { state: camp, worked, summary: summariseCamp(camp, worked) };
    }),
  );
  const summaries = camps.map((camp) => camp.summary);
  const people = await countPeople(db, tripId);
  return {
    trip: toTripView(state.trip, role, countNights(summaries.map((one) => ({ nights: one.days.length })))),
    peopleCount: people.total,
    camps: summaries,
    headline: writeHeadline(summaries),
    subline: writeSubline(summaries, speedUnit),
    todo: listTodo(tripId, camps, people, speedUnit),
    kit: weighKit(state.kit),
    papers: await countPapers(db, state.trip, people.total),
  };
}
