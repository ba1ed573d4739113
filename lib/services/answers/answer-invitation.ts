import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { invitationAnswerInput } from "@/lib/domain/answer/schema";
import type { OwnAnswerView } from "@/lib/domain/people-views";
import { loadOpenInvitation } from "../invitations/internal";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { keepAnswer, toOwnAnswer } from "./internal";

/** Whoever holds the link of an invitation says whether they come; they need no account, and the link stays good. */
export async function answerInvitation({
  input,
}: {
  input: z.input<typeof invitationAnswerInput>;
}): Promise<OwnAnswerView> {
  const { token, value, note } = parseInput(invitationAnswerInput, input);
  return withTransaction(async (tx) => {
    const { person } = await loadOpenInvitation(tx, token);
    const trip = await loadTripRow(tx, person.tripId);
    await keepAnswer(tx, { trip, person, value, note, userId: null });
    return toOwnAnswer(tx, trip, person);
  });
}
