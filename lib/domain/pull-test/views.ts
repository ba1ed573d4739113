/** What the pages of pull tests get: dates as text, SI beside what was typed. */
import type { AnchorSpec, GroundKind, Verdict } from "@/lib/calc/types";
import type { Preferences } from "../preferences";
import type { CurvePoint, LearnedFrom } from "./learn";
import type { Patch, PullOutcome, TestedGround } from "./schema";

/** How a reading stands to the others and to the model. */
export type PullFit =
  | {
      readonly status: "counts";
      readonly kind: "exact" | "at-least";
      readonly groundMedianN: number;
      /** Force ÷ the model's median for the ground. */
      readonly ratio: number;
      /** Estimate with it ÷ without it. */
      readonly pull: number;
      /** How likely a reading at least as far out was, given the others. */
      readonly chance: number;
      readonly isOutlier: boolean;
    }
  | { readonly status: "off"; readonly ratio: number | null; readonly kind: "exact" | "at-least" }
  /** More than twenty times off the model: not counted until somebody has looked at it. */
  | { readonly status: "implausible"; readonly groundMedianN: number; readonly ratio: number }
  | { readonly status: "says-nothing" }
  /** Logged while the ground here was said to be another. */
  | { readonly status: "other-ground"; readonly groundName: string };

export interface PullTestView {
  readonly id: string;
  readonly patch: Patch | null;
  readonly place: string;
  readonly anchorName: string;
  readonly anchor: AnchorSpec;
  readonly ground: TestedGround;
  readonly groundName: string;
  readonly leanDeg: number;
  readonly lineAngleDeg: number;
  readonly depthOutM: number;
  readonly force: number;
  readonly forceUnit: Preferences["forceUnit"];
  readonly forceN: number;
  readonly outcome: PullOutcome;
  readonly note: string;
  readonly isOff: boolean;
  readonly pulledAt: string;
  readonly loggedByName: string;
  readonly version: number;
  readonly hasPhoto: boolean;
  readonly fit: PullFit;
}

/** One ground at one place: the curve and the readings on it. */
export interface GroundLearningView {
  readonly kind: GroundKind;
  readonly groundName: string;
  readonly from: LearnedFrom;
  readonly ownCount: number;
  readonly elsewhereCount: number;
  readonly placeCount: number;
  /** Multiples of the table: middle, and the 90 % interval of the ground's own strength. */
  readonly factor: number;
  readonly lowFactor: number;
  readonly highFactor: number;
  /** What nineteen of twenty next pulls hold, as a multiple of the same of the table. */
  readonly dependableFactor: number;
  readonly scatter: number;
  readonly tableScatter: number;
  readonly curve: readonly CurvePoint[];
}

export interface PatchLearningView extends GroundLearningView {
  readonly patch: Patch;
  readonly usesElsewhere: boolean;
}

export interface ShelterStanding {
  readonly verdict: Verdict;
  readonly holdsToGustMs: number | null;
  readonly isHoldsToOpen: boolean;
  /** Of the weakest tie-out. */
  readonly margin: number | null;
}

export interface ShelterChange {
  readonly pitchId: string;
  readonly name: string;
  readonly byTable: ShelterStanding;
  readonly learned: ShelterStanding;
}

export interface AnchorChoice {
  readonly id: string;
  readonly name: string;
}

export interface CampPullTestsView {
  readonly campName: string;
  readonly days: readonly string[];
  readonly timeZone: string;
  readonly patches: readonly PatchLearningView[];
  /** Newest first, at most a page of them. */
  readonly readings: readonly PullTestView[];
  readonly total: number;
  readonly anchors: readonly AnchorChoice[];
  readonly changes: readonly ShelterChange[];
}

export interface PracticeGround extends GroundLearningView {
  readonly key: string;
  readonly place: string;
}

export interface PracticeView {
  readonly grounds: readonly PracticeGround[];
  readonly readings: readonly PullTestView[];
  readonly total: number;
  readonly anchors: readonly AnchorChoice[];
}
