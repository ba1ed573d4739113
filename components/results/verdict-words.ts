import type { Gap, ShelterResult, Verdict } from "@/lib/calc/types";
import type { Preferences } from "@/lib/domain/preferences";
import { formatHoldsTo } from "@/lib/format/speeds";

/** As LARGEST_GUST_MS of the calculation, which is too heavy to send along for one number; a test keeps them equal. */
export const BEYOND_GUST_MS = 120;

/** The first words of a gap, for a headline: "No gust yet". */
const GAP_HEADLINES: Readonly<Record<string, string>> = {
  "camp.gust": "No gust yet",
  "camp.wind": "No gust yet",
  "camp.ground": "No ground yet",
  "camp.secondGround": "No second ground yet",
  "camp.exposure": "Exposure not said",
  "camp.shelters": "No shelter yet",
  "shelter.analysis": "Working out the pull…",
  "shelter.dimensions": "This shelter can't be built",
};

export const VERDICT_TONES: Readonly<Record<Verdict, string>> = {
  holds: "text-ink",
  thin: "text-ochre",
  "gives-way": "text-rowan",
  unknown: "text-pencil",
};

export function gustWords(gustMs: number, unit: Preferences["speedUnit"]): string {
  return gustMs >= BEYOND_GUST_MS ? `more than ${formatHoldsTo(BEYOND_GUST_MS, unit)}` : formatHoldsTo(gustMs, unit);
}

/** "gives way at 62 km/h", "holds to 96 km/h", "thin: holds to 71 km/h", "No gust yet". */
export function verdictHeadline(
  result: Pick<ShelterResult, "verdict" | "holdsToGustMs" | "gaps" | "standing" | "tieOuts">,
  unit: Preferences["speedUnit"],
): string {
  const gust = result.holdsToGustMs === null ? null : gustWords(result.holdsToGustMs, unit);
  switch (result.verdict) {
    case "holds":
      return gust ? `holds to ${gust}` : "holds";
    case "thin":
      return gust ? `thin: holds to ${gust}` : "thin";
    case "gives-way":
      if (result.standing === false) return gust ? `loses its shape at ${gust}` : "loses its shape";
      return gust ? `gives way at ${gust}` : "gives way";
    case "unknown":
      return gapHeadline(result.gaps, result.tieOuts);
  }
}

function gapHeadline(gaps: readonly Gap[], tieOuts: ShelterResult["tieOuts"]): string {
  const [first] = gaps;
  if (first) return GAP_HEADLINES[first.field] ?? "Something is missing";
  const empty = tieOuts.filter((one) => one.placement === null).length;
  if (empty === tieOuts.length) return "No anchors yet";
  if (empty > 0) return empty === 1 ? "One tie-out has no anchor" : `${empty} tie-outs have no anchor`;
  return "Something is missing";
}
