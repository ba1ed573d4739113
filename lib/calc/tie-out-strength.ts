import { anchorCapacity, capacityNumbers } from "./capacity";
import type { Capacity, CapacityMode, GroundState, Placement, Rigging, ShelterSpec, TrayAnchor } from "./types";

/** Anchors of the tray by id. */
export type AnchorsById = ReadonlyMap<string, TrayAnchor>;

/** What an anchor holds, without the working. */
export interface Strength {
  readonly medianN: number;
  /** σ of the logarithm. */
  readonly scatter: number;
  readonly dependableN: number;
  /** What gives first; null where it can't be used. */
  readonly mode: CapacityMode | null;
}

/** Names one tie-out of one pitched shelter. */
export const spotKey = (pitchId: string, tieOutId: string): string => `${pitchId} ${tieOutId}`;

/** Everything of a placement that changes what it holds; two placements with the same key hold the same. */
export function strengthKey(placement: Placement): string {
  const { anchorId, leanDeg, depthOutM, tandem, rockKg, shockCord, knot } = placement;
  const second = tandem ? `${tandem.anchorId}@${tandem.spacingM}` : "";
  return `${anchorId}|${leanDeg}|${depthOutM}|${second}|${rockKg}|${shockCord ? 1 : 0}|${knot}`;
}

/** The rigging of a placement, with the line of the shelter; null when its second anchor is not in the tray. */
export function riggingOf(placement: Placement, anchors: AnchorsById, line: ShelterSpec["line"]): Rigging | null {
  const second = placement.tandem ? anchors.get(placement.tandem.anchorId) : undefined;
  if (placement.tandem && !second) return null;
  return {
    leanDeg: placement.leanDeg,
    depthOutM: placement.depthOutM,
    tandem: placement.tandem && second ? { anchor: second.spec, spacingM: placement.tandem.spacingM } : null,
    rockKg: placement.rockKg,
    shockCord: placement.shockCord,
    line,
    knot: placement.knot,
  };
}

/** One anchor set in one ground with one rigging, ready to be asked at any line angle. */
export interface SetAnchor {
  /** With its working. `pullCycles` = gusts it has already taken. */
  readonly capacityAt: (lineAngleDeg: number, pullCycles?: number) => Capacity;
  /** Numbers only: zero where it can't be used, null where something is not known. */
  readonly strengthAt: (lineAngleDeg: number, pullCycles?: number) => Strength | null;
}

/** The strength of what can't be used. */
export const NOTHING_HOLDS: Strength = { medianN: 0, scatter: 0, dependableN: 0, mode: null };

/** Ties a placement to its anchor, ground and rigging; null when an anchor it names is not in the tray. */
export function setAnchor(
  placement: Placement,
  anchors: AnchorsById,
  ground: GroundState,
  line: ShelterSpec["line"],
): SetAnchor | null {
  const anchor = anchors.get(placement.anchorId)?.spec;
  const rigging = riggingOf(placement, anchors, line);
  if (!anchor || !rigging) return null;
  const inputAt = (lineAngleDeg: number, pullCycles: number | undefined) =>
    pullCycles === undefined
      ? { anchor, ground, lineAngleDeg, rigging }
      : { anchor, ground, lineAngleDeg, rigging, pullCycles };
  return {
    capacityAt: (lineAngleDeg, pullCycles) => anchorCapacity(inputAt(lineAngleDeg, pullCycles)),
    strengthAt: (lineAngleDeg, pullCycles) => {
      const input = inputAt(lineAngleDeg, pullCycles);
      const numbers = capacityNumbers(input);
      if (numbers) return numbers;
      return anchorCapacity(input).status === "unusable" ? NOTHING_HOLDS : null;
    },
  };
}

/** "Holds to" is looked for up to this gust, m/s: above any 3-second gust that a camp could be planned for. */
export const LARGEST_GUST_MS = 120;
/** A gust is found to this share of itself, or to 0.01 m/s near zero. */
const GUST_TOLERANCE = 0.002;

/**
 * The lowest gust, m/s, at which the margin falls to 1; 0 when it is below 1 in still air, LARGEST_GUST_MS when it is
 * still 1 there (read that as "this or more").
 *
 * `marginAt` gives dependable ÷ demand for a gust in m/s. It is walked through `checkpointsMs` (m/s, ascending) from
 * below, so that a margin which is lost and found again counts as lost; then bisected to 0.2 %.
 */
export function findHoldsTo(marginAt: (gustMs: number) => number, checkpointsMs: readonly number[]): number {
  let low = 0;
  if (marginAt(0) < 1) return 0;
  for (const checkpoint of [...checkpointsMs, LARGEST_GUST_MS]) {
    if (checkpoint <= low) continue;
    const gust = Math.min(checkpoint, LARGEST_GUST_MS);
    if (marginAt(gust) >= 1) {
      low = gust;
      continue;
    }
    let high = gust;
    while (high - low > Math.max(0.01, GUST_TOLERANCE * low)) {
      const middle = (low + high) / 2;
      if (marginAt(middle) >= 1) low = middle;
      else high = middle;
    }
    return low;
  }
  return LARGEST_GUST_MS;
}
