import { eq, sql } from "drizzle-orm";
import type { z } from "zod";
import { getDb, withTransaction } from "@/db/client";
import { forecast, forecastFailure } from "@/db/schema";
import { forecastFetchInput, type ForecastContent } from "@/lib/domain/forecast/schema";
import { newId } from "@/lib/domain/ids";
import { AppError } from "@/lib/errors";
import { addDays, formatInstant } from "@/lib/format/days";
import { log } from "@/lib/log";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { getForecastSource } from "@/lib/weather/get-source";
import { ForecastTrouble, type ForecastSource, type TroubleKind } from "@/lib/weather/source";
import { summariseNights } from "@/lib/weather/summarise-nights";
import { findCampState, loadTripState, type CampState, type TripState } from "../plan/load-trip-state";
import { consumeQuota } from "../quota/consume-quota";
import { parseInput } from "../trips/parse-input";
import { loadForecastRows, trimForecasts } from "./internal";

/** Services have new values every hour at best; the one that came is shown again until then. */
const FRESH_MS = 10 * 60_000;

export type FetchOutcome =
  | { readonly outcome: "fetched"; readonly sentence: string }
  | { readonly outcome: "fresh"; readonly sentence: string }
  | { readonly outcome: "failed"; readonly sentence: string; readonly kind: TroubleKind };

async function askSource(
  source: ForecastSource,
  state: TripState,
  camp: CampState,
  at: Date,
): Promise<ForecastContent> {
  const { details, days } = camp.camp;
  const [first = "", last = first] = [days[0], days[days.length - 1]];
  if (details.latitude === null || details.longitude === null) {
    const message = "Enter the camp's position first: a forecast is for a place.";
    throw new AppError("bad-input", message, { fieldErrors: { campId: [message] } });
  }
  const hours = await source.fetchHours({
    latitude: details.latitude,
    longitude: details.longitude,
    altitudeM: details.altitudeM,
    // A day more at either end: a night in the trip's zone can begin or end on another day of UTC.
    fromDay: addDays(first, -1),
    toDay: addDays(last, 2),
    askedAt: at,
  });
  const nights = summariseNights(hours, days, state.trip.timeZone);
  if (nights.every((night) => night.gustMs === null && night.meanMs === null)) {
    throw new ForecastTrouble("not-covered", `no hour of ${first} to ${last}`);
  }
  return { source: source.name, isSample: source.isSample, fetchedAt: at.toISOString(), nights };
}

async function keepForecast(ctx: Context, tripId: string, campId: string, content: ForecastContent): Promise<void> {
  await withTransaction(async (tx) => {
    // Between question and answer seconds can pass; whoever lost their role meanwhile writes nothing.
    await requirePermission(ctx, tripId, "camp.edit", tx);
    findCampState(await loadTripState(tx, tripId), campId);
    const fetchedAt = new Date(content.fetchedAt);
    const row = { id: newId(), tripId, campId, content, fetchedByName: ctx.actor.name, fetchedAt };
    await tx.insert(forecast).values(row);
    await tx.delete(forecastFailure).where(eq(forecastFailure.campId, campId));
    await trimForecasts(tx, tripId, campId);
  });
}

async function keepFailure(ctx: Context, tripId: string, campId: string, reason: string, at: Date): Promise<void> {
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "camp.edit", tx);
    findCampState(await loadTripState(tx, tripId), campId);
    await tx
      .insert(forecastFailure)
      .values({ campId, tripId, reason, failedAt: at })
      .onConflictDoUpdate({
        target: forecastFailure.campId,
        set: { reason, failedAt: at, count: sql`${forecastFailure.count} + 1` },
      });
  });
}

/**
 * Asks for the forecast of a camp's nights and keeps it beside the plan: nothing of the plan changes. When none comes,
 * that is kept too, and what was accepted before stays as it is.
 */
export async function fetchForecast({
  ctx,
  input,
  source = getForecastSource(),
  at = new Date(),
}: {
  ctx: Context;
  input: z.input<typeof forecastFetchInput>;
  source?: ForecastSource;
  at?: Date;
}): Promise<FetchOutcome> {
  const { tripId, campId } = parseInput(forecastFetchInput, input);
  await requirePermission(ctx, tripId, "camp.edit");
  const db = getDb();
  const state = await loadTripState(db, tripId);
  const camp = findCampState(state, campId);
  const { fetched } = await loadForecastRows(db, tripId);
  const before = fetched.find((row) => row.campId === campId);
  const isForTheseNights = camp.camp.days.every((day) => before?.content.nights.some((night) => night.day === day));
  if (before && isForTheseNights && at.getTime() - before.fetchedAt.getTime() < FRESH_MS) {
    const when = formatInstant(before.fetchedAt, state.trip.timeZone);
    return { outcome: "fresh", sentence: `Fetched at ${when}; services have nothing newer within ten minutes.` };
  }
  await consumeQuota("forecast", ctx.actor.userId);
  try {
    const content = await askSource(source, state, camp, at);
    await keepForecast(ctx, tripId, campId, content);
    return { outcome: "fetched", sentence: `Forecast for ${camp.camp.details.name} fetched from ${source.name}.` };
  } catch (error) {
    if (!(error instanceof ForecastTrouble)) throw error;
    log.warn("no forecast", { requestId: ctx.requestId, kind: error.kind, detail: error.detail });
    await keepFailure(ctx, tripId, campId, error.sentence, at);
    return { outcome: "failed", sentence: error.sentence, kind: error.kind };
  }
}
