import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { campCopyInput } from "@/lib/domain/camp/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { cloneCamp } from "./clone-camp";
import { countNights, listCampRows, loadCampRow, requireNightsFit } from "./internal";

/** Another camp with the same ground, wind, shelters and plan, at the end of the trip. */
export async function copyCamp({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campCopyInput>;
}): Promise<{ campId: string }> {
  const { tripId, campId, withSleepers } = parseInput(campCopyInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "camp.arrange", tx);
    const source = await loadCampRow(tx, tripId, campId);
    const camps = await listCampRows(tx, tripId);
    requireNightsFit(countNights(camps) + source.nights);
    const name = `${source.name.slice(0, 73)} (copy)`;
    const copyId = await cloneCamp(tx, ctx, source, {
      tripId,
      name,
      alternativeToId: null,
      position: Math.max(...camps.map((one) => one.position)) + 1,
      mapShelterId: (id) => id,
      mapAnchorId: (id) => id,
      mapPersonId: withSleepers ? (id) => id : () => null,
    });
    await recordChange(tx, ctx, {
      tripId,
      action: "copy",
      entity: "camp",
      entityId: copyId,
      summary: `${source.name} as ${name}`,
      isPrinted: true,
    });
    return { campId: copyId };
  });
}
