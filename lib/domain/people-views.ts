/** What the services hand to the screens about answers, own details, the emergency plan and messages. */
import type { AnswerValue } from "./answer/schema";
import type { PersonalDetails } from "./details/schema";
import type { OverdueStep } from "./emergency/schema";
import type { Role } from "./permissions/permissions";
import type { PlannedSendState } from "./post/schema";
import type { Contact } from "./trip/schema";

export interface AnswerView {
  readonly value: AnswerValue;
  readonly note: string;
  readonly isWaiting: boolean;
  readonly answeredAt: string;
}

export interface RosterView {
  readonly capacity: number | null;
  readonly answerBy: string | null;
  readonly remindDaysBefore: number | null;
  readonly keepDetailsDays: number;
  readonly version: number;
  readonly counts: {
    /** With a place, leaders included. */
    readonly coming: number;
    readonly waiting: number;
    readonly maybe: number;
    readonly no: number;
    /** Have not answered. */
    readonly open: number;
  };
}

export interface OwnAnswerView {
  readonly role: Role;
  readonly answer: AnswerView | null;
  readonly answerBy: string | null;
  /** The last day for an answer is over, or the trip is. */
  readonly isClosed: boolean;
  readonly isCalledOff: boolean;
  /** No free place: a yes goes on the waiting list. */
  readonly isFull: boolean;
  /** Their place on the waiting list, from 1. */
  readonly waitingPlace: number | null;
}

export interface OwnDetailsView {
  readonly details: PersonalDetails;
  readonly version: number;
  /** What one agrees to by saving now. */
  readonly consentText: string;
  /** What one has agreed to, and when. */
  readonly consent: { readonly text: string; readonly at: string } | null;
}

export interface ContactSheetView {
  readonly people: readonly {
    readonly id: string;
    readonly name: string;
    readonly role: Role;
    readonly email: string;
    /** Null: has written nothing; "unreadable": the key is not there. */
    readonly details: PersonalDetails | null | "unreadable";
  }[];
  readonly contacts: readonly Contact[];
  readonly meetingPoints: string;
  readonly wayOut: string;
  readonly groupPhone: string;
}

export interface EmergencyPlanView {
  readonly meetingPoints: string;
  readonly wayOut: string;
  readonly groupPhone: string;
  /** In the trip's time zone; empty while not set. */
  readonly dueBackDay: string;
  readonly dueBackTime: string;
  readonly outsideName: string;
  readonly outsideEmail: string;
  readonly outsidePhone: string;
  readonly steps: readonly (OverdueStep & { readonly at: string | null })[];
  readonly version: number;
  readonly sentVersion: number | null;
  readonly sentAt: string | null;
  readonly backAt: string | null;
  /** What has to be there before it can be sent. */
  readonly missing: readonly string[];
}

export interface PlannedSendView {
  readonly id: string;
  readonly subject: string;
  readonly names: readonly string[];
  readonly sendAt: string;
  readonly state: PlannedSendState;
  readonly reason: string | null;
}

export interface OwnMessageView {
  readonly id: string;
  readonly subject: string;
  readonly text: string;
  readonly sentAt: string;
  /** When they said themselves that they have read it. */
  readonly readAt: string | null;
  readonly files: readonly string[];
}

/** Whose sent pages are old. */
export interface ConcernedView {
  readonly people: readonly {
    readonly personId: string;
    readonly name: string;
    /** That they were sent. */
    readonly version: number;
    readonly changes: readonly string[];
  }[];
  /** "Skarn Edge": 4 people. */
  readonly subjects: readonly { readonly subject: string; readonly count: number }[];
}
