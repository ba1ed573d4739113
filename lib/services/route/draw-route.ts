import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { normaliseLongitude } from "@/lib/calc/places/utm";
import { drawRouteInput } from "@/lib/domain/route/schema";
import { AppError } from "@/lib/errors";
import { measureSegments } from "@/lib/gpx/measure-line";
import { GpxFault } from "@/lib/gpx/types";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { storeRoute } from "./internal";

function measureDrawn(points: readonly { latitude: number; longitude: number }[]) {
  try {
    return measureSegments([
      {
        latitudes: points.map((point) => point.latitude),
        longitudes: points.map((point) => normaliseLongitude(point.longitude)),
        heightsM: points.map(() => Number.NaN),
      },
    ]);
  } catch (error) {
    if (!(error instanceof GpxFault)) throw error;
    throw new AppError("bad-input", error.message, { fieldErrors: { points: [error.message] } });
  }
}

/** The trip's way as points set by hand: lengths, but no heights. */
export async function drawRoute({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof drawRouteInput>;
}): Promise<{ lengthM: number; snapped: number }> {
  const { tripId, points } = parseInput(drawRouteInput, input);
  await requirePermission(ctx, tripId, "route.edit");
  const measured = measureDrawn(points);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "route.edit", tx);
    const { snapped } = await storeRoute(tx, ctx, {
      tripId,
      name: "Drawn by hand",
      source: "drawn",
      measured,
      places: [],
      remarks: [],
    });
    return { lengthM: measured.lengthM, snapped };
  });
}
