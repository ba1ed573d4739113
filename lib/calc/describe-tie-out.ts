import { itemAt } from "./indexed";
import type { TieOut, TieOutKind, Vec3 } from "./types";
import { bearingDeg } from "./vectors";

const POINTS_8 = ["north", "north-east", "east", "south-east", "south", "south-west", "west", "north-west"] as const;
const BETWEEN_8 = [
  "north-north-east",
  "east-north-east",
  "east-south-east",
  "south-south-east",
  "south-south-west",
  "west-south-west",
  "west-north-west",
  "north-north-west",
] as const;

const NOUNS: Readonly<Record<TieOutKind, string>> = {
  "ridge-end": "ridge end",
  corner: "corner",
  hem: "hem",
  "side-pull-out": "pull-out",
  guy: "guy",
};

const turn = (degrees: number): number => ((degrees % 360) + 360) % 360;

/** Name of a compass direction, to 45° (8 points) or 22.5° (16 points). */
export function compassPoint(deg: number, points: 8 | 16 = 8): string {
  if (points === 8) return itemAt(POINTS_8, Math.round(turn(deg) / 45) % 8);
  const index = Math.round(turn(deg) / 22.5) % 16;
  return index % 2 === 0 ? itemAt(POINTS_8, index / 2) : itemAt(BETWEEN_8, (index - 1) / 2);
}

/**
 * A point of the shelter's frame turned to the map: x east, y north, z up.
 *
 * @param headingDeg compass bearing of the shelter's front, degrees clockwise from true north
 */
export function toWorld(point: Vec3, headingDeg: number): Vec3 {
  const angle = (headingDeg * Math.PI) / 180;
  const [sine, cosine] = [Math.sin(angle), Math.cos(angle)];
  return { x: point.x * cosine + point.y * sine, y: point.y * cosine - point.x * sine, z: point.z };
}

/** How far a direction is outside a wind range that runs clockwise from one bearing to the other, degrees; 0 inside. */
function outsideRange(deg: number, wind: { readonly fromDeg: number; readonly toDeg: number }): number {
  const width = turn(wind.toDeg - wind.fromDeg);
  const along = turn(deg - wind.fromDeg);
  return along <= width ? 0 : Math.min(along - width, 360 - along);
}

/**
 * A tie-out as a person at the camp would call it: "Windward hem, south".
 *
 * Windward: within 45° of the wind range; lee: its opposite is. Neither word where both or none holds, or when the wind may
 * come from anywhere. Hems and guys stand close together, so they get one of 16 compass points, the rest one of 8.
 *
 * @param headingDeg compass bearing of the shelter's front
 * @param wind range the wind may come from, clockwise; null = unknown or anywhere
 */
export function describeTieOut(
  tieOut: TieOut,
  headingDeg: number,
  wind: { readonly fromDeg: number; readonly toDeg: number } | null,
): string {
  const deg = turn(bearingDeg(tieOut.anchor) + headingDeg);
  const noun = NOUNS[tieOut.kind];
  const isFine = tieOut.kind === "hem" || tieOut.kind === "guy" || tieOut.kind === "side-pull-out";
  const place = compassPoint(deg, isFine ? 16 : 8);
  const isWindward = wind !== null && outsideRange(deg, wind) <= 45;
  const isLee = wind !== null && outsideRange(turn(deg + 180), wind) <= 45;
  const side = isWindward === isLee ? "" : isWindward ? "windward " : "lee ";
  const name = `${side}${noun}`;
  return `${name.charAt(0).toUpperCase()}${name.slice(1)}, ${place}`;
}
