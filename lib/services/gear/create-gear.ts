import { count, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { gear } from "@/db/schema";
import { gearCreateInput, MAX_GEAR } from "@/lib/domain/gear/schema";
import { newId } from "@/lib/domain/ids";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { requireBuildableGear } from "./internal";

export async function createGear({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof gearCreateInput>;
}): Promise<{ gearId: string }> {
  const { details } = parseInput(gearCreateInput, input);
  requireBuildableGear(details);
  const gearId = newId();
  await withTransaction(async (tx) => {
    const [own] = await tx.select({ count: count() }).from(gear).where(eq(gear.ownerId, ctx.actor.userId));
    if (own && own.count >= MAX_GEAR) throw new AppError("bad-input", `Your gear can have at most ${MAX_GEAR} things.`);
    const now = new Date();
    await tx.insert(gear).values({ id: gearId, ownerId: ctx.actor.userId, details, createdAt: now, updatedAt: now });
  });
  return { gearId };
}
