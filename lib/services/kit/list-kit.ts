import type { z } from "zod";
import { getDb } from "@/db/client";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { KitItemView } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { listCampRows } from "../camps/internal";
import { listPlacementRows } from "../plan/internal";
import { parseInput } from "../trips/parse-input";
import { countUses } from "./count-uses";
import { listKitRows } from "./internal";

export async function listKit({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<KitItemView[]> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "camp.read");
  const db = getDb();
  const camps = await listCampRows(db, tripId);
  const inLine = new Set(camps.map((camp) => camp.id));
  const placements = (await listPlacementRows(db, tripId)).filter((one) => inLine.has(one.campId));
  return (await listKitRows(db, tripId)).map((row) => {
    const uses = countUses(placements, row.id);
    const usedAt = new Set(uses.map((use) => use.campId));
    return {
      id: row.id,
      position: row.position,
      details: row.details,
      version: row.version,
      mostUsed: Math.max(0, ...uses.map((use) => use.pieces)),
      campNames: camps.filter((camp) => usedAt.has(camp.id)).map((camp) => camp.name),
    };
  });
}
