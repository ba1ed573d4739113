import type { z } from "zod";
import { getDb } from "@/db/client";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { CampSummary } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { workOutCamp } from "../analysis/work-out-camp";
import { loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { summariseCamp } from "./summarise-camp";

export async function listCampSummaries({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<CampSummary[]> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "camp.read");
  const state = await loadTripState(getDb(), tripId);
  return Promise.all(state.camps.map(async (camp) => summariseCamp(camp, await workOutCamp(camp))));
}
