import { tz } from "@date-fns/tz";
import { addMinutes, format } from "date-fns";
import { eq } from "drizzle-orm";
import { emergencyPlan } from "@/db/schema";
import type { EmergencyPlanView } from "@/lib/domain/people-views";
import type { Reader, TripRow } from "../trips/internal";

export type EmergencyRow = typeof emergencyPlan.$inferSelect;

/** Version 0 while nobody has written one. */
export async function loadEmergencyPlan(reader: Reader, tripId: string): Promise<EmergencyRow> {
  const [row] = await reader.select().from(emergencyPlan).where(eq(emergencyPlan.tripId, tripId));
  return (
    row ?? {
      tripId,
      meetingPoints: "",
      wayOut: "",
      groupPhone: "",
      dueBackAt: null,
      outsideName: "",
      outsideEmail: "",
      outsidePhone: "",
      steps: [],
      version: 0,
      sentVersion: null,
      sentAt: null,
      backAt: null,
      updatedAt: new Date(0),
    }
  );
}

/** "Sun 14 June 20:30" on the clock of the trip. */
export function formatMoment(instant: Date, timeZone: string): string {
  return format(instant, "EEE d MMMM HH:mm", { in: tz(timeZone) });
}

function listMissing(row: EmergencyRow): string[] {
  return [
    ...(row.dueBackAt === null ? ["when the group is due back"] : []),
    ...(row.outsideName === "" ? ["the name of the contact outside"] : []),
    ...(row.outsideEmail === "" ? ["the address of the contact outside"] : []),
    ...(row.steps.length === 0 ? ["at least one step"] : []),
  ];
}

export function toEmergencyView(row: EmergencyRow, trip: TripRow): EmergencyPlanView {
  const { dueBackAt } = row;
  const clock = (pattern: string) => (dueBackAt ? format(dueBackAt, pattern, { in: tz(trip.timeZone) }) : "");
  return {
    meetingPoints: row.meetingPoints,
    wayOut: row.wayOut,
    groupPhone: row.groupPhone,
    dueBackDay: clock("yyyy-MM-dd"),
    dueBackTime: clock("HH:mm"),
    outsideName: row.outsideName,
    outsideEmail: row.outsideEmail,
    outsidePhone: row.outsidePhone,
    steps: row.steps.map((step) => ({
      ...step,
      at: dueBackAt && formatMoment(addMinutes(dueBackAt, step.afterMinutes), trip.timeZone),
    })),
    version: row.version,
    sentVersion: row.sentVersion,
    sentAt: row.sentAt?.toISOString() ?? null,
    backAt: row.backAt?.toISOString() ?? null,
    missing: listMissing(row),
  };
}
