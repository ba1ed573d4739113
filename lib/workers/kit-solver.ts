import type { ProgramSolver } from "@/lib/calc/kit/types";

interface OneShotSolver {
  solve(
    problem: string,
    options: { time_limit: number; mip_rel_gap: number; mip_abs_gap: number },
  ): { Status: string; Columns: Record<string, object> };
}

/** Costs are whole numbers, so that a gap below 1 is none. */
const WHOLE_GAP = 0.5;

/** The HiGHS of this thread as the calculation wants it. `secondsEach` limits each program on its own. */
export function toProgramSolver(highs: OneShotSolver, secondsEach: number): ProgramSolver {
  return (program) => {
    const answer = highs.solve(program, { time_limit: secondsEach, mip_rel_gap: 0, mip_abs_gap: WHOLE_GAP });
    if (answer.Status === "Infeasible") return { status: "infeasible", values: null };
    const values = Object.entries(answer.Columns).flatMap(([name, column]) =>
      "Primal" in column && typeof column.Primal === "number" ? [[name, column.Primal] as const] : [],
    );
    const status = answer.Status === "Optimal" ? "optimal" : "stopped";
    const isThere = status === "optimal" || answer.Status === "Time limit reached";
    return { status, values: isThere && values.length > 0 ? Object.fromEntries(values) : null };
  };
}
