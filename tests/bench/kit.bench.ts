import { rmSync } from "node:fs";
import path from "node:path";
import { monitorEventLoopDelay } from "node:perf_hooks";
import { build } from "esbuild";
import loadHighs from "highs";
import { analyseShelter } from "@/lib/calc/analyse-shelter";
import { designAnalysisRequest } from "@/lib/calc/camp";
import { findKit } from "@/lib/calc/kit/find-kit";
import { readCampForKit, type KitCampChoice, type KitKindChoice } from "@/lib/calc/kit/read-camp";
import { toProblem, type KitSearch } from "@/lib/calc/kit/search-input";
import { searchKit } from "@/lib/calc/kit/search-kit";
import { defaultShelterSpec } from "@/lib/calc/shelter-kinds";
import { builtInAnchor } from "@/lib/calc/tables/anchors";
import type { CampInput, GroundKind, PitchedShelter, ShelterKind } from "@/lib/calc/types";
import { toProgramSolver } from "@/lib/workers/kit-solver";
import { runKitThread } from "@/lib/workers/start-kit-job";
import type { Bench } from "./run";

const SHELTERS: readonly ShelterKind[] = ["tunnel", "ridge-tarp", "pyramid", "dome", "ridge-tent", "half-pyramid"];
const GROUNDS: readonly GroundKind[] = ["firm-moist-loam", "hard-trodden-loam", "baked-clay", "litter-over-loam"];

const KINDS = [
  "three-blade-150",
  "three-blade-200",
  "v-160",
  "titanium-nail-200",
  "wide-sand-240",
  "wide-sand-300",
  "snow-stake-300",
  "screw-in-200",
  "tube-peg-230",
  "round-hook-180",
  "hardwood-250",
  "long-nail-230",
];

/** A camp of a few shelters; ground, gust and headings differ from camp to camp. */
function campAt(place: number, tieOuts: number): KitCampChoice {
  const shelters: PitchedShelter[] = [];
  const wind = {
    strength: { kind: "gust" as const, speedMs: 7 + (place % 5) },
    fromDeg: 240,
    toDeg: 300,
    exposure: "II" as const,
    altitudeM: 400,
    temperatureC: null,
    hill: null,
    windbreak: null,
    underTreesSpeedRatio: null,
  };
  let total = 0;
  for (let at = 0; total < tieOuts; at += 1) {
    const kind = SHELTERS[(place + at) % SHELTERS.length] ?? "dome";
    const pitch: PitchedShelter = {
      pitchId: `p${place}-${at}`,
      name: `${kind} ${at + 1}`,
      spec: defaultShelterSpec(kind),
      headingDeg: ((place % 3) * 40 + at * 60) % 360,
      patch: "main",
      analysis: null,
    };
    const request = designAnalysisRequest({ wind }, pitch);
    if ("gaps" in request) throw new Error("the bench's camp has a gap");
    const analysis = analyseShelter(request);
    total += analysis.design.tieOuts.length;
    shelters.push({ ...pitch, analysis });
  }
  const ground = {
    kind: GROUNDS[place % GROUNDS.length] ?? "firm-moist-loam",
    wetness: "usual" as const,
    looseTopM: null,
    stoneDepthM: null,
    slopeDeg: 0,
    learned: null,
  };
  const input: CampInput = {
    wind,
    ground,
    secondGround: null,
    strongWindHours: 6,
    rocksAvailable: false,
    shelters,
    tray: [],
    placements: [],
  };
  return { id: `c${place}`, name: `Camp ${place + 1}`, input, allowFound: false };
}

export function benchSearch(camps: number, tieOuts: number, kinds: number): KitSearch {
  return {
    camps: Array.from({ length: camps }, (_, place) => campAt(place, tieOuts)),
    kinds: KINDS.slice(0, kinds).map((wanted): KitKindChoice => {
      const { id, name, spec, massKg } = builtInAnchor(wanted);
      return { id, name, spec, massKg, most: null };
    }),
    otherKinds: [],
    settings: { spares: 1, workPriceKg: 0.1, allowDoubling: true },
  };
}

const seconds = (ms: number): string => `${(ms / 1000).toFixed(2)} s`;

/** The search in its thread, while this thread does what a server does between requests. */
async function reportEventLoop(search: KitSearch, report: Parameters<Bench>[0]): Promise<void> {
  const outfile = path.join(process.cwd(), ".next-kit-bench.mjs");
  try {
    await build({
      entryPoints: [path.join(process.cwd(), "lib/workers/kit.worker.ts")],
      outfile,
      bundle: true,
      platform: "node",
      format: "esm",
      packages: "external",
      alias: { "@": process.cwd() },
      logLevel: "error",
    });
    const delay = monitorEventLoopDelay({ resolution: 5 });
    const start = performance.now();
    delay.enable();
    const { outcome } = runKitThread(outfile, search, () => undefined);
    const { status } = await outcome;
    delay.disable();
    report({
      name: "large: event loop of the server meanwhile, p99",
      value: `${(delay.percentile(99) / 1e6).toFixed(1)} ms (${status} in ${seconds(performance.now() - start)})`,
      target: "≤ 50 ms",
    });
  } finally {
    rmSync(outfile, { force: true });
  }
}

const bench: Bench = async (report) => {
  const solve = toProgramSolver(await loadHighs(), 10);
  for (const [name, camps, tieOuts, kinds, target] of [
    ["small", 5, 30, 8, "≤ 1 s"],
    ["large", 14, 60, 12, "≤ 10 s, optimum or gap ≤ 1 %"],
  ] as const) {
    const search = benchSearch(camps, tieOuts, kinds);
    const pieces = search.camps.map((camp) =>
      camp.input.shelters.reduce((sum, one) => sum + (one.analysis?.design.tieOuts.length ?? 0), 0),
    );
    const start = performance.now();
    const reads = search.camps.map((camp) => readCampForKit(camp, search.kinds, search.settings));
    const read = performance.now();
    const answer = findKit(toProblem(reads, search.kinds, search.settings), solve);
    const found = performance.now();
    const outcome = searchKit(search, solve, () => undefined);
    const whole = performance.now();
    const gap =
      outcome.status === "found"
        ? `gap ${(outcome.gap * 100).toFixed(1)} %, ${outcome.massUnits / 10_000} kg`
        : outcome.status;
    report({
      name: `${name}: ${camps} camps, ${Math.min(...pieces)}–${Math.max(...pieces)} tie-outs, ${kinds} kinds: kit`,
      value: `${seconds(found - start)} (${answer.status}, ${gap})`,
      target,
    });
    report({ name: `${name}: of that the program alone`, value: seconds(found - read) });
    if (name === "large") await reportEventLoop(search, report);
    report({ name: `${name}: with reasons, curve and plans`, value: seconds(whole - found) });
  }
};

export default bench;
