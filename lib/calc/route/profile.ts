import { itemAt } from "../indexed";
import type { Profile } from "./types";

/** Finest spacing of stations, m, and their largest number; longer lines get wider spacing. Our choice. */
export const FINEST_STEP_M = 25;
export const MAX_STEPS = 4000;
/** Heights are averaged over this far to either side, m. Our choice: wider than the scatter of a barometer, narrower than a hill. */
export const SMOOTHING_M = 75;
/** Between two known heights farther apart than this, m, nothing is drawn in. Our choice. */
export const MAX_HEIGHT_GAP_M = 500;

/** Where along the line each point lies, m (never falling), and its height, m; NaN where it has none. */
export interface MeasuredLine {
  readonly atM: ArrayLike<number>;
  readonly heightsM: ArrayLike<number>;
}

/** Spacing of stations for a line of this length, m. */
export function stepFor(lengthM: number): number {
  return Math.max(FINEST_STEP_M, lengthM / MAX_STEPS);
}

/** Place of a station along the line, m. */
export function stationAtM(profile: Pick<Profile, "lengthM" | "stepM">, index: number): number {
  return Math.min(profile.lengthM, index * profile.stepM);
}

/**
 * Stations of equal spacing with smoothed heights: linear between known heights at most MAX_HEIGHT_GAP_M apart, then the
 * mean over SMOOTHING_M to either side (less near an end or a stretch without heights, alike on both sides).
 * @param line places in rising order
 */
export function buildProfile(line: MeasuredLine): Profile {
  const count = line.atM.length;
  const lengthM = count === 0 ? 0 : itemAt(line.atM, count - 1);
  const stepM = stepFor(lengthM);
  const stations = Math.ceil(lengthM / stepM - 1e-9) + 1;
  const raw = interpolateHeights(line, { lengthM, stepM }, stations);
  return { lengthM, stepM, heightsM: smooth(raw, Math.max(1, Math.round(SMOOTHING_M / stepM))) };
}

function interpolateHeights(
  line: MeasuredLine,
  spacing: Pick<Profile, "lengthM" | "stepM">,
  stations: number,
): (number | null)[] {
  const places: number[] = [];
  const heights: number[] = [];
  for (let index = 0; index < line.atM.length; index += 1) {
    const height = itemAt(line.heightsM, index);
    if (!Number.isFinite(height)) continue;
    places.push(itemAt(line.atM, index));
    heights.push(height);
  }
  let next = 0;
  return Array.from({ length: stations }, (_, station) => {
    const at = stationAtM(spacing, station);
    while (next < places.length && itemAt(places, next) < at) next += 1;
    return heightBetween(places, heights, next, at);
  });
}

/** Height at a place whose first known point not before it is `next`. */
function heightBetween(places: readonly number[], heights: readonly number[], next: number, at: number): number | null {
  const toM = places[next];
  const fromM = places[next - 1];
  if (toM !== undefined && toM === at) return itemAt(heights, next);
  if (toM === undefined || fromM === undefined || toM - fromM > MAX_HEIGHT_GAP_M) return null;
  const share = (at - fromM) / (toM - fromM);
  return itemAt(heights, next - 1) * (1 - share) + itemAt(heights, next) * share;
}

function smooth(raw: readonly (number | null)[], half: number): (number | null)[] {
  return raw.map((own, index) => {
    if (own === null) return null;
    let sum = own;
    let reach = 0;
    while (reach < half) {
      const before = raw[index - reach - 1] ?? null;
      const after = raw[index + reach + 1] ?? null;
      if (before === null || after === null) break;
      sum += before + after;
      reach += 1;
    }
    return sum / (2 * reach + 1);
  });
}

/** The smoothed height at a place along the line, m; null where it is not known. @param atM 0…lengthM */
export function heightAtM(profile: Profile, atM: number): number | null {
  const place = Math.min(Math.max(atM, 0), profile.lengthM);
  const index = Math.min(Math.floor(place / profile.stepM), profile.heightsM.length - 1);
  const own = profile.heightsM[index] ?? null;
  const next = profile.heightsM[index + 1] ?? null;
  const fromM = stationAtM(profile, index);
  const toM = stationAtM(profile, index + 1);
  if (own === null || next === null || toM <= fromM) return own;
  return own + ((next - own) * (place - fromM)) / (toM - fromM);
}
