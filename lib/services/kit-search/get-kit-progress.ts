import type { z } from "zod";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { KitProgressView } from "@/lib/domain/kit/search-view";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { getSearchState } from "./running";

/** How far the search of a trip is, or why it ended without a result. */
export async function getKitProgress({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<KitProgressView> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "kit.edit");
  const { running, failures } = getSearchState();
  const search = running.get(tripId);
  return {
    isRunning: search !== undefined,
    progress: search?.progress ?? null,
    failure: search ? null : (failures.get(tripId) ?? null),
  };
}
