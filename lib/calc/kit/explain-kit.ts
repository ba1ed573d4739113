import { itemAt } from "../indexed";
import { listSets, rowsOfSet } from "./cover-rows";
import { findKit, massOf } from "./find-kit";
import { findShort, groupNeeds, isWithin, supplyOf } from "./match";
import { groupSpots, type Spots } from "./group-spots";
import type { KindSet, KitProblem, KitSolution, ProgramSolver } from "./types";

/** A camp that can't do with one piece fewer, and the tie-outs there that only these kinds hold. */
export interface Forcing {
  readonly campId: string;
  readonly campName: string;
  readonly spots: readonly Spots[];
  readonly kinds: KindSet;
  /** True when only the spares are at stake: the camp can be staked, but not with pieces lost. */
  readonly isForSpares: boolean;
}

/** What a kit without something weighs; with null, the camps that then can't be held. */
export interface Otherwise {
  readonly massUnits: number | null;
  readonly campNames: readonly string[];
}

export interface PieceReason {
  /** Place of the kind. */
  readonly kind: number;
  readonly count: number;
  readonly forcedBy: readonly Forcing[];
  /** The lightest kit with one fewer of this kind. */
  readonly oneFewer: Otherwise;
  /** The lightest kit without this kind. */
  readonly without: Otherwise;
}

/** Where a kit with one piece of `kind` fewer falls short. */
export function findForcing(problem: KitProblem, solution: KitSolution, kind: number): Forcing[] {
  const counts = solution.counts.map((count, at) => (at === kind ? count - 1 : count));
  return problem.camps.flatMap((camp, campAt): Forcing[] => {
    const toForcing = (set: KindSet, isForSpares: boolean): Forcing => ({
      campId: camp.id,
      campName: camp.name,
      spots: groupSpots(camp.needs.filter((need) => isWithin(need.kinds, set))),
      kinds: set,
      isForSpares,
    });
    const short = findShort(camp, counts, itemAt(solution.foundUsed, campAt));
    if (short !== null) return [toForcing(short, false)];
    if (problem.spares === 0) return [];
    const classes = groupNeeds(camp.needs);
    const tight = listSets(camp).sets.find((set) =>
      rowsOfSet(problem, campAt, classes, set).some(
        (row) => row.camp < 0 && supplyOf(row.carried, counts) < row.least && (row.carried & (1 << kind)) !== 0,
      ),
    );
    return tight === undefined ? [] : [toForcing(tight, true)];
  });
}

function solveWithMost(problem: KitProblem, solve: ProgramSolver, kind: number, most: number): Otherwise {
  const kinds = problem.kinds.map((one, at) => (at === kind ? { ...one, most } : one));
  const answer = findKit({ ...problem, kinds }, solve);
  if (answer.status === "found") return { massUnits: massOf(problem, answer.solution.counts), campNames: [] };
  return {
    massUnits: null,
    campNames: answer.status === "short" ? answer.shortfalls.map((one) => one.campName) : [],
  };
}

/** Why each kind is in the kit, and what it would cost to do with one fewer or without it. */
export function explainKit(problem: KitProblem, solution: KitSolution, solve: ProgramSolver): PieceReason[] {
  return solution.counts.flatMap((count, kind): PieceReason[] => {
    if (count === 0) return [];
    const without = solveWithMost(problem, solve, kind, 0);
    return [
      {
        kind,
        count,
        forcedBy: findForcing(problem, solution, kind),
        oneFewer: count === 1 ? without : solveWithMost(problem, solve, kind, count - 1),
        without,
      },
    ];
  });
}
