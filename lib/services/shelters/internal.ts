import { and, asc, eq } from "drizzle-orm";
import { shelter } from "@/db/schema";
import { checkShelterSpec } from "@/lib/calc/shelter-kinds";
import type { ShelterSpec } from "@/lib/calc/types";
import type { ShelterDetails } from "@/lib/domain/shelter/schema";
import { AppError } from "@/lib/errors";
import type { Reader } from "../trips/internal";

export type ShelterRow = typeof shelter.$inferSelect;

export async function listShelterRows(reader: Reader, tripId: string): Promise<ShelterRow[]> {
  return reader
    .select()
    .from(shelter)
    .where(eq(shelter.tripId, tripId))
    .orderBy(asc(shelter.position), asc(shelter.id));
}

export async function loadShelterRow(reader: Reader, tripId: string, shelterId: string): Promise<ShelterRow> {
  const [row] = await reader
    .select()
    .from(shelter)
    .where(and(eq(shelter.id, shelterId), eq(shelter.tripId, tripId)))
    .limit(1);
  if (!row) throw new AppError("not-found", "There is no such shelter on this trip.");
  return row;
}

export function toShelterDetails(row: ShelterRow): ShelterDetails {
  return { name: row.name, sleeps: row.sleeps, massKg: row.massKg, spec: row.spec };
}

/** Refuses a shelter that can't be built, field by field. */
export function requireBuildable(spec: ShelterSpec, pathTo: (field: string) => string): void {
  const problems = checkShelterSpec(spec);
  if (problems.length === 0) return;
  const fieldErrors: Record<string, string[]> = {};
  for (const { field, message } of problems) (fieldErrors[pathTo(field)] ??= []).push(message);
  throw new AppError("bad-input", problems[0]?.message ?? "This shelter can't be built.", { fieldErrors });
}
