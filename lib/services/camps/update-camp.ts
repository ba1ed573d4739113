import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { camp } from "@/db/schema";
import { campUpdateInput } from "@/lib/domain/camp/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { listFoundAnchorIds } from "../kit/to-tray";
import { amendPlacements } from "../plan/internal";
import { loadTripRow, recordChange, refuseStale } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { countNights, listCampRows, loadCampRow, requireNightsFit, toCampDetails } from "./internal";

/**
 * `lifted` is how many tie-outs lost their anchor because the camp no longer has what they were tied to (trees, rocks,
 * sticks); the screen says so.
 */
export async function updateCamp({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campUpdateInput>;
}): Promise<{ version: number; lifted: number }> {
  const { tripId, campId, version, details: typed } = parseInput(campUpdateInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "camp.edit", tx);
    const before = await loadCampRow(tx, tripId, campId);
    const others = (await listCampRows(tx, tripId)).filter((one) => one.id !== campId);
    const main = others.find((one) => one.id === before.alternativeToId);
    // An alternative has the nights of the camp that it stands by for.
    const details = main ? { ...typed, nights: main.nights } : typed;
    if (!main) requireNightsFit(countNights(others) + details.nights);
    const [row] = await tx
      .update(camp)
      .set({ ...details, version: version + 1, updatedAt: new Date() })
      .where(and(eq(camp.id, campId), eq(camp.tripId, tripId), eq(camp.version, version)))
      .returning({ version: camp.version });
    if (!row) {
      return refuseStale(tx, {
        trip: await loadTripRow(tx, tripId),
        entityId: campId,
        what: before.name,
        current: { version: before.version, details: toCampDetails(before) },
      });
    }
    await tx
      .update(camp)
      .set({ nights: details.nights })
      .where(and(eq(camp.tripId, tripId), eq(camp.alternativeToId, campId)));
    const found = listFoundAnchorIds(details);
    const gone = new Set([...listFoundAnchorIds(toCampDetails(before))].filter((id) => !found.has(id)));
    const lifted = await amendPlacements(tx, ctx, tripId, (placement, placedAt) => {
      if (placedAt !== campId) return placement;
      if (gone.has(placement.anchorId)) return null;
      return placement.tandem && gone.has(placement.tandem.anchorId) ? { ...placement, tandem: null } : placement;
    });
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "camp",
      entityId: campId,
      summary: `${details.name}: ground and wind`,
      isPrinted: true,
    });
    return { ...row, lifted };
  });
}
