import { eq } from "drizzle-orm";
import { getDb } from "@/db/client";
import { preference } from "@/db/schema";
import { METRIC, type Preferences } from "@/lib/domain/preferences";
import type { Context } from "@/lib/services/context/context";

/** Units and paper as the person likes them; metric and A4 until they say otherwise. */
export async function getPreferences({ ctx }: { ctx: Context }): Promise<Preferences> {
  const [row] = await getDb()
    .select({ preferences: preference.preferences })
    .from(preference)
    .where(eq(preference.userId, ctx.actor.userId))
    .limit(1);
  return { ...METRIC, ...row?.preferences };
}
