import type { z } from "zod";
import { getDb } from "@/db/client";
import { campRefInput } from "@/lib/domain/camp/schema";
import type { SleepingPlanView } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { findCampState, loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";

/** Who sleeps where at a camp. Everybody on the trip is in exactly one of the lists. */
export async function getSleepingPlan({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campRefInput>;
}): Promise<SleepingPlanView> {
  const { tripId, campId } = parseInput(campRefInput, input);
  await requirePermission(ctx, tripId, "camp.read");
  const state = await loadTripState(getDb(), tripId);
  const { camp, pitches, sleepers } = findCampState(state, campId);
  const placed = new Map(sleepers.map((one) => [one.personId, one.pitchId]));
  return {
    campId,
    campName: camp.details.name,
    days: camp.days,
    people: state.people,
    pitches: pitches.map((pitch) => ({
      id: pitch.id,
      name: pitch.name,
      sleeps: pitch.sleeps,
      sleeperIds: state.people.filter((one) => placed.get(one.id) === pitch.id).map((one) => one.id),
      spec: pitch.spec,
      headingDeg: pitch.details.headingDeg,
    })),
    outsideIds: state.people.filter((one) => placed.get(one.id) === null).map((one) => one.id),
    unplacedIds: state.people.filter((one) => !placed.has(one.id)).map((one) => one.id),
  };
}
