import { asc, eq } from "drizzle-orm";
import { getDb } from "@/db/client";
import { gear } from "@/db/schema";
import type { GearView } from "@/lib/domain/views";
import type { Context } from "@/lib/services/context/context";

/** The person's own shelters, anchors and cords; nobody else's. */
export async function listGear({ ctx }: { ctx: Context }): Promise<GearView[]> {
  return getDb()
    .select({ id: gear.id, details: gear.details, version: gear.version })
    .from(gear)
    .where(eq(gear.ownerId, ctx.actor.userId))
    .orderBy(asc(gear.createdAt), asc(gear.id));
}
