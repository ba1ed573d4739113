import type { Placement, TrayAnchor } from "@/lib/calc/types";
import { findShockCordFault } from "./count-shock-cords";
import { applyPlanChange } from "./reduce";
import type { PlanChange } from "./schema";

const spotKey = (spot: { readonly pitchId: string; readonly tieOutId: string }) => `${spot.pitchId} ${spot.tieOutId}`;

/** Tie-outs that a change touches; a whole plan touches all of them. */
function listTouchedSpots(change: PlanChange): readonly string[] | "all" {
  switch (change.type) {
    case "place":
      return [spotKey(change.placement)];
    case "lift":
      return [spotKey(change)];
    case "swap":
      return [spotKey(change.from), spotKey(change.to)];
    case "replace":
      return "all";
  }
}

function touchesSame(one: PlanChange, other: PlanChange): boolean {
  const mine = listTouchedSpots(one);
  const theirs = listTouchedSpots(other);
  return mine === "all" || theirs === "all" || mine.some((spot) => theirs.includes(spot));
}

export interface LaterChange {
  readonly byName: string;
  readonly at: string;
  readonly change: PlanChange;
}

export type IntentJudgement =
  | { readonly outcome: "applied"; readonly placements: readonly Placement[] }
  | { readonly outcome: "refused"; readonly reason: string }
  | { readonly outcome: "conflict"; readonly against: readonly LaterChange[] };

function isSamePlan(one: readonly Placement[], other: readonly Placement[]): boolean {
  const asText = (placements: readonly Placement[]) => placements.map((each) => JSON.stringify(each)).sort();
  return one.length === other.length && asText(one).join() === asText(other).join();
}

/**
 * What becomes of a change that somebody made on an earlier version of the plan. `laterByOthers` is what other people
 * saved since that version; a person's own later changes are their own chain and never stand against them.
 *
 * - Nobody else saved anything: it is applied, or refused when the plan can't be so (a count below zero …).
 * - It leads to the plan that is there already: applied, there is nothing to argue about.
 * - Others touched only other tie-outs: merged, so long as the counts still work out.
 * - Others touched the same tie-out, either side gives a whole plan, or the counts no longer work: conflict. Nothing
 *   of it is applied; the person is told who did what and chooses.
 */
export function judgeIntent(
  plan: {
    readonly placements: readonly Placement[];
    readonly tray: readonly TrayAnchor[];
    readonly shockCordCount: number;
    readonly isTieOut: (pitchId: string, tieOutId: string) => boolean;
  },
  change: PlanChange,
  laterByOthers: readonly LaterChange[],
): IntentJudgement {
  const next = applyPlanChange(plan.placements, change, plan.tray, plan.isTieOut);
  if (next.ok && isSamePlan(next.placements, plan.placements)) {
    return { outcome: "applied", placements: plan.placements };
  }
  const against = laterByOthers.filter((later) => touchesSame(change, later.change));
  if (against.length > 0) return { outcome: "conflict", against };

  const reason = next.ok ? findShockCordFault(next.placements, plan.shockCordCount) : next.reason;
  if (next.ok && reason === null) return { outcome: "applied", placements: next.placements };
  if (laterByOthers.length > 0) return { outcome: "conflict", against: laterByOthers };
  return { outcome: "refused", reason: reason ?? "The plan can't be so." };
}
