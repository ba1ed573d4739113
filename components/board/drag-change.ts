import type { PreparedCamp } from "@/lib/calc/prepare-camp";
import type { Placement } from "@/lib/calc/types";
import type { PlanChange } from "@/lib/domain/plan/schema";
import type { Piece, Target } from "./drag-ids";
import { findPrepared } from "./find-prepared";
import { isSameSpot, placementAt, type Spot } from "./plan-change";
import type { Engine } from "./use-engine";

/** An anchor from the tray at a tie-out: at its best lean there, with the knot and cord that the tie-out has. */
export function placeFromTray(
  engine: Engine,
  prepared: PreparedCamp,
  placements: readonly Placement[],
  anchorId: string,
  spot: Spot,
): Placement {
  const found = findPrepared(prepared, spot);
  const anchor = prepared.anchors.get(anchorId);
  const present = placementAt(placements, spot);
  const rigged =
    found && anchor && engine.isKnownTieOut(found.tieOut)
      ? engine.rigAtBestLean(prepared, found.shelter, found.tieOut, anchor, present)
      : null;
  const plain = engine.plainPlacement(spot.pitchId, spot.tieOutId, anchorId);
  if (rigged) return rigged.placement;
  return present ? { ...plain, knot: present.knot, shockCord: present.shockCord } : plain;
}

/** What dropping a piece on a target means for the plan; null where it means nothing. */
export function changeOfDrop(
  engine: Engine,
  prepared: PreparedCamp,
  placements: readonly Placement[],
  piece: Piece,
  target: Target,
): PlanChange | null {
  if (piece.kind === "tray") {
    if (target.kind === "tray") return null;
    return { type: "place", placement: placeFromTray(engine, prepared, placements, piece.anchorId, target.spot) };
  }
  if (target.kind === "tray") return { type: "lift", ...piece.spot };
  if (isSameSpot(piece.spot, target.spot)) return null;
  return { type: "swap", from: piece.spot, to: target.spot };
}
