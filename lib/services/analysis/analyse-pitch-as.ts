import type { z } from "zod";
import { getDb } from "@/db/client";
import { designAnalysisRequest } from "@/lib/calc/camp";
import type { Gap, ShelterAnalysis } from "@/lib/calc/types";
import { idSchema } from "@/lib/domain/ids";
import { toWindInput } from "@/lib/domain/plan/to-camp-input";
import { analysePitchBody } from "@/lib/domain/shelter/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow, toCampDetails } from "../camps/internal";
import { loadPitchRow, toPitchSpec } from "../pitches/internal";
import { loadShelterRow, requireBuildable } from "../shelters/internal";
import { parseInput } from "../trips/parse-input";
import { getAnalysis } from "./get-analysis";

const analysePitchInput = analysePitchBody.extend({ tripId: idSchema, campId: idSchema });

/** The pull in the lines of a pitch as somebody would like it, in the camp's wind; null with the gaps that prevent it. */
export async function analysePitchAs({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof analysePitchInput>;
}): Promise<{ analysis: ShelterAnalysis | null; gaps: readonly Gap[] }> {
  const { tripId, campId, pitchId, details } = parseInput(analysePitchInput, input);
  await requirePermission(ctx, tripId, "plan.read");
  const db = getDb();
  const camp = toCampDetails(await loadCampRow(db, tripId, campId));
  const pitch = await loadPitchRow(db, { tripId, campId, pitchId });
  const shelter = await loadShelterRow(db, tripId, pitch.shelterId);
  const spec = toPitchSpec(shelter.spec, details);
  requireBuildable(spec, (field) => `details.${field}`);
  const { headingDeg, patch } = details;
  const request = designAnalysisRequest(
    { wind: toWindInput(camp) },
    { pitchId, name: shelter.name, spec, headingDeg, patch, analysis: null },
  );
  if ("gaps" in request) return { analysis: null, gaps: request.gaps };
  return { analysis: await getAnalysis(request, { isKept: false }), gaps: [] };
}
