import { eq } from "drizzle-orm";
import { personalDetail } from "@/db/schema";
import { personalDetailsSchema, type PersonalDetails } from "@/lib/domain/details/schema";
import type { Reader } from "../trips/internal";
import { unseal } from "./seal";

export type DetailRow = typeof personalDetail.$inferSelect;

export const NO_DETAILS: PersonalDetails = { phone: "", emergencyContacts: [], health: "", diet: "" };

export function openDetails(row: DetailRow): PersonalDetails {
  const text = unseal(row.sealed, { rowId: row.id, personId: row.personId, tripId: row.tripId });
  return personalDetailsSchema.parse(JSON.parse(text));
}

export async function findDetailRow(reader: Reader, personId: string): Promise<DetailRow | null> {
  const [row] = await reader.select().from(personalDetail).where(eq(personalDetail.personId, personId));
  return row ?? null;
}
