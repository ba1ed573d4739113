import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { camp } from "@/db/schema";
import { campCreateInput } from "@/lib/domain/camp/schema";
import { newId } from "@/lib/domain/ids";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { countNights, listCampRows, requireNightsFit } from "./internal";

/** After the last camp of the trip. */
export async function createCamp({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campCreateInput>;
}): Promise<{ campId: string }> {
  const { tripId, details } = parseInput(campCreateInput, input);
  const campId = newId();
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "camp.arrange", tx);
    const camps = await listCampRows(tx, tripId);
    requireNightsFit(countNights(camps) + details.nights);
    const now = new Date();
    const position = Math.max(-1, ...camps.map((one) => one.position)) + 1;
    await tx.insert(camp).values({ id: campId, tripId, position, ...details, createdAt: now, updatedAt: now });
    await recordChange(tx, ctx, {
      tripId,
      action: "create",
      entity: "camp",
      entityId: campId,
      summary: details.name,
      isPrinted: true,
    });
  });
  return { campId };
}
