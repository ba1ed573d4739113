import { and, asc, eq, isNotNull, isNull } from "drizzle-orm";
import { camp } from "@/db/schema";
import type { CampDetails } from "@/lib/domain/camp/schema";
import { MAX_NIGHTS } from "@/lib/domain/trip/schema";
import type { CampView } from "@/lib/domain/views";
import { AppError } from "@/lib/errors";
import { addDays } from "@/lib/format/days";
import type { Reader } from "../trips/internal";

export type CampRow = typeof camp.$inferSelect;

/** What every list of camps asks for: an alternative is kept beside, in no night, count or paper of the trip. */
export const isInLine = isNull(camp.alternativeToId);

/** The line of nights. Alternatives are not in it. */
export async function listCampRows(reader: Reader, tripId: string): Promise<CampRow[]> {
  return reader
    .select()
    .from(camp)
    .where(and(eq(camp.tripId, tripId), isInLine))
    .orderBy(asc(camp.position), asc(camp.id));
}

export async function listAlternativeRows(reader: Reader, tripId: string): Promise<CampRow[]> {
  return reader
    .select()
    .from(camp)
    .where(and(eq(camp.tripId, tripId), isNotNull(camp.alternativeToId)))
    .orderBy(asc(camp.createdAt), asc(camp.id));
}

/** Names of all camps by id, with what an alternative is: for sentences about what uses a thing. */
export async function nameCamps(reader: Reader, tripId: string): Promise<ReadonlyMap<string, string>> {
  const rows = await reader
    .select({ id: camp.id, name: camp.name, alternativeToId: camp.alternativeToId })
    .from(camp)
    .where(eq(camp.tripId, tripId));
  return new Map(rows.map((row) => [row.id, row.alternativeToId === null ? row.name : `${row.name} (alternative)`]));
}

export async function loadCampRow(reader: Reader, tripId: string, campId: string): Promise<CampRow> {
  const [row] = await reader
    .select()
    .from(camp)
    .where(and(eq(camp.id, campId), eq(camp.tripId, tripId)))
    .limit(1);
  if (!row) throw new AppError("not-found", "There is no such camp on this trip.");
  return row;
}

export function countNights(camps: readonly { readonly nights: number }[]): number {
  return camps.reduce((sum, one) => sum + one.nights, 0);
}

export function requireNightsFit(nights: number): void {
  if (nights <= MAX_NIGHTS) return;
  throw new AppError("bad-input", `A trip can have at most ${MAX_NIGHTS} nights.`, {
    fieldErrors: { "details.nights": [`With this camp the trip has ${nights} nights; at most ${MAX_NIGHTS} fit.`] },
  });
}

export function toCampDetails(row: CampRow): CampDetails {
  return {
    name: row.name,
    nights: row.nights,
    latitude: row.latitude,
    longitude: row.longitude,
    altitudeM: row.altitudeM,
    ground: row.ground,
    secondGround: row.secondGround,
    slopeDeg: row.slopeDeg,
    exposure: row.exposure,
    hill: row.hill,
    windbreak: row.windbreak,
    underTreesSpeedRatio: row.underTreesSpeedRatio,
    temperatureC: row.temperatureC,
    wind: row.wind,
    windFromDeg: row.windFromDeg,
    windToDeg: row.windToDeg,
    strongWindHours: row.strongWindHours,
    hasRocks: row.hasRocks,
    hasTrees: row.hasTrees,
    hasSticks: row.hasSticks,
    water: row.water,
    waterDistanceM: row.waterDistanceM,
    wayOut: row.wayOut,
    meetingPoint: row.meetingPoint,
    notes: row.notes,
    hazards: row.hazards,
  };
}

function toCampView(row: CampRow, days: readonly string[], position: number, main: CampRow | null): CampView {
  return {
    id: row.id,
    position,
    days,
    alternativeTo: main && { id: main.id, name: main.name },
    details: toCampDetails(row),
    version: row.version,
  };
}

/** Days follow from the trip's first day and the nights of the camps before. */
export function toCampViews(startDate: string, rows: readonly CampRow[]): CampView[] {
  let nightsBefore = 0;
  return rows.map((row) => {
    const first = nightsBefore;
    nightsBefore += row.nights;
    const days = Array.from({ length: row.nights }, (_, night) => addDays(startDate, first + night));
    return toCampView(row, days, row.position, null);
  });
}

/** Each with nights, days and place in the order of the camp that it stands by for. */
export function toAlternativeViews(
  startDate: string,
  rows: readonly CampRow[],
  alternatives: readonly CampRow[],
): CampView[] {
  const inLine = toCampViews(startDate, rows);
  return alternatives.flatMap((row) => {
    const index = rows.findIndex((one) => one.id === row.alternativeToId);
    const [main, view] = [rows[index], inLine[index]];
    if (!main || !view) return [];
    return [toCampView({ ...row, nights: main.nights }, view.days, view.position, main)];
  });
}
