import type { Preferences } from "@/lib/domain/preferences";
import { workOutLegs } from "@/lib/domain/route/work-out-legs";
import { describeWay } from "@/lib/format/route";
import type { Reader } from "../trips/internal";
import { loadRoute } from "./get-route";

/** The way to each camp, in sentences for paper, by the camp's id; camps whose way is not known are left out. */
export async function listWays(
  reader: Reader,
  tripId: string,
  unit: Preferences["lengthUnit"],
): Promise<ReadonlyMap<string, readonly string[]>> {
  const route = await loadRoute(reader, tripId);
  const legs = workOutLegs(route).filter((leg) => leg.distanceM !== null);
  return new Map(legs.map((leg) => [leg.key, describeWay(leg, route.settings.pitchingMin, unit)]));
}
