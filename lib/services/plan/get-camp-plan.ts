import type { z } from "zod";
import { getDb } from "@/db/client";
import { campRefInput } from "@/lib/domain/camp/schema";
import type { CampPlanView } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { workOutCamp } from "../analysis/work-out-camp";
import { countNights } from "../camps/internal";
import { summariseCamp } from "../camps/summarise-camp";
import { toTripView } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { findCampState, loadTripState } from "./load-trip-state";

/** Everything that the staking plan of a camp needs, and the other camps for the line of nights. */
export async function getCampPlan({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campRefInput>;
}): Promise<CampPlanView> {
  const { tripId, campId } = parseInput(campRefInput, input);
  const { role } = await requirePermission(ctx, tripId, "plan.read");
  const state = await loadTripState(getDb(), tripId);
  const own = findCampState(state, campId);
  const worked = await Promise.all(state.camps.map((camp) => workOutCamp(camp)));
  const summaries = state.camps.flatMap((camp, index) => {
    const one = worked[index];
    return one ? [summariseCamp(camp, one)] : [];
  });
  return {
    trip: toTripView(state.trip, role, countNights(state.camps.map((one) => one.camp.details))),
    camp: own.camp,
    camps: summaries,
    pitches: (await workOutCamp(own)).pitches,
    tray: own.tray,
    shockCordCount: state.shockCordCount,
    placements: own.placements,
    learned: own.learned,
    planVersion: own.plan?.version ?? 0,
    savedAt: own.plan?.updatedAt.toISOString() ?? null,
    savedByName: own.plan?.updatedByName ?? null,
    people: state.people,
  };
}
