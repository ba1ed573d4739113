import type { AnchorSpec } from "@/lib/calc/types";
import type { KitOutcome } from "@/lib/calc/kit/search-kit";
import type { KitSearchSettings } from "./search-schema";

export interface KitProgressView {
  readonly isRunning: boolean;
  readonly progress: { readonly step: string; readonly done: number; readonly total: number } | null;
  /** Why the last search ended without a result. */
  readonly failure: string | null;
}

export interface KitCandidateView {
  readonly source: KitSearchSettings["kinds"][number]["source"];
  readonly id: string;
  readonly name: string;
  readonly spec: AnchorSpec;
  readonly massKg: number;
  readonly owned: number | null;
  readonly isChosen: boolean;
  readonly most: number | null;
}

export interface KitCampView {
  readonly id: string;
  readonly name: string;
  /** What keeps it from being planned for; empty when nothing does. */
  readonly gaps: readonly string[];
  readonly foundNames: readonly string[];
  readonly isChosen: boolean;
  readonly allowFound: boolean;
}

export interface KitSearchView {
  readonly candidates: readonly KitCandidateView[];
  readonly camps: readonly KitCampView[];
  readonly spares: number;
  readonly workPriceKg: number;
  readonly allowDoubling: boolean;
  readonly progress: KitProgressView;
  readonly result: {
    readonly outcome: KitOutcome;
    readonly foundByName: string;
    readonly foundAt: string;
    readonly acceptedAt: string | null;
    /** Camps, shelters, anchors or plans changed since. */
    readonly isStale: boolean;
    /** Camps of the trip that it does not cover. */
    readonly leftOut: readonly string[];
  } | null;
}
