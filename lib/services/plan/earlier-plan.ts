import { and, asc, eq, lte } from "drizzle-orm";
import { planIntent } from "@/db/schema";
import { buildShelter } from "@/lib/calc/shelter-kinds";
import type { Placement } from "@/lib/calc/types";
import { reducePlan } from "@/lib/domain/plan/reduce";
import { AppError } from "@/lib/errors";
import { formatLean } from "@/lib/format/angles";
import { knotName, riggingRemarks } from "@/lib/pdf/words";
import type { Reader } from "../trips/internal";
import type { CampState } from "./load-trip-state";

export interface EarlierPlan {
  readonly byName: string;
  readonly at: Date;
  /** What of it can still be: its shelter, tie-out and anchors are there. */
  readonly placements: readonly Placement[];
  readonly leftOut: readonly string[];
}

/** Every change is kept, so a plan as it stood is the sum of them. A version that never was reads as not there. */
export async function loadEarlierPlan(
  reader: Reader,
  own: CampState,
  tripId: string,
  version: number,
): Promise<EarlierPlan> {
  const campId = own.camp.id;
  const rows = await reader
    .select()
    .from(planIntent)
    .where(and(eq(planIntent.campId, campId), eq(planIntent.tripId, tripId), lte(planIntent.resultVersion, version)))
    .orderBy(asc(planIntent.resultVersion), asc(planIntent.createdAt));
  const last = rows.findLast((row) => row.resultVersion === version);
  if (!last) throw new AppError("not-found", "There was no such version of this plan.");
  const all = rows.reduce<readonly Placement[]>((plan, row) => reducePlan(plan, row.change), []);
  const leftOut: string[] = [];
  const placements = all.filter((one) => {
    const reason = findLoss(own, one);
    if (reason !== null) leftOut.push(reason);
    return reason === null;
  });
  return { byName: last.userName, at: last.createdAt, placements, leftOut: [...new Set(leftOut)] };
}

function findLoss(own: CampState, one: Placement): string | null {
  const pitch = own.pitches.find((each) => each.id === one.pitchId);
  if (!pitch) return "A shelter that is no longer pitched here.";
  if (!buildShelter(pitch.spec).tieOuts.some((tieOut) => tieOut.id === one.tieOutId)) {
    return `${pitch.name}: a tie-out that it no longer has.`;
  }
  const wanted = [one.anchorId, ...(one.tandem ? [one.tandem.anchorId] : [])];
  return wanted.every((id) => own.tray.some((anchor) => anchor.id === id))
    ? null
    : `${nameSpot(own, one)}: an anchor that is no longer in the kit.`;
}

export function nameSpot(own: CampState, spot: Pick<Placement, "pitchId" | "tieOutId">): string {
  const pitch = own.pitches.find((each) => each.id === spot.pitchId);
  const tieOut = pitch && buildShelter(pitch.spec).tieOuts.find((each) => each.id === spot.tieOutId);
  return pitch && tieOut ? `${pitch.name}, tie-out ${tieOut.number}` : "A tie-out that is no longer here";
}

/** "Three-blade 200, 10° back, bowline, pinned". */
export function describePlacement(own: CampState, placement: Placement | undefined): string {
  if (!placement) return "no anchor";
  const anchor = own.tray.find((one) => one.id === placement.anchorId);
  return [
    anchor?.name ?? "an anchor no longer in the kit",
    formatLean(placement.leanDeg),
    knotName(placement.knot),
    ...riggingRemarks(placement, own.tray, "m"),
    ...(placement.pinned ? ["pinned"] : []),
  ].join(", ");
}
