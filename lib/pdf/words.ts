import { KNOTS } from "@/lib/calc/tables/lines";
import { GROUNDS } from "@/lib/calc/tables/grounds";
import type { CampResult, KnotId, Placement, ShelterResult, TieOutResult, TrayAnchor, Verdict } from "@/lib/calc/types";
import type { CampDetails, GroundPatch } from "@/lib/domain/camp/schema";
import { HAZARDS } from "@/lib/domain/camp/schema";
import { STATE_MARKS } from "@/lib/domain/drawing/state-marks";
import type { Preferences } from "@/lib/domain/preferences";
import type { NightForecast } from "@/lib/domain/forecast/schema";
import type { CampView, PaperForecast, PitchView } from "@/lib/domain/views";
import { formatCompass, formatWindRange } from "@/lib/format/angles";
import { formatDay } from "@/lib/format/days";
import { formatAltitude, formatLength, formatMillimetres } from "@/lib/format/lengths";
import { withUnit } from "@/lib/format/numbers";
import { formatRain, formatTemperature } from "@/lib/format/weather";
import { formatBeaufort, formatHoldsTo, formatSpeed } from "@/lib/format/speeds";

/** How the camps, shelters and tie-outs of a plan are put into words on paper. */

const WETNESS_WORDS = { dry: "dry", usual: "as usual", wet: "wet", saturated: "soaked" } as const;

export function groundName(patch: GroundPatch | null): string | null {
  return patch && (GROUNDS.find((row) => row.kind === patch.kind)?.name ?? patch.kind);
}

/** "wet, 40 mm loose on top, stones at 200 mm, slope 5°". */
export function groundRemarks(patch: GroundPatch, slopeDeg: number): string {
  const parts = [patch.wetness === "usual" ? "" : WETNESS_WORDS[patch.wetness]];
  if (patch.looseTopM) parts.push(`${formatMillimetres(patch.looseTopM)} loose on top`);
  if (patch.stoneDepthM !== null) parts.push(`stones at ${formatMillimetres(patch.stoneDepthM)}`);
  if (slopeDeg > 0) parts.push(`slope ${Math.round(slopeDeg)}°`);
  return parts.filter(Boolean).join(", ");
}

export function patchOf(camp: CampDetails, patch: "main" | "second"): GroundPatch | null {
  return patch === "second" ? camp.secondGround : camp.ground;
}

export function windWords(camp: CampDetails): string {
  return `wind ${formatWindRange(camp.windFromDeg, camp.windToDeg)}`;
}

const HAS_RIDGE: ReadonlySet<string> = new Set(["ridge-tarp", "ridge-tent", "tunnel"]);

/** "ridge N–S" where a ridge runs through, else "front to NW". */
export function facingWords(pitch: PitchView): string {
  const heading = pitch.details.headingDeg;
  if (!HAS_RIDGE.has(pitch.spec.kind)) return `front to ${formatCompass(heading)}`;
  const ends = [heading, heading + 180]
    .map((bearing) => ((bearing % 360) + 360) % 360)
    .sort((a, b) => fromNorth(a) - fromNorth(b));
  const word = pitch.spec.kind === "tunnel" ? "tunnel" : "ridge";
  return `${word} ${ends.map(formatCompass).join("–")}`;
}

const fromNorth = (bearing: number) => Math.min(bearing, 360 - bearing);

export function nightWords(nightNumbers: string, camp: CampView): string {
  const night = /^night/i.test(nightNumbers) ? nightNumbers : `night ${nightNumbers}`;
  return camp.alternativeTo
    ? `${datedNight(night, camp)} · in place of ${camp.alternativeTo.name}`
    : datedNight(night, camp);
}

function datedNight(night: string, camp: CampView): string {
  const [first] = camp.days;
  const last = camp.days[camp.days.length - 1];
  if (first === undefined || last === undefined) return night;
  return `${night} · ${first === last ? formatDay(first) : `${formatDay(first)} to ${formatDay(last)}`}`;
}

export function knotName(id: KnotId): string {
  const name = KNOTS.find((row) => row.id === id)?.name ?? id;
  return name.charAt(0).toLowerCase() + name.slice(1);
}

export function hazardNames(keys: readonly string[]): string[] {
  return HAZARDS.filter((hazard) => keys.includes(hazard.key)).map((hazard) => hazard.name);
}

/** "Sun 14 June: gust 75 km/h from W, mean 43 km/h, rain 4 mm, 3 °C, feels −2 °C", one a night. */
export function forecastLines(nights: readonly NightForecast[], { speedUnit, lengthUnit }: Preferences): string[] {
  return nights.map((night) => {
    const parts = [
      night.gustMs === null ? null : `gust ${formatSpeed(night.gustMs, speedUnit)}`,
      night.meanMs === null ? null : `mean ${formatSpeed(night.meanMs, speedUnit)}`,
      night.fromDeg === null ? null : `from ${formatCompass(night.fromDeg)}`,
      night.rainMm === null ? null : `rain ${formatRain(night.rainMm, lengthUnit)}`,
      night.temperatureC === null ? null : `down to ${formatTemperature(night.temperatureC, lengthUnit)}`,
      night.windChillC === null ? null : `feels like ${formatTemperature(night.windChillC, lengthUnit)}`,
    ];
    return `${formatDay(night.day)}: ${parts.filter(Boolean).join(", ")}`;
  });
}

/** Where it is from and when; sample data says that it is none. */
export function forecastSource({ source, isSample, fetchedAt }: PaperForecast): string {
  return isSample ? "Sample data, not a forecast." : `From ${source}, fetched ${fetchedAt}.`;
}

/** "Tide. Pitch above the highest drift line…", one for each that is ticked. */
export function hazardCautions(keys: readonly string[]): string[] {
  return HAZARDS.filter((hazard) => keys.includes(hazard.key)).map((hazard) => `${hazard.name}. ${hazard.caution}`);
}

export function stateWord(verdict: Verdict): string {
  return STATE_MARKS[verdict].word;
}

/** "120 m away. Spring below the wall." */
export function waterWords(
  { waterDistanceM, water }: Pick<CampDetails, "waterDistanceM" | "water">,
  unit: Preferences["lengthUnit"],
): string {
  const distance = waterDistanceM === null ? "" : `${formatAltitude(waterDistanceM, unit)} away.`;
  return [distance, water].filter(Boolean).join(" ");
}

/** What is done at a tie-out beside driving the anchor. */
export function riggingRemarks(
  placement: Placement,
  tray: readonly TrayAnchor[],
  lengthUnit: Preferences["lengthUnit"],
): string[] {
  const remarks: string[] = [];
  const { tandem } = placement;
  if (tandem) {
    const second = tray.find((anchor) => anchor.id === tandem.anchorId)?.name ?? "second anchor";
    remarks.push(`second in line ${formatLength(tandem.spacingM, lengthUnit)} behind: ${second}`);
  }
  if (placement.rockKg > 0) remarks.push(`rock of ${withUnit(String(Math.round(placement.rockKg)), "kg")} on it`);
  if (placement.shockCord) remarks.push("shock cord in the line");
  if (placement.depthOutM > 0.004) remarks.push(`${formatMillimetres(placement.depthOutM)} stays out of the ground`);
  return remarks;
}

/** Missing inputs of a shelter or camp as one sentence. */
export function gapWords(gaps: readonly { readonly message: string }[]): string {
  return [...new Set(gaps.map((gap) => gap.message))].join(" ");
}

export interface HoldsToWords {
  readonly value: string;
  readonly remark: string;
}

export function holdsToWords(
  result: Pick<ShelterResult, "holdsToGustMs" | "gaps" | "verdict">,
  designGustMs: number | null,
  unit: Preferences["speedUnit"],
): HoldsToWords {
  const planned = designGustMs === null ? "" : `planned ${formatSpeed(designGustMs, unit)}`;
  if (result.holdsToGustMs === null) {
    return {
      value: "unknown",
      remark: gapWords(result.gaps) || ["not worked out", planned].filter(Boolean).join(" · "),
    };
  }
  const beaufort = unit === "Beaufort" ? "gust" : `gust, ${formatBeaufort(result.holdsToGustMs)}`;
  return { value: formatHoldsTo(result.holdsToGustMs, unit), remark: [beaufort, planned].filter(Boolean).join(" · ") };
}

export function tieOutsByNumber(shelter: ShelterResult): TieOutResult[] {
  return [...shelter.tieOuts].sort((a, b) => a.number - b.number);
}

/** The camp's verdict as a sentence: "Gives way at 54 km/h: ridge tarp, tie-out 3, windward hem." */
export function campHeadline(result: CampResult, unit: Preferences["speedUnit"]): string {
  const holdsTo = result.holdsToGustMs === null ? null : formatHoldsTo(result.holdsToGustMs, unit);
  const weakest = weakestWords(result);
  const gap = gapWords(result.gaps);
  switch (result.verdict) {
    case "holds":
      return holdsTo === null ? "Holds." : `Holds to gusts of ${holdsTo}.`;
    case "thin":
      return `Thin: holds to gusts of ${holdsTo ?? "?"}.${weakest}`;
    case "gives-way":
      return holdsTo === null ? `Gives way.${weakest}` : `Gives way at ${holdsTo}.${weakest}`;
    case "unknown":
      return `Not known yet. ${gap}`.trim();
  }
}

function weakestWords(result: CampResult): string {
  const shelter = result.shelters.find((one) => one.pitchId === result.weakest?.pitchId);
  const tieOut = shelter?.tieOuts.find((one) => one.tieOutId === result.weakest?.tieOutId);
  return shelter && tieOut ? ` Weakest: ${shelter.name}, tie-out ${tieOut.number}, ${lowerFirst(tieOut.name)}.` : "";
}

export function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}

/** The address without what a hand-held reader does not need to type. */
export function shortAddress(address: string): string {
  return address.replace(/^https?:\/\//, "").replace(/\/$/, "");
}
