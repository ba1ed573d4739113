import { and, desc, eq, inArray, lt, ne, type SQL } from "drizzle-orm";
import { z } from "zod";
import { getDb } from "@/db/client";
import { changeLog, pitch } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { idSchema } from "@/lib/domain/ids";
import type { TripHistory } from "@/lib/domain/history/views";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow } from "../camps/internal";
import type { Reader } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { changeWords } from "./change-words";

export const listChangesInput = z.object({
  tripId: idSchema,
  campId: idSchema.optional(),
  userId: idSchema.optional(),
  /** Only what happened before this moment. */
  before: z.iso.datetime({ error: "That is no moment." }).optional(),
});

const AT_ONCE = 100;

/** What belongs to a camp: itself, its plan and sleepers, and the shelters pitched at it. */
async function whereCamp(reader: Reader, tripId: string, campId: string): Promise<SQL> {
  await loadCampRow(reader, tripId, campId);
  const pitches = await reader
    .select({ id: pitch.id })
    .from(pitch)
    .where(and(eq(pitch.campId, campId), eq(pitch.tripId, tripId)));
  return inArray(changeLog.entityId, [campId, ...pitches.map((one) => one.id)]);
}

async function listAuthors(reader: Reader, tripId: string): Promise<TripHistory["people"]> {
  const rows = await reader
    .select({ userId: changeLog.userId, name: changeLog.userName })
    .from(changeLog)
    .where(and(eq(changeLog.tripId, tripId), ne(changeLog.action, "hand-out")))
    .groupBy(changeLog.userId, changeLog.userName)
    .orderBy(changeLog.userName);
  const known = rows.flatMap(({ userId, name }) => (userId ? [{ userId, name }] : []));
  return known.filter((one, index) => known.findIndex((other) => other.userId === one.userId) === index);
}

/** Who changed what on the trip, newest first; for one camp or by one person when asked. */
export async function listChanges({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof listChangesInput>;
}): Promise<TripHistory> {
  const { tripId, campId, userId, before } = parseInput(listChangesInput, input);
  await requirePermission(ctx, tripId, "history.read");
  const db = getDb();
  const rows = await db
    .select()
    .from(changeLog)
    .where(
      and(
        eq(changeLog.tripId, tripId),
        ne(changeLog.action, "hand-out"),
        campId ? await whereCamp(db, tripId, campId) : undefined,
        userId ? eq(changeLog.userId, userId) : undefined,
        before ? lt(changeLog.createdAt, new Date(before)) : undefined,
      ),
    )
    .orderBy(desc(changeLog.createdAt), desc(changeLog.id))
    .limit(AT_ONCE + 1);
  const shown = rows.slice(0, AT_ONCE);
  return {
    entries: shown.map((row) => ({
      id: row.id,
      at: row.createdAt.toISOString(),
      byName: row.userName,
      what: changeWords(row.action, row.entity),
      summary: row.summary,
    })),
    people: await listAuthors(db, tripId),
    olderThan: rows.length > AT_ONCE ? (shown.at(-1)?.createdAt.toISOString() ?? null) : null,
  };
}
