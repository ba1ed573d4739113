import type { KitNeed } from "./types";

/** Tie-outs of one shelter, by number. */
export interface Spots {
  readonly shelterName: string;
  readonly numbers: readonly number[];
}

/** The tie-outs of these needs, each once, by shelter, in the order of their numbers. */
export function groupSpots(needs: readonly KitNeed[]): Spots[] {
  const byPitch = new Map<string, { shelterName: string; numbers: Set<number> }>();
  for (const { pitchId, shelterName, number } of needs) {
    const own = byPitch.get(pitchId) ?? { shelterName, numbers: new Set() };
    own.numbers.add(number);
    byPitch.set(pitchId, own);
  }
  return [...byPitch.values()].map(({ shelterName, numbers }) => ({
    shelterName,
    numbers: [...numbers].sort((a, b) => a - b),
  }));
}
