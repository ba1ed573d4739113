import { itemAt } from "../indexed";
import { findKit } from "./find-kit";
import { groupSpots, type Spots } from "./group-spots";
import { listKinds } from "./match";
import { readCampForKit, type KitCampChoice, type KitKindChoice, type KitSettings, type ReadCamp } from "./read-camp";
import { inStrongerGust, toProblem, type KitSearch, type Progress } from "./search-input";
import { MOST_KINDS, type KitShortfall, type ProgramSolver } from "./types";

type Pieces = readonly { readonly name: string; readonly count: number }[];

export type Remedy =
  /** More of the kinds that are on the list. */
  | { readonly type: "more"; readonly pieces: Pieces }
  /** More of them, and kinds that are not on the list. */
  | { readonly type: "other-kinds"; readonly pieces: Pieces }
  | { readonly type: "found" }
  /** What is found there, and more pieces or other kinds on top. */
  | { readonly type: "found-and-more"; readonly pieces: Pieces }
  | { readonly type: "doubling" }
  | { readonly type: "fewer-spares" };

/** A camp that can't be held with what there is to take. */
export interface ShortCamp {
  readonly campId: string;
  readonly campName: string;
  /** The tie-outs that compete for too few pieces; of one piece each, two where two in line are needed. */
  readonly spots: readonly Spots[];
  /** Pieces that those need, and whether a pin is among what keeps them from being met. */
  readonly needed: number;
  readonly isPinned: boolean;
  /** The only kinds that hold there; empty when none does. */
  readonly kindNames: readonly string[];
  readonly available: number;
  /** Shelters without a standing shape in the gust: anchors can't mend that. */
  readonly fallen: readonly string[];
  /** Gust that the camp was to hold, and the gust that it holds with everything there is to take, m/s. */
  readonly gustMs: number;
  readonly holdsToMs: number;
  readonly remedies: readonly Remedy[];
}

/** A gust is looked for to this, m/s. */
const GUST_STEP_MS = 0.25;

interface Attempt {
  readonly camp: KitCampChoice;
  readonly kinds: readonly KitKindChoice[];
  readonly settings: KitSettings;
}

/** The counts of the lightest kit for one camp alone, or null. */
function solveAlone({ camp, kinds, settings }: Attempt, solve: ProgramSolver): readonly number[] | null {
  const read = readCampForKit(camp, kinds, settings);
  if (read.fallen.length > 0) return null;
  const answer = findKit(toProblem([read], kinds, settings), solve);
  return answer.status === "found" ? answer.solution.counts : null;
}

function holdsTo(attempt: Attempt, read: ReadCamp, solve: ProgramSolver): number {
  const gustMs = read.prepared.designGustMs ?? 0;
  let [low, high] = [0, gustMs];
  while (high - low > GUST_STEP_MS) {
    const middle = (low + high) / 2;
    const camp = inStrongerGust(attempt.camp, read, middle - gustMs);
    if (solveAlone({ ...attempt, camp }, solve)) low = middle;
    else high = middle;
  }
  return low;
}

function listPieces(kinds: readonly KitKindChoice[], counts: readonly number[]) {
  return kinds.flatMap(({ name, most }, at) => {
    const more = itemAt(counts, at) - (most ?? Infinity);
    return more > 0 ? [{ name, count: more }] : [];
  });
}

function listRemedies(attempt: Attempt, otherKinds: readonly KitKindChoice[], solve: ProgramSolver): Remedy[] {
  const { camp, kinds, settings } = attempt;
  const endless = kinds.map((kind) => ({ ...kind, most: null }));
  const unlisted = otherKinds.map((kind) => ({ ...kind, most: 0 }));
  const all = [...endless, ...unlisted.map((kind) => ({ ...kind, most: null }))].slice(0, MOST_KINDS);
  const inHand = [...kinds, ...unlisted].slice(0, MOST_KINDS);
  const withMore = (type: "more" | "other-kinds" | "found-and-more", from: Attempt): Remedy | null => {
    const counts = solveAlone(from, solve);
    return counts && { type, pieces: listPieces(inHand, counts) };
  };
  const found = { ...camp, allowFound: true };
  const hasFound = camp.input.tray.some((anchor) => anchor.found) && !camp.allowFound;
  const isFoundEnough = hasFound && solveAlone({ ...attempt, camp: found }, solve) !== null;
  const doubled = { ...settings, allowDoubling: true };
  const isDoublingEnough = !settings.allowDoubling && solveAlone({ ...attempt, settings: doubled }, solve) !== null;
  const lean = { ...settings, spares: 0 };
  const isLeanEnough = settings.spares > 0 && solveAlone({ ...attempt, settings: lean }, solve) !== null;
  const more = withMore("more", { ...attempt, kinds: endless }) ?? withMore("other-kinds", { ...attempt, kinds: all });
  const last =
    more || !hasFound || isFoundEnough ? null : withMore("found-and-more", { ...attempt, camp: found, kinds: all });
  const remedies: (Remedy | null)[] = [
    more,
    isFoundEnough ? { type: "found" } : last,
    isDoublingEnough ? { type: "doubling" } : null,
    isLeanEnough ? { type: "fewer-spares" } : null,
  ];
  return remedies.filter((remedy) => remedy !== null);
}

/** Which camps can't be held, at which tie-outs, up to which gust they can, and what would change it. */
export function explainShortfalls(
  search: KitSearch,
  reads: readonly ReadCamp[],
  shortfalls: readonly KitShortfall[],
  solve: ProgramSolver,
  onProgress: Progress,
): ShortCamp[] {
  return search.camps.flatMap((camp, at): ShortCamp[] => {
    const read = itemAt(reads, at);
    const short = shortfalls.find((one) => one.campId === camp.id);
    if (!short && read.fallen.length === 0) return [];
    onProgress(`Looking for what would hold at ${camp.name}`, at, search.camps.length);
    const attempt = { camp, kinds: search.kinds, settings: search.settings };
    return [
      {
        campId: camp.id,
        campName: camp.name,
        spots: groupSpots(short?.needs ?? []),
        needed: short?.needs.length ?? 0,
        isPinned: short?.needs.some((need) => need.isPinned) ?? false,
        kindNames: short ? listKinds(short.kinds).map((kind) => itemAt(read.anchors, kind).name) : [],
        available: short?.available ?? 0,
        fallen: read.fallen,
        gustMs: read.prepared.designGustMs ?? 0,
        holdsToMs: holdsTo(attempt, read, solve),
        remedies: listRemedies(attempt, search.otherKinds, solve),
      },
    ];
  });
}
