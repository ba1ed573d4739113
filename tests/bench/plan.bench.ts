import loadHighs from "highs";
import { analyseShelter } from "@/lib/calc/analyse-shelter";
import { assignLexicographic, type GroupedProblem } from "@/lib/calc/assignment";
import { designAnalysisRequest, evaluateCamp, evaluatePlacements, prepareCamp } from "@/lib/calc/camp";
import { proposePlan, proposePreparedPlan } from "@/lib/calc/plan";
import { weightedMargin } from "@/lib/calc/plan-score";
import { quickMends } from "@/lib/calc/mend";
import { isKnownTieOut } from "@/lib/calc/prepare-camp";
import { rigAtBestLean } from "@/lib/calc/rig-anchor";
import { defaultShelterSpec } from "@/lib/calc/shelter-kinds";
import { BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import type { CampInput, PitchedShelter, Placement, ShelterKind } from "@/lib/calc/types";
import type { Bench } from "./run";

const KINDS: readonly ShelterKind[] = ["tunnel", "dome", "pyramid", "ridge-tent", "ridge-tarp", "half-pyramid"];
const ANCHOR_KINDS = 12;
const OPTIONS = { allowFound: false, allowDoubling: true };

/** 12 shelters with 140 tie-outs and 12 kinds of stakes, a few more stakes than tie-outs. */
function largeCamp(): CampInput {
  const pitches = [...KINDS, ...KINDS].map((kind, index): PitchedShelter => ({
    pitchId: `pitch-${index}`,
    name: `${kind} ${index + 1}`,
    spec: defaultShelterSpec(kind),
    headingDeg: (index * 37) % 360,
    patch: "main",
    analysis: null,
  }));
  const camp: CampInput = {
    wind: {
      strength: { kind: "gust", speedMs: 15 },
      fromDeg: 240,
      toDeg: 300,
      exposure: "II",
      altitudeM: 600,
      temperatureC: null,
      hill: null,
      windbreak: null,
      underTreesSpeedRatio: null,
    },
    ground: {
      kind: "firm-moist-loam",
      wetness: "usual",
      looseTopM: null,
      stoneDepthM: null,
      slopeDeg: 0,
      learned: null,
    },
    secondGround: null,
    strongWindHours: 6,
    rocksAvailable: false,
    shelters: pitches,
    tray: BUILT_IN_ANCHORS.filter((anchor) => anchor.spec.class === "stake")
      .slice(0, ANCHOR_KINDS)
      .map((anchor) => ({ ...anchor, count: 13 })),
    placements: [],
  };
  return {
    ...camp,
    shelters: pitches.map((pitch) => {
      const request = designAnalysisRequest(camp, pitch);
      if ("gaps" in request) throw new Error("the bench's camp has a gap");
      return { ...pitch, analysis: analyseShelter(request) };
    }),
  };
}

interface Timing {
  readonly medianMs: number;
  /** On a busy machine the better measure of the work itself. */
  readonly fastestMs: number;
}

/** Times `runs` calls, each on what `prepare` gives. */
function time<T>(runs: number, prepare: () => T, call: (input: T) => unknown): Timing {
  const times = Array.from({ length: runs }, () => {
    const input = prepare();
    const start = performance.now();
    call(input);
    return performance.now() - start;
  });
  times.sort((a, b) => a - b);
  return { medianMs: times[Math.floor(runs / 2)] ?? NaN, fastestMs: times[0] ?? NaN };
}

const inMs = (ms: number): string => `${ms.toFixed(ms < 10 ? 2 : 0)} ms`;
const both = ({ medianMs, fastestMs }: Timing): string => `${inMs(medianMs)} (fastest ${inMs(fastestMs)})`;

/** The allocation that the proposal solves, margins in steps of `step` so that HiGHS has a countable number of levels. */
function allocationOf(camp: CampInput, step: number): GroupedProblem {
  const prepared = prepareCamp(camp);
  const rows = prepared.shelters.flatMap((shelter) =>
    shelter.tieOuts.filter(isKnownTieOut).map((tieOut) => ({ shelter, tieOut })),
  );
  const largest = Math.max(...rows.map((row) => row.tieOut.weightN));
  const inSteps = (value: number) => Math.round(value / step);
  return {
    values: rows.map(({ shelter, tieOut }) =>
      camp.tray.map((anchor) => {
        const rigged = rigAtBestLean(prepared, shelter, tieOut, anchor, null);
        return rigged ? inSteps(weightedMargin(rigged.strength.dependableN, tieOut.weightN, largest)) : null;
      }),
    ),
    counts: camp.tray.map((anchor) => anchor.count),
    emptyValues: rows.map(({ tieOut }) => inSteps(weightedMargin(null, tieOut.weightN, largest))),
    costs: camp.tray.map((anchor) => [Math.round(anchor.massKg * 10_000)]),
  };
}

/** The same allocation as one integer program per level: fewest rows at the worst level, then at the next … then mass. */
async function solveByHighs(problem: GroupedProblem): Promise<{ values: number[]; programs: number; timeMs: number }> {
  const highs = await loadHighs();
  const cells = problem.values.flatMap((row, i) => [
    ...row.flatMap((value, k) => (value === null ? [] : [{ i, k, value, name: `x${i}_${k}` }])),
    { i, k: -1, value: problem.emptyValues[i] ?? 0, name: `e${i}` },
  ]);
  const namesOf = (keep: (cell: (typeof cells)[number]) => boolean) =>
    cells
      .filter(keep)
      .map((cell) => cell.name)
      .join(" + ");
  const rules = problem.values.map((_, i) => `${namesOf((cell) => cell.i === i)} = 1`);
  problem.counts.forEach((count, k) => rules.push(`${namesOf((cell) => cell.k === k)} <= ${count}`));
  const names = cells.map((cell) => cell.name).join(" ");
  const start = performance.now();
  let programs = 0;
  const solve = (objective: string) => {
    programs++;
    const answer = highs.solve(
      `Minimize\n obj: ${objective}\nSubject To\n${rules.map((rule, i) => ` r${i}: ${rule}`).join("\n")}\nBinary\n ${names}\nEnd`,
    );
    if (answer.Status !== "Optimal") throw new Error(`HiGHS: ${answer.Status}`);
    return answer.ObjectiveValue;
  };
  const values: number[] = [];
  for (const level of [...new Set(cells.map((cell) => cell.value))].sort((a, b) => a - b)) {
    const atLevel = namesOf((cell) => cell.value === level);
    const count = Math.round(solve(atLevel));
    for (let i = 0; i < count; i++) values.push(level);
    rules.push(`${atLevel} <= ${count}`);
    if (values.length === problem.values.length) break;
  }
  solve(
    cells
      .filter((cell) => cell.k >= 0)
      .map((cell) => `${problem.costs?.[cell.k]?.[0] ?? 0} ${cell.name}`)
      .join(" + "),
  );
  return { values, programs, timeMs: performance.now() - start };
}

const bench: Bench = async (report) => {
  const camp = largeCamp();
  const prepared = prepareCamp(camp);
  const tieOuts = prepared.shelters.reduce((sum, shelter) => sum + shelter.tieOuts.length, 0);
  report({ name: "camp", value: `${camp.shelters.length} shelters, ${tieOuts} tie-outs, ${camp.tray.length} kinds` });

  const first = performance.now();
  const plan = proposePlan(camp, OPTIONS);
  report({ name: "best plan, first call of the process", value: inMs(performance.now() - first) });
  report({
    name: "best plan, nothing remembered (median of 15)",
    value: both(
      time(
        15,
        () => camp,
        (input) => proposePlan(input, OPTIONS),
      ),
    ),
    target: "≤ 50 ms",
  });
  proposePreparedPlan(prepared, OPTIONS);
  report({
    name: "best plan, camp prepared (median of 15)",
    value: both(
      time(
        15,
        () => prepared,
        (input) => proposePreparedPlan(input, OPTIONS),
      ),
    ),
  });
  report({ name: "prepare camp (median of 9)", value: both(time(9, () => camp, prepareCamp)) });
  const placed = { ...camp, placements: plan.placements };
  report({ name: "whole camp evaluated (median of 9)", value: both(time(9, () => placed, evaluateCamp)) });

  evaluatePlacements(prepared, plan.placements);
  let lean = 0;
  const moveOne = (): readonly Placement[] => {
    lean++;
    const index = (lean * 17) % plan.placements.length;
    return plan.placements.map((one, other) =>
      other === index ? { ...one, leanDeg: one.leanDeg + lean / 1000 } : one,
    );
  };
  report({
    name: "margins after one move (median of 101)",
    value: both(time(101, moveOne, (placements) => evaluatePlacements(prepared, placements))),
    target: "≤ 4 ms",
  });
  const [weakest] = prepared.shelters;
  const tieOut = weakest?.tieOuts[0];
  if (weakest && tieOut) {
    const spot = { pitchId: weakest.pitch.pitchId, tieOutId: tieOut.tieOut.id };
    report({
      name: "quick mends of one tie-out (median of 5)",
      value: both(
        time(
          5,
          () => placed,
          (input) => quickMends(input, spot),
        ),
      ),
    });
  }

  const allocation = allocationOf(camp, 0.01);
  const our = time(15, () => allocation, assignLexicographic);
  report({ name: "allocation alone, margins in steps of 0.01 (median of 15)", value: both(our) });
  const theirs = await solveByHighs(allocation);
  const ours = assignLexicographic(allocation)
    .map((kind, row) => (kind === null ? allocation.emptyValues[row] : allocation.values[row]?.[kind]) ?? NaN)
    .sort((a, b) => a - b);
  const isSame = ours.every((value, index) => value === theirs.values[index]);
  report({ name: `same allocation by HiGHS, ${theirs.programs} integer programs`, value: inMs(theirs.timeMs) });
  report({ name: "HiGHS ÷ ours", value: `${(theirs.timeMs / our.medianMs).toFixed(0)} ×`, target: "> 1" });
  report({ name: "same margins in every tie-out", value: isSame ? "yes" : "NO", target: "yes" });
};

export default bench;
