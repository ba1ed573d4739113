/** What the services hand to the screens about answers, own details, the emergency plan and messages. */
import type { AnswerValue } from "./answer/schema";
import type { Role } from "./permissions/permissions";

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
