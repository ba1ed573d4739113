import type { ShelterKind } from "@/lib/calc/types";

/** Middle of a range that runs clockwise from one direction to the other, degrees. */
export function middleOfRange(fromDeg: number, toDeg: number): number {
  const widthDeg = (((toDeg - fromDeg) % 360) + 360) % 360;
  return (fromDeg + widthDeg / 2) % 360;
}

/**
 * How to turn a shelter before anybody has: a ridge tarp broadside to the wind, everything else with its back to it.
 * 0 when the wind is not known.
 */
export function suggestHeading(kind: ShelterKind, windFromDeg: number | null, windToDeg: number | null): number {
  if (windFromDeg === null || windToDeg === null) return 0;
  const turnDeg = kind === "ridge-tarp" ? 90 : 180;
  return Math.round((middleOfRange(windFromDeg, windToDeg) + turnDeg) % 360);
}
