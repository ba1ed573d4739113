import { and, count, eq, isNotNull } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { camp, pitch, shelter, sleeper } from "@/db/schema";
import { buildShelter, checkShelterSpec } from "@/lib/calc/shelter-kinds";
import type { ShelterSpec } from "@/lib/calc/types";
import { shelterUpdateInput } from "@/lib/domain/shelter/schema";
import { AppError } from "@/lib/errors";
import { plural } from "@/lib/format/words";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { keepPitchedParts, toPitchSpec } from "../pitches/internal";
import { amendPlacements } from "../plan/internal";
import { loadTripRow, recordChange, refuseStale } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { loadShelterRow, requireBuildable, toShelterDetails } from "./internal";

async function requireRoomForSleepers(tx: Transaction, tripId: string, shelterId: string, sleeps: number) {
  const places = await tx
    .select({ campName: camp.name, count: count() })
    .from(sleeper)
    .innerJoin(pitch, eq(pitch.id, sleeper.pitchId))
    .innerJoin(camp, eq(camp.id, sleeper.campId))
    .where(and(eq(sleeper.tripId, tripId), eq(pitch.shelterId, shelterId), isNotNull(sleeper.pitchId)))
    .groupBy(sleeper.campId);
  const full = places.find((place) => place.count > sleeps);
  if (!full) return;
  const message = `${plural(full.count, "person sleeps", "people sleep")} in it at ${full.campName}. Move somebody first.`;
  throw new AppError("bad-input", message, { fieldErrors: { "details.sleeps": [message] } });
}

/** Each pitch keeps what still fits the shelter; where it no longer can be built so, it goes back to the shelter's own. */
async function fitPitches(tx: Transaction, tripId: string, shelterId: string, spec: ShelterSpec) {
  const rows = await tx
    .select()
    .from(pitch)
    .where(and(eq(pitch.tripId, tripId), eq(pitch.shelterId, shelterId)));
  for (const row of rows) {
    const kept = keepPitchedParts(spec, row);
    const over = checkShelterSpec(toPitchSpec(spec, kept)).length === 0 ? kept : { dimensions: {}, lineLengthsM: {} };
    await tx
      .update(pitch)
      .set({ ...over, version: row.version + 1, updatedAt: new Date() })
      .where(and(eq(pitch.id, row.id), eq(pitch.tripId, tripId)));
  }
  return new Set(rows.map((row) => row.id));
}

/** `lifted` is how many tie-outs of its plans are no longer there, with their anchors back in the tray. */
export async function updateShelter({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof shelterUpdateInput>;
}): Promise<{ version: number; lifted: number }> {
  const { tripId, shelterId, version, details } = parseInput(shelterUpdateInput, input);
  requireBuildable(details.spec, (field) => `details.spec.${field}`);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "shelter.edit", tx);
    const before = await loadShelterRow(tx, tripId, shelterId);
    const [row] = await tx
      .update(shelter)
      .set({ ...details, version: version + 1, updatedAt: new Date() })
      .where(and(eq(shelter.id, shelterId), eq(shelter.tripId, tripId), eq(shelter.version, version)))
      .returning({ version: shelter.version });
    if (!row) {
      return refuseStale(tx, {
        trip: await loadTripRow(tx, tripId),
        entityId: shelterId,
        what: before.name,
        current: { version: before.version, details: toShelterDetails(before) },
      });
    }
    await requireRoomForSleepers(tx, tripId, shelterId, details.sleeps);
    const pitchIds = await fitPitches(tx, tripId, shelterId, details.spec);
    const tieOutIds = new Set(buildShelter(details.spec).tieOuts.map((tieOut) => tieOut.id));
    const lifted = await amendPlacements(tx, ctx, tripId, (placement) =>
      pitchIds.has(placement.pitchId) && !tieOutIds.has(placement.tieOutId) ? null : placement,
    );
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "shelter",
      entityId: shelterId,
      summary: details.name,
      isPrinted: true,
    });
    return { ...row, lifted };
  });
}
