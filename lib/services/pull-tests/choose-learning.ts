import { and, eq, sql } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { learningChoice, pullTest } from "@/db/schema";
import { elsewhereInput, patchRefInput, type Patch } from "@/lib/domain/pull-test/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow } from "../camps/internal";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { inScope } from "./internal";

interface PatchOfCamp {
  readonly tripId: string;
  readonly campId: string;
  readonly patch: Patch;
}

async function writeChoice(tx: Transaction, at: PatchOfCamp, usesElsewhere: boolean): Promise<void> {
  await tx
    .insert(learningChoice)
    .values({ ...at, usesElsewhere })
    .onConflictDoUpdate({ target: [learningChoice.campId, learningChoice.patch], set: { usesElsewhere } });
}

/** Whether readings of the same kind of ground elsewhere count for this patch. */
export async function chooseElsewhere({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof elsewhereInput>;
}): Promise<void> {
  const { usesElsewhere, ...at } = parseInput(elsewhereInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, at.tripId, "pull-test.edit", tx);
    const camp = await loadCampRow(tx, at.tripId, at.campId);
    await writeChoice(tx, at, usesElsewhere);
    await recordChange(tx, ctx, {
      tripId: at.tripId,
      action: "update",
      entity: "pull-test",
      entityId: at.campId,
      summary: `${camp.name}: readings from elsewhere ${usesElsewhere ? "count" : "do not count"}`,
      isPrinted: true,
    });
  });
}

/** Back to the table for one patch: its readings are switched off, those from elsewhere no longer count; none is lost. */
export async function startAgainFromTable({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof patchRefInput>;
}): Promise<{ switchedOff: number }> {
  const at = parseInput(patchRefInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, at.tripId, "pull-test.edit", tx);
    const camp = await loadCampRow(tx, at.tripId, at.campId);
    const off = await tx
      .update(pullTest)
      .set({ isOff: true, version: sql`${pullTest.version} + 1`, updatedAt: new Date() })
      .where(and(inScope({ kind: "camp", ...at }), eq(pullTest.patch, at.patch), eq(pullTest.isOff, false)))
      .returning({ id: pullTest.id });
    await writeChoice(tx, at, false);
    await recordChange(tx, ctx, {
      tripId: at.tripId,
      action: "update",
      entity: "pull-test",
      entityId: at.campId,
      summary: `${camp.name}: ground from the table again`,
      isPrinted: true,
    });
    return { switchedOff: off.length };
  });
}
