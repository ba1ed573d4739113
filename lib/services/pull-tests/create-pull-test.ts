import { eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { pullTest } from "@/db/schema";
import {
  campPullCreateInput,
  practicePullCreateInput,
  type CampReading,
  type PracticeReading,
} from "@/lib/domain/pull-test/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow } from "../camps/internal";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import {
  findAnchor,
  groundOfPatch,
  listCampAnchors,
  listPracticeAnchors,
  requireRoom,
  type PullScope,
  type TestAnchor,
} from "./internal";
import { requireStanding } from "./require-standing";

/** The columns that the form and a table have in common. */
export function toColumns(reading: CampReading | PracticeReading, now: Date) {
  return {
    leanDeg: reading.leanDeg,
    lineAngleDeg: reading.lineAngleDeg,
    depthOutM: reading.depthOutM,
    force: reading.force,
    forceUnit: reading.forceUnit,
    outcome: reading.outcome,
    note: reading.note,
    pulledAt: reading.pulledAt === null ? now : new Date(reading.pulledAt),
  };
}

/** Who logged it, and that it is new. */
export function newRow(ctx: Context, anchor: TestAnchor, now: Date) {
  return {
    anchorName: anchor.name,
    anchor: anchor.spec,
    isOff: false,
    loggedBy: ctx.actor.userId,
    loggedByName: ctx.actor.name,
    version: 1,
    createdAt: now,
    updatedAt: now,
  };
}

/** True when this very reading was saved already: the form was sent twice. Somebody else's id is refused. */
async function isRepeated(tx: Transaction, id: string, scope: PullScope): Promise<boolean> {
  const [row] = await tx
    .select({ campId: pullTest.campId, ownerId: pullTest.ownerId })
    .from(pullTest)
    .where(eq(pullTest.id, id))
    .limit(1);
  if (!row) return false;
  if (scope.kind === "camp" ? row.campId === scope.campId : row.ownerId === scope.ownerId) return true;
  throw new AppError("conflict", "That reading was saved somewhere else already. Load the page again and log it anew.");
}

/** Logs a pull at a camp. The anchor and the ground are kept as they are now. */
export async function createCampPullTest({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campPullCreateInput>;
}): Promise<{ pullTestId: string }> {
  const { tripId, campId, pullTestId, anchorId, reading } = parseInput(campPullCreateInput, input);
  const scope = { kind: "camp", tripId, campId } as const;
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "pull-test.edit", tx);
    const camp = await loadCampRow(tx, tripId, campId);
    if (await isRepeated(tx, pullTestId, scope)) return;
    const anchor = findAnchor(await listCampAnchors(tx, tripId, camp), anchorId);
    const ground = groundOfPatch(camp, reading.patch, reading.wetness);
    requireStanding(anchor.spec, ground, reading);
    await requireRoom(tx, scope, 1);
    const now = new Date();
    await tx.insert(pullTest).values({
      ...newRow(ctx, anchor, now),
      ...toColumns(reading, now),
      id: pullTestId,
      tripId,
      campId,
      patch: reading.patch,
      ground,
    });
    await recordChange(tx, ctx, {
      tripId,
      action: "create",
      entity: "pull-test",
      entityId: pullTestId,
      summary: `${camp.name}: pull test of ${anchor.name}`,
      isPrinted: true,
    });
  });
  return { pullTestId };
}

/** Logs a pull in the person's own practice field, outside any trip. */
export async function createPracticePullTest({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof practicePullCreateInput>;
}): Promise<{ pullTestId: string }> {
  const { pullTestId, anchorId, reading } = parseInput(practicePullCreateInput, input);
  const scope = { kind: "practice", ownerId: ctx.actor.userId } as const;
  const anchor = findAnchor(await listPracticeAnchors(ctx), anchorId);
  const { kind, wetness, looseTopM, stoneDepthM } = reading;
  const ground = { kind, wetness, looseTopM, stoneDepthM, slopeDeg: 0 };
  requireStanding(anchor.spec, ground, reading);
  await withTransaction(async (tx) => {
    if (await isRepeated(tx, pullTestId, scope)) return;
    await requireRoom(tx, scope, 1);
    const now = new Date();
    await tx.insert(pullTest).values({
      ...newRow(ctx, anchor, now),
      ...toColumns(reading, now),
      id: pullTestId,
      ownerId: scope.ownerId,
      place: reading.place,
      ground,
    });
  });
  return { pullTestId };
}
