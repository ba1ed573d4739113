import { itemAt } from "./indexed";
import { DUOPITCH_CANOPY, MONOPITCH_CANOPY, type CanopyRow } from "./tables/canopy";
import { PITCHED_ROOF_ACROSS, PITCHED_ROOF_ALONG, SIDE_WALL, WALLS } from "./tables/pitched-roof";
import type { LoadCase } from "./types";

/** Value at `at` on a line of points sorted by `key`; held constant beyond both ends. */
function interpolate<T>(rows: readonly T[], at: number, key: (row: T) => number, value: (row: T) => number): number {
  let before = itemAt(rows, 0);
  for (const row of rows) {
    if (key(row) >= at) {
      const span = key(row) - key(before);
      return span <= 0 ? value(row) : value(before) + ((value(row) - value(before)) * (at - key(before))) / span;
    }
    before = row;
  }
  return value(before);
}

/**
 * Overall force coefficients of a canopy. EN 1991-1-4:2005+A1 §7.3, Table 7.6 or 7.7, linear in α and φ.
 *
 * @param shape one plane, or two planes with a ridge (negative slope: a trough)
 * @param angleDeg slope α; monopitch 0…30, duopitch −20…30
 * @param blockage φ, 0 = nothing under the canopy, 1 = blocked to its lee eaves
 * @returns c_f pressing down (max) and lifting (min)
 * @throws RangeError outside the table
 */
export function canopyCoefficient(
  shape: "monopitch" | "duopitch",
  angleDeg: number,
  blockage: number,
): { max: number; min: number } {
  const rows: readonly CanopyRow[] = shape === "monopitch" ? MONOPITCH_CANOPY : DUOPITCH_CANOPY;
  const lowest = shape === "monopitch" ? 0 : -20;
  if (!(angleDeg >= lowest && angleDeg <= 30)) throw new RangeError(`Canopy slope must be ${lowest}° to 30°.`);
  if (!(blockage >= 0 && blockage <= 1)) throw new RangeError("Blockage must be 0 to 1.");
  const read = (value: (row: CanopyRow) => number) => interpolate(rows, angleDeg, (row) => row.angleDeg, value);
  const minOpen = read((row) => row.minOpen);
  return { max: read((row) => row.max), min: minOpen + (read((row) => row.minBlocked) - minOpen) * blockage };
}

/** Size of the shelter as the wind sees it. */
export interface WindBox {
  readonly heightM: number;
  /** Across the wind, m (b), and along it, m (d). */
  readonly acrossM: number;
  readonly alongM: number;
  /** Loaded area for the step from c_pe,1 to c_pe,10, m². */
  readonly loadedAreaM2: number;
}

/** c_pe between 1 and 10 m² of loaded area. EN 1991-1-4 Fig. 7.2: c_pe,1 − (c_pe,1 − c_pe,10) log10 A. */
export function byLoadedArea(cpe10: number, cpe1: number, areaM2: number): number {
  return cpe1 - (cpe1 - cpe10) * Math.log10(Math.min(10, Math.max(1, areaM2)));
}

/**
 * External coefficient of a flat face of a pitched roof or wall, averaged over the zones of the face.
 * EN 1991-1-4:2005+A1 Tables 7.4a, 7.4b, 7.1; between the tabulated directions blended by cos² (judgement); from 75° to
 * upright by linear interpolation to the wall (judgement).
 *
 * @param angleDeg slope of the face, 0 = level, 90 = upright
 * @param cosine cosine of the angle between the way the face looks and where the wind comes from: 1 windward, −1 lee
 * @param box size of the shelter as the wind sees it
 * @param loadCase which of two tabulated signs to take
 */
export function faceCoefficient(angleDeg: number, cosine: number, box: WindBox, loadCase: LoadCase): number {
  const e = Math.min(box.acrossM, 2 * box.heightM);
  const strip = Math.min(1, e / 10 / (box.alongM / 2));
  const roofAngle = Math.min(75, Math.max(5, angleDeg));
  const isPressing = loadCase === "pressing";
  const across = (value: (row: (typeof PITCHED_ROOF_ACROSS)[number]) => number) =>
    interpolate(PITCHED_ROOF_ACROSS, roofAngle, (row) => row.angleDeg, value);
  const along = (value: (row: (typeof PITCHED_ROOF_ALONG)[number]) => number) =>
    interpolate(PITCHED_ROOF_ALONG, roofAngle, (row) => row.angleDeg, value);
  const area = box.loadedAreaM2;
  const g = isPressing
    ? across((row) => row.gMax)
    : byLoadedArea(
        across((r) => r.g10),
        across((r) => r.g1),
        area,
      );
  const h = isPressing
    ? across((row) => row.hMax)
    : byLoadedArea(
        across((r) => r.h10),
        across((r) => r.h1),
        area,
      );
  let windward = strip * g + (1 - strip) * h;
  let lee =
    strip * across((row) => (isPressing ? row.jMax : row.jMin)) +
    (1 - strip) * across((row) => (isPressing ? row.iMax : row.iMin));
  const first = Math.min(1, e / 10 / box.alongM);
  const second = Math.min(1, e / 2 / box.alongM) - first;
  let side =
    first *
      byLoadedArea(
        along((r) => r.g10),
        along((r) => r.g1),
        area,
      ) +
    second *
      byLoadedArea(
        along((r) => r.h10),
        along((r) => r.h1),
        area,
      ) +
    (1 - first - second) * along((r) => r.i);
  const upright = Math.min(1, Math.max(0, (angleDeg - 75) / 15));
  if (upright > 0) {
    const wall = wallCoefficients(box);
    windward += (wall.windward - windward) * upright;
    lee += (wall.lee - lee) * upright;
    side += (wall.side - side) * upright;
  }
  const square = cosine * cosine;
  return square * (cosine >= 0 ? windward : lee) + (1 - square) * side;
}

/** Walls: windward D, lee E, and the mean of A, B, C along a side. EN 1991-1-4:2005+A1 Table 7.1, Fig. 7.5. */
export function wallCoefficients(box: WindBox): { windward: number; lee: number; side: number } {
  const ratio = box.heightM / box.alongM;
  const read = (value: (row: (typeof WALLS)[number]) => number) =>
    interpolate(WALLS, ratio, (row) => row.heightToDepth, value);
  const e = Math.min(box.acrossM, 2 * box.heightM);
  const a = Math.min(1, e / 5 / box.alongM);
  const b = Math.min(1, e / box.alongM) - a;
  return {
    windward: read((row) => row.d),
    lee: read((row) => row.e),
    side: a * SIDE_WALL.a + b * SIDE_WALL.b + (1 - a - b) * SIDE_WALL.c,
  };
}
