import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { pitch } from "@/db/schema";
import { pitchUpdateInput } from "@/lib/domain/shelter/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow } from "../camps/internal";
import { loadShelterRow, requireBuildable } from "../shelters/internal";
import { loadTripRow, recordChange, refuseStale } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { keepPitchedParts, loadPitchRow, toPitchDetails, toPitchSpec } from "./internal";

/** Heading, patch of ground, heights and line lengths. Tie-outs stay the same whatever they are. */
export async function updatePitch({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof pitchUpdateInput>;
}): Promise<{ version: number }> {
  const { tripId, campId, pitchId, version, details } = parseInput(pitchUpdateInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "shelter.pitch", tx);
    const before = await loadPitchRow(tx, { tripId, campId, pitchId });
    const camp = await loadCampRow(tx, tripId, campId);
    const shelter = await loadShelterRow(tx, tripId, before.shelterId);
    requireBuildable(toPitchSpec(shelter.spec, details), (field) => `details.${field}`);
    if (details.patch === "second" && camp.secondGround === null) {
      const message = `${camp.name} has no second patch of ground.`;
      throw new AppError("bad-input", message, { fieldErrors: { "details.patch": [message] } });
    }
    const [row] = await tx
      .update(pitch)
      .set({
        headingDeg: details.headingDeg % 360,
        patch: details.patch,
        ...keepPitchedParts(shelter.spec, details),
        version: version + 1,
        updatedAt: new Date(),
      })
      .where(and(eq(pitch.id, pitchId), eq(pitch.tripId, tripId), eq(pitch.campId, campId), eq(pitch.version, version)))
      .returning({ version: pitch.version });
    if (!row) {
      return refuseStale(tx, {
        trip: await loadTripRow(tx, tripId),
        entityId: pitchId,
        what: `${shelter.name} at ${camp.name}`,
        current: { version: before.version, details: toPitchDetails(before) },
      });
    }
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "pitch",
      entityId: pitchId,
      summary: `${shelter.name} at ${camp.name}`,
      isPrinted: true,
    });
    return row;
  });
}
