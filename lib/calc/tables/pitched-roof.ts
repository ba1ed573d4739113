/**
 * External pressure coefficients of pitched roofs and walls.
 * EN 1991-1-4:2005+A1:2010 Table 7.4a (wind across the ridge), 7.4b (along it) and 7.1 (walls).
 *
 * Legend: values for loaded areas of 10 m² and 1 m² (`…10`, `…1`); `max` is the pressing value of the zone, where the
 * table gives two signs. Zones: G windward eaves strip, H rest of the windward slope, I lee slope, J lee strip at the ridge.
 */
export interface PitchedRoofRow {
  readonly angleDeg: number;
  readonly g10: number;
  readonly g1: number;
  readonly gMax: number;
  readonly h10: number;
  readonly h1: number;
  readonly hMax: number;
  readonly iMin: number;
  readonly iMax: number;
  readonly jMin: number;
  readonly jMax: number;
}

export const PITCHED_ROOF_ACROSS: readonly PitchedRoofRow[] = [
  {
    angleDeg: 5,
    g10: -1.2,
    g1: -2,
    gMax: 0,
    h10: -0.6,
    h1: -1.2,
    hMax: 0,
    iMin: -0.6,
    iMax: -0.6,
    jMin: -0.6,
    jMax: 0.2,
  },
  {
    angleDeg: 15,
    g10: -0.8,
    g1: -1.5,
    gMax: 0.2,
    h10: -0.3,
    h1: -0.3,
    hMax: 0.2,
    iMin: -0.4,
    iMax: 0,
    jMin: -1,
    jMax: 0,
  },
  {
    angleDeg: 30,
    g10: -0.5,
    g1: -1.5,
    gMax: 0.7,
    h10: -0.2,
    h1: -0.2,
    hMax: 0.4,
    iMin: -0.4,
    iMax: 0,
    jMin: -0.5,
    jMax: 0,
  },
  { angleDeg: 45, g10: 0, g1: 0, gMax: 0.7, h10: 0, h1: 0, hMax: 0.6, iMin: -0.2, iMax: 0, jMin: -0.3, jMax: 0 },
  {
    angleDeg: 60,
    g10: 0.7,
    g1: 0.7,
    gMax: 0.7,
    h10: 0.7,
    h1: 0.7,
    hMax: 0.7,
    iMin: -0.2,
    iMax: -0.2,
    jMin: -0.3,
    jMax: -0.3,
  },
  {
    angleDeg: 75,
    g10: 0.8,
    g1: 0.8,
    gMax: 0.8,
    h10: 0.8,
    h1: 0.8,
    hMax: 0.8,
    iMin: -0.2,
    iMax: -0.2,
    jMin: -0.3,
    jMax: -0.3,
  },
];

/** Along the ridge: G first strip e/10, H from there to e/2, I the rest. Rows 5°, 15° and 75° from memory. */
export interface PitchedRoofAlongRow {
  readonly angleDeg: number;
  readonly g10: number;
  readonly g1: number;
  readonly h10: number;
  readonly h1: number;
  readonly i: number;
}

export const PITCHED_ROOF_ALONG: readonly PitchedRoofAlongRow[] = [
  { angleDeg: 5, g10: -1.3, g1: -2, h10: -0.7, h1: -1.2, i: -0.6 },
  { angleDeg: 15, g10: -1.3, g1: -2, h10: -0.6, h1: -1.2, i: -0.5 },
  { angleDeg: 30, g10: -1.4, g1: -2, h10: -0.8, h1: -1.2, i: -0.5 },
  { angleDeg: 45, g10: -1.4, g1: -2, h10: -0.9, h1: -1.2, i: -0.5 },
  { angleDeg: 60, g10: -1.2, g1: -2, h10: -0.8, h1: -1, i: -0.5 },
  { angleDeg: 75, g10: -1.2, g1: -2, h10: -0.8, h1: -1, i: -0.5 },
];

/** Walls by height to depth: D windward, E lee. Side walls: A −1.2 (to e/5), B −0.8 (to e), C −0.5 (the rest). */
export const WALLS: readonly { readonly heightToDepth: number; readonly d: number; readonly e: number }[] = [
  { heightToDepth: 0.25, d: 0.7, e: -0.3 },
  { heightToDepth: 1, d: 0.8, e: -0.5 },
  { heightToDepth: 5, d: 0.8, e: -0.7 },
];
export const SIDE_WALL = { a: -1.2, b: -0.8, c: -0.5 } as const;

/** Internal pressure of a shelter that is shut: the worse of the two. EN 1991-1-4 §7.2.9(6), note 2. */
export const INTERNAL_SHUT = { lifting: 0.2, pressing: -0.3 } as const;
/** Internal pressure behind a dominant opening, share of the pressure at it. EN 1991-1-4 §7.2.9(5), from memory. */
export const INTERNAL_OPENING = { low: 0.75, high: 0.9 } as const;

export const PITCHED_ROOF_SOURCE = "EN 1991-1-4:2005+A1 §7.2.5 Tables 7.4a/b, §7.2.2 Table 7.1, §7.2.9";

/** Vault and dome springing from the ground, rise ÷ span 0.5: windward, crown, lee. Figures 7.11 and 7.12, from memory. */
export const VAULT = { windward: 0.8, crown: -1.2, lee: -0.4 } as const;
export const DOME_POINTS = { windward: 0.8, crown: -1.2, lee: 0 } as const;
export const VAULT_SOURCE = "EN 1991-1-4:2005+A1 Figs. 7.11, 7.12 read from memory: low confidence";
