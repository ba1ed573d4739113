import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { importGpxInput, MAX_GPX_BYTES } from "@/lib/domain/route/schema";
import { AppError } from "@/lib/errors";
import { simplifiedLine } from "@/lib/gpx/measure-line";
import { nearestOnLine } from "@/lib/gpx/line-places";
import type { Context } from "@/lib/services/context/context";
import { measureGpxInWorker } from "@/lib/workers/measure-gpx-in-worker";
import { consumeQuota } from "../quota/consume-quota";
import { parseInput } from "../trips/parse-input";
import { storeRoute } from "./internal";

export interface GpxImported {
  readonly lengthM: number;
  readonly pointCount: number;
  readonly simplifiedCount: number;
  readonly placeCount: number;
  /** Camps that lie near the line and now have a place on it. */
  readonly snapped: number;
  readonly remarks: readonly string[];
}

/** The trip's way from a GPX file. Read and measured before anything is written: what is refused leaves no mark. */
export async function importGpx({
  ctx,
  input,
  bytes,
}: {
  ctx: Context;
  input: z.input<typeof importGpxInput>;
  bytes: Uint8Array;
}): Promise<GpxImported> {
  const { tripId, fileName } = parseInput(importGpxInput, input);
  await requirePermission(ctx, tripId, "route.edit");
  if (bytes.byteLength > MAX_GPX_BYTES) throw new AppError("too-large", "A GPX file may have at most 12 MB.");
  if (bytes.byteLength === 0) throw new AppError("bad-input", "The file is empty.");
  await consumeQuota("gpx", ctx.actor.userId);
  const answer = await measureGpxInWorker(bytes);
  if (answer.refused !== null) {
    throw new AppError("bad-input", answer.refused, { fieldErrors: { file: [answer.refused] } });
  }
  const { route, remarks } = answer;
  const line = simplifiedLine(route.simplified);
  const places = answer.waypoints.map((place) => {
    const found = nearestOnLine(line, place);
    return { ...place, atM: found?.atM ?? 0, offM: found?.offM ?? 0 };
  });
  const name = answer.name || fileName.replace(/\.gpx$/i, "");
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "route.edit", tx);
    const { snapped } = await storeRoute(tx, ctx, { tripId, name, source: "file", measured: route, places, remarks });
    return {
      lengthM: route.lengthM,
      pointCount: route.line.atM.length,
      simplifiedCount: line.atM.length,
      placeCount: places.length,
      snapped,
      remarks,
    };
  });
}
