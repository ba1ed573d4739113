import "server-only";
import { notFound } from "next/navigation";
import { requireContext } from "@/lib/auth/session";
import { isAllowed, type Permission } from "@/lib/domain/permissions/permissions";
import { orNotFound } from "@/lib/http/or-not-found";
import { getPreferences } from "@/lib/services/preferences/get-preferences";
import { getTrip } from "@/lib/services/trips/get-trip";

/**
 * What every page of a trip starts with. Who may not see the page gets "not found" here, before anything is sent, so
 * that the status says so too; services check again for themselves.
 */
export async function loadTrip(params: Promise<{ tripId: string }>, permission: Permission) {
  const { tripId } = await params;
  const ctx = await requireContext();
  const trip = await orNotFound(getTrip({ ctx, input: { tripId } }));
  if (!isAllowed(trip.role, permission)) notFound();
  const preferences = await getPreferences({ ctx });
  return { ctx, trip, preferences, can: (what: Permission) => isAllowed(trip.role, what) };
}
