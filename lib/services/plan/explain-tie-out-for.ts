import { z } from "zod";
import { getDb } from "@/db/client";
import type { TieOutResult } from "@/lib/calc/types";
import { explainTieOut, type TieOutExplanation } from "@/lib/calc/workings";
import { campRefInput } from "@/lib/domain/camp/schema";
import { idSchema } from "@/lib/domain/ids";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { workOutCamp } from "../analysis/work-out-camp";
import { parseInput } from "../trips/parse-input";
import { findCampState, loadTripState } from "./load-trip-state";

const explainTieOutInput = campRefInput.extend({
  pitchId: idSchema,
  tieOutId: z.string().regex(/^[0-9a-z-]{1,40}$/, "Unknown tie-out."),
});

export interface TieOutExplanationView {
  readonly campName: string;
  readonly pitchName: string;
  readonly result: TieOutResult;
  readonly explanation: TieOutExplanation;
}

/** How the margin of one tie-out comes about, step by step. */
export async function explainTieOutFor({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof explainTieOutInput>;
}): Promise<TieOutExplanationView> {
  const { tripId, campId, pitchId, tieOutId } = parseInput(explainTieOutInput, input);
  await requirePermission(ctx, tripId, "plan.read");
  const own = findCampState(await loadTripState(getDb(), tripId), campId);
  const worked = await workOutCamp(own);
  const shelter = worked.result.shelters.find((one) => one.pitchId === pitchId);
  const result = shelter?.tieOuts.find((one) => one.tieOutId === tieOutId);
  if (!shelter || !result) throw new AppError("not-found", "There is no such tie-out at this camp.");
  return {
    campName: own.camp.details.name,
    pitchName: shelter.name,
    result,
    explanation: explainTieOut(worked.input, pitchId, tieOutId),
  };
}
