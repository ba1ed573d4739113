import { demandAt } from "./analyse-shelter";
import { prepareCamp, type PreparedCamp, type PreparedShelter, type PreparedTieOut } from "./prepare-camp";
import { retensionSentence } from "./retension";
import { Stock } from "./stock";
import {
  findHoldsTo,
  LARGEST_GUST_MS,
  NOTHING_HOLDS,
  setAnchor,
  spotKey,
  strengthKey,
  type SetAnchor,
} from "./tie-out-strength";
import type { CampInput, CampResult, Gap, Placement, ShelterResult, TieOutResult } from "./types";
import { chanceHolds, verdictOf, worstVerdict } from "./verdict";

export { designAnalysisRequest, planProblems, prepareCamp } from "./prepare-camp";
export type { AnalysisRequest, PlanProblem, PreparedCamp, PreparedShelter, PreparedTieOut } from "./prepare-camp";
export { LARGEST_GUST_MS, spotKey } from "./tie-out-strength";

/** Margins are cut off here: more says nothing to anybody. */
export const LARGEST_MARGIN = 99;

/** dependable ÷ demand, both N ≥ 0, cut off at LARGEST_MARGIN. */
export function marginOf(dependableN: number, demandN: number): number {
  return demandN > 0 ? Math.min(LARGEST_MARGIN, dependableN / demandN) : LARGEST_MARGIN;
}

/** Holds-to of one set anchor at one tie-out: the line angle follows the load, so both sides move with the gust. */
function holdsToOf(shelter: PreparedShelter, tieOut: PreparedTieOut, anchor: SetAnchor): number | null {
  const { wind } = shelter;
  const { analysis } = shelter.pitch;
  if (!wind || !analysis) return null;
  const marginAt = (gustMs: number): number => {
    const demand = demandAt(analysis, tieOut.demandIndex, wind.pressurePerGustSquared * gustMs * gustMs);
    const strength = anchor.strengthAt(demand.lineAngleDeg);
    return strength ? marginOf(strength.dependableN, demand.pullN) : 0;
  };
  return findHoldsTo(marginAt, shelter.checkpointsMs);
}

/** One tie-out with one placement, or with none. */
export function evaluateTieOut(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  tieOut: PreparedTieOut,
  placement: Placement | null,
): TieOutResult {
  const base = {
    pitchId: shelter.pitch.pitchId,
    tieOutId: tieOut.tieOut.id,
    number: tieOut.tieOut.number,
    name: tieOut.name,
    demandN: tieOut.demandN,
    lineAngleDeg: tieOut.lineAngleDeg,
    priority: tieOut.priority,
    consequence: tieOut.consequence,
    placement,
  };
  const nothing = { capacity: null, margin: null, morningMargin: null, chanceHolds: null, holdsToGustMs: null };
  const unknown = (gaps: readonly Gap[]): TieOutResult => ({ ...base, ...nothing, verdict: "unknown", gaps });

  const gaps = [...tieOut.gaps];
  const anchor =
    placement && shelter.ground
      ? setAnchor(placement, prepared.anchors, shelter.ground, shelter.pitch.spec.line)
      : null;
  if (!placement) {
    gaps.push({ field: "tieOut.anchor", message: `Tie-out ${tieOut.tieOut.number} has no anchor.` });
  } else if (shelter.ground && !anchor) {
    gaps.push({
      field: "tieOut.anchor",
      message: `The anchor at tie-out ${tieOut.tieOut.number} is no longer in the tray. Choose another.`,
    });
  }
  if (gaps.length > 0 || !anchor || tieOut.demandN === null || tieOut.lineAngleDeg === null) return unknown(gaps);

  const capacity = anchor.capacityAt(tieOut.lineAngleDeg);
  if (capacity.status === "unknown") return { ...unknown(capacity.gaps), capacity };
  const evening = capacity.status === "ok" ? capacity : NOTHING_HOLDS;
  const morning =
    prepared.nightCycles === null
      ? null
      : prepared.nightCycles > 0
        ? anchor.strengthAt(tieOut.lineAngleDeg, prepared.nightCycles)
        : evening;
  return {
    ...base,
    verdict: capacity.status === "ok" ? verdictOf(evening.medianN, evening.dependableN, tieOut.demandN) : "gives-way",
    gaps: [],
    capacity,
    margin: marginOf(evening.dependableN, tieOut.demandN),
    morningMargin: morning ? marginOf(morning.dependableN, tieOut.demandN) : null,
    chanceHolds: chanceHolds(evening.medianN, evening.scatter, tieOut.demandN),
    holdsToGustMs: capacity.status === "ok" ? holdsToOf(shelter, tieOut, anchor) : 0,
  };
}

/** The same, remembered per tie-out and rigging, so that a move costs only the tie-outs it touches. */
function recallTieOut(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  tieOut: PreparedTieOut,
  placement: Placement | null,
): TieOutResult {
  const key = placement ? strengthKey(placement) : "";
  const known = tieOut.memo.get(key);
  if (known) {
    return known.placement === placement || (placement && known.placement?.pinned === placement.pinned)
      ? known
      : { ...known, placement };
  }
  const result = evaluateTieOut(prepared, shelter, tieOut, placement);
  tieOut.memo.set(key, result);
  return result;
}

const isLess = (a: number | null, b: number | null): boolean => a !== null && (b === null || a < b);

/** The lowest of all; null when one is not known or there are none. */
function lowest(gustsMs: readonly (number | null)[]): number | null {
  const known = gustsMs.filter((gust) => gust !== null);
  return known.length > 0 && known.length === gustsMs.length ? Math.min(...known) : null;
}

/** The tie-out that decides the verdict: the weakest that gives way, else the first with a gap, else the weakest. */
function findWeakest(tieOuts: readonly TieOutResult[]): TieOutResult | null {
  let weakest: TieOutResult | null = null;
  for (const one of tieOuts) if (isLess(one.margin, weakest?.margin ?? null)) weakest = one;
  if (weakest?.verdict === "gives-way") return weakest;
  return tieOuts.find((one) => one.verdict === "unknown") ?? weakest;
}

function evaluateShelter(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  placementAt: ReadonlyMap<string, Placement>,
): ShelterResult {
  const { pitchId, name } = shelter.pitch;
  const tieOuts = shelter.tieOuts.map((tieOut) =>
    recallTieOut(prepared, shelter, tieOut, placementAt.get(spotKey(pitchId, tieOut.tieOut.id)) ?? null),
  );
  const before = shelter.memo.last;
  if (before && before.tieOuts.every((one, index) => one === tieOuts[index])) return before;

  const parts = tieOuts.map((one) => one.verdict);
  const verdict =
    shelter.standing === false
      ? "gives-way"
      : shelter.gaps.length > 0
        ? worstVerdict([...parts, "unknown"])
        : worstVerdict(parts);
  const holds = lowest(tieOuts.map((one) => one.holdsToGustMs));
  const stands = shelter.standsToGustMs;
  const result: ShelterResult = {
    pitchId,
    name,
    verdict,
    gaps: shelter.gaps,
    holdsToGustMs: holds === null || stands === null ? null : Math.min(holds, stands),
    isHoldsToOpen:
      holds !== null && stands !== null && shelter.isStandsToOpen && holds >= Math.min(stands, LARGEST_GUST_MS),
    tieOuts,
    weakestTieOutId: findWeakest(tieOuts)?.tieOutId ?? null,
    standing: shelter.standing,
  };
  shelter.memo.last = result;
  return result;
}

/**
 * Every margin of a camp for these placements. Of a prepared camp only the tie-outs whose placement is new are
 * computed; results of the others are the same objects as before.
 *
 * Holds-to gusts are 3-second gusts at 10 m over open ground, m/s, found to 0.2 %, from 0 to LARGEST_GUST_MS (then
 * "this or more"); above the highest analysed level pulls are extended by their last slope. A shelter holds to what its
 * weakest tie-out holds to, and no further than the highest analysed level up to which it has a standing shape.
 */
export function evaluatePlacements(prepared: PreparedCamp, placements: readonly Placement[]): CampResult {
  const placementAt = new Map(placements.map((one) => [spotKey(one.pitchId, one.tieOutId), one]));
  const shelters = prepared.shelters.map((shelter) => evaluateShelter(prepared, shelter, placementAt));
  const verdicts = shelters.map((shelter) => shelter.verdict);
  const holds = lowest(shelters.map((shelter) => shelter.holdsToGustMs));
  const weakest = findWeakest(shelters.flatMap((shelter) => shelter.tieOuts));
  return {
    verdict: worstVerdict(prepared.isComplete ? verdicts : [...verdicts, "unknown"]),
    gaps: prepared.gaps,
    designGustMs: prepared.designGustMs,
    wind: prepared.wind,
    holdsToGustMs: holds,
    isHoldsToOpen: shelters.some((shelter) => shelter.holdsToGustMs === holds && shelter.isHoldsToOpen === true),
    weakest: weakest ? { pitchId: weakest.pitchId, tieOutId: weakest.tieOutId } : null,
    shelters,
    left: new Stock(prepared.input.tray, placements).toRecord(),
    retension: retensionSentence(prepared.input.strongWindHours, shelters),
  };
}

/** Every margin of a camp. Gaps are named; a verdict that hangs on one is "unknown". */
export function evaluateCamp(input: CampInput): CampResult {
  return evaluatePlacements(prepareCamp(input), input.placements);
}
