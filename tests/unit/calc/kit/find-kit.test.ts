import { describe, expect, it } from "vitest";
import { costOf, findKit, listLosses, survivesLosses } from "@/lib/calc/kit/find-kit";
import { findShort } from "@/lib/calc/kit/match";
import type { KitCamp, KitNeed, KitProblem } from "@/lib/calc/kit/types";
import { createDraws } from "../camp-fixtures";
import { highs, SOLVE } from "./solver";

const need = (tieOut: number, kinds: number): KitNeed => ({
  pitchId: "p",
  tieOutId: `t${tieOut}`,
  number: tieOut,
  shelterName: "Tarp",
  kinds,
  isPinned: false,
});

interface Size {
  readonly kinds: number;
  readonly camps: number;
  readonly needs: number;
  readonly found: number;
  readonly most: number;
  readonly spares: number;
}

/** Kinds from weak to strong in an order of each camp's own, so that sets are partly nested, as they are in nature. */
function randomProblem(seed: number, size: Size): KitProblem {
  const draw = createDraws(seed);
  const below = (count: number) => Math.floor(draw() * count);
  const kinds = Array.from({ length: size.kinds }, (_, at) => ({
    id: `k${at}`,
    name: `Kind ${at}`,
    massUnits: 50 + below(400),
    extraWork: below(4) === 0 ? 2 : 0,
    most: 1 + below(size.most),
  }));
  const camps = Array.from({ length: size.camps }, (_, at): KitCamp => {
    const found = Array.from({ length: below(size.found + 1) }, (_, i) => ({
      id: `f${i}`,
      name: `Found ${i}`,
      most: 1 + below(2),
      work: 1 + below(6),
    }));
    const strengths = Array.from({ length: size.kinds + found.length }, () => draw());
    const needs = Array.from({ length: 1 + below(size.needs) }, (_, i) => {
      const load = draw() * 0.85;
      const odd = draw() < 0.2 ? 1 << below(size.kinds) : 0;
      return need(i, strengths.reduce((set, strength, kind) => (strength >= load ? set | (1 << kind) : set), 0) & ~odd);
    });
    return { id: `c${at}`, name: `Camp ${at}`, found, needs };
  });
  return { kinds, camps, spares: size.spares, workPriceUnits: below(3) * 70 };
}

const countUp = (most: readonly number[]): number[][] =>
  most.reduce<number[][]>(
    (all, top) => all.flatMap((counts) => Array.from({ length: top + 1 }, (_, count) => [...counts, count])),
    [[]],
  );

/** Every kit, every use of found things: the least cost, or null. */
function bruteForce(problem: KitProblem): number | null {
  let best: number | null = null;
  for (const counts of countUp(problem.kinds.map((kind) => kind.most))) {
    if (!outlivesLosses(problem, counts)) continue;
    const used = problem.camps.map((camp) => {
      const ways = countUp(camp.found.map((one) => one.most)).filter((way) => isStaked(camp, counts, way));
      const price = (way: readonly number[]) =>
        way.reduce(
          (sum, count, at) => sum + Math.round((camp.found[at]?.work ?? 0) * problem.workPriceUnits) * count,
          0,
        );
      return ways.sort((a, b) => price(a) - price(b))[0] ?? null;
    });
    if (used.some((way) => way === null)) continue;
    const cost = costOf(
      problem,
      counts,
      used.map((way) => way ?? []),
    );
    if (best === null || cost < best) best = cost;
  }
  return best;
}

/** By trying every loss; what is found at a camp may then be used up. */
function outlivesLosses(problem: KitProblem, counts: readonly number[]): boolean {
  return listLosses(counts, problem.spares).every((lost) =>
    problem.camps.every((camp) =>
      isStaked(
        camp,
        counts.map((count, kind) => count - (lost[kind] ?? 0)),
        camp.found.map((one) => one.most),
      ),
    ),
  );
}

/** By trying every piece at every need, one after the other: nothing of the matching under test. */
function isStaked(camp: KitCamp, counts: readonly number[], found: readonly number[]): boolean {
  const left = [...counts, ...found];
  const needs = [...camp.needs].sort((a, b) => a.kinds - b.kinds);
  const place = (at: number): boolean => {
    const one = needs[at];
    if (!one) return true;
    return left.some((count, kind) => {
      if (count === 0 || (one.kinds & (1 << kind)) === 0) return false;
      left[kind] = count - 1;
      const isDone = place(at + 1);
      left[kind] = count;
      return isDone;
    });
  };
  return place(0);
}

describe("the lightest kit", () => {
  it("equals brute force on 200 small random trips", () => {
    let foundCount = 0;
    for (let seed = 1; seed <= 200; seed += 1) {
      const problem = randomProblem(seed, { kinds: 4, camps: 3, needs: 5, found: 2, most: 4, spares: seed % 3 });
      const answer = findKit(problem, SOLVE);
      const cost = answer.status === "found" ? answer.solution.cost : null;
      expect({ seed, cost }).toEqual({ seed, cost: bruteForce(problem) });
      if (answer.status !== "found") continue;
      foundCount += 1;
      const { counts, foundUsed, bound } = answer.solution;
      expect(bound).toBe(answer.solution.cost);
      problem.camps.forEach((camp, at) => expect(isStaked(camp, counts, foundUsed[at] ?? [])).toBe(true));
    }
    expect(foundCount).toBeGreaterThan(60);
    expect(foundCount).toBeLessThan(200);
  });

  it.each([1, 2, 3, 4, 5, 6])("equals the program over every assignment on a medium trip (seed %i)", (seed) => {
    const problem = randomProblem(seed, { kinds: 9, camps: 6, needs: 24, found: 3, most: 24, spares: 0 });
    const answer = findKit(problem, SOLVE);
    const other = solveAssignments(problem);
    expect(answer.status === "found" ? answer.solution.cost : null).toBe(other);
  });

  it("finds the rows it needs when there are too many to write down", () => {
    const draw = createDraws(7);
    const kinds = Array.from({ length: 12 }, (_, at) => ({
      id: `k${at}`,
      name: `Kind ${at}`,
      massUnits: 100 + Math.floor(draw() * 300),
      extraWork: 0,
      most: 30,
    }));
    const needs = Array.from({ length: 36 }, (_, i) =>
      need(i, (1 << Math.floor(draw() * 12)) | (1 << Math.floor(draw() * 12)) | (1 << Math.floor(draw() * 12))),
    );
    const problem: KitProblem = {
      kinds,
      camps: [{ id: "c", name: "Camp", found: [], needs }],
      spares: 1,
      workPriceUnits: 0,
    };
    const answer = findKit(problem, SOLVE);
    if (answer.status !== "found") throw new Error("there is a kit");
    expect(survivesLosses(problem, answer.solution.counts)).toBe(true);
    const without = findKit({ ...problem, spares: 0 }, SOLVE);
    expect(without.status === "found" ? without.solution.cost : null).toBe(solveAssignments({ ...problem, spares: 0 }));
  });

  it("names the needs and kinds of a camp that can't be staked", () => {
    const kinds = [
      { id: "a", name: "Short", massUnits: 100, extraWork: 0, most: 9 },
      { id: "b", name: "Long", massUnits: 200, extraWork: 0, most: 1 },
    ];
    const camp = (id: string, ...sets: number[]): KitCamp => ({
      id,
      name: id,
      found: [],
      needs: sets.map((set, at) => need(at, set)),
    });
    const problem = { kinds, camps: [camp("easy", 3, 3), camp("hard", 3, 2, 2)], spares: 0, workPriceUnits: 0 };
    const answer = findKit(problem, SOLVE);
    expect(answer).toMatchObject({
      status: "short",
      shortfalls: [{ campId: "hard", kinds: 2, available: 1, needs: [{ tieOutId: "t1" }, { tieOutId: "t2" }] }],
    });
    const loose = findKit({ ...problem, camps: [camp("easy", 3, 2)], spares: 1 }, SOLVE);
    expect(loose).toMatchObject({ status: "short", shortfalls: [{ campId: "easy", kinds: 2, available: 0 }] });
  });

  it("takes the fewest pieces among equals, nothing for no camps, and refuses what is no problem", () => {
    const kinds = [{ id: "a", name: "Weightless", massUnits: 0, extraWork: 0, most: 9 }];
    const empty = findKit({ kinds, camps: [], spares: 2, workPriceUnits: 0 }, SOLVE);
    expect(empty).toMatchObject({ status: "found", solution: { counts: [0], cost: 0 } });
    const none = findKit({ kinds: [], camps: [], spares: 0, workPriceUnits: 0 }, SOLVE);
    expect(none).toMatchObject({ status: "found", solution: { counts: [], cost: 0 } });
    const bad = [{ id: "a", name: "Negative", massUnits: -1, extraWork: 0, most: 9 }];
    expect(() => findKit({ kinds: bad, camps: [], spares: 0, workPriceUnits: 0 }, SOLVE)).toThrow(RangeError);
    expect(() => findKit({ kinds, camps: [], spares: 9, workPriceUnits: 0 }, SOLVE)).toThrow(RangeError);
    const many = Array.from({ length: 25 }, () => kinds[0]).flatMap((one) => one ?? []);
    expect(() => findKit({ kinds: many, camps: [], spares: 0, workPriceUnits: 0 }, SOLVE)).toThrow(RangeError);
    const found = Array.from({ length: 7 }, (_, at) => ({ id: `f${at}`, name: "Rock", most: 1, work: 1 }));
    const camps = [{ id: "c", name: "C", found, needs: [] }];
    expect(() => findKit({ kinds, camps, spares: 0, workPriceUnits: 0 }, SOLVE)).toThrow(RangeError);
  });

  it("says what is proven when the time runs out", () => {
    const kinds = [
      { id: "a", name: "A", massUnits: 100, extraWork: 0, most: 9 },
      { id: "b", name: "B", massUnits: 30, extraWork: 0, most: 9 },
    ];
    const camps = [{ id: "c", name: "C", found: [], needs: [need(1, 3), need(2, 3)] }];
    const problem = { kinds, camps, spares: 0, workPriceUnits: 0 };
    const late = findKit(problem, (program) =>
      program.includes("General") ? { status: "stopped", values: { k0: 2 } } : SOLVE(program),
    );
    expect(late).toMatchObject({ status: "found", solution: { counts: [2, 0], cost: 200, bound: 60 } });
    expect(findKit(problem, () => ({ status: "stopped", values: null }))).toEqual({ status: "stopped" });
    const blind = findKit(problem, (program) =>
      program.includes("General") ? { status: "stopped", values: { k0: 2 } } : { status: "stopped", values: null },
    );
    expect(blind).toMatchObject({ solution: { bound: 0 } });
  });

  it("lists losses once each", () => {
    expect(listLosses([1, 2], 2)).toEqual([
      [0, 0],
      [0, 1],
      [0, 2],
      [1, 0],
      [1, 1],
    ]);
    const camp = { id: "c", name: "C", found: [], needs: [need(1, 1)] };
    expect(findShort(camp, [0], [])).toBe(1);
    expect(findShort(camp, [1], [])).toBeNull();
  });
});

/** The other formulation: a whole number for every need class and kind at every camp, tied to the counts. */
function solveAssignments(problem: KitProblem): number | null {
  const cost = [
    ...problem.kinds.map(
      (kind, at) => `${kind.massUnits + Math.round(kind.extraWork * problem.workPriceUnits)} y${at}`,
    ),
    ...problem.camps.flatMap((camp, c) =>
      camp.found.map((found, f) => `${Math.round(found.work * problem.workPriceUnits)} u${c}_${f}`),
    ),
  ];
  const rules: string[] = [];
  const cells = problem.camps.map((camp, c) =>
    camp.needs.map((one, n) =>
      [...problem.kinds, ...camp.found].flatMap((_, k) =>
        one.kinds & (1 << k) ? [{ k, name: `x${c}_${n}_${k}` }] : [],
      ),
    ),
  );
  let isImpossible = false;
  problem.camps.forEach((camp, c) => {
    const rows = cells[c] ?? [];
    rows.forEach((row) => {
      if (row.length === 0) isImpossible = true;
      else rules.push(`${row.map((cell) => cell.name).join(" + ")} = 1`);
    });
    [...problem.kinds, ...camp.found].forEach((_, k) => {
      const used = rows.flat().filter((cell) => cell.k === k);
      const limit = k < problem.kinds.length ? `y${k}` : `u${c}_${k - problem.kinds.length}`;
      if (used.length > 0) rules.push(`${used.map((cell) => cell.name).join(" + ")} - ${limit} <= 0`);
    });
  });
  if (isImpossible) return null;
  const bounds = [
    ...problem.kinds.map((kind, at) => `0 <= y${at} <= ${kind.most}`),
    ...problem.camps.flatMap((camp, c) => camp.found.map((found, f) => `0 <= u${c}_${f} <= ${found.most}`)),
  ];
  const names = [
    ...problem.kinds.map((_, at) => `y${at}`),
    ...problem.camps.flatMap((camp, c) => camp.found.map((_, f) => `u${c}_${f}`)),
  ];
  const binaries = cells.flat(2).map((cell) => cell.name);
  const text = [
    "Minimize",
    ` obj: ${cost.join(" + ")}`,
    "Subject To",
    ...rules.map((rule, at) => ` r${at}: ${rule}`),
    "Bounds",
    ...bounds.map((bound) => ` ${bound}`),
    "General",
    ` ${names.join(" ")}`,
    "Binary",
    ` ${binaries.join(" ")}`,
    "End",
  ].join("\n");
  const answer = highs.solve(text, { mip_rel_gap: 0 });
  return answer.Status === "Optimal" ? Math.round(answer.ObjectiveValue) : null;
}
