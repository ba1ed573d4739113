import { and, asc, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { placement, planIntent, stakingPlan } from "@/db/schema";
import type { Placement } from "@/lib/calc/types";
import { newId } from "@/lib/domain/ids";
import type { PlanChange } from "@/lib/domain/plan/schema";
import type { Context } from "@/lib/services/context/context";
import type { Reader } from "../trips/internal";

export type PlacementRow = typeof placement.$inferSelect;
export type PlanRow = typeof stakingPlan.$inferSelect;

export function toPlacement(row: PlacementRow): Placement {
  return {
    pitchId: row.pitchId,
    tieOutId: row.tieOutId,
    anchorId: row.anchorId,
    leanDeg: row.leanDeg,
    depthOutM: row.depthOutM,
    tandem: row.tandem,
    rockKg: row.rockKg,
    shockCord: row.hasShockCord,
    knot: row.knot,
    pinned: row.isPinned,
  };
}

export async function listPlacementRows(reader: Reader, tripId: string): Promise<PlacementRow[]> {
  return reader
    .select()
    .from(placement)
    .where(eq(placement.tripId, tripId))
    .orderBy(asc(placement.pitchId), asc(placement.tieOutId));
}

export async function findPlanRow(reader: Reader, tripId: string, campId: string): Promise<PlanRow | null> {
  const [row] = await reader
    .select()
    .from(stakingPlan)
    .where(and(eq(stakingPlan.campId, campId), eq(stakingPlan.tripId, tripId)))
    .limit(1);
  return row ?? null;
}

/** The order in which plans are read and answered. */
export function sortPlacements(placements: readonly Placement[]): Placement[] {
  return [...placements].sort((a, b) => (spotKey(a) < spotKey(b) ? -1 : 1));
}

interface PlanScope {
  readonly tripId: string;
  readonly campId: string;
}

const spotKey = (one: { readonly pitchId: string; readonly tieOutId: string }) => `${one.pitchId} ${one.tieOutId}`;

/** Writes only the tie-outs that differ. `before` is what the camp has now. */
export async function writePlacements(
  tx: Transaction,
  scope: PlanScope,
  before: readonly Placement[],
  after: readonly Placement[],
): Promise<void> {
  const asText = new Map(before.map((one) => [spotKey(one), JSON.stringify(one)]));
  const changed = after.filter((one) => asText.get(spotKey(one)) !== JSON.stringify(one));
  const kept = new Set(after.map(spotKey));
  const stale = new Set([...before.filter((one) => !kept.has(spotKey(one))), ...changed].map(spotKey));
  if (stale.size > 0) {
    const rows = await tx
      .select({ id: placement.id, pitchId: placement.pitchId, tieOutId: placement.tieOutId })
      .from(placement)
      .where(and(eq(placement.tripId, scope.tripId), eq(placement.campId, scope.campId)));
    const ids = rows.filter((row) => stale.has(spotKey(row))).map((row) => row.id);
    if (ids.length > 0) {
      await tx.delete(placement).where(and(eq(placement.tripId, scope.tripId), inArray(placement.id, ids)));
    }
  }
  if (changed.length > 0) {
    await tx.insert(placement).values(
      changed.map(({ shockCord, pinned, ...one }) => ({
        ...one,
        id: newId(),
        ...scope,
        hasShockCord: shockCord,
        isPinned: pinned,
      })),
    );
  }
}

/** The plan's new version, and who made it. */
export async function savePlanRow(tx: Transaction, ctx: Context, scope: PlanScope, version: number): Promise<void> {
  const values = { version, updatedBy: ctx.actor.userId, updatedByName: ctx.actor.name, updatedAt: new Date() };
  await tx
    .insert(stakingPlan)
    .values({ ...scope, ...values })
    .onConflictDoUpdate({ target: stakingPlan.campId, set: values });
}

export async function writeIntent(
  tx: Transaction,
  ctx: Context,
  intent: PlanScope & {
    readonly id: string;
    readonly baseVersion: number;
    readonly resultVersion: number;
    readonly change: PlanChange;
  },
): Promise<void> {
  await tx
    .insert(planIntent)
    .values({ ...intent, userId: ctx.actor.userId, userName: ctx.actor.name, createdAt: new Date() });
}

/**
 * Changes plans because what they stand on goes (a pitch, a kit item, trees at the camp): null lifts a placement,
 * another placement takes its place, the same one stays. Written as intents like any other change, so that whoever
 * has the plan open is told. Returns how many changed.
 */
export async function amendPlacements(
  tx: Transaction,
  ctx: Context,
  tripId: string,
  amend: (placement: Placement, campId: string) => Placement | null,
): Promise<number> {
  const rows = await listPlacementRows(tx, tripId);
  let count = 0;
  for (const campId of new Set(rows.map((row) => row.campId))) {
    const scope = { tripId, campId };
    const before = rows.filter((row) => row.campId === campId).map(toPlacement);
    const after: Placement[] = [];
    const changes: PlanChange[] = [];
    for (const one of before) {
      const next = amend(one, campId);
      if (next) after.push(next);
      if (next === null) changes.push({ type: "lift", pitchId: one.pitchId, tieOutId: one.tieOutId });
      else if (next !== one) changes.push({ type: "place", placement: next });
    }
    if (changes.length === 0) continue;
    let version = (await findPlanRow(tx, tripId, campId))?.version ?? 0;
    for (const change of changes) {
      const base = { baseVersion: version, resultVersion: version + 1 };
      await writeIntent(tx, ctx, { ...scope, ...base, id: newId(), change });
      version += 1;
    }
    await writePlacements(tx, scope, before, after);
    await savePlanRow(tx, ctx, scope, version);
    count += changes.length;
  }
  return count;
}
