import type { Placement, TrayAnchor } from "@/lib/calc/types";
import type { PlanChange } from "./schema";

const NO_TIE_OUT = "That tie-out is no longer at this camp.";

export type PlanReduction =
  { readonly ok: true; readonly placements: readonly Placement[] } | { readonly ok: false; readonly reason: string };

const isAt = (spot: { pitchId: string; tieOutId: string }) => (placement: Placement) =>
  placement.pitchId === spot.pitchId && placement.tieOutId === spot.tieOutId;

/** How many of each anchor the placements use, second stakes in line included. */
export function countUsed(placements: readonly Placement[]): ReadonlyMap<string, number> {
  const used = new Map<string, number>();
  const add = (id: string) => used.set(id, (used.get(id) ?? 0) + 1);
  for (const placement of placements) {
    add(placement.anchorId);
    if (placement.tandem) add(placement.tandem.anchorId);
  }
  return used;
}

/** Says why placements can't stand: a count below zero, an unknown anchor, a tie-out used twice. Null = they can. */
export function findPlanFault(
  placements: readonly Placement[],
  tray: readonly TrayAnchor[],
  isTieOut: (pitchId: string, tieOutId: string) => boolean,
): string | null {
  const anchors = new Map(tray.map((anchor) => [anchor.id, anchor]));
  const spots = new Set<string>();
  for (const placement of placements) {
    const spot = `${placement.pitchId} ${placement.tieOutId}`;
    if (spots.has(spot)) return "A tie-out can take one anchor, or two in line; it was given two plans.";
    spots.add(spot);
    if (!isTieOut(placement.pitchId, placement.tieOutId)) return NO_TIE_OUT;
  }
  for (const [id, count] of countUsed(placements)) {
    const anchor = anchors.get(id);
    if (!anchor) return "That anchor is no longer in the tray.";
    if (count > anchor.count) {
      return anchor.count === 0
        ? `No ${anchor.name} is in the tray.`
        : `All ${anchor.count} of ${anchor.name} are placed. Lift one first.`;
    }
  }
  return null;
}

/** Applies one change. Pure; the counts and ids are checked by `findPlanFault` afterwards. */
export function reducePlan(placements: readonly Placement[], change: PlanChange): readonly Placement[] {
  switch (change.type) {
    case "place":
      return [...placements.filter((one) => !isAt(change.placement)(one)), change.placement];
    case "lift":
      return placements.filter((one) => !isAt(change)(one));
    case "swap": {
      const swapped = placements.map((one) => {
        if (isAt(change.from)(one)) return { ...one, ...change.to };
        if (isAt(change.to)(one)) return { ...one, ...change.from };
        return one;
      });
      return swapped;
    }
    case "replace":
      return change.placements;
  }
}

export function applyPlanChange(
  placements: readonly Placement[],
  change: PlanChange,
  tray: readonly TrayAnchor[],
  isTieOut: (pitchId: string, tieOutId: string) => boolean,
): PlanReduction {
  const isThere = (spot: { pitchId: string; tieOutId: string }) =>
    isTieOut(spot.pitchId, spot.tieOutId) || placements.some(isAt(spot));
  const from = change.type === "lift" ? change : change.type === "swap" ? change.from : null;
  if (from && !isThere(from)) return { ok: false, reason: NO_TIE_OUT };
  const next = reducePlan(placements, change);
  const reason = findPlanFault(next, tray, isTieOut);
  return reason === null ? { ok: true, placements: next } : { ok: false, reason };
}
