import type { z } from "zod";
import { withTransaction } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { answerInput } from "@/lib/domain/answer/schema";
import type { OwnAnswerView } from "@/lib/domain/people-views";
import type { Context } from "@/lib/services/context/context";
import { loadPersonRow } from "../people/internal";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { keepAnswer, toOwnAnswer } from "./internal";

/** Somebody on the trip says whether they come. */
export async function saveAnswer({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof answerInput>;
}): Promise<OwnAnswerView> {
  const { tripId, value, note } = parseInput(answerInput, input);
  return withTransaction(async (tx) => {
    const { personId } = await requirePermission(ctx, tripId, "answer.own", tx);
    const trip = await loadTripRow(tx, tripId);
    const person = await loadPersonRow(tx, tripId, personId);
    await keepAnswer(tx, { trip, person, value, note, userId: ctx.actor.userId });
    return toOwnAnswer(tx, trip, person);
  });
}
