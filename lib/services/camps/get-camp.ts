import type { z } from "zod";
import { getDb } from "@/db/client";
import { campRefInput } from "@/lib/domain/camp/schema";
import type { CampView } from "@/lib/domain/views";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { listAlternativeRows, listCampRows, toAlternativeViews, toCampViews } from "./internal";

export async function getCamp({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campRefInput>;
}): Promise<CampView> {
  const { tripId, campId } = parseInput(campRefInput, input);
  await requirePermission(ctx, tripId, "camp.read");
  const db = getDb();
  const trip = await loadTripRow(db, tripId);
  const rows = await listCampRows(db, tripId);
  const alternatives = await listAlternativeRows(db, tripId);
  const views = [...toCampViews(trip.startDate, rows), ...toAlternativeViews(trip.startDate, rows, alternatives)];
  const found = views.find((camp) => camp.id === campId);
  if (!found) throw new AppError("not-found", "There is no such camp on this trip.");
  return found;
}
