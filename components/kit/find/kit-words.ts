import type { Spots } from "@/lib/calc/kit/group-spots";
import type { KitSearchView } from "@/lib/domain/kit/search-view";
import { formatMass } from "@/lib/format/masses";
import { joinWords, numberWord, plural } from "@/lib/format/words";

/** Whole numbers in a row are drawn together: 1, 2, 3, 7 → "1–3 and 7". */
export function listNumbers(numbers: readonly number[]): string {
  const runs: [number, number][] = [];
  for (const number of numbers) {
    const last = runs.at(-1);
    if (last && last[1] === number - 1) last[1] = number;
    else runs.push([number, number]);
  }
  return joinWords(
    runs.map(([from, to]) => (from === to ? `${from}` : to === from + 1 ? `${from}, ${to}` : `${from}–${to}`)),
  );
}

/** "tie-outs 1–3 of Ridge tarp and tie-out 5 of Dome". */
export function nameSpots(spots: readonly Spots[]): string {
  return joinWords(
    spots.map(
      ({ shelterName, numbers }) =>
        `${numbers.length === 1 ? "tie-out" : "tie-outs"} ${listNumbers(numbers)} of ${shelterName}`,
    ),
  );
}

const KG_PER_UNIT = 1e-4;

/** Tenths of a gram, as the kit finder counts, for people. */
export const massOfUnits = (units: number): string => formatMass(units * KG_PER_UNIT);

/** "12 anchors, 412 g, hold at all five camps". */
export function describeResult(result: KitSearchView["result"]): string {
  if (!result) return "Find a kit for the whole trip";
  const { outcome } = result;
  if (outcome.status === "stopped") return "The time ran out before a kit was found";
  if (outcome.status === "short") {
    const [first] = outcome.camps;
    if (outcome.camps.length === 1 && first) return `No kit of these anchors holds at ${first.campName}`;
    return `No kit of these anchors holds at ${numberWord(outcome.camps.length)} camps`;
  }
  const count = outcome.kinds.reduce((sum, kind) => sum + kind.count, 0);
  const camps = outcome.camps.length;
  const where = camps === 1 ? `at ${outcome.camps[0]?.campName ?? "the camp"}` : `at ${numberWord(camps)} camps`;
  return `${massOfUnits(outcome.massUnits)}, ${plural(count, "anchor")}: holds ${where}`;
}
