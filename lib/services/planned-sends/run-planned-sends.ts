import { and, asc, eq, inArray, lte } from "drizzle-orm";
import { getDb, withTransaction } from "@/db/client";
import { person, plannedSend, user } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import type { PlannedSendState } from "@/lib/domain/post/schema";
import { AppError } from "@/lib/errors";
import { sendPapers, type PaperSource } from "../post/send-papers";
import { isCalledOff } from "../roster/internal";

type Row = typeof plannedSend.$inferSelect;

async function settle(row: Row, state: PlannedSendState, reason: string | null = null): Promise<void> {
  await withTransaction(async (tx) => {
    await tx
      .update(plannedSend)
      .set({ state, reason })
      .where(and(eq(plannedSend.id, row.id), eq(plannedSend.state, "planned")));
  });
}

/** With the rights that whoever planned it has now, to those chosen who are still on the trip. */
async function sendOne(row: Row, source: PaperSource | undefined): Promise<void> {
  const [by] = await getDb().select().from(user).where(eq(user.id, row.byUserId));
  if (!by) return settle(row, "failed", "Who planned it has no account any more.");
  if (await isCalledOff(getDb(), row.tripId)) return settle(row, "failed", "The trip has been called off.");
  const present = await getDb()
    .select({ id: person.id })
    .from(person)
    .where(and(eq(person.tripId, row.tripId), inArray(person.id, row.content.personIds)));
  const personIds = row.content.personIds.filter((id) => present.some((one) => one.id === id));
  if (personIds.length === 0) return settle(row, "failed", "Nobody of those you chose is on the trip any more.");
  const ctx = { actor: { userId: by.id, name: by.name, email: by.email }, requestId: newId() };
  const input = { ...row.content, personIds, tripId: row.tripId, requestId: row.id };
  try {
    await sendPapers({ ctx, input, ...(source ? { source } : {}) });
  } catch (error) {
    const isForNow = error instanceof AppError && (error.code === "too-many" || error.code === "unavailable");
    if (!(error instanceof AppError) || isForNow) throw error;
    return settle(row, "failed", error.userMessage);
  }
  return settle(row, "sent");
}

/** What was planned and is due. Its id is the request's: however often this runs, each goes out once. */
export async function runPlannedSends(now: Date, source?: PaperSource): Promise<number> {
  const rows = await getDb()
    .select()
    .from(plannedSend)
    .where(and(eq(plannedSend.state, "planned"), lte(plannedSend.sendAt, now)))
    .orderBy(asc(plannedSend.sendAt))
    .limit(20);
  let firstError: unknown = null;
  for (const row of rows) {
    try {
      await sendOne(row, source);
    } catch (error) {
      firstError ??= error;
    }
  }
  if (firstError) throw firstError;
  return rows.length;
}
