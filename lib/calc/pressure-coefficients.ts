import type { LoadCase, ShelterModel, Vec3 } from "./types";
import { CANOPY_SOURCE, DUOPITCH_CANOPY, MONOPITCH_CANOPY, type CanopyRow } from "./tables/canopy";
import {
  DOME_POINTS,
  INTERNAL_OPENING,
  INTERNAL_SHUT,
  PITCHED_ROOF_ACROSS,
  PITCHED_ROOF_ALONG,
  PITCHED_ROOF_SOURCE,
  SIDE_WALL,
  VAULT,
  VAULT_SOURCE,
  WALLS,
} from "./tables/pitched-roof";
import { add, cross, lengthOf, scale, subtract } from "./vectors";

const RADIANS = Math.PI / 180;

/** Value at `at` on a line of points sorted by `key`; held constant beyond both ends. */
function interpolate<T>(rows: readonly T[], at: number, key: (row: T) => number, value: (row: T) => number): number {
  let before = rows[0];
  if (before === undefined) throw new RangeError("The table has no rows.");
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

interface Opening {
  /** Which way the opening looks, clockwise from the front. */
  readonly bearingDeg: number;
  readonly areaM2: number;
}

/** Open sides of the open kinds, by the drawn shape; a shelter that is shut or a flat roof has none. */
function openingsOf({ kind, drawing: { outline, poleFeet } }: ShelterModel): readonly Opening[] {
  const heights = outline.map((point) => point.z);
  const [high, low] = [Math.max(...heights), Math.min(...heights)];
  const halfWidthM = Math.max(...outline.map((point) => point.x));
  const lengthM = Math.max(...outline.map((point) => point.y)) - Math.min(...outline.map((point) => point.y));
  switch (kind) {
    case "ridge-tarp": {
      const endM2 = halfWidthM * (high + low);
      const gapM2 = lengthM * low;
      return [
        { bearingDeg: 0, areaM2: endM2 },
        { bearingDeg: 90, areaM2: gapM2 },
        { bearingDeg: 180, areaM2: endM2 },
        { bearingDeg: 270, areaM2: gapM2 },
      ];
    }
    case "poncho-lean-to":
      return [
        { bearingDeg: 0, areaM2: 2 * halfWidthM * high },
        { bearingDeg: 90, areaM2: (lengthM * high) / 2 },
        { bearingDeg: 270, areaM2: (lengthM * high) / 2 },
      ];
    case "diamond":
      return [
        { bearingDeg: 45, areaM2: 1 },
        { bearingDeg: 315, areaM2: 1 },
      ];
    case "half-pyramid":
      return poleFeet.length > 0 ? [{ bearingDeg: 0, areaM2: 1 }] : [];
    default:
      return [];
  }
}

/** Share of the wind's way under a tarp that sleepers and packs block when it blows through (judgement). */
const GEAR_BLOCKAGE = 0.2;

/**
 * Pressure inside. Shut: the worse of +0.2 and −0.3. With open sides: 0.75 to 0.90 of the external pressure at them,
 * averaged over the open area (the clause names one dominant face; the average is judgement). EN 1991-1-4 §7.2.9.
 */
export function internalCoefficient(
  model: ShelterModel,
  relativeWindDeg: number,
  box: WindBox,
  loadCase: LoadCase,
): number {
  const openings = openingsOf(model);
  if (openings.length === 0) return INTERNAL_SHUT[loadCase];
  const wall = wallCoefficients(box);
  let sum = 0;
  let areaM2 = 0;
  for (const opening of openings) {
    const cosine = Math.cos((relativeWindDeg - opening.bearingDeg) * RADIANS);
    const square = cosine * cosine;
    sum += opening.areaM2 * (square * (cosine >= 0 ? wall.windward : wall.lee) + (1 - square) * wall.side);
    areaM2 += opening.areaM2;
  }
  const bounds = [(INTERNAL_OPENING.low * sum) / areaM2, (INTERNAL_OPENING.high * sum) / areaM2];
  // Open all round below the hems: the values of a shut shelter bound the lifting case as well.
  if (model.kind === "ridge-tarp" && loadCase === "lifting") bounds.push(INTERNAL_SHUT.lifting);
  return loadCase === "pressing" ? Math.min(...bounds) : Math.max(...bounds);
}

export interface PanelCoefficient {
  readonly zone: string;
  /** Net coefficient: positive presses the cloth inward. */
  readonly net: number;
  /** External and internal part; null where a canopy table gives the net value at once. */
  readonly external: number | null;
  readonly internal: number | null;
  readonly source: string;
}

interface Face {
  readonly normal: Vec3;
  readonly areaM2: number;
  readonly middle: Vec3;
  readonly slopeDeg: number;
}

function measureFaces(model: ShelterModel): Face[] {
  return model.panels.map(({ nodes }) => {
    const [a, b, c, d] = nodes.map((node) => model.nodes[node]?.position ?? { x: 0, y: 0, z: 0 });
    if (!a || !b || !c || !d) throw new RangeError("A panel needs four corners.");
    const vector = scale(cross(subtract(c, a), subtract(d, b)), 0.5);
    const areaM2 = lengthOf(vector);
    const normal = scale(vector, 1 / areaM2);
    return {
      normal,
      areaM2,
      middle: scale(add(add(a, b), add(c, d)), 0.25),
      slopeDeg: Math.acos(Math.min(1, Math.max(-1, normal.z))) / RADIANS,
    };
  });
}

function measureBox(
  model: ShelterModel,
  faces: readonly Face[],
  towards: { x: number; y: number },
): WindBox & { first: number } {
  let [heightM, low, high, left, right] = [0, Infinity, -Infinity, Infinity, -Infinity];
  for (const { nodes } of model.panels) {
    for (const node of nodes) {
      const { x, y, z } = model.nodes[node]?.position ?? { x: 0, y: 0, z: 0 };
      heightM = Math.max(heightM, z);
      const ahead = x * towards.x + y * towards.y;
      const beside = x * towards.y - y * towards.x;
      [low, high] = [Math.min(low, ahead), Math.max(high, ahead)];
      [left, right] = [Math.min(left, beside), Math.max(right, beside)];
    }
  }
  const area = faces.reduce((sum, face) => sum + face.areaM2, 0);
  return { heightM, alongM: high - low, acrossM: right - left, loadedAreaM2: area / 2, first: -high };
}

/**
 * Net pressure coefficient of every panel of a shelter, by its drawn shape.
 *
 * Flat flying tarps: Table 7.6, the centre of pressure a quarter of the depth behind the windward edge (Fig. 7.16).
 * Tarps with a ridge up to 30°: Table 7.7; pressing wind across loads the windward slope alone, as the clause demands.
 * From 45° the faces of a pitched roof less the pressure inside; between 30° and 45° linear between the two (judgement).
 * Closed tents: Tables 7.4 and 7.1 less internal pressure. Vaults and domes: Figs. 7.11 and 7.12 (low confidence).
 *
 * @param model from `buildShelter`
 * @param relativeWindDeg where the wind comes from, clockwise from the shelter's front
 * @param loadCase pressing or lifting
 */
export function panelCoefficients(
  model: ShelterModel,
  relativeWindDeg: number,
  loadCase: LoadCase,
): PanelCoefficient[] {
  const faces = measureFaces(model);
  // Unit vector to where the wind comes from.
  const source = { x: Math.sin(relativeWindDeg * RADIANS), y: Math.cos(relativeWindDeg * RADIANS) };
  const box = measureBox(model, faces, source);
  const internal = internalCoefficient(model, relativeWindDeg, box, loadCase);
  const halfWidthM = Math.max(...model.drawing.outline.map((point) => point.x));
  return faces.map((face, index) => {
    const zone = model.panels[index]?.zone ?? "";
    const flat = Math.hypot(face.normal.x, face.normal.y);
    const cosine = flat < 1e-9 ? 0 : (face.normal.x * source.x + face.normal.y * source.y) / flat;
    if (model.kind === "flying-tarp") {
      const depth = (-(face.middle.x * source.x + face.middle.y * source.y) - box.first) / box.alongM;
      const { max, min } = canopyCoefficient("monopitch", Math.min(30, face.slopeDeg), 0);
      const net = (loadCase === "pressing" ? max : min) * (1 + 1.5 * (1 - 2 * depth));
      return { zone, net, external: null, internal: null, source: CANOPY_SOURCE };
    }
    if (model.kind === "dome") {
      const external = alongArc(-(face.normal.x * source.x + face.normal.y * source.y), DOME_POINTS);
      return { zone, net: external - internal, external, internal, source: VAULT_SOURCE };
    }
    if (model.kind === "tunnel" && zone === "vault") {
      const external = vaultCoefficient(face, halfWidthM, source, box, loadCase);
      return { zone, net: external - internal, external, internal, source: VAULT_SOURCE };
    }
    const external = faceCoefficient(face.slopeDeg, cosine, box, loadCase);
    const closed = { zone, net: external - internal, external, internal, source: PITCHED_ROOF_SOURCE };
    const isCanopy = model.kind === "ridge-tarp" || model.kind === "diamond" || model.kind === "poncho-lean-to";
    if (!isCanopy || face.slopeDeg >= 45) return closed;
    const steep = Math.max(0, (face.slopeDeg - 30) / 15);
    const canopyShare = (1 - steep) * (loadCase === "lifting" ? entryShare(model, source) : 1);
    const net = closed.net + (openCoefficient(model, face, cosine, loadCase) - closed.net) * canopyShare;
    return { ...closed, net, source: `${CANOPY_SOURCE}; ${PITCHED_ROOF_SOURCE}` };
  });
}

/**
 * How far the wind gets under the tarp to lift it, 0…1 (judgement): everywhere under raised hems; under a lean-to or a
 * diamond, whose rear stands on the ground, fully from the front and not from the rear.
 */
function entryShare(model: ShelterModel, source: { x: number; y: number }): number {
  return model.kind === "ridge-tarp" || source.y >= 0 ? 1 : 1 - source.y * source.y;
}

/**
 * A panel of an open tarp of up to 30°, by the canopy tables; steeper ones take the row of 30°. Lifting holds for every
 * direction. Pressing holds across the slope, on the windward slope alone; along it the wind meets no slope: row 0°.
 */
function openCoefficient(model: ShelterModel, face: Face, cosine: number, loadCase: LoadCase): number {
  const square = cosine * cosine;
  const angle = Math.min(30, face.slopeDeg);
  const heights = model.drawing.outline.map((point) => point.z);
  const hemShare = Math.min(...heights) / Math.max(...heights);
  const isLeanTo = model.kind === "poncho-lean-to";
  // A low hem on the lee side closes the way out; over a lean-to's back there is no way in.
  const across = isLeanTo && cosine >= 0 ? 0 : 1 - hemShare;
  const blockage = Math.min(1, square * across + (1 - square) * GEAR_BLOCKAGE);
  const { max, min } = canopyCoefficient(isLeanTo ? "monopitch" : "duopitch", angle, blockage);
  if (loadCase === "lifting") return min;
  const level = canopyCoefficient("monopitch", 0, 0).max;
  return (cosine >= 0 ? square * max : 0) + (1 - square) * level;
}

/** Linear along the arc from windward (downwind share −1) over the crown (0) to lee (1). */
function alongArc(downwind: number, points: { windward: number; crown: number; lee: number }): number {
  const quarter = Math.acos(Math.min(1, Math.max(-1, -downwind))) / (Math.PI / 2);
  return quarter <= 1
    ? points.windward + (points.crown - points.windward) * quarter
    : points.crown + (points.lee - points.crown) * (quarter - 1);
}

/**
 * Vault with its axis along y. Across the wind: a quarter, a half and a quarter of the arc, by the angle at which its
 * point would stand on a round vault. Along the wind: like the side of a 45° roof (judgement).
 */
function vaultCoefficient(
  face: Face,
  halfWidthM: number,
  source: { x: number; y: number },
  box: WindBox,
  loadCase: LoadCase,
): number {
  const upwind = (face.middle.x * Math.sign(source.x)) / halfWidthM;
  const rise = face.middle.z / box.heightM;
  const across = upwind > rise ? VAULT.windward : -upwind > rise ? VAULT.lee : VAULT.crown;
  const along = faceCoefficient(45, 0, box, loadCase);
  return source.x * source.x * across + source.y * source.y * along;
}
