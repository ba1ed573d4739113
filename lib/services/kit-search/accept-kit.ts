import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { kitItem, kitSearch } from "@/db/schema";
import type { FoundKit } from "@/lib/calc/kit/search-kit";
import type { Placement } from "@/lib/calc/types";
import { newId } from "@/lib/domain/ids";
import { MAX_KIT_ITEMS } from "@/lib/domain/kit/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { findPlanRow, savePlanRow, writeIntent, writePlacements } from "../plan/internal";
import { countUses } from "../kit/count-uses";
import { listPlacementRows } from "../plan/internal";
import { findCampState, loadTripState, type TripState } from "../plan/load-trip-state";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { findKitSearchRow, fingerprint, type KitSearchRow } from "./internal";

/** Kinds of the found kit by what they are in the trip's kit afterwards. */
type KitIds = ReadonlyMap<string, string>;

/** Sets the counts of the kit; a camp that the search left out keeps what its plan uses. */
async function writeCounts(tx: Transaction, state: TripState, row: KitSearchRow, kit: FoundKit): Promise<KitIds> {
  const tripId = state.trip.id;
  const covered = new Set(row.settings.campIds);
  const placements = (await listPlacementRows(tx, tripId)).filter((one) => !covered.has(one.campId));
  const ids = new Map<string, string>();
  let position = Math.max(-1, ...state.kit.map((one) => one.position));
  for (const { id, name, spec, massKg, count } of kit.kinds) {
    const item = state.kit.find((one) => one.id === id);
    if (item) {
      const elsewhere = Math.max(0, ...countUses(placements, id).map((use) => use.pieces));
      const details = { ...item.details, count: Math.max(count, elsewhere) };
      ids.set(id, id);
      if (details.count === item.details.count) continue;
      await tx
        .update(kitItem)
        .set({ details, version: item.version + 1, updatedAt: new Date() })
        .where(and(eq(kitItem.id, id), eq(kitItem.tripId, tripId)));
    } else if (count > 0) {
      position += 1;
      const now = new Date();
      const details = { type: "anchor" as const, name, spec, massKg, count };
      const kitItemId = newId();
      ids.set(id, kitItemId);
      await tx.insert(kitItem).values({ id: kitItemId, tripId, position, details, createdAt: now, updatedAt: now });
    }
  }
  if (
    state.kit.length + [...ids.keys()].filter((id) => !state.kit.some((one) => one.id === id)).length >
    MAX_KIT_ITEMS
  ) {
    throw new AppError("bad-input", `A kit can have at most ${MAX_KIT_ITEMS} kinds of things.`);
  }
  return ids;
}

async function writePlans(tx: Transaction, ctx: Context, state: TripState, kit: FoundKit, ids: KitIds): Promise<void> {
  const tripId = state.trip.id;
  const inKit = (anchorId: string) => ids.get(anchorId) ?? anchorId;
  for (const plan of kit.camps) {
    const { placements: before, camp } = findCampState(state, plan.campId);
    const after = plan.placements.map((one): Placement => ({
      ...one,
      anchorId: inKit(one.anchorId),
      tandem: one.tandem && { ...one.tandem, anchorId: inKit(one.tandem.anchorId) },
    }));
    const scope = { tripId, campId: plan.campId };
    const version = (await findPlanRow(tx, tripId, plan.campId))?.version ?? 0;
    const change = { type: "replace" as const, placements: after };
    await writeIntent(tx, ctx, { ...scope, id: newId(), baseVersion: version, resultVersion: version + 1, change });
    await writePlacements(tx, scope, before, after);
    await savePlanRow(tx, ctx, scope, version + 1);
    const summary = `${camp.details.name}: staking plan`;
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "plan",
      entityId: plan.campId,
      summary,
      isPrinted: true,
    });
  }
}

/**
 * Takes the found kit over: the counts of the kit and the staking plan of each camp at once, or nothing. Refused when
 * camps, shelters, anchors or plans changed since it was found. Earlier plans stay in each plan's history.
 */
export async function acceptKit({ ctx, input }: { ctx: Context; input: z.input<typeof tripRefInput> }): Promise<void> {
  const { tripId } = parseInput(tripRefInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "kit.edit", tx);
    await requirePermission(ctx, tripId, "plan.edit", tx);
    const row = await findKitSearchRow(tx, tripId);
    if (!row) throw new AppError("not-found", "No kit was found for this trip yet.");
    if (row.outcome.status !== "found") throw new AppError("bad-input", "That search found no kit to take over.");
    if (row.acceptedAt) throw new AppError("conflict", "This kit was taken over already.");
    const state = await loadTripState(tx, tripId);
    if (fingerprint(state, row.settings) !== row.basis) {
      throw new AppError(
        "conflict",
        "Camps, shelters, anchors or plans changed since this kit was found. Search again.",
      );
    }
    const ids = await writeCounts(tx, state, row, row.outcome);
    await writePlans(tx, ctx, state, row.outcome, ids);
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "kit",
      entityId: tripId,
      summary: "A kit for the whole trip",
      isPrinted: true,
    });
    // What came from somewhere else is in the kit now; the next search starts from there.
    const kinds = row.settings.kinds.map((kind) => {
      const id = ids.get(kind.id);
      return id === undefined ? kind : { ...kind, source: "kit" as const, id };
    });
    await tx
      .update(kitSearch)
      .set({ acceptedAt: new Date(), settings: { ...row.settings, kinds } })
      .where(eq(kitSearch.tripId, tripId));
  });
}
