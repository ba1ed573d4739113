import type { z } from "zod";
import { getDb } from "@/db/client";
import type { CampForecastView } from "@/lib/domain/forecast/views";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { loadForecastRows, toCampForecast } from "./internal";

/** The forecasts of all camps in the line of nights, in its order. */
export async function listTripForecasts({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<CampForecastView[]> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "camp.read");
  const db = getDb();
  const state = await loadTripState(db, tripId);
  const rows = await loadForecastRows(db, tripId);
  return Promise.all(state.camps.map((camp) => toCampForecast(camp, rows)));
}
