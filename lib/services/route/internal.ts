import { asc, eq } from "drizzle-orm";
import { campStop, routeLine, routeSettings } from "@/db/schema";
import type { Transaction } from "@/db/client";
import type { LatLon } from "@/lib/calc/places/utm";
import { nearestOnLine } from "@/lib/gpx/line-places";
import type { LineData, MeasuredRoute } from "@/lib/gpx/measure-line";
import type { RoutePlace } from "@/lib/domain/route/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { listCampRows } from "../camps/internal";
import { recordChange, type Reader } from "../trips/internal";

export type RouteLineRow = typeof routeLine.$inferSelect;
export type RouteHead = Omit<RouteLineRow, "points">;
export type RouteSettingsRow = typeof routeSettings.$inferSelect;
export type CampStopRow = typeof campStop.$inferSelect;

/** A camp farther than this from a new line, m, is not put on it. */
export const SNAP_M = 500;

/** Everything of the line but its points, which are megabytes. */
export async function findRouteHead(reader: Reader, tripId: string): Promise<RouteHead | null> {
  const [row] = await reader
    .select({
      tripId: routeLine.tripId,
      name: routeLine.name,
      source: routeLine.source,
      pointCount: routeLine.pointCount,
      starts: routeLine.starts,
      lengthM: routeLine.lengthM,
      breaks: routeLine.breaks,
      simplified: routeLine.simplified,
      profile: routeLine.profile,
      places: routeLine.places,
      remarks: routeLine.remarks,
      createdAt: routeLine.createdAt,
    })
    .from(routeLine)
    .where(eq(routeLine.tripId, tripId))
    .limit(1);
  return row ?? null;
}

export async function findRouteLine(reader: Reader, tripId: string): Promise<RouteLineRow | null> {
  const [row] = await reader.select().from(routeLine).where(eq(routeLine.tripId, tripId)).limit(1);
  return row ?? null;
}

export async function findRouteSettings(reader: Reader, tripId: string): Promise<RouteSettingsRow | null> {
  const [row] = await reader.select().from(routeSettings).where(eq(routeSettings.tripId, tripId)).limit(1);
  return row ?? null;
}

export async function listStopRows(reader: Reader, tripId: string): Promise<CampStopRow[]> {
  return reader.select().from(campStop).where(eq(campStop.tripId, tripId)).orderBy(asc(campStop.campId));
}

/** The four rows of doubles one after the other. */
export function packPoints(line: LineData): Buffer {
  const count = line.atM.length;
  const all = new Float64Array(count * 4);
  all.set(line.latitudes, 0);
  all.set(line.longitudes, count);
  all.set(line.heightsM, count * 2);
  all.set(line.atM, count * 3);
  return Buffer.from(all.buffer);
}

export function unpackLine(row: Pick<RouteLineRow, "points" | "pointCount" | "starts">): LineData {
  // A copy begins at a whole number of doubles, which the database's own buffer need not.
  const bytes = Uint8Array.from(row.points);
  const all = new Float64Array(bytes.buffer, 0, row.pointCount * 4);
  const part = (index: number) => all.subarray(index * row.pointCount, (index + 1) * row.pointCount);
  return { latitudes: part(0), longitudes: part(1), heightsM: part(2), atM: part(3), starts: row.starts };
}

export function requirePosition(place: { latitude: number | null; longitude: number | null }): LatLon | null {
  const { latitude, longitude } = place;
  return latitude === null || longitude === null ? null : { latitude, longitude };
}

export async function writeStop(
  tx: Transaction,
  stop: { tripId: string; campId: string },
  values: Partial<Pick<CampStopRow, "atM" | "leg">>,
): Promise<void> {
  await tx
    .insert(campStop)
    .values({ ...stop, atM: null, leg: null, ...values })
    .onConflictDoUpdate({ target: campStop.campId, set: values });
}

/** Puts every camp with a position near the line on it, in the order of the nights; the others are taken off it. */
export async function snapCamps(tx: Transaction, tripId: string, line: LineData): Promise<number> {
  let fromM = 0;
  let snapped = 0;
  for (const camp of await listCampRows(tx, tripId)) {
    const place = requirePosition(camp);
    const found = place && nearestOnLine(line, place, fromM);
    const atM = found && found.offM <= SNAP_M ? found.atM : null;
    await writeStop(tx, { tripId, campId: camp.id }, { atM });
    if (atM === null) continue;
    fromM = atM;
    snapped += 1;
  }
  return snapped;
}

/** The trip's line, in place of the one before; camps are put on it where they lie near. */
export async function storeRoute(
  tx: Transaction,
  ctx: Context,
  route: {
    readonly tripId: string;
    readonly name: string;
    readonly source: RouteLineRow["source"];
    readonly measured: MeasuredRoute;
    readonly places: readonly RoutePlace[];
    readonly remarks: readonly string[];
  },
): Promise<{ snapped: number }> {
  const { tripId, measured, ...rest } = route;
  await tx.delete(routeLine).where(eq(routeLine.tripId, tripId));
  await tx.insert(routeLine).values({
    tripId,
    ...rest,
    points: packPoints(measured.line),
    pointCount: measured.line.atM.length,
    starts: measured.line.starts,
    lengthM: measured.lengthM,
    breaks: measured.breaks,
    simplified: measured.simplified,
    profile: measured.profile,
    createdAt: new Date(),
  });
  const snapped = await snapCamps(tx, tripId, measured.line);
  await recordChange(tx, ctx, {
    tripId,
    action: "update",
    entity: "route",
    entityId: tripId,
    summary: route.source === "file" ? `Route from a file: ${route.name}` : "Route drawn by hand",
    isPrinted: true,
  });
  return { snapped };
}

export function requireLine<Row extends RouteHead>(row: Row | null): Row {
  if (row) return row;
  throw new AppError("not-found", "This trip has no line yet. Import a file or draw one first.");
}
