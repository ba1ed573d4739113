import type { FabricId } from "../types";

/**
 * Stiffness of shelter fabrics.
 *
 * `stiffnessNPerM` is the secant membrane stiffness at working tension, N per metre of width: breaking strength divided
 * by elongation at break of typical cloths of that weight, rounded. `shearShare` is the stiffness of the shear diagonals
 * as a share of it: woven cloth gives easily along its bias. All rows are judgement; no maker's data sheet is quoted.
 */
export interface FabricRow {
  readonly id: FabricId;
  readonly name: string;
  readonly stiffnessNPerM: number;
  readonly shearShare: number;
  readonly massKgPerM2: number;
  readonly source: string;
}

const JUDGEMENT = "judgement (strength ÷ elongation at break of cloth of this weight)";

export const FABRICS: readonly FabricRow[] = [
  {
    id: "nylon-light",
    name: "Light coated nylon",
    stiffnessNPerM: 30_000,
    shearShare: 0.2,
    massKgPerM2: 0.045,
    source: JUDGEMENT,
  },
  {
    id: "polyester-light",
    name: "Light coated polyester",
    stiffnessNPerM: 50_000,
    shearShare: 0.2,
    massKgPerM2: 0.06,
    source: JUDGEMENT,
  },
  {
    id: "polyester-heavy",
    name: "Heavy coated polyester",
    stiffnessNPerM: 110_000,
    shearShare: 0.2,
    massKgPerM2: 0.15,
    source: JUDGEMENT,
  },
  {
    id: "cotton-canvas",
    name: "Cotton canvas",
    stiffnessNPerM: 90_000,
    shearShare: 0.15,
    massKgPerM2: 0.3,
    source: JUDGEMENT,
  },
  {
    id: "laminate",
    name: "Laminate film with fibres",
    stiffnessNPerM: 200_000,
    shearShare: 0.25,
    massKgPerM2: 0.035,
    source: JUDGEMENT,
  },
];

/** Row of a fabric. Throws RangeError when there is none. */
export function fabricRow(id: FabricId): FabricRow {
  const row = FABRICS.find((fabric) => fabric.id === id);
  if (!row) throw new RangeError(`There is no fabric "${id}".`);
  return row;
}
