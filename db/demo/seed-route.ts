import type { Context } from "@/lib/services/context/context";
import { importGpx } from "@/lib/services/route/import-gpx";
import { getRoute } from "@/lib/services/route/get-route";
import { saveRouteSettings } from "@/lib/services/route/save-route-settings";
import { BLANK_LEG } from "@/lib/domain/route/schema";
import { ROUTE_FILE_NAME, WALKING, writeDemoRoute } from "./skarn-edge-route";

/** The way through the demo's camps, from its file. On the day up to the edge the group sets off late: it gets tight. */
export async function seedRoute(ctx: Context, tripId: string): Promise<void> {
  const bytes = new TextEncoder().encode(writeDemoRoute());
  await importGpx({ ctx, input: { tripId, fileName: ROUTE_FILE_NAME }, bytes });
  const { stops } = await getRoute({ ctx, input: { tripId } });
  const late = stops.find((stop) => stop.name === "Skarn Edge");
  const legs = late ? [{ campId: late.campId, leg: { ...BLANK_LEG, setOffMinute: 12 * 60 } }] : [];
  const input = { tripId, version: 0, settings: WALKING, legs, homeLeg: BLANK_LEG };
  await saveRouteSettings({ ctx, input });
}
