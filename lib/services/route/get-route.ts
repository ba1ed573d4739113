import type { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import type { LatLon } from "@/lib/calc/places/utm";
import { BLANK_SETTINGS, routeRefInput } from "@/lib/domain/route/schema";
import type { EveningLight, RouteStop, RouteView } from "@/lib/domain/route/views";
import { addDays, minuteOn } from "@/lib/format/days";
import { placeOnLine } from "@/lib/gpx/line-places";
import { simplifiedLine } from "@/lib/gpx/measure-line";
import { sunOn } from "@/lib/places/sun-moon";
import type { Context } from "@/lib/services/context/context";
import { countNights, listCampRows, toCampViews, type CampRow } from "../camps/internal";
import { loadTripRow, type Reader, type TripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { findRouteHead, findRouteSettings, listStopRows, requirePosition, type RouteHead } from "./internal";

function eveningAt(place: LatLon | null, day: string, timeZone: string): EveningLight | null {
  if (!place) return null;
  const { light, sunset, dusk } = sunOn(place, day, timeZone);
  const minute = (instant: string | null) => (instant === null ? null : minuteOn(day, instant, timeZone));
  return { light, sunsetMin: minute(sunset), duskMin: minute(dusk) };
}

function toStops(
  trip: TripRow,
  camps: readonly CampRow[],
  rows: Awaited<ReturnType<typeof listStopRows>>,
): RouteStop[] {
  const byCamp = new Map(rows.map((row) => [row.campId, row]));
  return toCampViews(trip.startDate, camps).map(({ id, days, details, version }) => ({
    campId: id,
    name: details.name,
    version,
    days,
    latitude: details.latitude,
    longitude: details.longitude,
    altitudeM: details.altitudeM,
    atM: byCamp.get(id)?.atM ?? null,
    leg: byCamp.get(id)?.leg ?? null,
  }));
}

function listEvenings(trip: TripRow, stops: readonly RouteStop[], homeDay: string, head: RouteHead | null) {
  const line = head && simplifiedLine(head.simplified);
  const evenings = stops.map((stop) => {
    const place = requirePosition(stop) ?? (line && stop.atM !== null ? placeOnLine(line, stop.atM) : null);
    return eveningAt(place, stop.days[0] ?? homeDay, trip.timeZone);
  });
  const last = stops[stops.length - 1];
  const end = head && line ? placeOnLine(line, head.lengthM) : last ? requirePosition(last) : null;
  return last ? [...evenings, eveningAt(end, homeDay, trip.timeZone)] : evenings;
}

/** The route of a trip as its legs are worked out from; for services that have looked at the permission already. */
export async function loadRoute(reader: Reader, tripId: string): Promise<RouteView> {
  const trip = await loadTripRow(reader, tripId);
  const camps = await listCampRows(reader, tripId);
  const head = await findRouteHead(reader, tripId);
  const saved = await findRouteSettings(reader, tripId);
  const stops = toStops(trip, camps, await listStopRows(reader, tripId));
  const homeDay = addDays(trip.startDate, countNights(camps));
  return {
    tripId,
    line: head && {
      name: head.name,
      source: head.source,
      pointCount: head.pointCount,
      lengthM: head.lengthM,
      breaks: head.breaks,
      simplified: head.simplified,
      profile: head.profile,
      places: head.places,
      remarks: head.remarks,
    },
    stops,
    homeDay,
    homeLeg: saved?.homeLeg ?? null,
    evenings: listEvenings(trip, stops, homeDay, head),
    settings: saved?.settings ?? BLANK_SETTINGS,
    settingsVersion: saved?.version ?? 0,
  };
}

export async function getRoute({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof routeRefInput>;
}): Promise<RouteView> {
  const { tripId } = parseInput(routeRefInput, input);
  await requirePermission(ctx, tripId, "route.read");
  return loadRoute(getDb(), tripId);
}
