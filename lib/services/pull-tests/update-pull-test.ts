import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { pullTest } from "@/db/schema";
import {
  campPullUpdateInput,
  practicePullUpdateInput,
  type CampReading,
  type PracticeReading,
  type TestedGround,
} from "@/lib/domain/pull-test/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow } from "../camps/internal";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { toColumns } from "./create-pull-test";
import {
  findAnchor,
  groundOfPatch,
  inScope,
  listCampAnchors,
  listPracticeAnchors,
  loadPullTestFor,
  type PullScope,
  type PullTestRow,
  type TestAnchor,
} from "./internal";
import { requireStanding } from "./require-standing";

const notHere = () => new AppError("not-found", "There is no such pull test.");

const asLogged = (row: PullTestRow): TestAnchor => ({ id: row.id, name: row.anchorName, spec: row.anchor });

interface Change {
  readonly row: PullTestRow;
  readonly scope: PullScope;
  readonly version: number;
  readonly anchor: TestAnchor;
  readonly ground: TestedGround;
  readonly reading: CampReading | PracticeReading;
}

async function writeReading(tx: Transaction, change: Change): Promise<{ version: number }> {
  const { row, scope, version, anchor, ground, reading } = change;
  requireStanding(anchor.spec, ground, reading);
  const [saved] = await tx
    .update(pullTest)
    .set({
      ...toColumns(reading, row.pulledAt),
      anchorName: anchor.name,
      anchor: anchor.spec,
      ground,
      ...("patch" in reading ? { patch: reading.patch } : { place: reading.place }),
      version: version + 1,
      updatedAt: new Date(),
    })
    .where(and(eq(pullTest.id, row.id), inScope(scope), eq(pullTest.version, version)))
    .returning({ version: pullTest.version });
  if (saved) return saved;
  throw new AppError("conflict", "Somebody changed this reading after you opened it. Nothing of yours was saved yet.", {
    details: { current: { version: row.version } },
  });
}

/** Corrects a reading at a camp. Its ground stays as it was logged unless the patch is another. */
export async function updateCampPullTest({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campPullUpdateInput>;
}): Promise<{ version: number }> {
  const { tripId, campId, pullTestId, version, anchorId, reading } = parseInput(campPullUpdateInput, input);
  return withTransaction(async (tx) => {
    const { row, scope } = await loadPullTestFor(tx, ctx, pullTestId, "pull-test.edit");
    if (scope.kind !== "camp" || scope.tripId !== tripId || scope.campId !== campId) throw notHere();
    const camp = await loadCampRow(tx, tripId, campId);
    const anchor =
      anchorId === "as-logged" ? asLogged(row) : findAnchor(await listCampAnchors(tx, tripId, camp), anchorId);
    const ground =
      reading.patch === row.patch
        ? { ...row.ground, wetness: reading.wetness }
        : groundOfPatch(camp, reading.patch, reading.wetness);
    const saved = await writeReading(tx, { row, scope, version, anchor, ground, reading });
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "pull-test",
      entityId: pullTestId,
      summary: `${camp.name}: pull test of ${anchor.name}`,
      isPrinted: true,
    });
    return saved;
  });
}

export async function updatePracticePullTest({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof practicePullUpdateInput>;
}): Promise<{ version: number }> {
  const { pullTestId, version, anchorId, reading } = parseInput(practicePullUpdateInput, input);
  const anchors = await listPracticeAnchors(ctx);
  return withTransaction(async (tx) => {
    const { row, scope } = await loadPullTestFor(tx, ctx, pullTestId, "pull-test.edit");
    if (scope.kind !== "practice") throw notHere();
    const anchor = anchorId === "as-logged" ? asLogged(row) : findAnchor(anchors, anchorId);
    const { kind, wetness, looseTopM, stoneDepthM } = reading;
    const ground = { kind, wetness, looseTopM, stoneDepthM, slopeDeg: row.ground.slopeDeg };
    return writeReading(tx, { row, scope, version, anchor, ground, reading });
  });
}
