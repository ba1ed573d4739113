import { capacityNumbers } from "./capacity";
import { isKnownTieOut, type KnownTieOut, type PreparedCamp, type PreparedShelter } from "./prepare-camp";
import { setAnchor, spotKey, strengthKey, type Strength } from "./tie-out-strength";
import type { AnchorSpec, Placement, Rigging, TrayAnchor } from "./types";

/** Knot of a placement that nobody has rigged yet: holds and can be tightened (judgement). */
const USUAL_KNOT = "taut-line-hitch";
/** Leans are looked for at line angles this far apart, degrees: the best lean changes little in between. */
const LINE_ANGLE_STEP_DEG = 5;
/** Leans that are tried first, degrees, and how far to either side of the best of them: what an eye can set. */
const COARSE_LEANS_DEG: readonly number[] = [0, 10, 20, 30, 40];
const LEAN_STEP_DEG = 5;
/** Never towards the pull: what is gained there rests on plane wedges, which overstate it (judgement). */
const LEAST_LEAN_DEG = 0;
/** A line that never breaks, so that the lean is that of the stake in the ground. */
const STRONG_LINE: Rigging["line"] = { material: "uhmwpe", diameterMm: 20 };

/** Anchors that are driven at a lean. */
export const isDriven = (spec: AnchorSpec): boolean => spec.class === "stake";

/** A placement with nothing special: upright, driven home, single, no rock, no shock cord. */
export function plainPlacement(pitchId: string, tieOutId: string, anchorId: string): Placement {
  return {
    pitchId,
    tieOutId,
    anchorId,
    leanDeg: 0,
    depthOutM: 0,
    tandem: null,
    rockKg: 0,
    shockCord: false,
    knot: USUAL_KNOT,
    pinned: false,
  };
}

/** Length of a stake, m; 0 of anything else. */
export const stakeLengthM = (spec: AnchorSpec): number => (spec.class === "stake" ? spec.lengthM : 0);

export interface Rigged {
  readonly anchor: TrayAnchor;
  readonly placement: Placement;
  readonly strength: Strength;
}

/** What a placement holds at its tie-out in the design gust; null when something is not known. */
export function strengthOf(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  tieOut: KnownTieOut,
  placement: Placement,
): Strength | null {
  const key = strengthKey(placement);
  const known = tieOut.strengths.get(key);
  if (known !== undefined) return known;
  const anchor = setAnchor(placement, prepared.anchors, tieOut.ground, shelter.pitch.spec.line);
  const strength = anchor?.strengthAt(tieOut.lineAngleDeg) ?? null;
  tieOut.strengths.set(key, strength);
  return strength;
}

/**
 * The anchor at its best lean at this tie-out, driven home, with the knot, shock cord and rock of `habit` (what is there
 * now, or null). Null when it can't be used there or something is not known.
 */
export function rigAtBestLean(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  tieOut: KnownTieOut,
  anchor: TrayAnchor,
  habit: Placement | null,
): Rigged | null {
  const plain = plainPlacement(shelter.pitch.pitchId, tieOut.tieOut.id, anchor.id);
  const base: Placement = habit
    ? { ...plain, knot: habit.knot, shockCord: habit.shockCord, rockKg: isDriven(anchor.spec) ? habit.rockKg : 0 }
    : plain;
  const leans = isDriven(anchor.spec) ? [recallBestLean(prepared, shelter, tieOut, anchor, base.rockKg)] : [0];
  if (isDriven(anchor.spec) && habit?.anchorId === anchor.id) leans.push(habit.leanDeg);
  let best: Rigged | null = null;
  for (const leanDeg of leans) {
    const placement = { ...base, leanDeg };
    const strength = strengthOf(prepared, shelter, tieOut, placement);
    if (!strength || strength.dependableN <= 0) continue;
    if (!best || strength.dependableN > best.strength.dependableN * (1 + 1e-9)) best = { anchor, placement, strength };
  }
  if (!best || best.placement.leanDeg === 0 || !isLeanIdle(best.strength)) return best;
  // Line or head give first: upright is less work and holds the same.
  const placement = { ...base, leanDeg: 0 };
  const strength = strengthOf(prepared, shelter, tieOut, placement);
  return strength && strength.dependableN >= best.strength.dependableN ? { anchor, placement, strength } : best;
}

const isLeanIdle = ({ mode }: Strength): boolean => mode === "line-breaks" || mode === "head-gives" || mode === "rated";

/** The best lean of a stake in a ground, 0…45° in steps of 5°; among equals the nearest to upright. */
function recallBestLean(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  { ground, lineAngleDeg }: KnownTieOut,
  anchor: TrayAnchor,
  rockKg: number,
): number {
  const angleDeg = Math.min(90, Math.round(lineAngleDeg / LINE_ANGLE_STEP_DEG) * LINE_ANGLE_STEP_DEG);
  const key = `${anchor.id}|${shelter.pitch.patch}|${angleDeg}|${rockKg}`;
  const known = prepared.leans.get(key);
  if (known !== undefined) return known;
  const rigging = {
    depthOutM: 0,
    tandem: null,
    rockKg,
    shockCord: false,
    line: STRONG_LINE,
    knot: USUAL_KNOT,
  } as const;
  const holdsAt = (leanDeg: number): number =>
    capacityNumbers({ anchor: anchor.spec, ground, lineAngleDeg: angleDeg, rigging: { ...rigging, leanDeg } })
      ?.dependableN ?? 0;
  let best = { leanDeg: 0, holdsN: -1 };
  const consider = (leanDeg: number) => {
    const holdsN = holdsAt(leanDeg);
    if (holdsN > best.holdsN * (1 + 1e-6)) best = { leanDeg, holdsN };
  };
  COARSE_LEANS_DEG.forEach(consider);
  const centre = best.leanDeg;
  if (centre > LEAST_LEAN_DEG) consider(centre - LEAN_STEP_DEG);
  consider(centre + LEAN_STEP_DEG);
  prepared.leans.set(key, best.leanDeg);
  return best.leanDeg;
}

/** One known tie-out of a camp with what a plan puts there and what that holds. */
export interface PlannedTieOut {
  readonly shelter: PreparedShelter;
  readonly tieOut: KnownTieOut;
  readonly placement: Placement | null;
  /** Null when it is empty or what it holds is not known. */
  readonly strength: Strength | null;
}

/** Every tie-out without a gap, with what a plan puts there. */
export function readPlan(prepared: PreparedCamp, placements: readonly Placement[]): PlannedTieOut[] {
  const placementAt = new Map(placements.map((one) => [spotKey(one.pitchId, one.tieOutId), one]));
  return prepared.shelters.flatMap((shelter) =>
    shelter.tieOuts.filter(isKnownTieOut).map((tieOut) => {
      const placement = placementAt.get(spotKey(shelter.pitch.pitchId, tieOut.tieOut.id)) ?? null;
      const strength = placement && strengthOf(prepared, shelter, tieOut, placement);
      return { shelter, tieOut, placement, strength };
    }),
  );
}
