import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { pitch } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { pitchCreateInput } from "@/lib/domain/shelter/schema";
import { suggestHeading } from "@/lib/domain/shelter/suggest-heading";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow } from "../camps/internal";
import { loadShelterRow } from "../shelters/internal";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";

/** Pitches a shelter at a camp: turned to the camp's wind, with the shelter's own measures. */
export async function createPitch({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof pitchCreateInput>;
}): Promise<{ pitchId: string }> {
  const { tripId, campId, shelterId } = parseInput(pitchCreateInput, input);
  const pitchId = newId();
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "shelter.pitch", tx);
    const camp = await loadCampRow(tx, tripId, campId);
    const shelter = await loadShelterRow(tx, tripId, shelterId);
    const pitches = await tx
      .select({ shelterId: pitch.shelterId, position: pitch.position })
      .from(pitch)
      .where(and(eq(pitch.tripId, tripId), eq(pitch.campId, campId)));
    if (pitches.some((one) => one.shelterId === shelterId)) {
      throw new AppError("conflict", `${shelter.name} is pitched at ${camp.name} already.`);
    }
    await tx.insert(pitch).values({
      id: pitchId,
      tripId,
      campId,
      shelterId,
      position: Math.max(-1, ...pitches.map((one) => one.position)) + 1,
      headingDeg: suggestHeading(shelter.spec.kind, camp.windFromDeg, camp.windToDeg),
      patch: "main",
      dimensions: {},
      lineLengthsM: {},
      updatedAt: new Date(),
    });
    await recordChange(tx, ctx, {
      tripId,
      action: "create",
      entity: "pitch",
      entityId: pitchId,
      summary: `${shelter.name} at ${camp.name}`,
      isPrinted: true,
    });
  });
  return { pitchId };
}
