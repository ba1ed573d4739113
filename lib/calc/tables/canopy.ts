/**
 * Overall force coefficients c_f of free-standing canopies and their local net coefficients c_p,net.
 * EN 1991-1-4:2005+A1:2010 Tables 7.6 (monopitch) and 7.7 (duopitch).
 *
 * Legend: `angleDeg` roof slope α; `max` downward, for every blockage φ; `minOpen` upward at φ = 0; `minBlocked` upward
 * at φ = 1. Positive presses the roof down. Between rows and between φ = 0 and 1 interpolate linearly.
 */
export interface CanopyRow {
  readonly angleDeg: number;
  readonly max: number;
  readonly minOpen: number;
  readonly minBlocked: number;
}

export const MONOPITCH_CANOPY: readonly CanopyRow[] = [
  { angleDeg: 0, max: 0.2, minOpen: -0.5, minBlocked: -1.3 },
  { angleDeg: 5, max: 0.4, minOpen: -0.7, minBlocked: -1.4 },
  { angleDeg: 10, max: 0.5, minOpen: -0.9, minBlocked: -1.4 },
  { angleDeg: 15, max: 0.7, minOpen: -1.1, minBlocked: -1.4 },
  { angleDeg: 20, max: 0.8, minOpen: -1.3, minBlocked: -1.4 },
  { angleDeg: 25, max: 1, minOpen: -1.6, minBlocked: -1.4 },
  { angleDeg: 30, max: 1.2, minOpen: -1.8, minBlocked: -1.4 },
];

/** The value of row 20° at φ = 1 is −1.4 in public code and −1.3 from memory; the more cautious one is kept. */
export const DUOPITCH_CANOPY: readonly CanopyRow[] = [
  { angleDeg: -20, max: 0.7, minOpen: -0.7, minBlocked: -1.3 },
  { angleDeg: -15, max: 0.5, minOpen: -0.6, minBlocked: -1.4 },
  { angleDeg: -10, max: 0.4, minOpen: -0.6, minBlocked: -1.4 },
  { angleDeg: -5, max: 0.3, minOpen: -0.5, minBlocked: -1.3 },
  { angleDeg: 5, max: 0.3, minOpen: -0.6, minBlocked: -1.3 },
  { angleDeg: 10, max: 0.4, minOpen: -0.7, minBlocked: -1.3 },
  { angleDeg: 15, max: 0.4, minOpen: -0.8, minBlocked: -1.3 },
  { angleDeg: 20, max: 0.6, minOpen: -0.9, minBlocked: -1.4 },
  { angleDeg: 25, max: 0.7, minOpen: -1, minBlocked: -1.3 },
  { angleDeg: 30, max: 0.9, minOpen: -1, minBlocked: -1.3 },
];

export const CANOPY_SOURCE = "EN 1991-1-4:2005+A1 §7.3, Tables 7.6 and 7.7";
