import { canopyCoefficient, faceCoefficient, wallCoefficients, type WindBox } from "./face-coefficients";
import { itemAt } from "./indexed";
import { CANOPY_SOURCE } from "./tables/canopy";
import {
  DOME_POINTS,
  INTERNAL_OPENING,
  INTERNAL_SHUT,
  PITCHED_ROOF_SOURCE,
  VAULT,
  VAULT_SOURCE,
} from "./tables/pitched-roof";
import type { LoadCase, ShelterModel, Vec3 } from "./types";
import { add, cross, lengthOf, scale, subtract } from "./vectors";

const RADIANS = Math.PI / 180;

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
    const at = (corner: number) => itemAt(model.nodes, itemAt(nodes, corner)).position;
    const [a, b, c, d] = [at(0), at(1), at(2), at(3)];
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
      const { x, y, z } = itemAt(model.nodes, node).position;
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
    const { zone } = itemAt(model.panels, index);
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
