import type { z } from "zod";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { getSearchState } from "./running";

/** Stops the search of a trip; when there is none, there is nothing to stop. */
export async function cancelKitSearch({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<{ isRunning: false }> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "kit.edit");
  const search = getSearchState().running.get(tripId);
  search?.job.cancel();
  await search?.job.outcome.catch(() => undefined);
  return { isRunning: false };
}
