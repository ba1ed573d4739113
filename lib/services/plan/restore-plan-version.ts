import { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { campRefInput } from "@/lib/domain/camp/schema";
import { idSchema } from "@/lib/domain/ids";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { loadEarlierPlan } from "./earlier-plan";
import { findCampState, loadTripState } from "./load-trip-state";
import { savePlanIntents } from "./save-plan-intents";

export const restorePlanVersionInput = campRefInput.extend({
  version: z.number({ error: "Say which version." }).int().min(1),
  /** The plan's version that the preview was compared with. */
  baseVersion: z.number({ error: "Say which plan you saw." }).int().min(0),
  /** Made by the form: pressed twice, it is brought back once. */
  intentId: idSchema,
});

/**
 * Brings an earlier plan back as a change of its own: a new version, so that it can be taken back the same way. What
 * no longer exists is left out; what the tray can't cover any more, or what others changed meanwhile, refuses it all.
 */
export async function restorePlanVersion({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof restorePlanVersionInput>;
}): Promise<{ planVersion: number }> {
  const { tripId, campId, version, baseVersion, intentId } = parseInput(restorePlanVersionInput, input);
  await requirePermission(ctx, tripId, "plan.edit");
  const db = getDb();
  const own = findCampState(await loadTripState(db, tripId), campId);
  const { placements } = await loadEarlierPlan(db, own, tripId, version);
  const change = { type: "replace" as const, placements: [...placements] };
  const saved = await savePlanIntents({ ctx, input: { tripId, campId, intents: [{ intentId, baseVersion, change }] } });
  const [outcome] = saved.outcomes;
  if (outcome?.outcome === "refused") throw new AppError("bad-input", `It can’t be brought back: ${outcome.reason}`);
  if (outcome?.outcome === "conflict") {
    throw new AppError("conflict", `${outcome.by} changed the plan meanwhile. Look at the difference again.`);
  }
  return { planVersion: saved.planVersion };
}
