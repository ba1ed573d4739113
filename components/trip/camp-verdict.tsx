import { StateMark, STATE_TONES } from "@/components/drawing/state-mark";
import type { Preferences } from "@/lib/domain/preferences";
import type { CampSummary } from "@/lib/domain/views";
import { formatHoldsTo } from "@/lib/format/speeds";

type SpeedUnit = Preferences["speedUnit"];

/** "thin: holds to 71 km/h", "gives way at 62 km/h", "no gust yet". */
function describeVerdict(camp: CampSummary, unit: SpeedUnit): string {
  const holdsTo = camp.holdsToGustMs === null ? null : formatHoldsTo(camp.holdsToGustMs, unit);
  switch (camp.verdict) {
    case "holds":
      return holdsTo ? `holds to ${holdsTo}` : "holds";
    case "thin":
      return holdsTo ? `thin: holds to ${holdsTo}` : "thin";
    case "gives-way":
      return holdsTo ? `gives way at ${holdsTo}` : "gives way";
    case "unknown":
      return describeUnknown(camp);
  }
}

const MISSING: readonly (readonly [field: string, words: string])[] = [
  ["camp.gust", "no wind yet"],
  ["camp.ground", "no ground yet"],
  ["camp.exposure", "exposure not said yet"],
  ["camp.secondGround", "no second ground yet"],
  ["camp.shelters", "no shelter yet"],
  ["plan.anchors", "tie-outs without an anchor"],
];

function describeUnknown(camp: CampSummary): string {
  const found = MISSING.find(([field]) => camp.gaps.some((gap) => gap.field === field));
  return found?.[1] ?? (camp.gaps.length > 0 ? "something is missing" : "not planned yet");
}

export function CampVerdict({ camp, unit }: { readonly camp: CampSummary; readonly unit: SpeedUnit }) {
  return (
    <span className={`inline-flex items-baseline gap-2 ${STATE_TONES[camp.verdict]}`}>
      <StateMark verdict={camp.verdict} isDecorative className="translate-y-[3px]" />
      <span className={camp.verdict === "gives-way" ? "font-bold" : ""}>{describeVerdict(camp, unit)}</span>
    </span>
  );
}
