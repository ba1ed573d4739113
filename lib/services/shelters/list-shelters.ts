import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { camp, pitch } from "@/db/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { ShelterView } from "@/lib/domain/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { isInLine } from "../camps/internal";
import { parseInput } from "../trips/parse-input";
import { listShelterRows, toShelterDetails } from "./internal";

export async function listShelters({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<ShelterView[]> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "camp.read");
  const db = getDb();
  const pitched = await db
    .select({ shelterId: pitch.shelterId, campName: camp.name })
    .from(pitch)
    .innerJoin(camp, eq(camp.id, pitch.campId))
    .where(and(eq(pitch.tripId, tripId), isInLine))
    .orderBy(camp.position);
  return (await listShelterRows(db, tripId)).map((row) => ({
    id: row.id,
    position: row.position,
    details: toShelterDetails(row),
    version: row.version,
    campNames: pitched.filter((one) => one.shelterId === row.id).map((one) => one.campName),
  }));
}
