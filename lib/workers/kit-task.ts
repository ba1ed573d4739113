import loadHighs from "highs";
import { searchKit, type KitOutcome } from "@/lib/calc/kit/search-kit";
import type { KitSearch, Progress } from "@/lib/calc/kit/search-input";
import { toProgramSolver } from "./kit-solver";

/** One program; a search solves a few dozen. Kits of real trips take milliseconds. */
const SECONDS_EACH = 10;

export interface KitProgress {
  readonly step: string;
  readonly done: number;
  readonly total: number;
}

export type KitMessage =
  { readonly progress: KitProgress } | { readonly result: KitOutcome } | { readonly failure: string };

export async function runKitSearch(search: KitSearch, onProgress: Progress): Promise<KitOutcome> {
  return searchKit(search, toProgramSolver(await loadHighs(), SECONDS_EACH), onProgress);
}
