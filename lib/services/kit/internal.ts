import { and, asc, eq } from "drizzle-orm";
import { kitItem } from "@/db/schema";
import { AppError } from "@/lib/errors";
import type { Reader } from "../trips/internal";

export type KitRow = typeof kitItem.$inferSelect;

export async function listKitRows(reader: Reader, tripId: string): Promise<KitRow[]> {
  return reader
    .select()
    .from(kitItem)
    .where(eq(kitItem.tripId, tripId))
    .orderBy(asc(kitItem.position), asc(kitItem.id));
}

export async function loadKitRow(reader: Reader, tripId: string, kitItemId: string): Promise<KitRow> {
  const [row] = await reader
    .select()
    .from(kitItem)
    .where(and(eq(kitItem.id, kitItemId), eq(kitItem.tripId, tripId)))
    .limit(1);
  if (!row) throw new AppError("not-found", "There is no such thing in this trip's kit.");
  return row;
}
