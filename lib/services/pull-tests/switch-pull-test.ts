import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { pullTest } from "@/db/schema";
import { pullTestSwitchInput } from "@/lib/domain/pull-test/schema";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { inScope, loadPullTestFor } from "./internal";

/** A reading that is switched off stays where it is and counts for nothing. */
export async function switchPullTest({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof pullTestSwitchInput>;
}): Promise<void> {
  const { pullTestId, isOff } = parseInput(pullTestSwitchInput, input);
  await withTransaction(async (tx) => {
    const { row, scope } = await loadPullTestFor(tx, ctx, pullTestId, "pull-test.edit");
    if (row.isOff === isOff) return;
    await tx
      .update(pullTest)
      .set({ isOff, version: row.version + 1, updatedAt: new Date() })
      .where(and(eq(pullTest.id, pullTestId), inScope(scope)));
    if (scope.kind !== "camp") return;
    await recordChange(tx, ctx, {
      tripId: scope.tripId,
      action: "update",
      entity: "pull-test",
      entityId: pullTestId,
      summary: `Pull test of ${row.anchorName} switched ${isOff ? "off" : "on"}`,
      isPrinted: true,
    });
  });
}
