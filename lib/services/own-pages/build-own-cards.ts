import { buildShelter } from "@/lib/calc/shelter-kinds";
import type { ShelterResult, TieOut } from "@/lib/calc/types";
import type { OwnCard, OwnStep } from "@/lib/domain/own-pages/views";
import { orderForPitching } from "@/lib/domain/own-pages/pitch-order";
import type { Preferences } from "@/lib/domain/preferences";
import type { PackListView, PaperCamp, PitchView } from "@/lib/domain/views";
import { formatLean } from "@/lib/format/angles";
import { formatLength } from "@/lib/format/lengths";
import {
  facingWords,
  groundName,
  groundRemarks,
  holdsToWords,
  patchOf,
  riggingRemarks,
  windWords,
} from "@/lib/pdf/words";
import { toPaperCamp, type PaperDesk } from "../papers/paper-camp";

const DRIVEN: ReadonlySet<string> = new Set(["stake", "screw-in"]);
/** Shorter than this, a tie-out is pegged down by its own loop. */
const HEM_LOOP_M = 0.15;

function toStep(
  { tray, placements }: PaperCamp,
  shelter: ShelterResult | undefined,
  pitchId: string,
  tieOut: TieOut,
  lengthUnit: Preferences["lengthUnit"],
): OwnStep {
  const placement = placements.find((one) => one.pitchId === pitchId && one.tieOutId === tieOut.id);
  const anchor = tray.find((one) => one.id === placement?.anchorId);
  const result = shelter?.tieOuts.find((one) => one.tieOutId === tieOut.id);
  const isLoop = tieOut.lineLengthM < HEM_LOOP_M;
  return {
    tieOutId: tieOut.id,
    number: tieOut.number,
    where: result?.name ?? tieOut.name,
    anchor: anchor ? { name: anchor.name, spec: anchor.spec } : null,
    lean: placement && anchor && DRIVEN.has(anchor.spec.class) ? formatLean(placement.leanDeg) : "",
    line: isLoop
      ? "by its own loop"
      : `line ${formatLength(tieOut.lineLengthM, lengthUnit)}, ${Math.round(tieOut.lineAngleDeg)}° up`,
    knot: placement && anchor ? placement.knot : null,
    remarks: placement && anchor ? riggingRemarks(placement, tray, lengthUnit) : [],
    verdict: result?.verdict ?? "unknown",
  };
}

/** One shelter as a card to pitch by. */
export function toOwnCard(
  paper: PaperCamp,
  pitch: PitchView,
  preferences: Pick<Preferences, "speedUnit" | "lengthUnit">,
): OwnCard {
  const { camp, result } = paper;
  const { details } = camp;
  const shelter = result.shelters.find((one) => one.pitchId === pitch.id);
  const patch = patchOf(details, pitch.details.patch);
  const holdsTo = holdsToWords(
    shelter ?? { holdsToGustMs: null, gaps: [], verdict: "unknown" },
    result.designGustMs,
    preferences.speedUnit,
  );
  const wind = { fromDeg: details.windFromDeg, toDeg: details.windToDeg };
  const ground = patch
    ? [groundName(patch)?.toLowerCase() ?? "", groundRemarks(patch, details.slopeDeg)].filter(Boolean).join(", ")
    : "not known yet";
  return {
    campId: camp.id,
    campName: details.name,
    days: camp.days,
    pitchId: pitch.id,
    shelterName: pitch.name,
    spec: pitch.spec,
    headingDeg: pitch.details.headingDeg,
    wind,
    facing: facingWords(pitch),
    windWords: windWords(details),
    ground: pitch.details.patch === "second" ? `second patch: ${ground}` : ground,
    verdict: shelter?.verdict ?? "unknown",
    holdsTo: holdsTo.value,
    holdsToRemark: holdsTo.remark,
    sleeperNames: paper.sleeperNames[pitch.id] ?? [],
    steps: orderForPitching(buildShelter(pitch.spec).tieOuts, pitch.details.headingDeg, wind).map((tieOut) =>
      toStep(paper, shelter, pitch.id, tieOut, preferences.lengthUnit),
    ),
    fallbacks: paper.fallbacks[pitch.id] ?? [],
    retension: result.retension,
  };
}

/** The shelters that somebody sleeps in, camp by camp, as cards to pitch by. */
export async function buildOwnCards(
  desk: PaperDesk & { readonly lengthUnit: Preferences["lengthUnit"] },
  list: PackListView,
): Promise<OwnCard[]> {
  const own = new Set(list.nights.flatMap((night) => night.pitchId ?? []));
  const cards: OwnCard[] = [];
  for (const camp of desk.state.camps) {
    const pitchId = camp.pitches.find((pitch) => own.has(pitch.id))?.id;
    if (pitchId === undefined) continue;
    const paper = await toPaperCamp(desk, camp, pitchId);
    cards.push(...paper.pitches.map((pitch) => toOwnCard(paper, pitch, desk)));
  }
  return cards;
}
