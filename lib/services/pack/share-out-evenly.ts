import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { carrySaveInput } from "@/lib/domain/pack/schema";
import { shareOut } from "@/lib/domain/pack/share-plan";
import { toCarries } from "@/lib/domain/pack/to-carries";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { writeLoads } from "./assign-carry";
import { buildLoadPlan } from "./get-load-plan";

/** Everything that is not fixed among everybody on the trip, so that the largest load by its limit is least. */
export async function shareOutEvenly({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<{ largest: number; bound: number }> {
  const { tripId } = parseInput(tripRefInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "pack.edit", tx);
    const state = await loadTripState(tx, tripId);
    if (state.people.length === 0) throw new AppError("bad-input", "Nobody is on this trip to carry anything.");
    const { shares, largest, bound } = shareOut(await buildLoadPlan(tx, state));
    const { carries } = carrySaveInput.parse({ tripId, carries: toCarries(shares) });
    await writeLoads(tx, ctx, state, carries);
    return { largest, bound };
  });
}
