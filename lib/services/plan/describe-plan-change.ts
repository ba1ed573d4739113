import { buildShelter } from "@/lib/calc/shelter-kinds";
import type { PlanChange } from "@/lib/domain/plan/schema";
import { formatLean } from "@/lib/format/angles";
import { plural } from "@/lib/format/words";
import type { CampState } from "./load-trip-state";

interface Spot {
  readonly pitchId: string;
  readonly tieOutId: string;
}

function nameSpot(spot: Spot, camp: CampState): string {
  const pitch = camp.pitches.find((one) => one.id === spot.pitchId);
  if (!pitch) return "a shelter that is no longer here";
  const tieOut = buildShelter(pitch.spec).tieOuts.find((one) => one.id === spot.tieOutId);
  return tieOut ? `${pitch.name}, tie-out ${tieOut.number}` : pitch.name;
}

/** One change in words: "Ridge tarp, tie-out 3: wide sand stake, 10° back". */
export function describePlanChange(change: PlanChange, camp: CampState): string {
  const nameAnchor = (id: string) => camp.tray.find((one) => one.id === id)?.name ?? "an anchor no longer in the tray";
  switch (change.type) {
    case "place": {
      const { placement } = change;
      const second = placement.tandem ? `, ${nameAnchor(placement.tandem.anchorId)} in line behind it` : "";
      return `${nameSpot(placement, camp)}: ${nameAnchor(placement.anchorId)}, ${formatLean(placement.leanDeg)}${second}`;
    }
    case "lift":
      return `${nameSpot(change, camp)}: anchor back to the tray`;
    case "swap":
      return `${nameSpot(change.from, camp)} and ${nameSpot(change.to, camp)}: anchors exchanged`;
    case "replace":
      return `Whole plan: ${plural(change.placements.length, "tie-out")} set`;
  }
}
