import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { packItem, person, trip } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { tripCreateInput } from "@/lib/domain/trip/schema";
import type { Context } from "@/lib/services/context/context";
import { STARTER_PACK_ITEMS } from "../pack/starter-items";
import { recordChange, requireRoomForTrip } from "./internal";
import { parseInput } from "./parse-input";

/** Whoever creates a trip leads it. */
export async function createTrip({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripCreateInput>;
}): Promise<{ tripId: string }> {
  const details = parseInput(tripCreateInput, input);
  const tripId = newId();
  await withTransaction(async (tx) => {
    await requireRoomForTrip(tx, ctx);
    const now = new Date();
    await tx
      .insert(trip)
      .values({ id: tripId, ...details, createdBy: ctx.actor.userId, createdAt: now, updatedAt: now });
    await tx.insert(person).values({
      id: newId(),
      tripId,
      userId: ctx.actor.userId,
      name: ctx.actor.name,
      email: ctx.actor.email.toLowerCase(),
      role: "leader",
      createdAt: now,
    });
    await tx
      .insert(packItem)
      .values(STARTER_PACK_ITEMS.map((name, position) => ({ id: newId(), tripId, personId: null, position, name })));
    await recordChange(tx, ctx, {
      tripId,
      action: "create",
      entity: "trip",
      entityId: tripId,
      summary: details.name,
      isPrinted: false,
    });
  });
  return { tripId };
}
