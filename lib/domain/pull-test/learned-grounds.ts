import type { GroundState } from "@/lib/calc/types";

/** What pull tests say of each patch of a camp's ground; null leaves the table's numbers. */
export interface LearnedGrounds {
  readonly main: GroundState["learned"];
  readonly second: GroundState["learned"];
}

export const NOTHING_LEARNED: LearnedGrounds = { main: null, second: null };
