import type { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { campPullCreateInput, type Patch } from "@/lib/domain/pull-test/schema";
import type { Context } from "@/lib/services/context/context";
import { workOutCamp } from "../analysis/work-out-camp";
import { findCampState, loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { createCampPullTest } from "./create-pull-test";

export interface CampMeasure {
  /** Of the patch that was pulled, as a multiple of the table; null without readings that count. */
  readonly factor: number | null;
  readonly holdsToGustMs: number | null;
}

async function measureCamp(tripId: string, campId: string, patch: Patch): Promise<CampMeasure> {
  const own = findCampState(await loadTripState(getDb(), tripId), campId);
  const { result } = await workOutCamp(own);
  return { factor: own.learned[patch]?.factor ?? null, holdsToGustMs: result.holdsToGustMs };
}

/** Logs a pull and says what it did to the ground's estimate and to what the camp holds. */
export async function logCampPull({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campPullCreateInput>;
}): Promise<{ pullTestId: string; before: CampMeasure; after: CampMeasure }> {
  const parsed = parseInput(campPullCreateInput, input);
  const { tripId, campId, reading } = parsed;
  await requirePermission(ctx, tripId, "pull-test.edit");
  const before = await measureCamp(tripId, campId, reading.patch);
  const { pullTestId } = await createCampPullTest({ ctx, input });
  return { pullTestId, before, after: await measureCamp(tripId, campId, reading.patch) };
}
