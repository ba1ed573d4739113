import { quickMends } from "@/lib/calc/mend";
import type { TieOutResult } from "@/lib/calc/types";
import { formatHoldsTo } from "@/lib/format/speeds";
import type { Preferences } from "@/lib/domain/preferences";
import type { WorkedCamp } from "../analysis/work-out-camp";

/** So many tie-outs of a shelter, and so many steps at each: what one can read off a card by head torch. */
const TIE_OUTS = 3;
const STEPS = 2;

const known = new WeakMap<WorkedCamp, Promise<readonly PitchSteps[]>>();

interface PitchSteps {
  readonly pitchId: string;
  readonly tieOuts: readonly { readonly number: number; readonly mends: readonly Step[] }[];
  /** The first that gives; named when nothing in the tray helps. */
  readonly weakest: { readonly number: number; readonly holdsToGustMs: number } | null;
}

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

/** Other requests get their turn between two searches: a trip's booklet needs dozens. */
const takeTurns = () => new Promise<void>((resolve) => setImmediate(resolve));

async function searchSteps({ input, result }: WorkedCamp): Promise<readonly PitchSteps[]> {
  const pitches: PitchSteps[] = [];
  for (const { pitchId, tieOuts } of result.shelters) {
    const found: { number: number; mends: readonly Step[] }[] = [];
    for (const { tieOutId, number } of listWeakest(tieOuts)) {
      const mends = quickMends(input, { pitchId, tieOutId });
      if (mends.length > 0) found.push({ number, mends: mends.slice(0, STEPS) });
      await takeTurns();
    }
    const [first] = listWeakest(tieOuts);
    const weakest = first ? { number: first.number, holdsToGustMs: first.holdsToGustMs ?? 0 } : null;
    pitches.push({ pitchId, tieOuts: found, weakest });
  }
  return pitches;
}

function findSteps(worked: WorkedCamp): Promise<readonly PitchSteps[]> {
  const before = known.get(worked);
  if (before) return before;
  const search = searchSteps(worked);
  known.set(worked, search);
  return search;
}

/** What to do first when the ground is softer or the wind stronger than planned, per pitch, in order. */
export async function listFallbacks(
  worked: WorkedCamp,
  unit: Preferences["speedUnit"],
): Promise<Readonly<Record<string, readonly string[]>>> {
  return Object.fromEntries(
    (await findSteps(worked)).map(({ pitchId, tieOuts, weakest }) => {
      const lines = tieOuts.map(({ number, mends }) => {
        const words = mends.map((mend) => `${mend.title} (to ${formatHoldsTo(mend.holdsToGustMs, unit)})`);
        return `Tie-out ${number}: ${words.join("; or ")}.`;
      });
      if (lines.length === 0 && weakest) {
        const limit = formatHoldsTo(weakest.holdsToGustMs, unit);
        lines.push(
          `Tie-out ${weakest.number} gives first, at ${limit}. Nothing in the tray helps: pitch lower or leave in time.`,
        );
      }
      return [pitchId, lines];
    }),
  );
}
