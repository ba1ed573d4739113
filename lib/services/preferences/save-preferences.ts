import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { preference } from "@/db/schema";
import { preferencesSchema } from "@/lib/domain/preferences";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

export async function savePreferences({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof preferencesSchema>;
}): Promise<void> {
  const preferences = parseInput(preferencesSchema, input);
  await withTransaction(async (tx) => {
    await tx
      .insert(preference)
      .values({ userId: ctx.actor.userId, preferences })
      .onConflictDoUpdate({ target: preference.userId, set: { preferences } });
  });
}
