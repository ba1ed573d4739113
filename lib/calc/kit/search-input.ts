import { toCarriedKinds, type KitCampChoice, type KitKindChoice, type KitSettings, type ReadCamp } from "./read-camp";
import type { KitProblem } from "./types";

export interface KitSearch {
  readonly camps: readonly KitCampChoice[];
  readonly kinds: readonly KitKindChoice[];
  /** Kinds that the group does not mean to take; named where they would help. */
  readonly otherKinds: readonly KitKindChoice[];
  readonly settings: KitSettings;
}

/** Told each step as it starts. */
export type Progress = (step: string, done: number, total: number) => void;

/** The same camp in a gust that is stronger by `extraMs`, m/s; of calm air nothing is left to take away. */
export function inStrongerGust(camp: KitCampChoice, read: ReadCamp, extraMs: number): KitCampChoice {
  const speedMs = Math.max(0, (read.prepared.designGustMs ?? 0) + extraMs);
  return { ...camp, input: { ...camp.input, wind: { ...camp.input.wind, strength: { kind: "gust", speedMs } } } };
}

export function toProblem(
  reads: readonly ReadCamp[],
  kinds: readonly KitKindChoice[],
  settings: KitSettings,
): KitProblem {
  const camps = reads.map((read) => read.camp);
  return {
    kinds: toCarriedKinds(kinds, camps, settings.spares),
    camps,
    spares: settings.spares,
    workPriceUnits: settings.workPriceKg * 10_000,
  };
}
