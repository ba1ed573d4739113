import { groundRow } from "@/lib/calc/ground";
import { fitCensoredLognormal, type PullReading } from "@/lib/calc/learning";
import { predictPull } from "@/lib/calc/pull-reading";
import type { LoggedPull } from "./learn";
import { newtonsOf, type PullOutcome } from "./schema";

/** One reading beside what the model expects of the anchor: whatever gives first, by the table. */
export interface ComparedPull {
  readonly id: string;
  readonly anchorName: string;
  readonly groundName: string;
  readonly leanDeg: number;
  readonly lineAngleDeg: number;
  readonly outcome: PullOutcome;
  readonly measuredN: number;
  readonly predictedN: number;
  /** "at-least": it was still holding, or the line failed first. */
  readonly kind: PullReading["kind"];
}

export interface ComparedGroup {
  readonly name: string;
  readonly count: number;
  readonly gaveWayCount: number;
  /** Measured ÷ predicted: median and σ of the logarithm, those that only held counted as such; null with too few. */
  readonly ratio: { readonly median: number; readonly scatter: number } | null;
}

export interface Comparison {
  readonly pulls: readonly ComparedPull[];
  readonly overall: ComparedGroup;
  readonly groups: readonly { readonly title: string; readonly rows: readonly ComparedGroup[] }[];
  /** Readings without a number of the model beside them. */
  readonly leftOut: number;
}

type NamedPull = LoggedPull & { readonly anchorName: string };

function comparePull(pull: NamedPull): ComparedPull | null {
  try {
    const prediction = predictPull(pull);
    if (!prediction) return null;
    const { id, anchorName, leanDeg, lineAngleDeg, outcome } = pull;
    return {
      id,
      anchorName,
      groundName: groundRow(pull.ground.kind).name,
      leanDeg,
      lineAngleDeg,
      outcome,
      measuredN: newtonsOf(pull),
      predictedN: prediction.medianN,
      // A bent stake has given way: here it is the whole anchor that is held against the model.
      kind: outcome === "came-out" || outcome === "bent" ? "exact" : "at-least",
    };
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

function summarise(name: string, pulls: readonly ComparedPull[]): ComparedGroup {
  const readings = pulls.map(({ measuredN, predictedN, kind }) => ({
    logRatio: Math.log(measuredN / predictedN),
    kind,
  }));
  const fit = fitCensoredLognormal(readings);
  return {
    name,
    count: pulls.length,
    gaveWayCount: pulls.filter((one) => one.kind === "exact").length,
    ratio: fit && { median: Math.exp(fit.mean), scatter: fit.deviation },
  };
}

function groupBy(pulls: readonly ComparedPull[], nameOf: (pull: ComparedPull) => string): ComparedGroup[] {
  const groups = new Map<string, ComparedPull[]>();
  for (const pull of pulls) {
    const name = nameOf(pull);
    const list = groups.get(name) ?? [];
    list.push(pull);
    groups.set(name, list);
  }
  return [...groups].map(([name, list]) => summarise(name, list)).sort((a, b) => b.count - a.count);
}

const nameLean = ({ leanDeg }: ComparedPull) =>
  leanDeg < -7 ? "leaning forward" : leanDeg <= 7 ? "upright" : leanDeg <= 25 ? "8–25° back" : "26–60° back";
const nameLine = ({ lineAngleDeg }: ComparedPull) =>
  lineAngleDeg < 30 ? "below 30°" : lineAngleDeg <= 45 ? "30–45°" : "above 45°";

/** All readings that are switched on, against the model as it stands in the table. */
export function comparePulls(pulls: readonly NamedPull[]): Comparison {
  const on = pulls.filter((pull) => !pull.isOff);
  const compared = on.flatMap((pull) => comparePull(pull) ?? []);
  return {
    pulls: compared,
    overall: summarise("all", compared),
    groups: [
      { title: "Anchor", rows: groupBy(compared, (pull) => pull.anchorName) },
      { title: "Ground", rows: groupBy(compared, (pull) => pull.groundName) },
      { title: "Lean", rows: groupBy(compared, nameLean) },
      { title: "Line above ground", rows: groupBy(compared, nameLine) },
    ],
    leftOut: on.length - compared.length,
  };
}
