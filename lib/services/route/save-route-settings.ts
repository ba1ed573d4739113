import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { routeSettings } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { routeSettingsInput } from "@/lib/domain/route/schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { listCampRows } from "../camps/internal";
import { loadTripRow, recordChange, refuseStale } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { findRouteSettings, writeStop } from "./internal";

/** How the group walks, and what is typed of each leg, as one. */
export async function saveRouteSettings({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof routeSettingsInput>;
}): Promise<{ version: number }> {
  const { tripId, version, settings, legs, homeLeg } = parseInput(routeSettingsInput, input);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "route.edit", tx);
    const camps = new Set((await listCampRows(tx, tripId)).map((camp) => camp.id));
    if (legs.some((one) => !camps.has(one.campId))) {
      throw new AppError("not-found", "There is no such camp on this trip.");
    }
    const before = await findRouteSettings(tx, tripId);
    if ((before?.version ?? 0) !== version) {
      return refuseStale(tx, {
        trip: await loadTripRow(tx, tripId),
        entityId: tripId,
        what: "how the group walks",
        current: { version: before?.version ?? 0 },
      });
    }
    const values = { settings, homeLeg, version: version + 1, updatedAt: new Date() };
    if (before) {
      const isOpened = and(eq(routeSettings.tripId, tripId), eq(routeSettings.version, version));
      await tx.update(routeSettings).set(values).where(isOpened);
    } else {
      await tx.insert(routeSettings).values({ tripId, ...values });
    }
    for (const { campId, leg } of legs) await writeStop(tx, { tripId, campId }, { leg });
    await recordChange(tx, ctx, {
      tripId,
      action: "update",
      entity: "route",
      entityId: tripId,
      summary: "How the group walks",
      isPrinted: true,
    });
    return { version: version + 1 };
  });
}
