import { quickMends } from "@/lib/calc/mend";
import type { TieOutResult } from "@/lib/calc/types";
import { formatHoldsTo } from "@/lib/format/speeds";
import type { Preferences } from "@/lib/domain/preferences";
import type { WorkedCamp } from "../analysis/work-out-camp";

/** So many tie-outs of a shelter, and so many steps at each: what one can read off a card by head torch. */
const TIE_OUTS = 3;
const STEPS = 2;

const steps = new WeakMap<
  WorkedCamp,
  Readonly<Record<string, readonly { number: number; mends: readonly Step[] }[]>>
>();

interface Step {
  readonly title: string;
  readonly holdsToGustMs: number;
}

/** Weakest first; among those of one margin the one that deserves most. */
function listWeakest(tieOuts: readonly TieOutResult[]): TieOutResult[] {
  return tieOuts
    .filter((one) => one.margin !== null)
    .sort((a, b) => (a.margin ?? 0) - (b.margin ?? 0) || (b.priority ?? 0) - (a.priority ?? 0))
    .slice(0, TIE_OUTS);
}

function findSteps(worked: WorkedCamp) {
  const known = steps.get(worked);
  if (known) return known;
  const found = Object.fromEntries(
    worked.result.shelters.map((shelter) => [
      shelter.pitchId,
      listWeakest(shelter.tieOuts).flatMap((one) => {
        const mends = quickMends(worked.input, { pitchId: shelter.pitchId, tieOutId: one.tieOutId });
        return mends.length === 0 ? [] : [{ number: one.number, mends: mends.slice(0, STEPS) }];
      }),
    ]),
  );
  steps.set(worked, found);
  return found;
}

/** What to do first when the ground is softer or the wind stronger than planned, per pitch, in order. */
export function listFallbacks(
  worked: WorkedCamp,
  unit: Preferences["speedUnit"],
): Readonly<Record<string, readonly string[]>> {
  return Object.fromEntries(
    Object.entries(findSteps(worked)).map(([pitchId, tieOuts]) => [
      pitchId,
      tieOuts.map(({ number, mends }) => {
        const words = mends.map((mend) => `${mend.title} (to ${formatHoldsTo(mend.holdsToGustMs, unit)})`);
        return `Tie-out ${number}: ${words.join("; or ")}.`;
      }),
    ]),
  );
}
