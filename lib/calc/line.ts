import { requireInRange } from "./constants";
import { KNOTS, LINES, type KnotRow, type LineRow } from "./tables/lines";
import type { KnotId, LineMaterialId } from "./types";

const LINE_BY_MATERIAL: ReadonlyMap<LineMaterialId, LineRow> = new Map(LINES.map((row) => [row.material, row]));
const KNOT_BY_ID: ReadonlyMap<KnotId, KnotRow> = new Map(KNOTS.map((row) => [row.id, row]));

/** Scatter of the strength of line and knot (σ of the logarithm; judgement: tests of knots spread by 10–20 %). */
export const LINE_SCATTER = 0.15;

/** The table row of a line material. @throws RangeError when it is not known. */
export function lineRow(material: LineMaterialId): LineRow {
  const row = LINE_BY_MATERIAL.get(material);
  if (row === undefined) throw new RangeError(`rigging.line.material is not known: ${String(material)}`);
  return row;
}

/** The table row of a knot. @throws RangeError when it is not known. */
export function knotRow(id: KnotId): KnotRow {
  const row = KNOT_BY_ID.get(id);
  if (row === undefined) throw new RangeError(`rigging.knot is not known: ${String(id)}`);
  return row;
}

/**
 * Breaking load of dry line without a knot, N.
 * @param diameterMm 0.8…20 mm
 * @throws RangeError outside. Source: EN 564 / UIAA 102, F = 200·d² (from memory); tables/lines.ts.
 */
export function lineBreakingLoadN(material: LineMaterialId, diameterMm: number): number {
  requireInRange("rigging.line.diameterMm", diameterMm, 0.8, 20);
  return lineRow(material).breakingCoefficientNmm2 * diameterMm * diameterMm;
}

/** Share of the line's strength left at the knot: the published figure, capped for the material (tables/lines.ts). */
export function knotEfficiency(knot: KnotId, material: LineMaterialId): number {
  return Math.min(knotRow(knot).efficiency, lineRow(material).knotCap);
}

/** What a wet line holds at its knot, N. */
export function lineStrengthN(material: LineMaterialId, diameterMm: number, knot: KnotId): number {
  return lineBreakingLoadN(material, diameterMm) * lineRow(material).wetFactor * knotEfficiency(knot, material);
}
