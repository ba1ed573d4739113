/** What the services hand to screens and paper: only what they need to show, dates as text, SI units. */
import type { CampResult, Gap, Placement, ShelterAnalysis, ShelterSpec, TrayAnchor, Verdict } from "@/lib/calc/types";
import type { CampDetails } from "./camp/schema";
import type { NightForecast } from "./forecast/schema";
import type { GearDetails } from "./gear/schema";
import type { KitItemDetails } from "./kit/schema";
import type { AnswerView, ContactSheetView } from "./people-views";
import type { OwnPages } from "./own-pages/own-pages";
import type { OwnCard } from "./own-pages/views";
import type { PaperFold } from "./paper/schema";
import type { Role } from "./permissions/permissions";
import type { MessageState } from "./post/schema";
import type { LearnedGrounds } from "./pull-test/learned-grounds";
import type { PitchDetails, ShelterDetails } from "./shelter/schema";
import type { Contact } from "./trip/schema";

export interface TripView {
  readonly id: string;
  readonly name: string;
  /** yyyy-mm-dd of the first night; the last day is the morning after the last night. */
  readonly startDate: string;
  readonly endDate: string;
  readonly timeZone: string;
  readonly notes: string;
  readonly contacts: readonly Contact[];
  readonly version: number;
  readonly paperVersion: number;
  readonly role: Role;
}

export interface TripListItem {
  readonly id: string;
  readonly name: string;
  readonly startDate: string;
  readonly endDate: string;
  readonly nights: number;
  readonly campCount: number;
  readonly peopleCount: number;
  readonly role: Role;
}

export interface CampView {
  readonly id: string;
  readonly position: number;
  /** Calendar days of its nights, yyyy-mm-dd. */
  readonly days: readonly string[];
  /** The camp in whose place it stands by in bad weather, with that camp's days; null: it is in the line of nights. */
  readonly alternativeTo: { readonly id: string; readonly name: string } | null;
  readonly details: CampDetails;
  readonly version: number;
}

export interface PersonView {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  readonly version: number;
  /** "joined" has an account here; "invited" has an open link; "expired" needs a new one; "none" was never invited. */
  readonly state: "joined" | "invited" | "expired" | "none";
  readonly isSelf: boolean;
  /** Null while they have not answered. */
  readonly answer: AnswerView | null;
}

export interface ShelterView {
  readonly id: string;
  readonly position: number;
  readonly details: ShelterDetails;
  readonly version: number;
  /** Camps where it is pitched. */
  readonly campNames: readonly string[];
}

export interface KitItemView {
  readonly id: string;
  readonly position: number;
  readonly details: KitItemDetails;
  readonly version: number;
  /** Most pieces of it that any one camp's plan uses. */
  readonly mostUsed: number;
  readonly campNames: readonly string[];
}

export interface PitchView {
  readonly id: string;
  readonly shelterId: string;
  readonly name: string;
  readonly sleeps: number;
  readonly position: number;
  readonly details: PitchDetails;
  readonly version: number;
  /** The shelter's spec with this pitch's dimensions and line lengths laid over it. */
  readonly spec: ShelterSpec;
  /** Null while a gap (no wind, no exposure …) keeps it from being worked out. */
  readonly analysis: ShelterAnalysis | null;
  readonly sleeperIds: readonly string[];
}

/** Who sleeps where at a camp. Everybody on the trip is in exactly one list. */
export interface SleepingPlanView {
  readonly campId: string;
  readonly campName: string;
  readonly days: readonly string[];
  readonly people: readonly { readonly id: string; readonly name: string }[];
  readonly pitches: readonly {
    readonly id: string;
    readonly name: string;
    /** How many it sleeps. */
    readonly sleeps: number;
    readonly sleeperIds: readonly string[];
    /** For the drawing: shelter, its spec at this pitch and its heading. */
    readonly spec: ShelterSpec;
    readonly headingDeg: number;
  }[];
  /** Sleep outside any shelter, and said so. */
  readonly outsideIds: readonly string[];
  /** Placed nowhere yet. */
  readonly unplacedIds: readonly string[];
}

export interface GearView {
  readonly id: string;
  readonly details: GearDetails;
  readonly version: number;
}

/** One change of a staking plan, newest first. */
export interface PlanHistoryEntry {
  readonly intentId: string;
  readonly planVersion: number;
  readonly byName: string;
  readonly at: string;
  readonly sentence: string;
}

/** Lines of a pack list as the leader edits them. */
export interface PackItemView {
  readonly id: string;
  readonly personId: string | null;
  readonly name: string;
  readonly isGroupThing: boolean;
  readonly massKg: number | null;
}

/** A camp as the plan sees it, for the line of nights and the overview. */
export interface CampSummary {
  readonly id: string;
  readonly name: string;
  readonly days: readonly string[];
  readonly position: number;
  readonly verdict: Verdict;
  readonly designGustMs: number | null;
  readonly holdsToGustMs: number | null;
  readonly gaps: readonly Gap[];
  /** "Ridge tarp, tie-out 3: windward hem, south"; null when nothing is weak or known. */
  readonly weakest: string | null;
  readonly altitudeM: number | null;
  readonly groundName: string | null;
}

/** A camp kept beside the line of nights, for bad weather. */
export interface AlternativeSummary extends CampSummary {
  readonly alternativeTo: { readonly id: string; readonly name: string };
  readonly pitches: readonly { readonly id: string; readonly name: string }[];
}

export interface TodoItem {
  readonly tone: "gives-way" | "thin" | "unknown" | "people";
  readonly title: string;
  readonly action: string;
  readonly href: string;
}

export interface TripOverview {
  readonly trip: TripView;
  readonly peopleCount: number;
  readonly camps: readonly CampSummary[];
  /** "One night gives way, one has no wind yet". */
  readonly headline: string;
  readonly subline: string;
  readonly todo: readonly TodoItem[];
  readonly kit: { readonly massKg: number; readonly anchorCount: number };
  /** People whose latest sent papers have which version. */
  readonly papers: {
    readonly version: number;
    readonly current: number;
    readonly outdated: number;
    readonly never: number;
  };
}

/** Everything the staking plan of a camp needs, on the server, in the browser and on paper. */
export interface CampPlanView {
  readonly trip: TripView;
  readonly camp: CampView;
  readonly camps: readonly CampSummary[];
  readonly pitches: readonly PitchView[];
  readonly tray: readonly TrayAnchor[];
  readonly shockCordCount: number;
  readonly placements: readonly Placement[];
  /** What pull tests say of the camp's ground. */
  readonly learned: LearnedGrounds;
  readonly planVersion: number;
  readonly savedAt: string | null;
  readonly savedByName: string | null;
  readonly people: readonly { readonly id: string; readonly name: string }[];
}

/** Answer to a batch of plan intents. */
export interface PlanSaveResult {
  readonly planVersion: number;
  readonly placements: readonly Placement[];
  readonly savedAt: string;
  readonly savedByName: string;
  /** Per intent, in order. */
  readonly outcomes: readonly (
    | { readonly intentId: string; readonly outcome: "applied" | "repeated" }
    | { readonly intentId: string; readonly outcome: "refused"; readonly reason: string }
    /** Somebody else saved since `baseVersion`; nothing of this intent was applied. */
    | {
        readonly intentId: string;
        readonly outcome: "conflict";
        readonly by: string;
        readonly at: string;
        readonly changes: readonly string[];
      }
  )[];
}

export interface PackLine {
  /** Key for ticking: "item:<id>", "shelter:<id>", "kit:<id>". */
  readonly key: string;
  readonly name: string;
  readonly detail: string;
  readonly massKg: number | null;
  readonly isTicked: boolean;
}

export interface PackListView {
  readonly person: { readonly id: string; readonly name: string };
  readonly own: readonly PackLine[];
  readonly group: readonly PackLine[];
  readonly groupMassKg: number;
  readonly nights: readonly {
    readonly campId: string;
    readonly campName: string;
    readonly day: string;
    /** Null: not placed yet; "outside" said so. */
    readonly shelterName: string | null;
    readonly pitchId: string | null;
    readonly withNames: readonly string[];
  }[];
}

export interface MessageView {
  readonly id: string;
  readonly toName: string;
  readonly toAddress: string;
  readonly subject: string;
  readonly state: MessageState;
  readonly attempts: number;
  readonly lastError: string | null;
  readonly createdAt: string;
  readonly sentAt: string | null;
  readonly nextAttemptAt: string | null;
  readonly files: readonly string[];
  /** When the recipient said themselves that they have read it. */
  readonly readAt: string | null;
  /** To the sender alone, to look at. */
  readonly isTest: boolean;
}

// ---------------------------------------------------------------- paper

export interface PaperHeader {
  readonly tripName: string;
  readonly version: number;
  /** Already formatted in the trip's time zone: "9 June 18:20". */
  readonly printedAt: string;
  /** Address of the live page, absolute. */
  readonly address: string;
}

export interface PaperForecast {
  readonly source: string;
  readonly isSample: boolean;
  /** Already formatted in the trip's time zone. */
  readonly fetchedAt: string;
  readonly nights: readonly NightForecast[];
}

/** A camp for printing: what the plan says, already worked out. */
export interface PaperCamp {
  readonly camp: CampView;
  readonly nightNumbers: string;
  readonly pitches: readonly PitchView[];
  readonly tray: readonly TrayAnchor[];
  readonly placements: readonly Placement[];
  readonly result: CampResult;
  /** Sleeper names by pitch id. */
  readonly sleeperNames: Readonly<Record<string, readonly string[]>>;
  /** What was accepted of a forecast, while the camp is still planned for it. */
  readonly forecast: PaperForecast | null;
  /** What to do first when ground is softer or wind stronger, per pitch id, in order. */
  readonly fallbacks: Readonly<Record<string, readonly string[]>>;
  /** The day's way to it, in sentences; empty when it is not known. */
  readonly way: readonly string[];
}

export type PaperDocument =
  | {
      readonly kind: "field-card";
      readonly header: PaperHeader;
      readonly contacts: readonly Contact[];
      readonly camp: PaperCamp;
    }
  | {
      readonly kind: "pitch-card";
      readonly header: PaperHeader;
      readonly contacts: readonly Contact[];
      readonly camp: PaperCamp;
      readonly pitchIds: readonly string[];
    }
  | { readonly kind: "contact-sheet"; readonly header: PaperHeader; readonly sheet: ContactSheetView }
  | { readonly kind: "pack-list"; readonly header: PaperHeader; readonly list: PackListView }
  | {
      readonly kind: "pitch-and-pack";
      readonly header: PaperHeader;
      readonly contacts: readonly Contact[];
      readonly fold: PaperFold;
      readonly list: PackListView;
      readonly cards: readonly OwnCard[];
      /** What stands on it, to tell later whether it is old. */
      readonly content: OwnPages;
    }
  | {
      readonly kind: "booklet";
      readonly header: PaperHeader;
      readonly trip: TripView;
      readonly contacts: readonly Contact[];
      readonly camps: readonly PaperCamp[];
      readonly packLists: readonly PackListView[];
    };
