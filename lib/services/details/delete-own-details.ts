import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { personalDetail } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";

/** At once and for good. */
export async function deleteOwnDetails({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<void> {
  const { tripId } = parseInput(tripRefInput, input);
  await withTransaction(async (tx) => {
    const { personId } = await requirePermission(ctx, tripId, "details.own", tx);
    await tx
      .delete(personalDetail)
      .where(and(eq(personalDetail.personId, personId), eq(personalDetail.tripId, tripId)));
  });
}
