import type { PlacementRow } from "../plan/internal";

export interface CampUse {
  readonly campId: string;
  readonly tieOuts: number;
  /** Pieces, second stakes in line included. */
  readonly pieces: number;
}

/** How many pieces of an anchor each camp's plan uses. */
export function countUses(placements: readonly PlacementRow[], anchorId: string): CampUse[] {
  const uses = new Map<string, CampUse>();
  for (const one of placements) {
    const pieces = Number(one.anchorId === anchorId) + Number(one.tandem?.anchorId === anchorId);
    if (pieces === 0) continue;
    const before = uses.get(one.campId) ?? { campId: one.campId, tieOuts: 0, pieces: 0 };
    uses.set(one.campId, { ...before, tieOuts: before.tieOuts + 1, pieces: before.pieces + pieces });
  }
  return [...uses.values()];
}

/** How many shock cords each camp's plan uses. */
export function countShockCordUses(placements: readonly PlacementRow[]): ReadonlyMap<string, number> {
  const uses = new Map<string, number>();
  for (const one of placements) if (one.hasShockCord) uses.set(one.campId, (uses.get(one.campId) ?? 0) + 1);
  return uses;
}
