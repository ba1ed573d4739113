import { bestLean } from "./capacity";
import type { PreparedCamp, PreparedShelter, PreparedTieOut } from "./prepare-camp";
import { riggingOf, setAnchor, strengthKey, type Strength } from "./tie-out-strength";
import type { AnchorSpec, Placement, TrayAnchor } from "./types";

/** Knot of a placement that nobody has rigged yet: holds and can be tightened (judgement). */
const USUAL_KNOT = "taut-line-hitch";
/** Leans are looked for at line angles this far apart, degrees: the best lean changes little in between. */
const LEAN_ANGLE_STEP_DEG = 5;

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

export interface Rigged {
  readonly placement: Placement;
  readonly strength: Strength;
}

/** What a placement holds at its tie-out in the design gust; null when something is not known. */
export function strengthOf(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  tieOut: PreparedTieOut,
  placement: Placement,
): Strength | null {
  const key = strengthKey(placement);
  const known = tieOut.strengths.get(key);
  if (known !== undefined) return known;
  const anchor = shelter.ground
    ? setAnchor(placement, prepared.anchors, shelter.ground, shelter.pitch.spec.line)
    : null;
  const strength = anchor && tieOut.lineAngleDeg !== null ? anchor.strengthAt(tieOut.lineAngleDeg) : null;
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
  tieOut: PreparedTieOut,
  anchor: TrayAnchor,
  habit: Placement | null,
): Rigged | null {
  if (!shelter.ground || tieOut.lineAngleDeg === null) return null;
  const plain = plainPlacement(shelter.pitch.pitchId, tieOut.tieOut.id, anchor.id);
  const base: Placement = habit
    ? {
        ...plain,
        knot: habit.knot,
        shockCord: habit.shockCord,
        rockKg: isDriven(anchor.spec) ? habit.rockKg : 0,
      }
    : plain;
  const leans = new Set([0]);
  if (isDriven(anchor.spec)) {
    leans.add(recallBestLean(prepared, shelter, tieOut.lineAngleDeg, base));
    if (habit?.anchorId === anchor.id) leans.add(habit.leanDeg);
  }
  let best: Rigged | null = null;
  for (const leanDeg of leans) {
    const placement = { ...base, leanDeg };
    const strength = strengthOf(prepared, shelter, tieOut, placement);
    if (!strength || strength.dependableN <= 0) continue;
    // Upright is the least work, so a lean has to be really better.
    if (!best || strength.dependableN > best.strength.dependableN * (1 + 1e-9)) best = { placement, strength };
  }
  return best;
}

function recallBestLean(
  prepared: PreparedCamp,
  shelter: PreparedShelter,
  lineAngleDeg: number,
  base: Placement,
): number {
  const angleDeg = Math.round(lineAngleDeg / LEAN_ANGLE_STEP_DEG) * LEAN_ANGLE_STEP_DEG;
  const { line } = shelter.pitch.spec;
  const key = `${strengthKey(base)}|${shelter.pitch.patch}|${angleDeg}|${line.material}|${line.diameterMm}`;
  const known = prepared.leans.get(key);
  if (known !== undefined) return known;
  const anchor = prepared.anchors.get(base.anchorId)?.spec;
  const rigging = riggingOf(base, prepared.anchors, line);
  const found =
    anchor && rigging && shelter.ground
      ? bestLean({ anchor, ground: shelter.ground, lineAngleDeg: angleDeg, rigging })
      : null;
  const leanDeg = found?.leanDeg ?? 0;
  prepared.leans.set(key, leanDeg);
  return leanDeg;
}
