import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { pullTest } from "@/db/schema";
import { pullTestRefInput } from "@/lib/domain/pull-test/schema";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { inScope, loadPullTestFor } from "./internal";

/** For a slip of the pen; what only looks odd is better switched off. Its photo goes with it. */
export async function deletePullTest({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof pullTestRefInput>;
}): Promise<void> {
  const { pullTestId } = parseInput(pullTestRefInput, input);
  await withTransaction(async (tx) => {
    const { row, scope } = await loadPullTestFor(tx, ctx, pullTestId, "pull-test.edit");
    await tx.delete(pullTest).where(and(eq(pullTest.id, pullTestId), inScope(scope)));
    if (scope.kind !== "camp") return;
    await recordChange(tx, ctx, {
      tripId: scope.tripId,
      action: "delete",
      entity: "pull-test",
      entityId: pullTestId,
      summary: `Pull test of ${row.anchorName}`,
      isPrinted: true,
    });
  });
}
