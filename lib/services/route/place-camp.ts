import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { camp } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { placeCampInput } from "@/lib/domain/route/schema";
import { AppError } from "@/lib/errors";
import { placeOnLine } from "@/lib/gpx/line-places";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow, toCampDetails, type CampRow } from "../camps/internal";
import { loadTripRow, recordChange, refuseStale } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { findRouteLine, requireLine, unpackLine, writeStop } from "./internal";

type Placing = z.output<typeof placeCampInput>;
type Where = Pick<CampRow, "latitude" | "longitude" | "altitudeM">;

const ALTITUDE_DIGITS = 1;
const DEGREE_DIGITS = 6;

async function findWhere(tx: Transaction, before: CampRow, { tripId, atM, position }: Placing): Promise<Where> {
  const kept = { latitude: before.latitude, longitude: before.longitude, altitudeM: before.altitudeM };
  if (position === "keep") return kept;
  if (position !== "line") return position;
  if (atM === null) return kept;
  const line = unpackLine(requireLine(await findRouteLine(tx, tripId)));
  const place = placeOnLine(line, atM);
  return {
    latitude: Number(place.latitude.toFixed(DEGREE_DIGITS)),
    longitude: Number(place.longitude.toFixed(DEGREE_DIGITS)),
    // A line without heights says nothing of the camp's.
    altitudeM: place.heightM === null ? before.altitudeM : Number(place.heightM.toFixed(ALTITUDE_DIGITS)),
  };
}

/** Puts a camp on the line, or takes it off; with "line", its position and altitude become those of that place. */
export async function placeCamp({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof placeCampInput>;
}): Promise<{ version: number }> {
  const placing = parseInput(placeCampInput, input);
  const { tripId, campId, version, atM } = placing;
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "camp.edit", tx);
    const before = await loadCampRow(tx, tripId, campId);
    if (atM !== null) {
      const { lengthM } = requireLine(await findRouteLine(tx, tripId));
      if (atM > lengthM + 1e-6) throw new AppError("bad-input", "That place lies beyond the end of the line.");
    }
    const where = await findWhere(tx, before, placing);
    if ((where.latitude === null) !== (where.longitude === null)) {
      throw new AppError("bad-input", "Enter both latitude and longitude, or neither.");
    }
    const [row] = await tx
      .update(camp)
      .set({ ...where, version: version + 1, updatedAt: new Date() })
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
    await writeStop(tx, { tripId, campId }, { atM });
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "camp",
      entityId: campId,
      summary: `${before.name}: place on the route`,
      isPrinted: true,
    });
    return row;
  });
}
