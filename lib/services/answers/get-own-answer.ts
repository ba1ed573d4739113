import type { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import type { OwnAnswerView } from "@/lib/domain/people-views";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { Context } from "@/lib/services/context/context";
import { loadPersonRow } from "../people/internal";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { toOwnAnswer } from "./internal";

export async function getOwnAnswer({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<OwnAnswerView> {
  const { tripId } = parseInput(tripRefInput, input);
  const { personId } = await requirePermission(ctx, tripId, "answer.own");
  return toOwnAnswer(getDb(), await loadTripRow(getDb(), tripId), await loadPersonRow(getDb(), tripId, personId));
}
