import type { OwnAnswerView } from "@/lib/domain/people-views";
import { formatDayLong } from "@/lib/format/days";

/** Where one stands, in a sentence or two. */
export function describeOwnAnswer(own: OwnAnswerView): string {
  if (own.isCalledOff) return "The trip has been called off.";
  const until = own.answerBy && !own.isClosed ? ` You can change it until ${formatDayLong(own.answerBy)}.` : "";
  if (own.waitingPlace !== null) return `You are number ${own.waitingPlace} on the waiting list.${until}`;
  switch (own.answer?.value) {
    case "yes":
      return `You come along and have a place.${until}`;
    case "maybe":
      return `You may come along.${until}`;
    case "no":
      return `You do not come along.${until}`;
    default:
      break;
  }
  if (own.role !== "participant") return "You lead, so you count as coming until you say otherwise.";
  if (own.isClosed) return "The last day for an answer is over. Ask the leader if you still want to come.";
  return own.answerBy ? `Please answer until ${formatDayLong(own.answerBy)}.` : "You have not answered yet.";
}
