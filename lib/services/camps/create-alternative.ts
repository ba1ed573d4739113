import { and, count, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { camp } from "@/db/schema";
import { blankCamp, campAlternativeInput } from "@/lib/domain/camp/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { cloneCamp } from "./clone-camp";
import { loadCampRow } from "./internal";

const MAX_ALTERNATIVES = 3;

/**
 * Another place for the nights of a camp, for bad weather: the same shelters and sleepers, everything of the place still
 * to be said, no plan yet. It stands beside the line of nights until somebody switches to it.
 */
export async function createAlternative({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campAlternativeInput>;
}): Promise<{ campId: string }> {
  const { tripId, campId, name } = parseInput(campAlternativeInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "camp.arrange", tx);
    const asked = await loadCampRow(tx, tripId, campId);
    const main = asked.alternativeToId === null ? asked : await loadCampRow(tx, tripId, asked.alternativeToId);
    const [standing] = await tx
      .select({ count: count() })
      .from(camp)
      .where(and(eq(camp.tripId, tripId), eq(camp.alternativeToId, main.id)));
    if ((standing?.count ?? 0) >= MAX_ALTERNATIVES) {
      throw new AppError("bad-input", `${main.name} has ${MAX_ALTERNATIVES} alternatives already. Delete one first.`);
    }
    const alternativeId = await cloneCamp(tx, ctx, main, {
      tripId,
      name,
      position: main.position,
      alternativeToId: main.id,
      details: { ...blankCamp(name), nights: main.nights },
      mapShelterId: (id) => id,
      // What the main camp's anchors stand in is not what these will.
      mapAnchorId: () => null,
      mapPersonId: (id) => id,
    });
    await recordChange(tx, ctx, {
      tripId,
      action: "create",
      entity: "camp",
      entityId: alternativeId,
      summary: `${name}, alternative to ${main.name}`,
      isPrinted: false,
    });
    return { campId: alternativeId };
  });
}
