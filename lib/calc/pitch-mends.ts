import { analyseShelter } from "./analyse-shelter";
import {
  measurePitchChange,
  openCase,
  rankMends,
  type MendCase,
  type MendDraft,
  type TieOutSpot,
} from "./mend-measure";
import { designAnalysisRequest, prepareCamp, type AnalysisRequest } from "./prepare-camp";
import { checkShelterSpec, shelterKind } from "./shelter-kinds";
import type { CampInput, Mend, PitchedShelter, ShelterAnalysis } from "./types";
import { compassPoint } from "./describe-tie-out";
import { inSentence } from "./wording";

/** Lengths that are tried, as multiples of the line there now. */
const LINE_STRETCHES: readonly number[] = [1.5, 2.5];
/** Nobody pitches with lines longer than this, m (judgement). */
const LONGEST_LINE_M = 8;
/** A loop at the hem is pegged, not lined out; there is nothing to lengthen. */
const SHORTEST_LINE_M = 0.2;
/** Shares of a height that are tried. */
const LOWER_SHARES: readonly number[] = [0.8];
/** Turns that are tried, degrees clockwise. */
const TURNS_DEG: readonly number[] = [-45, 45, 90, 180];

const roundTo = (value: number, step: number): number => Number((Math.round(value / step) * step).toFixed(3));

/**
 * What would mend a tie-out by pitching the shelter otherwise: a longer line, a lower pitch, another heading. Each is
 * analysed anew (a tenth to half a second apiece), so this belongs into a worker. A change is offered only when this
 * tie-out gains and the weakest tie-out of the shelter does not lose. Empty when its pull is not known.
 *
 * `pitchChange` holds only what changes and is to be laid over the pitch; `placements` are stakes leaned anew.
 */
export function pitchMends(
  camp: CampInput,
  spot: TieOutSpot,
  analyse: (request: AnalysisRequest) => ShelterAnalysis = analyseShelter,
): Mend[] {
  const one = openCase(prepareCamp(camp), spot);
  if (!one?.present) return [];
  const measure = (pitch: PitchedShelter, draft: (after: ShelterAnalysis) => MendDraft): Mend | null => {
    if (checkShelterSpec(pitch.spec).length > 0) return null;
    const request = designAnalysisRequest(camp, pitch);
    if ("gaps" in request) return null;
    const analysis = analyse(request);
    return measurePitchChange(one, { ...pitch, analysis }, draft(analysis));
  };
  return rankMends([
    ...firstEnough(lineTrials(one).map((trial) => () => measure(trial.pitch, trial.draft))),
    ...firstEnough(heightTrials(one).map((trial) => () => measure(trial.pitch, trial.draft))),
    ...best(turnTrials(one).map((trial) => measure(trial.pitch, trial.draft))),
  ]);
}

interface Trial {
  readonly pitch: PitchedShelter;
  readonly draft: (after: ShelterAnalysis) => MendDraft;
}

/** Tries from the smallest change on and stops at the first that is enough; else the best. */
function firstEnough(trials: readonly (() => Mend | null)[]): Mend[] {
  const tried: (Mend | null)[] = [];
  for (const trial of trials) {
    const mend = trial();
    if (mend && mend.margin >= 1) return [mend];
    tried.push(mend);
  }
  return best(tried);
}

function best(mends: readonly (Mend | null)[]): Mend[] {
  let found: Mend | null = null;
  for (const mend of mends) if (mend && (!found || mend.margin > found.margin)) found = mend;
  return found ? [found] : [];
}

function lineTrials(one: MendCase): Trial[] {
  const { pitch } = one.shelter;
  const { id, lineLengthM } = one.tieOut.tieOut;
  if (lineLengthM < SHORTEST_LINE_M) return [];
  return LINE_STRETCHES.map((stretch) => roundTo(lineLengthM * stretch, 0.1))
    .filter((lengthM) => lengthM <= LONGEST_LINE_M)
    .map((lengthM) => ({
      pitch: { ...pitch, spec: { ...pitch.spec, lineLengthsM: { ...pitch.spec.lineLengthsM, [id]: lengthM } } },
      draft: (after) => {
        const angleDeg = after.design.tieOuts.find((demand) => demand.tieOutId === id)?.lineAngleDeg ?? 0;
        const was = Math.round(one.tieOut.lineAngleDeg ?? 0);
        return {
          kind: "longer-line",
          title: `Lengthen the line to ${lengthM.toFixed(1)}\u2009m`,
          detail: `line falls from ${was}° to ${Math.round(angleDeg)}°`,
          placements: [],
          pitchChange: { lineLengthsM: { [id]: lengthM } },
        };
      },
    }));
}

function heightTrials(one: MendCase): Trial[] {
  const { pitch } = one.shelter;
  // The tallest of the heights that are chosen at each pitch.
  const [tallest] = shelterKind(pitch.spec.kind)
    .dimensions.filter((row) => row.pitched && row.key.toLowerCase().endsWith("heightm"))
    .map((row) => ({ ...row, heightM: pitch.spec.dimensions[row.key] ?? row.typicalM }))
    .sort((a, b) => b.heightM - a.heightM);
  if (!tallest) return [];
  return LOWER_SHARES.map((share) => roundTo(Math.max(tallest.minM, tallest.heightM * share), 0.05))
    .filter((heightM) => heightM < tallest.heightM && heightM >= tallest.minM)
    .map((heightM) => ({
      pitch: { ...pitch, spec: { ...pitch.spec, dimensions: { ...pitch.spec.dimensions, [tallest.key]: heightM } } },
      draft: () => ({
        kind: "lower-pitch",
        title: `Pitch it lower: ${heightM.toFixed(2)}\u2009m`,
        detail: `${inSentence(tallest.label)}, now ${tallest.heightM.toFixed(2)}\u2009m`,
        placements: [],
        pitchChange: { dimensions: { [tallest.key]: heightM } },
      }),
    }));
}

function turnTrials(one: MendCase): Trial[] {
  const { pitch } = one.shelter;
  const { fromDeg, toDeg } = one.prepared.input.wind;
  // With wind from anywhere a turned shelter stands as before.
  if (fromDeg === null || toDeg === null) return [];
  return TURNS_DEG.map((turnDeg) => {
    const headingDeg = (Math.round(pitch.headingDeg + turnDeg) + 360) % 360;
    return {
      pitch: { ...pitch, headingDeg },
      draft: () => ({
        kind: "turn-shelter",
        title: `Turn its front to ${compassPoint(headingDeg)}`,
        detail: `${headingDeg}°, now ${Math.round(pitch.headingDeg)}°`,
        placements: [],
        pitchChange: { headingDeg },
      }),
    };
  });
}
