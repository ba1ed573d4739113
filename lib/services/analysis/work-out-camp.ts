import { createHash } from "node:crypto";
import { designAnalysisRequest, evaluatePlacements, prepareCamp, type PreparedCamp } from "@/lib/calc/camp";
import type { CampInput, CampResult } from "@/lib/calc/types";
import { toCampInput, toWindInput } from "@/lib/domain/plan/to-camp-input";
import type { PitchView } from "@/lib/domain/views";
import type { CampState, UnworkedPitch } from "../plan/load-trip-state";
import { getAnalysis } from "./get-analysis";
import { LruCache } from "./lru-cache";

export interface WorkedCamp {
  readonly pitches: readonly PitchView[];
  readonly input: CampInput;
  readonly prepared: PreparedCamp;
  readonly result: CampResult;
}

const MEMORY_ENTRIES = 60;
const store = globalThis as typeof globalThis & { leesteadCamps?: LruCache<WorkedCamp> };

async function analysePitch(state: CampState, pitch: UnworkedPitch): Promise<PitchView> {
  const { headingDeg, patch } = pitch.details;
  const request = designAnalysisRequest(
    { wind: toWindInput(state.camp.details) },
    { pitchId: pitch.id, name: pitch.name, spec: pitch.spec, headingDeg, patch, analysis: null },
  );
  return { ...pitch, analysis: "gaps" in request ? null : await getAnalysis(request) };
}

/** Every margin of a camp as it stands. Remembered by all that goes into it, so that an overview costs little. */
export async function workOutCamp(state: CampState): Promise<WorkedCamp> {
  const { camp, pitches, tray, placements, learned } = state;
  const key = createHash("sha256")
    .update(JSON.stringify([camp.details, pitches, tray, placements, learned]))
    .digest("base64");
  const memory = (store.leesteadCamps ??= new LruCache(MEMORY_ENTRIES));
  const known = memory.get(key);
  if (known) return known;
  const analysed = await Promise.all(pitches.map((pitch) => analysePitch(state, pitch)));
  const input = toCampInput(camp.details, analysed, tray, placements, learned);
  const prepared = prepareCamp(input);
  const worked = { pitches: analysed, input, prepared, result: evaluatePlacements(prepared, placements) };
  memory.set(key, worked);
  return worked;
}
