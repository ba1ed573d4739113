import type { Transaction } from "@/db/client";
import { campStop, routeLine, routeSettings } from "@/db/schema";
import { listStopRows, findRouteLine, findRouteSettings } from "./internal";

/** The way, how the group walks and the camps' places on it, for a copy of a trip. @param camps new ids by old ones */
export async function copyRoute(
  tx: Transaction,
  tripId: string,
  copyId: string,
  camps: ReadonlyMap<string, string>,
): Promise<void> {
  const line = await findRouteLine(tx, tripId);
  if (line) await tx.insert(routeLine).values({ ...line, tripId: copyId, createdAt: new Date() });
  const settings = await findRouteSettings(tx, tripId);
  if (settings) {
    await tx.insert(routeSettings).values({ ...settings, tripId: copyId, version: 1, updatedAt: new Date() });
  }
  for (const stop of await listStopRows(tx, tripId)) {
    const campId = camps.get(stop.campId);
    if (campId) await tx.insert(campStop).values({ ...stop, campId, tripId: copyId });
  }
}
