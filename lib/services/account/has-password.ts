import { and, eq, isNotNull } from "drizzle-orm";
import { getDb } from "@/db/client";
import { account } from "@/db/schema";
import type { Context } from "@/lib/services/context/context";

/** Who joined by an invitation may have none and sign in by links. */
export async function hasPassword({ ctx }: { ctx: Context }): Promise<boolean> {
  const rows = await getDb()
    .select({ id: account.id })
    .from(account)
    .where(and(eq(account.userId, ctx.actor.userId), isNotNull(account.password)));
  return rows.length > 0;
}
