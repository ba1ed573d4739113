import { and, desc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { paperCopy, paperLook } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { compareOwnPages } from "@/lib/domain/own-pages/compare";
import type { OwnPages } from "@/lib/domain/own-pages/own-pages";
import type { CopyView } from "@/lib/domain/own-pages/views";
import type { Context } from "@/lib/services/context/context";
import type { Reader } from "../trips/internal";

export type CopyRow = typeof paperCopy.$inferSelect;
export type LookRow = typeof paperLook.$inferSelect;

export interface NewCopy {
  readonly tripId: string;
  readonly personId: string;
  readonly way: CopyRow["way"];
  readonly version: number;
  readonly content: OwnPages;
}

/** Remembers that somebody's pages left the desk. The same version again by the same way counts from the later time. */
export async function recordCopy(tx: Pick<Transaction, "insert">, ctx: Context, copy: NewCopy): Promise<void> {
  const latest = { content: copy.content, userName: ctx.actor.name, createdAt: new Date() };
  await tx
    .insert(paperCopy)
    .values({ id: newId(), ...copy, ...latest })
    .onConflictDoUpdate({ target: [paperCopy.personId, paperCopy.way, paperCopy.version], set: latest });
}

/** Newest first. */
export async function listCopies(reader: Reader, tripId: string): Promise<CopyRow[]> {
  return reader.select().from(paperCopy).where(eq(paperCopy.tripId, tripId)).orderBy(desc(paperCopy.createdAt));
}

export async function listLooks(reader: Reader, tripId: string): Promise<LookRow[]> {
  return reader.select().from(paperLook).where(eq(paperLook.tripId, tripId));
}

export async function findLook(reader: Reader, tripId: string, personId: string): Promise<LookRow | null> {
  const [row] = await reader
    .select()
    .from(paperLook)
    .where(and(eq(paperLook.personId, personId), eq(paperLook.tripId, tripId)))
    .limit(1);
  return row ?? null;
}

/** The latest copy of each way, with what is different on it by now. */
export function latestCopies(rows: readonly CopyRow[], personId: string, now: OwnPages): CopyView[] {
  const own = rows.filter((row) => row.personId === personId);
  const latest = own.filter((row, index) => own.findIndex((other) => other.way === row.way) === index);
  return latest.map(({ way, version, createdAt, content }) => ({
    way,
    version,
    at: createdAt.toISOString(),
    changes: compareOwnPages(content, now),
  }));
}
