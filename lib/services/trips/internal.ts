import { and, count, desc, eq, gte, ne, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { changeLog, person, trip } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import type { Role } from "@/lib/domain/permissions/permissions";
import type { TripView } from "@/lib/domain/views";
import { AppError } from "@/lib/errors";
import { addDays, formatInstant } from "@/lib/format/days";
import type { Context } from "@/lib/services/context/context";

/** What a read needs: the database itself or a transaction on it. */
export type Reader = Pick<Transaction, "select">;

export type TripRow = typeof trip.$inferSelect;

export async function loadTripRow(reader: Reader, tripId: string): Promise<TripRow> {
  const [row] = await reader.select().from(trip).where(eq(trip.id, tripId)).limit(1);
  if (!row) throw new AppError("not-found", "There is no such trip.");
  return row;
}

/** Trips that one person can lead at the same time; a limit against floods, far above what anybody plans. */
export const MOST_TRIPS = 200;

/** Throws when this person leads as many trips as one person may. */
export async function requireRoomForTrip(reader: Reader, ctx: Context): Promise<void> {
  const [row] = await reader
    .select({ trips: count() })
    .from(person)
    .where(and(eq(person.userId, ctx.actor.userId), eq(person.role, "leader")));
  if ((row?.trips ?? 0) >= MOST_TRIPS)
    throw new AppError("conflict", `You lead ${MOST_TRIPS} trips, the most one person can. Delete one first.`);
}

/** `nights` of all camps together: the last day is the morning after the last night. */
export function toTripView(row: TripRow, role: Role, nights: number): TripView {
  return {
    id: row.id,
    name: row.name,
    startDate: row.startDate,
    endDate: addDays(row.startDate, nights),
    timeZone: row.timeZone,
    notes: row.notes,
    contacts: row.contacts,
    version: row.version,
    paperVersion: row.paperVersion,
    role,
  };
}

interface Change {
  readonly tripId: string;
  readonly action: "create" | "update" | "delete" | "copy" | "reorder" | "hand-out";
  readonly entity:
    | "trip"
    | "camp"
    | "route"
    | "shelter"
    | "pitch"
    | "sleepers"
    | "kit"
    | "plan"
    | "pack"
    | "person"
    | "post"
    | "pull-test"
    | "comment";
  readonly entityId: string;
  /** For people: "Otter Flat: ground and wind". */
  readonly summary: string;
  /** True when something that stands on a card or list changes; `updatedAt` is when it last did. */
  readonly isPrinted: boolean;
}

/** Whether somebody was shown or sent papers as they are now. Until then a change makes no new version of them. */
export async function isHandedOut(reader: Reader, tripId: string): Promise<boolean> {
  const [row] = await reader
    .select({ id: changeLog.id })
    .from(changeLog)
    .innerJoin(trip, eq(trip.id, changeLog.tripId))
    .where(
      and(eq(changeLog.tripId, tripId), eq(changeLog.action, "hand-out"), gte(changeLog.createdAt, trip.updatedAt)),
    )
    .limit(1);
  return row !== undefined;
}

/**
 * Says who changed what, in the transaction of the change. When it stands on papers that somebody has, their version
 * counts up: two papers of one version never differ.
 */
export async function recordChange(tx: Transaction, ctx: Context, change: Change): Promise<void> {
  const { isPrinted, ...row } = change;
  const createdAt = new Date();
  await tx
    .insert(changeLog)
    .values({ id: newId(), ...row, userId: ctx.actor.userId, userName: ctx.actor.name, createdAt });
  if (!isPrinted) return;
  const step = (await isHandedOut(tx, change.tripId)) ? 1 : 0;
  await tx
    .update(trip)
    .set({ paperVersion: sql`${trip.paperVersion} + ${step}`, updatedAt: createdAt })
    .where(eq(trip.id, change.tripId));
}

/** After an update that matched no version: says who was first, and hands back what is there now. */
export async function refuseStale(
  tx: Transaction,
  stale: { readonly trip: TripRow; readonly entityId: string; readonly what: string; readonly current: unknown },
): Promise<never> {
  const [last] = await tx
    .select({ by: changeLog.userName, at: changeLog.createdAt })
    .from(changeLog)
    .where(
      and(
        eq(changeLog.tripId, stale.trip.id),
        eq(changeLog.entityId, stale.entityId),
        ne(changeLog.action, "hand-out"),
      ),
    )
    .orderBy(desc(changeLog.createdAt))
    .limit(1);
  const when = last ? ` on ${formatInstant(last.at, stale.trip.timeZone)}` : "";
  throw new AppError(
    "conflict",
    `${last?.by ?? "Somebody"} changed ${stale.what}${when}, after you opened it. Nothing of yours was saved yet.`,
    { details: { current: stale.current, by: last?.by ?? null, at: last?.at.toISOString() ?? null } },
  );
}
