import type { Placement } from "@/lib/calc/types";
import type { PlanChange } from "@/lib/domain/plan/schema";

/** One tie-out of one pitched shelter. */
export interface Spot {
  readonly pitchId: string;
  readonly tieOutId: string;
}

export const spotKey = ({ pitchId, tieOutId }: Spot) => `${pitchId} ${tieOutId}`;
export const isSameSpot = (a: Spot | null, b: Spot | null) => a !== null && b !== null && spotKey(a) === spotKey(b);

export function placementAt(placements: readonly Placement[], spot: Spot): Placement | null {
  return placements.find((one) => isSameSpot(one, spot)) ?? null;
}

/** The smallest change that leads from one plan to another: a small change argues with fewer people. Null: none. */
export function changeBetween(from: readonly Placement[], to: readonly Placement[]): PlanChange | null {
  const before = new Map(from.map((one) => [spotKey(one), JSON.stringify(one)]));
  const after = new Map(to.map((one) => [spotKey(one), JSON.stringify(one)]));
  const spots = new Set([...before.keys(), ...after.keys()]);
  const changed = [...spots].filter((spot) => before.get(spot) !== after.get(spot));
  const [only] = changed;
  if (only === undefined) return null;
  if (changed.length > 1) return { type: "replace", placements: [...to] };
  const placement = to.find((one) => spotKey(one) === only);
  if (placement) return { type: "place", placement };
  const [pitchId = "", tieOutId = ""] = only.split(" ");
  return { type: "lift", pitchId, tieOutId };
}
