import { itemAt } from "../indexed";
import type { Placement } from "../types";
import { listAlike, type AlikeKit } from "./alike";
import { explainKit, type PieceReason } from "./explain-kit";
import { explainShortfalls, type ShortCamp } from "./explain-shortfall";
import { findKit, massOf } from "./find-kit";
import { supplyAt } from "./match";
import { readCampForKit, type KitKindChoice, type ReadCamp } from "./read-camp";
import { inStrongerGust, toProblem, type KitSearch, type Progress } from "./search-input";
import { stakeCamp } from "./stake-camp";
import type { ProgramSolver } from "./types";

export interface KitCampPlan {
  readonly campId: string;
  readonly campName: string;
  readonly placements: readonly Placement[];
  readonly weakest: { readonly margin: number; readonly label: string } | null;
  /** Of what is found there. */
  readonly foundUsed: readonly { readonly name: string; readonly count: number }[];
}

/** What the kit weighs when every gust is so much stronger; null = no kit of these kinds holds then. */
export interface CurvePoint {
  readonly extraMs: number;
  readonly massUnits: number | null;
  /** The camps that can't be held. */
  readonly campNames: readonly string[];
}

export interface FoundKit {
  readonly status: "found";
  readonly kinds: readonly (Omit<KitKindChoice, "most"> & { readonly count: number })[];
  readonly massUnits: number;
  readonly cost: number;
  readonly bound: number;
  /** (cost − bound) ÷ cost; 0 = proven the lightest. */
  readonly gap: number;
  readonly spares: number;
  readonly camps: readonly KitCampPlan[];
  readonly reasons: readonly PieceReason[];
  readonly curve: readonly CurvePoint[];
  readonly alike: readonly AlikeKit[];
}

export type KitOutcome =
  FoundKit | { readonly status: "short"; readonly camps: readonly ShortCamp[] } | { readonly status: "stopped" };

/** By how much the gusts are made stronger or lighter for the curve, m/s. */
const CURVE_STEPS_MS: readonly number[] = [-3, -2, -1, 1, 2, 3, 4, 5, 6];

function curvePoint(search: KitSearch, reads: readonly ReadCamp[], extraMs: number, solve: ProgramSolver): CurvePoint {
  const there = search.camps.map((camp, at) =>
    readCampForKit(inStrongerGust(camp, itemAt(reads, at), extraMs), search.kinds, search.settings),
  );
  const fallen = there.filter((read) => read.fallen.length > 0).map((read) => read.camp.name);
  if (fallen.length > 0) return { extraMs, massUnits: null, campNames: fallen };
  const problem = toProblem(there, search.kinds, search.settings);
  const answer = findKit(problem, solve);
  if (answer.status === "found") {
    return { extraMs, massUnits: massOf(problem, answer.solution.counts), campNames: [] };
  }
  const campNames = answer.status === "short" ? answer.shortfalls.map((one) => one.campName) : [];
  return { extraMs, massUnits: null, campNames };
}

/**
 * The lightest kit for a trip with the staking plan of each camp, why each piece is in it, what a stronger gust costs, and
 * what kits of one kind are worth; or the camps that can't be held, and what would change that. Every camp's target is
 * the verdict "holds" in its own gust after its windy night. Call it for camps without gaps. `onProgress` is told each
 * step as it starts.
 */
export function searchKit(search: KitSearch, solve: ProgramSolver, onProgress: Progress): KitOutcome {
  const reads = search.camps.map((camp, at) => {
    onProgress(`Working out what holds at ${camp.name}`, at, search.camps.length);
    return readCampForKit(camp, search.kinds, search.settings);
  });
  const problem = toProblem(reads, search.kinds, search.settings);
  onProgress("Looking for the lightest kit", 0, 1);
  const answer = findKit(problem, solve);
  if (answer.status === "stopped") return answer;
  if (answer.status === "short" || reads.some((read) => read.fallen.length > 0)) {
    const shortfalls = answer.status === "short" ? answer.shortfalls : [];
    return { status: "short", camps: explainShortfalls(search, reads, shortfalls, solve, onProgress) };
  }
  const { solution } = answer;
  onProgress("Asking why each piece is in it", 0, 1);
  const reasons = explainKit(problem, solution, solve);
  const massUnits = massOf(problem, solution.counts);
  const curve = CURVE_STEPS_MS.map((extraMs, at) => {
    onProgress("Weighing kits for other gusts", at, CURVE_STEPS_MS.length);
    return curvePoint(search, reads, extraMs, solve);
  });
  const withZero = [...curve, { extraMs: 0, massUnits, campNames: [] }].sort((a, b) => a.extraMs - b.extraMs);
  return {
    status: "found",
    kinds: search.kinds.map(({ id, name, spec, massKg }, at) => ({
      id,
      name,
      spec,
      massKg,
      count: itemAt(solution.counts, at),
    })),
    massUnits,
    cost: solution.cost,
    bound: solution.bound,
    gap: solution.cost > 0 ? (solution.cost - solution.bound) / solution.cost : 0,
    spares: problem.spares,
    camps: reads.map((read, at): KitCampPlan => {
      const used = itemAt(solution.foundUsed, at);
      return {
        campId: read.camp.id,
        campName: read.camp.name,
        ...stakeCamp(read, supplyAt(solution.counts, used)),
        foundUsed: read.camp.found
          .map(({ name }, i) => ({ name, count: itemAt(used, i) }))
          .filter((one) => one.count > 0),
      };
    }),
    reasons,
    curve: withZero,
    alike: listAlike(problem, reads, solution.counts),
  };
}
