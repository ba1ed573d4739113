import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { gear } from "@/db/schema";
import { gearUpdateInput } from "@/lib/domain/gear/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { loadGearRow, requireBuildableGear } from "./internal";

export async function updateGear({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof gearUpdateInput>;
}): Promise<{ version: number }> {
  const { gearId, version, details } = parseInput(gearUpdateInput, input);
  requireBuildableGear(details);
  const ownerId = ctx.actor.userId;
  return withTransaction(async (tx) => {
    const before = await loadGearRow(tx, ownerId, gearId);
    const [row] = await tx
      .update(gear)
      .set({ details, version: version + 1, updatedAt: new Date() })
      .where(and(eq(gear.id, gearId), eq(gear.ownerId, ownerId), eq(gear.version, version)))
      .returning({ version: gear.version });
    if (row) return row;
    throw new AppError("conflict", "You changed this somewhere else after you opened it. Nothing was saved yet.", {
      details: { current: { version: before.version, details: before.details } },
    });
  });
}
