import type { AnchorSpec, KnotId, ShelterSpec, Verdict } from "@/lib/calc/types";
import type { PackListView } from "../views";

/** One thing to do at one tie-out, in the order of pitching. */
export interface OwnStep {
  readonly tieOutId: string;
  readonly number: number;
  readonly where: string;
  /** Null: nothing is planned there yet. */
  readonly anchor: { readonly name: string; readonly spec: AnchorSpec } | null;
  /** "lean 10° away from the pull"; empty for what is not driven. */
  readonly lean: string;
  readonly line: string;
  readonly knot: KnotId | null;
  readonly remarks: readonly string[];
  readonly verdict: Verdict;
}

/** A shelter that one sleeps in, at one camp, ready to be pitched. */
export interface OwnCard {
  readonly campId: string;
  readonly campName: string;
  readonly days: readonly string[];
  readonly pitchId: string;
  readonly shelterName: string;
  readonly spec: ShelterSpec;
  readonly headingDeg: number;
  readonly wind: { readonly fromDeg: number | null; readonly toDeg: number | null };
  readonly facing: string;
  readonly windWords: string;
  readonly ground: string;
  readonly verdict: Verdict;
  readonly holdsTo: string;
  readonly holdsToRemark: string;
  readonly sleeperNames: readonly string[];
  readonly steps: readonly OwnStep[];
  readonly fallbacks: readonly string[];
  /** When to tighten the lines again; null when not at all. */
  readonly retension: string | null;
}

/** A copy of one's pages that is out there. */
export interface CopyView {
  readonly way: "printed" | "sent";
  readonly version: number;
  readonly at: string;
  /** What is different now; none while it still says the right thing. */
  readonly changes: readonly string[];
}

export interface OwnHome {
  readonly version: number;
  /** When anything printed on the trip last changed, ms since 1970: names what is shown, for "I have read this". */
  readonly changedAt: number;
  readonly list: PackListView;
  readonly cards: readonly OwnCard[];
  /** Latest of each way, newest first. */
  readonly copies: readonly CopyView[];
  /** Null: never said that it was read. */
  readonly look: { readonly version: number; readonly at: string } | null;
  /** Since the last look, or since the latest copy when there was none; null when there is nothing to compare with. */
  readonly changes: readonly string[] | null;
}

/** For who leads: which version of their pages each person has and has read. */
export interface OwnPagesState {
  readonly personId: string;
  readonly name: string;
  readonly copies: readonly CopyView[];
  readonly readVersion: number | null;
  readonly readAt: string | null;
  /** What changed since they last said they read it. */
  readonly unread: readonly string[];
}
