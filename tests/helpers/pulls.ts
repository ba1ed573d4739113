import type { PullOutcome } from "@/lib/domain/pull-test/schema";

export { TINY_PNG } from "./tiny-png";

interface Reading {
  readonly leanDeg: number;
  readonly lineAngleDeg: number;
  readonly depthOutM: number;
  readonly force: number;
  readonly forceUnit: "N" | "kgf" | "lbf";
  readonly outcome: PullOutcome;
  readonly wetness: "dry" | "usual" | "wet" | "saturated";
}

const READING: Reading = {
  leanDeg: 0,
  lineAngleDeg: 45,
  depthOutM: 0,
  force: 20,
  forceUnit: "kgf",
  outcome: "came-out",
  wetness: "usual",
};

/** A three-blade that came out of the main ground of a camp; the model expects 165 N in firm loam. */
export function pullOf(pullTestId: string, over: Partial<Reading> & { patch?: "main" | "second"; note?: string } = {}) {
  return { pullTestId, anchorId: "three-blade-200", reading: { ...READING, patch: "main" as const, ...over } };
}

/** The same in somebody's practice field. */
export function practicePullOf(pullTestId: string, over: Partial<Reading> & { place?: string; note?: string } = {}) {
  const ground = { place: "Barn field", kind: "firm-moist-loam" as const };
  return { pullTestId, anchorId: "three-blade-200", reading: { ...READING, ...ground, ...over } };
}
