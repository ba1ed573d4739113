import { eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { personalDetail } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { ContactSheetView } from "@/lib/domain/people-views";
import { ROLES } from "@/lib/domain/permissions/permissions";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { loadEmergencyPlan } from "../emergency/internal";
import { listGuests } from "../roster/internal";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { openDetails, type DetailRow } from "./internal";

function read(row: DetailRow | undefined): ContactSheetView["people"][number]["details"] {
  if (!row) return null;
  try {
    return openDetails(row);
  } catch (error) {
    if (error instanceof AppError) return "unreadable";
    throw error;
  }
}

/** Who is on the trip, whom to call, what to know about them; for leaders and co-leaders. Who does not come is left out. */
export async function getContactSheet({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<ContactSheetView> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "contacts.read");
  const trip = await loadTripRow(getDb(), tripId);
  const rows = await getDb().select().from(personalDetail).where(eq(personalDetail.tripId, tripId));
  const plan = await loadEmergencyPlan(getDb(), tripId);
  const people = (await listGuests(getDb(), tripId))
    .filter((guest) => guest.value !== "no")
    .map(({ person }) => ({
      id: person.id,
      name: person.name,
      role: person.role,
      email: person.email,
      details: read(rows.find((row) => row.personId === person.id)),
    }))
    .sort((a, b) => ROLES.indexOf(a.role) - ROLES.indexOf(b.role) || a.name.localeCompare(b.name, "en"));
  return {
    people,
    contacts: trip.contacts,
    meetingPoints: plan.meetingPoints,
    wayOut: plan.wayOut,
    groupPhone: plan.groupPhone,
  };
}
