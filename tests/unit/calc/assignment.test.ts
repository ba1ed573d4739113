import fc from "fast-check";
import loadHighs from "highs";
import { describe, expect, it } from "vitest";
import {
  assignBottleneck,
  assignLeastSum,
  assignLexicographic,
  type Assignment,
  type GroupedProblem,
} from "@/lib/calc/assignment";

/** Lower is better in a cost matrix; every column can be used once; leaving a row empty is worse than any cost. */
function fromCosts(costs: readonly (readonly number[])[]): GroupedProblem {
  return {
    values: costs.map((row) => row.map((cost) => -cost)),
    counts: (costs[0] ?? []).map(() => 1),
    emptyValues: costs.map(() => -1e9),
  };
}

/** Exhaustive search: the best sorted vector of values, then costs; the reference for everything below. */
function enumerateAll(problem: GroupedProblem): { values: number[]; costs: number[] } {
  let best: { values: number[]; costs: number[] } | null = null;
  const walk = (row: number, left: number[], values: number[], costs: number[]) => {
    if (row === problem.values.length) {
      const candidate = { values: [...values].sort((a, b) => a - b), costs };
      if (best === null || compare(candidate, best) > 0) best = candidate;
      return;
    }
    walk(row + 1, left, [...values, problem.emptyValues[row] ?? NaN], costs);
    left.forEach((count, kind) => {
      const value = problem.values[row]?.[kind] ?? null;
      if (count === 0 || value === null) return;
      const after = left.map((other, index) => (index === kind ? other - 1 : other));
      const spent = costs.map((cost, index) => cost + (problem.costs?.[kind]?.[index] ?? 0));
      walk(row + 1, after, [...values, value], spent);
    });
  };
  walk(
    0,
    [...problem.counts],
    [],
    (problem.costs?.[0] ?? []).map(() => 0),
  );
  if (best === null) throw new Error("nothing to enumerate");
  return best;
}

function compare(a: { values: number[]; costs: number[] }, b: { values: number[]; costs: number[] }): number {
  for (let i = 0; i < a.values.length; i++) {
    const difference = (a.values[i] ?? NaN) - (b.values[i] ?? NaN);
    if (difference !== 0) return difference;
  }
  for (let i = 0; i < a.costs.length; i++) {
    const difference = (b.costs[i] ?? NaN) - (a.costs[i] ?? NaN);
    if (difference !== 0) return difference;
  }
  return 0;
}

function score(problem: GroupedProblem, assignment: Assignment): { values: number[]; costs: number[] } {
  const used = problem.counts.map(() => 0);
  const costs = (problem.costs?.[0] ?? []).map(() => 0);
  const values = assignment.map((kind, row) => {
    if (kind === null) return problem.emptyValues[row] ?? NaN;
    used[kind] = (used[kind] ?? 0) + 1;
    problem.costs?.[kind]?.forEach((cost, index) => (costs[index] = (costs[index] ?? 0) + cost));
    const value = problem.values[row]?.[kind] ?? null;
    if (value === null) throw new Error("a kind was given where it can't be used");
    return value;
  });
  used.forEach((count, kind) => expect(count).toBeLessThanOrEqual(problem.counts[kind] ?? 0));
  return { values: values.sort((a, b) => a - b), costs };
}

/** Matrices that textbooks use for the assignment problem (1 and 2) and further ones, all solved by exhaustive search. */
const MATRICES = [
  {
    costs: [
      [82, 83, 69, 92],
      [77, 37, 49, 92],
      [11, 69, 5, 86],
      [8, 9, 98, 23],
    ],
    sum: 140,
    bottleneck: 69,
    lexicographic: [69, 37, 23, 11],
  },
  {
    costs: [
      [400, 150, 400],
      [400, 450, 600],
      [300, 225, 300],
    ],
    sum: 850,
    bottleneck: 400,
    lexicographic: [400, 300, 150],
  },
  {
    costs: [
      [10, 10, 8],
      [9, 8, 1],
      [9, 7, 4],
    ],
    sum: 18,
    bottleneck: 9,
    lexicographic: [9, 8, 7],
  },
  {
    costs: [
      [9, 2, 7, 8],
      [6, 4, 3, 7],
      [5, 8, 1, 8],
      [7, 6, 9, 4],
    ],
    sum: 13,
    bottleneck: 5,
    lexicographic: [5, 4, 3, 2],
  },
  {
    costs: [
      [8, 2, 3, 3],
      [2, 7, 5, 8],
      [0, 9, 8, 4],
      [2, 5, 6, 3],
    ],
    sum: 10,
    bottleneck: 5,
    lexicographic: [5, 3, 2, 0],
  },
] as const;

describe("assignment matrices with known optima", () => {
  it.each(MATRICES)("sum $sum, bottleneck $bottleneck, lexicographic $lexicographic", (matrix) => {
    const columns = assignLeastSum(matrix.costs);
    expect(new Set(columns).size).toBe(columns.length);
    expect(columns.reduce((sum, column, row) => sum + (matrix.costs[row]?.[column] ?? NaN), 0)).toBe(matrix.sum);

    const problem = fromCosts(matrix.costs);
    expect(assignBottleneck(problem.values, problem.counts)?.value).toBe(-matrix.bottleneck);

    const assignment = assignLexicographic(problem);
    const costs = assignment.map((column, row) => (column === null ? NaN : (matrix.costs[row]?.[column] ?? NaN)));
    expect(costs.sort((a, b) => b - a)).toEqual([...matrix.lexicographic]);
  });

  it("gives the textbook columns of the least sum", () => {
    expect(assignLeastSum(MATRICES[0].costs)).toEqual([2, 1, 0, 3]);
    expect(assignLeastSum(MATRICES[1].costs)).toEqual([1, 0, 2]);
    expect(assignLeastSum(MATRICES[2].costs)).toEqual([0, 2, 1]);
    expect(assignLeastSum(MATRICES[3].costs)).toEqual([1, 0, 2, 3]);
  });
});

/** Few different values, so that many assignments are equal in their worst rows and the later levels matter. */
const smallProblem = fc
  .record({ rows: fc.integer({ min: 1, max: 6 }), kinds: fc.integer({ min: 1, max: 4 }) })
  .chain(({ rows, kinds }) =>
    fc.record({
      values: fc.array(
        fc.array(fc.option(fc.integer({ min: 0, max: 6 }), { freq: 6 }), { minLength: kinds, maxLength: kinds }),
        { minLength: rows, maxLength: rows },
      ),
      counts: fc.array(fc.integer({ min: 0, max: 3 }), { minLength: kinds, maxLength: kinds }),
      emptyValues: fc.array(fc.integer({ min: -5, max: -1 }), { minLength: rows, maxLength: rows }),
      costs: fc.array(fc.tuple(fc.integer({ min: 0, max: 4 }), fc.integer({ min: 0, max: 2 })), {
        minLength: kinds,
        maxLength: kinds,
      }),
    }),
  );

describe("lexicographic bottleneck", () => {
  it("equals exhaustive search in every level and in both tie-breaks", () => {
    fc.assert(
      fc.property(smallProblem, (problem) => {
        expect(score(problem, assignLexicographic(problem))).toEqual(enumerateAll(problem));
      }),
      { numRuns: 400, seed: 11 },
    );
  });

  it("has the plain bottleneck as its worst row whenever every row can be served", () => {
    fc.assert(
      fc.property(smallProblem, (problem) => {
        const bottleneck = assignBottleneck(problem.values, problem.counts);
        const worst = score(problem, assignLexicographic(problem)).values[0];
        if (bottleneck) expect(worst).toBe(bottleneck.value);
        else expect(worst).toBeLessThan(0);
      }),
      { numRuns: 300, seed: 12 },
    );
  });

  it("does not depend on the order of rows and kinds", () => {
    fc.assert(
      fc.property(smallProblem, (problem) => {
        const turned: GroupedProblem = {
          values: problem.values.map((row) => [...row].reverse()).reverse(),
          counts: [...problem.counts].reverse(),
          emptyValues: [...problem.emptyValues].reverse(),
          costs: [...problem.costs].reverse(),
        };
        expect(score(turned, assignLexicographic(turned))).toEqual(score(problem, assignLexicographic(problem)));
      }),
      { numRuns: 200, seed: 13 },
    );
  });

  it("is never worse with one more of any kind", () => {
    fc.assert(
      fc.property(smallProblem, fc.nat(3), (problem, pick) => {
        const kind = pick % problem.counts.length;
        const counts = problem.counts.map((count, index) => (index === kind ? count + 1 : count));
        const before = score(problem, assignLexicographic(problem));
        const more = { ...problem, counts };
        expect(
          compare({ ...score(more, assignLexicographic(more)), costs: [] }, { ...before, costs: [] }),
        ).toBeGreaterThanOrEqual(0);
      }),
      { numRuns: 200, seed: 14 },
    );
  });

  it("leaves the least important rows empty, never more than it must", () => {
    const problem: GroupedProblem = {
      values: [[3], [3], [3], [3]],
      counts: [2],
      emptyValues: [-40, -100, -70, -10],
    };
    expect(assignLexicographic(problem)).toEqual([null, 0, 0, null]);
  });

  it("changes as little as it can among equals", () => {
    const equal = {
      values: [
        [2, 2],
        [2, 2],
        [2, 2],
      ],
      counts: [2, 2],
      emptyValues: [0, 0, 0],
      costs: [[1], [1]],
    };
    for (const present of [
      [0, 1, 0],
      [1, 1, 0],
      [1, 0, 1],
    ]) {
      expect(assignLexicographic({ ...equal, present })).toEqual(present);
    }
    // The lighter kind still comes before the fewer changes.
    expect(assignLexicographic({ ...equal, costs: [[1], [2]], present: [1, 1, -1] })).toEqual([1, 0, 0]);
  });

  it("refuses sizes that do not fit, fractions of an anchor and numbers that are not finite", () => {
    expect(() => assignLexicographic({ values: [[1]], counts: [1, 2], emptyValues: [0] })).toThrow(RangeError);
    expect(() => assignLexicographic({ values: [[1]], counts: [1.5], emptyValues: [0] })).toThrow(RangeError);
    expect(() => assignLexicographic({ values: [[NaN]], counts: [1], emptyValues: [0] })).toThrow(RangeError);
    expect(() => assignLeastSum([[1], [2]])).toThrow(RangeError);
    expect(() => assignLeastSum([[Infinity]])).toThrow(RangeError);
    expect(assignLexicographic({ values: [], counts: [], emptyValues: [] })).toEqual([]);
    expect(assignLeastSum([])).toEqual([]);
  });
});

/** A small generator of our own, so that medium instances are the same on every machine. */
function createDraws(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 4294967296;
  };
}

function mediumProblem(seed: number, rows: number, kinds: number, levels: number): GroupedProblem {
  const draw = createDraws(seed);
  return {
    values: Array.from({ length: rows }, () =>
      Array.from({ length: kinds }, () => (draw() < 0.1 ? null : 1 + Math.floor(draw() * levels))),
    ),
    counts: Array.from({ length: kinds }, () => Math.ceil((1.2 * rows) / kinds)),
    emptyValues: Array.from({ length: rows }, () => 0),
    costs: Array.from({ length: kinds }, () => [1 + Math.floor(draw() * 30)]),
  };
}

/** The same problem as integer programs solved one level after the other by HiGHS. */
async function solveByHighs(problem: GroupedProblem): Promise<{ values: number[]; mass: number }> {
  const highs = await loadHighs();
  const levels = [...new Set([...problem.values.flat(), ...problem.emptyValues])]
    .filter((value): value is number => value !== null)
    .sort((a, b) => a - b);
  const cells = problem.values.flatMap((row, i) => [
    ...row.flatMap((value, k) => (value === null ? [] : [{ i, k, value, name: `x${i}_${k}` }])),
    { i, k: -1, value: problem.emptyValues[i] ?? 0, name: `e${i}` },
  ]);
  const rules = problem.values.map(
    (_, i) =>
      `${cells
        .filter((cell) => cell.i === i)
        .map((cell) => cell.name)
        .join(" + ")} = 1`,
  );
  problem.counts.forEach((count, k) => {
    const inKind = cells.filter((cell) => cell.k === k).map((cell) => cell.name);
    if (inKind.length > 0) rules.push(`${inKind.join(" + ")} <= ${count}`);
  });
  const solve = (objective: string) =>
    highs.solve(
      `Minimize\n obj: ${objective}\nSubject To\n${rules.map((rule, i) => ` r${i}: ${rule}`).join("\n")}\nBinary\n ${cells.map((cell) => cell.name).join(" ")}\nEnd`,
    );
  const values: number[] = [];
  for (const level of levels) {
    const at = cells.filter((cell) => cell.value === level).map((cell) => cell.name);
    const answer = solve(at.join(" + "));
    expect(answer.Status).toBe("Optimal");
    const count = Math.round(answer.ObjectiveValue);
    for (let i = 0; i < count; i++) values.push(level);
    rules.push(`${at.join(" + ")} <= ${count}`);
    if (values.length === problem.values.length) break;
  }
  const massTerms = cells
    .filter((cell) => cell.k >= 0)
    .map((cell) => `${problem.costs?.[cell.k]?.[0] ?? 0} ${cell.name}`)
    .join(" + ");
  return { values, mass: Math.round(solve(massTerms).ObjectiveValue) };
}

describe("against HiGHS, one integer program per level", () => {
  it.each([
    [21, 12, 5, 8],
    [22, 24, 8, 10],
    [23, 40, 12, 12],
    [24, 30, 6, 30],
  ])("seed %i: %i rows, %i kinds, %i levels", async (seed, rows, kinds, levels) => {
    const problem = mediumProblem(seed, rows, kinds, levels);
    const ours = score(problem, assignLexicographic(problem));
    const theirs = await solveByHighs(problem);
    expect(ours.values).toEqual(theirs.values);
    expect(ours.costs[0]).toBe(theirs.mass);
  });

  it("least sum on 25 × 30", async () => {
    const draw = createDraws(31);
    const costs = Array.from({ length: 25 }, () => Array.from({ length: 30 }, () => Math.floor(draw() * 1000)));
    const highs = await loadHighs();
    const name = (i: number, j: number) => `x${i}_${j}`;
    const terms = costs.flatMap((row, i) => row.map((cost, j) => `${cost} ${name(i, j)}`)).join(" + ");
    const rowRules = costs.map((row, i) => ` r${i}: ${row.map((_, j) => name(i, j)).join(" + ")} = 1`);
    const columnRules = (costs[0] ?? []).map(
      (_, j) => ` c${j}: ${costs.map((_row, i) => name(i, j)).join(" + ")} <= 1`,
    );
    const answer = highs.solve(
      `Minimize\n obj: ${terms}\nSubject To\n${[...rowRules, ...columnRules].join("\n")}\nEnd`,
    );
    const columns = assignLeastSum(costs);
    const sum = columns.reduce((total, column, row) => total + (costs[row]?.[column] ?? NaN), 0);
    expect(sum).toBe(Math.round(answer.ObjectiveValue));
  });
});
