import { eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { campStop, routeLine } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { routeRefInput } from "@/lib/domain/route/schema";
import type { Context } from "@/lib/services/context/context";
import { recordChange } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { findRouteHead, requireLine } from "./internal";

/** The line goes; camps keep their positions, and what was typed of legs stays. */
export async function deleteRoute({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof routeRefInput>;
}): Promise<void> {
  const { tripId } = parseInput(routeRefInput, input);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "route.edit", tx);
    const row = requireLine(await findRouteHead(tx, tripId));
    await tx.delete(routeLine).where(eq(routeLine.tripId, tripId));
    await tx.update(campStop).set({ atM: null }).where(eq(campStop.tripId, tripId));
    await recordChange(tx, ctx, {
      tripId,
      action: "delete",
      entity: "route",
      entityId: tripId,
      summary: row.name,
      isPrinted: true,
    });
  });
}
