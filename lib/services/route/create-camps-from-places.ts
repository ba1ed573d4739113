import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { camp } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { blankCamp } from "@/lib/domain/camp/schema";
import { newId } from "@/lib/domain/ids";
import { campsFromPlacesInput } from "@/lib/domain/route/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { countNights, listCampRows, requireNightsFit } from "../camps/internal";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { findRouteHead, requireLine, SNAP_M, writeStop } from "./internal";

/** A camp of one night at each chosen place of the file, in the order of the way, after the camps there are. */
export async function createCampsFromPlaces({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campsFromPlacesInput>;
}): Promise<{ campIds: string[] }> {
  const { tripId, places } = parseInput(campsFromPlacesInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "route.edit", tx);
    const route = requireLine(await findRouteHead(tx, tripId));
    const chosen = [...new Set(places)].map((index) => {
      const place = route.places[index];
      if (!place) throw new AppError("bad-input", "The file names no such place.");
      return place;
    });
    const camps = await listCampRows(tx, tripId);
    requireNightsFit(countNights(camps) + chosen.length);
    const first = Math.max(-1, ...camps.map((one) => one.position)) + 1;
    const now = new Date();
    const campIds: string[] = [];
    for (const [index, place] of chosen.toSorted((a, b) => a.atM - b.atM).entries()) {
      const campId = newId();
      campIds.push(campId);
      const { latitude, longitude, heightM, note } = place;
      const details = { ...blankCamp(place.name), latitude, longitude, altitudeM: heightM, notes: note };
      await tx
        .insert(camp)
        .values({ id: campId, tripId, position: first + index, ...details, createdAt: now, updatedAt: now });
      await writeStop(tx, { tripId, campId }, { atM: place.offM <= SNAP_M ? place.atM : null });
      await recordChange(tx, ctx, {
        tripId,
        action: "create",
        entity: "camp",
        entityId: campId,
        summary: place.name,
        isPrinted: true,
      });
    }
    return { campIds };
  });
}
