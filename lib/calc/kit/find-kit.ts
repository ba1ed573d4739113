import { itemAt } from "../indexed";
import {
  foundCost,
  foundName,
  kindName,
  listCoverRows,
  listSets,
  pieceCost,
  rowsOfSet,
  writeProgram,
  type CoverRow,
} from "./cover-rows";
import { findShort, groupNeeds, isWithin, matchNeeds, supplyAt, supplyOf } from "./match";
import {
  MOST_FOUND,
  MOST_KINDS,
  MOST_SPARES,
  type KindSet,
  type KitProblem,
  type KitShortfall,
  type KitSolution,
  type ProgramSolver,
} from "./types";

export type KitAnswer =
  | { readonly status: "found"; readonly solution: KitSolution }
  | { readonly status: "short"; readonly shortfalls: readonly KitShortfall[] }
  /** The time ran out before any kit was found. */
  | { readonly status: "stopped" };

/** Rows are added so often at most; each round adds a row that was violated, so that it ends far earlier. */
const MOST_ROUNDS = 400;

/** Every way to lose `pieces` of these counts, as counts lost by kind. */
export function listLosses(counts: readonly number[], pieces: number, from = 0): number[][] {
  if (pieces === 0 || from >= counts.length) return [counts.map(() => 0)];
  return Array.from({ length: Math.min(pieces, itemAt(counts, from)) + 1 }, (_, lost) =>
    listLosses(counts, pieces - lost, from + 1).map((rest) => rest.map((one, at) => (at === from ? lost : one))),
  ).flat();
}

const mostFound = (problem: KitProblem, campAt: number): number[] =>
  itemAt(problem.camps, campAt).found.map((one) => one.most);

/**
 * Whether every camp can still be staked whichever `spares` pieces are gone, by trying each way to lose them. What is
 * found at a camp may then be used whatever its work.
 */
export function survivesLosses(problem: KitProblem, counts: readonly number[]): boolean {
  const losses = listLosses(counts, problem.spares);
  return problem.camps.every((camp, campAt) =>
    losses.every((lost) => {
      const left = counts.map((count, kind) => count - itemAt(lost, kind));
      return findShort(camp, left, mostFound(problem, campAt)) === null;
    }),
  );
}

/** Rows that this kit violates, one set per camp: what it lacks as it is, and with pieces lost. */
function findViolated(
  problem: KitProblem,
  counts: readonly number[],
  used: readonly (readonly number[])[],
): CoverRow[] {
  const losses = problem.spares > 0 ? listLosses(counts, problem.spares) : [];
  return problem.camps.flatMap((camp, campAt) => {
    const classes = groupNeeds(camp.needs);
    const short = matchNeeds(classes, supplyAt(counts, itemAt(used, campAt))).short;
    if (short !== null) return rowsOfSet(problem, campAt, classes, short);
    for (const lost of losses) {
      const left = counts.map((count, kind) => count - itemAt(lost, kind));
      const weak = matchNeeds(classes, supplyAt(left, mostFound(problem, campAt))).short;
      if (weak !== null) return rowsOfSet(problem, campAt, classes, weak);
    }
    return [];
  });
}

function readSolution(problem: KitProblem, values: Readonly<Record<string, number>>) {
  const whole = (name: string) => Math.round(values[name] ?? 0);
  const counts = problem.kinds.map((_, kind) => whole(kindName(kind)));
  const foundUsed = problem.camps.map((camp, campAt) => camp.found.map((_, at) => whole(foundName(campAt, at))));
  return { counts, foundUsed, cost: costOf(problem, counts, foundUsed) };
}

export function massOf(problem: Pick<KitProblem, "kinds">, counts: readonly number[]): number {
  return problem.kinds.reduce((sum, kind, at) => sum + kind.massUnits * itemAt(counts, at), 0);
}

/** Mass and priced work of a kit, tenths of a gram. */
export function costOf(
  problem: KitProblem,
  counts: readonly number[],
  foundUsed: readonly (readonly number[])[],
): number {
  const carried = problem.kinds.map((kind, at) => pieceCost(problem, kind) * itemAt(counts, at));
  const found = problem.camps.flatMap((camp, campAt) =>
    camp.found.map((one, at) => foundCost(problem, one) * itemAt(itemAt(foundUsed, campAt), at)),
  );
  return [...carried, ...found].reduce((sum, one) => sum + one, 0);
}

/** The first set of kinds that a camp is short of, with everything there is to take, and how many pieces that is. */
function findShortSet(
  problem: KitProblem,
  campAt: number,
): { readonly set: KindSet; readonly available: number } | null {
  const camp = itemAt(problem.camps, campAt);
  const most = problem.kinds.map((kind) => kind.most);
  const found = mostFound(problem, campAt);
  const supply = supplyAt(most, found);
  const short = findShort(camp, most, found);
  if (short !== null) return { set: short, available: supplyOf(short, supply) };
  if (problem.spares === 0) return null;
  const { sets, isWhole } = listSets(camp);
  const classes = groupNeeds(camp.needs);
  for (const set of sets) {
    const isShort = rowsOfSet(problem, campAt, classes, set).some(
      (row) => supplyOf(row.carried, most) + supplyOf(row.found, found) < row.least,
    );
    if (isShort) return { set, available: supplyOf(set, supply) - problem.spares };
  }
  if (isWhole) return null;
  for (const lost of listLosses(most, problem.spares)) {
    const left = most.map((count, kind) => count - itemAt(lost, kind));
    const set = findShort(camp, left, found);
    if (set !== null) return { set, available: supplyOf(set, supplyAt(left, found)) };
  }
  return null;
}

/** Camps that can't be staked with everything there is, alone: kits are not used up, so no other camp matters. */
export function findShortfalls(problem: KitProblem): KitShortfall[] {
  return problem.camps.flatMap((camp, campAt): KitShortfall[] => {
    const short = findShortSet(problem, campAt);
    if (!short) return [];
    const { set, available } = short;
    const needs = camp.needs.filter((need) => isWithin(need.kinds, set));
    return [{ campId: camp.id, campName: camp.name, needs, kinds: set, available }];
  });
}

function checkProblem(problem: KitProblem): void {
  if (problem.kinds.length > MOST_KINDS) throw new RangeError(`A kit has at most ${MOST_KINDS} kinds to choose from.`);
  if (problem.camps.some((camp) => camp.found.length > MOST_FOUND)) throw new RangeError("Too many found things.");
  if (!(problem.spares >= 0 && problem.spares <= MOST_SPARES)) throw new RangeError("Spares: 0 to 3.");
  if (problem.kinds.some((kind) => !(kind.massUnits >= 0) || !(kind.most >= 0))) {
    throw new RangeError("Masses and counts must be 0 or more.");
  }
}

/**
 * The lightest kit with which every need of every camp is met, with a price on work with found things. A whole-number
 * program over the counts alone: by P. Hall's theorem (1935, from memory) a camp can be staked exactly when every set
 * of kinds has at least as many pieces as there are needs that only the set can meet. Where a camp has too many such
 * sets to write down, those that a solution violates are added until none is (Gomory & Hu 1961 and others, from memory).
 *
 * Mass and work are compared in tenths of a gram; among equals the kit has the fewest pieces. `solve` is the program
 * solver; when it is stopped by its time limit, `bound` comes from the program without whole numbers.
 */
export function findKit(problem: KitProblem, solve: ProgramSolver): KitAnswer {
  checkProblem(problem);
  const shortfalls = findShortfalls(problem);
  if (shortfalls.length > 0) return { status: "short", shortfalls };
  const listed = listCoverRows(problem);
  const rows = [...listed.rows];
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const answer = solve(writeProgram(problem, rows));
    if (answer.values === null) return { status: "stopped" };
    const read = readSolution(problem, answer.values);
    const violated = listed.isWhole ? [] : findViolated(problem, read.counts, read.foundUsed);
    if (violated.length > 0) {
      rows.push(...violated);
      continue;
    }
    const bound = answer.status === "optimal" ? read.cost : boundOf(problem, rows, solve);
    return { status: "found", solution: { ...read, bound: Math.min(bound, read.cost) } };
  }
  return { status: "stopped" };
}

/** The cost of the program without whole numbers, rounded up: no kit costs less. 0 when not even that was solved. */
function boundOf(problem: KitProblem, rows: readonly CoverRow[], solve: ProgramSolver): number {
  const { status, values } = solve(writeProgram(problem, rows, true));
  if (status !== "optimal" || !values) return 0;
  const counts = problem.kinds.map((_, at) => values[kindName(at)] ?? 0);
  const used = problem.camps.map((camp, campAt) => camp.found.map((_, at) => values[foundName(campAt, at)] ?? 0));
  const exact = costOf(problem, counts, used);
  return Math.ceil(exact - 1e-6);
}
