import { z } from "zod";
import { withTransaction } from "@/db/client";
import { paperLook } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { idSchema } from "@/lib/domain/ids";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { buildPackList, loadPackSources, loadPerson } from "../pack/internal";
import { loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { recordHandOut } from "../papers/mark-handed-out";
import { buildOwnPages } from "./build-own-pages";

export const markOwnPagesReadInput = z.object({
  tripId: idSchema,
  /** When what was on the screen had last changed, ms since 1970. */
  changedAt: z.number({ error: "Say what you read." }).int().min(0),
});

/** Says "I have read my pages as they are". Refused when they changed since: one can't have read what wasn't there. */
export async function markOwnPagesRead({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof markOwnPagesReadInput>;
}): Promise<void> {
  const { tripId, changedAt } = parseInput(markOwnPagesReadInput, input);
  await withTransaction(async (tx) => {
    const { personId } = await requirePermission(ctx, tripId, "paper.own", tx);
    const state = await loadTripState(tx, tripId);
    if (state.trip.updatedAt.getTime() !== changedAt) {
      throw new AppError("conflict", "Your pages have changed meanwhile. Look again, then mark them as read.");
    }
    await recordHandOut(tx, ctx, tripId);
    const list = buildPackList(await loadPackSources(tx, state), await loadPerson(tx, tripId, personId));
    const row = { version: state.trip.paperVersion, content: buildOwnPages(state, list), seenAt: new Date() };
    await tx
      .insert(paperLook)
      .values({ personId, tripId, ...row })
      .onConflictDoUpdate({ target: paperLook.personId, set: row });
  });
}
