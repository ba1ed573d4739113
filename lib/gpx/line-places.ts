import { itemAt } from "@/lib/calc/indexed";
import { normaliseLongitude, type LatLon } from "@/lib/calc/places/utm";
import { distanceM, placeBetween } from "@/lib/places/geodesic";
import type { LineData } from "./measure-line";

const RADIANS = Math.PI / 180;
const DEGREE_M = 111_320;
/** Places that differ by less than this, m, are alike. */
const SAME_M = 0.01;

/** Index of the last point that lies at or before a place along the line. */
export function pointBefore(line: LineData, atM: number): number {
  let low = 0;
  let high = line.atM.length - 1;
  while (low < high) {
    const middle = Math.ceil((low + high) / 2);
    if (itemAt(line.atM, middle) <= atM) low = middle;
    else high = middle - 1;
  }
  return low;
}

export interface LinePlace extends LatLon {
  readonly heightM: number | null;
}

/** Where a place along the line is, and how high. @param atM 0…length */
export function placeOnLine(line: LineData, atM: number): LinePlace {
  const index = pointBefore(line, atM);
  const here = { latitude: itemAt(line.latitudes, index), longitude: itemAt(line.longitudes, index) };
  const height = (point: number) => {
    const value = line.heightsM[point];
    return value === undefined || Number.isNaN(value) ? null : value;
  };
  const fromM = itemAt(line.atM, index);
  const toM = line.atM[index + 1];
  if (toM === undefined || toM - fromM <= 0 || atM <= fromM) return { ...here, heightM: height(index) };
  const share = (atM - fromM) / (toM - fromM);
  const next = { latitude: itemAt(line.latitudes, index + 1), longitude: itemAt(line.longitudes, index + 1) };
  const low = height(index);
  const high = height(index + 1);
  const heightM = low === null || high === null ? null : low + (high - low) * share;
  return { ...placeBetween(here, next, share), heightM };
}

interface Found {
  readonly atM: number;
  readonly offM: number;
}

interface Candidate extends Found {
  /** The point before it, and the share of the way to the next. */
  readonly index: number;
  readonly share: number;
}

/**
 * The place of the line nearest to a place, at or after `fromM`; the first of several that are alike. On a plane around
 * the place, which is good for the few hundred metres that count.
 */
export function nearestOnLine(line: LineData, place: LatLon, fromM = 0): Found | null {
  const eastM = DEGREE_M * Math.max(1e-6, Math.cos(place.latitude * RADIANS));
  const starts = new Set(line.starts);
  const xOf = (index: number) => normaliseLongitude(itemAt(line.longitudes, index) - place.longitude) * eastM;
  const yOf = (index: number) => (itemAt(line.latitudes, index) - place.latitude) * DEGREE_M;
  let best: Candidate | null = null;
  for (let index = 0; index + 1 < line.atM.length; index += 1) {
    const endM = itemAt(line.atM, index + 1);
    if (endM < fromM || starts.has(index + 1)) continue;
    const startM = itemAt(line.atM, index);
    const ax = xOf(index);
    const ay = yOf(index);
    const dx = xOf(index + 1) - ax;
    const dy = yOf(index + 1) - ay;
    const square = dx * dx + dy * dy;
    const least = endM > startM ? Math.max(0, (fromM - startM) / (endM - startM)) : 0;
    const share = square > 0 ? Math.min(1, Math.max(least, -(ax * dx + ay * dy) / square)) : least;
    const offM = Math.hypot(ax + share * dx, ay + share * dy);
    if (!best || offM < best.offM - SAME_M) best = { atM: startM + (endM - startM) * share, offM, index, share };
  }
  return best && refine(line, place, best);
}

/** Measured on the ellipsoid, and between these two points: at a break, two places have the same distance walked. */
function refine(line: LineData, place: LatLon, { atM, index, share }: Candidate): Found {
  const from = { latitude: itemAt(line.latitudes, index), longitude: itemAt(line.longitudes, index) };
  const to = { latitude: itemAt(line.latitudes, index + 1), longitude: itemAt(line.longitudes, index + 1) };
  return { atM, offM: distanceM(place, placeBetween(from, to, share)) };
}
