import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { gear } from "@/db/schema";
import { gearDeleteInput } from "@/lib/domain/gear/schema";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { loadGearRow } from "./internal";

/** Trips that were started from it keep their own copy. */
export async function deleteGear({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof gearDeleteInput>;
}): Promise<void> {
  const { gearId } = parseInput(gearDeleteInput, input);
  await withTransaction(async (tx) => {
    await loadGearRow(tx, ctx.actor.userId, gearId);
    await tx.delete(gear).where(and(eq(gear.id, gearId), eq(gear.ownerId, ctx.actor.userId)));
  });
}
