import type { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { routeRefInput } from "@/lib/domain/route/schema";
import type { RouteStop } from "@/lib/domain/route/views";
import { formatDayShort } from "@/lib/format/days";
import { AppError } from "@/lib/errors";
import { writeGpx, type GpxTrackPiece } from "@/lib/gpx/write-gpx";
import type { Context } from "@/lib/services/context/context";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { loadRoute } from "./get-route";
import { findRouteLine, unpackLine } from "./internal";

/** The line cut at the camps that are on it, in the order of the way; the whole of it is in one piece or another. */
export function cutIntoDays(stops: readonly RouteStop[], lengthM: number, homeDay: string): GpxTrackPiece[] {
  const placed = stops.filter((stop) => stop.atM !== null).toSorted((a, b) => (a.atM ?? 0) - (b.atM ?? 0));
  const ends = [
    ...placed.map((stop) => ({ name: stop.name, day: stop.days[0] ?? homeDay, atM: Math.min(stop.atM ?? 0, lengthM) })),
    { name: "end", day: homeDay, atM: lengthM },
  ];
  let fromM = 0;
  return ends.flatMap(({ name, day, atM }) => {
    const piece = { name: `${formatDayShort(day)}: to ${name}`, fromM, toM: atM };
    fromM = atM;
    return piece.toM > piece.fromM ? [piece] : [];
  });
}

/** GPX 1.1 of the plan: camps as waypoints, days as tracks, from all points of the line. */
export async function exportGpx({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof routeRefInput>;
}): Promise<{ fileName: string; content: string }> {
  const { tripId } = parseInput(routeRefInput, input);
  await requirePermission(ctx, tripId, "route.read");
  const db = getDb();
  const trip = await loadTripRow(db, tripId);
  const route = await loadRoute(db, tripId);
  const row = await findRouteLine(db, tripId);
  const waypoints = route.stops.flatMap(({ name, latitude, longitude, altitudeM, days }) =>
    latitude === null || longitude === null
      ? []
      : [{ name, note: `Night of ${days.map(formatDayShort).join(", ")}`, latitude, longitude, heightM: altitudeM }],
  );
  if (!row && waypoints.length === 0) {
    throw new AppError("not-found", "There is nothing to export yet: no line, and no camp with a position.");
  }
  const content = writeGpx({
    name: trip.name,
    waypoints,
    line: row && unpackLine(row),
    pieces: row ? cutIntoDays(route.stops, row.lengthM, route.homeDay) : [],
  });
  return { fileName: `${trip.name}.gpx`, content };
}
