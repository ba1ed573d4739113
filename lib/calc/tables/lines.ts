import type { KnotId, LineMaterialId } from "../types";

/**
 * Guy line. Breaking load = coefficient × d² (d in mm).
 * Sources: polyester and nylon by EN 564 / UIAA 102, F_min = 200·d² N for 4…8 mm cord (from memory), extended to thinner
 * cord (judgement); UHMWPE braid 850·d², lower end of suppliers' data (from memory). `wetFactor`: nylon loses 10–15 % wet
 * (from memory), and guy lines are wet when it matters. `knotCap` is the most that a knot is trusted with: slick UHMWPE
 * slips and creeps, modern synthetics do not reach the figures of natural fibre (judgement).
 */
export interface LineRow {
  readonly material: LineMaterialId;
  readonly name: string;
  readonly breakingCoefficientNmm2: number;
  readonly wetFactor: number;
  readonly knotCap: number;
}

export const LINES: readonly LineRow[] = [
  { material: "polyester", name: "Polyester", breakingCoefficientNmm2: 200, wetFactor: 1, knotCap: 0.6 },
  { material: "nylon", name: "Nylon", breakingCoefficientNmm2: 200, wetFactor: 0.87, knotCap: 0.6 },
  { material: "uhmwpe", name: "UHMWPE", breakingCoefficientNmm2: 850, wetFactor: 1, knotCap: 0.35 },
];

/**
 * Knots: share of the line's strength left.
 * Source: Day, The Art of Knotting and Splicing (1970) and Plymouth Cordage tables (1946) for laid natural-fibre rope;
 * figures marked judgement are ours (friction hitches slip before the line breaks).
 */
export interface KnotRow {
  readonly id: KnotId;
  readonly name: string;
  readonly efficiency: number;
  readonly source: string;
}

const DAY = "Day, The Art of Knotting and Splicing (1970)";

export const KNOTS: readonly KnotRow[] = [
  { id: "bowline", name: "Bowline", efficiency: 0.6, source: DAY },
  { id: "two-half-hitches", name: "Two half hitches", efficiency: 0.75, source: DAY },
  {
    id: "round-turn-two-half-hitches",
    name: "Round turn and two half hitches",
    efficiency: 0.75,
    source: `${DAY}, as two half hitches`,
  },
  { id: "clove-hitch", name: "Clove hitch", efficiency: 0.75, source: DAY },
  { id: "timber-hitch", name: "Timber hitch", efficiency: 0.7, source: DAY },
  { id: "sheet-bend", name: "Sheet bend", efficiency: 0.5, source: "45–55 %, from memory" },
  { id: "figure-eight-loop", name: "Figure-eight loop", efficiency: 0.48, source: `${DAY}, figure-eight` },
  {
    id: "taut-line-hitch",
    name: "Taut-line hitch",
    efficiency: 0.5,
    source: "judgement: slips before the line breaks",
  },
  { id: "truckers-hitch", name: "Trucker's hitch", efficiency: 0.5, source: "judgement" },
  { id: "anchor-bend", name: "Anchor bend", efficiency: 0.7, source: DAY },
];
