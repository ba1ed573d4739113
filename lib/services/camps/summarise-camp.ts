import { groundRow } from "@/lib/calc/ground";
import type { CampResult, Gap } from "@/lib/calc/types";
import type { CampSummary } from "@/lib/domain/views";
import { plural } from "@/lib/format/words";
import type { WorkedCamp } from "../analysis/work-out-camp";
import type { CampState } from "../plan/load-trip-state";

/** Each missing input once, the camp's own first; tie-outs without an anchor are counted instead of listed. */
function listGaps(state: CampState, result: CampResult): Gap[] {
  const tieOuts = result.shelters.flatMap((shelter) => shelter.tieOuts);
  const all = [
    ...result.gaps,
    ...result.shelters.flatMap((shelter) => shelter.gaps),
    ...tieOuts.filter((one) => one.placement !== null).flatMap((one) => one.gaps),
  ];
  const gaps = all.filter((gap, index) => all.findIndex((other) => other.field === gap.field) === index);
  const hasGround = state.camp.details.ground !== null || gaps.some((gap) => gap.field === "camp.ground");
  if (!hasGround) gaps.push({ field: "camp.ground", message: "Choose the ground of the camp." });
  const isNamed = gaps.some((gap) => gap.field === "camp.shelters");
  if (state.pitches.length === 0 && !isNamed)
    gaps.push({ field: "camp.shelters", message: "Pitch a shelter at this camp." });
  const bare = tieOuts.filter((one) => one.placement === null).length;
  if (bare > 0) {
    gaps.push({ field: "plan.anchors", message: `${plural(bare, "tie-out has", "tie-outs have")} no anchor.` });
  }
  return gaps;
}

function nameWeakest(result: CampResult): string | null {
  const shelter = result.shelters.find((one) => one.pitchId === result.weakest?.pitchId);
  const tieOut = shelter?.tieOuts.find((one) => one.tieOutId === result.weakest?.tieOutId);
  if (!shelter || !tieOut || tieOut.margin === null) return null;
  return `${shelter.name}, tie-out ${tieOut.number}: ${tieOut.name.charAt(0).toLowerCase()}${tieOut.name.slice(1)}`;
}

export function summariseCamp(state: CampState, { result }: WorkedCamp): CampSummary {
  const { camp, pitches } = state;
  return {
    id: camp.id,
    name: camp.details.name,
    days: camp.days,
    position: camp.position,
    verdict: pitches.length === 0 ? "unknown" : result.verdict,
    designGustMs: result.designGustMs,
    holdsToGustMs: result.holdsToGustMs,
    gaps: listGaps(state, result),
    weakest: nameWeakest(result),
    altitudeM: camp.details.altitudeM,
    groundName: camp.details.ground && groundRow(camp.details.ground.kind).name,
  };
}
