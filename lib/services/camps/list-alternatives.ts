import type { z } from "zod";
import { getDb } from "@/db/client";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { AlternativeSummary } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { workOutCamp } from "../analysis/work-out-camp";
import { loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { summariseCamp } from "./summarise-camp";

/** Camps kept beside the line of nights, each with its verdict and the camp it stands by for, in order of the nights. */
export async function listAlternatives({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<AlternativeSummary[]> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "camp.read");
  const state = await loadTripState(getDb(), tripId);
  const summaries = await Promise.all(
    state.alternatives.map(async (one) => {
      const summary = summariseCamp(one, await workOutCamp(one));
      const { alternativeTo } = one.camp;
      const pitches = one.pitches.map(({ id, name }) => ({ id, name }));
      return alternativeTo ? [{ ...summary, alternativeTo, pitches }] : [];
    }),
  );
  return summaries.flat().sort((a, b) => a.position - b.position);
}
