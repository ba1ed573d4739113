import { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import type { Placement } from "@/lib/calc/types";
import { campRefInput } from "@/lib/domain/camp/schema";
import type { PlanPreview } from "@/lib/domain/history/views";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { describePlacement, loadEarlierPlan, nameSpot } from "./earlier-plan";
import { findCampState, loadTripState } from "./load-trip-state";

const previewPlanVersionInput = campRefInput.extend({
  version: z.coerce.number({ error: "Say which version." }).int().min(1),
});

const keyOf = (one: Placement) => `${one.pitchId} ${one.tieOutId}`;

/** What bringing an earlier plan back would change, tie-out by tie-out. Changes nothing. */
export async function previewPlanVersion({
  ctx,
  input,
}: {
  ctx: Context;
  input: { readonly tripId: string; readonly campId: string; readonly version: number | string };
}): Promise<PlanPreview> {
  const { tripId, campId, version } = parseInput(previewPlanVersionInput, input);
  await requirePermission(ctx, tripId, "plan.read");
  const db = getDb();
  const own = findCampState(await loadTripState(db, tripId), campId);
  const earlier = await loadEarlierPlan(db, own, tripId, version);
  const now = new Map(own.placements.map((one) => [keyOf(one), one]));
  const then = new Map(earlier.placements.map((one) => [keyOf(one), one]));
  const spots = [...new Map([...now, ...then]).entries()];
  return {
    campId,
    campName: own.camp.details.name,
    version,
    currentVersion: own.plan?.version ?? 0,
    byName: earlier.byName,
    at: earlier.at.toISOString(),
    rows: spots
      .map(([key, spot]) => ({
        key,
        where: nameSpot(own, spot),
        now: describePlacement(own, now.get(key)),
        then: describePlacement(own, then.get(key)),
      }))
      .filter((row) => row.now !== row.then)
      .sort((a, b) => a.where.localeCompare(b.where, "en", { numeric: true })),
    leftOut: earlier.leftOut,
  };
}
