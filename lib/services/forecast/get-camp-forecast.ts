import type { z } from "zod";
import { getDb } from "@/db/client";
import { campRefInput } from "@/lib/domain/camp/schema";
import type { CampForecastView } from "@/lib/domain/forecast/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { findCampState, loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { loadForecastRows, toCampForecast } from "./internal";

/** The forecast of a camp: what came last, what was accepted, and what accepting would change. */
export async function getCampForecast({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campRefInput>;
}): Promise<CampForecastView> {
  const { tripId, campId } = parseInput(campRefInput, input);
  await requirePermission(ctx, tripId, "camp.read");
  const db = getDb();
  const own = findCampState(await loadTripState(db, tripId), campId);
  return toCampForecast(own, await loadForecastRows(db, tripId));
}
