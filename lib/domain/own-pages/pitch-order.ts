import type { TieOut, TieOutKind } from "@/lib/calc/types";

/** What holds a shelter up comes first, what only shapes it comes last. Common practice, no source. */
const RANK: Readonly<Record<TieOutKind, number>> = {
  "ridge-end": 0,
  corner: 1,
  hem: 2,
  guy: 3,
  "side-pull-out": 4,
};

/** Middle of the range that the wind may come from, clockwise from one end to the other. */
function middleOfWind(fromDeg: number | null, toDeg: number | null): number | null {
  if (fromDeg === null || toDeg === null) return null;
  return fromDeg + ((((toDeg - fromDeg) % 360) + 360) % 360) / 2;
}

/**
 * The order in which one pegs a shelter out: main points first and, among equals, the side that the wind comes from,
 * so that the cloth streams away from the hands. Without a wind the numbers decide.
 */
export function orderForPitching(
  tieOuts: readonly TieOut[],
  headingDeg: number,
  wind: { readonly fromDeg: number | null; readonly toDeg: number | null },
): TieOut[] {
  const windDeg = middleOfWind(wind.fromDeg, wind.toDeg);
  const windward = ({ anchor }: TieOut): number => {
    if (windDeg === null) return 0;
    const turn = ((windDeg - headingDeg) * Math.PI) / 180;
    // In the shelter's frame y points to its front and x to its right, so this is how far upwind the anchor lies.
    return Math.round((anchor.x * Math.sin(turn) + anchor.y * Math.cos(turn)) * 100);
  };
  return [...tieOuts].sort((a, b) => RANK[a.kind] - RANK[b.kind] || windward(b) - windward(a) || a.number - b.number);
}
