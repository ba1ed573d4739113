import type { Windbreak } from "../types";

/**
 * Wind speed behind a windbreak as a share of the open wind, by distance in heights of the windbreak.
 * Source: Brandle & Finch, "How windbreaks work" (EC91-1763-B), table of wind speed reductions (from memory).
 * Columns: 5, 10, 15, 20 and 30 heights downwind.
 */
export const WINDBREAK_DISTANCES_H: readonly number[] = [5, 10, 15, 20, 30];

export interface WindbreakRow {
  readonly kind: Windbreak["kind"];
  readonly name: string;
  readonly speedRatios: readonly number[];
}

export const WINDBREAKS: readonly WindbreakRow[] = [
  { kind: "deciduous-row", name: "One row of broadleaved trees", speedRatios: [0.5, 0.65, 0.8, 0.85, 0.95] },
  { kind: "conifer-row", name: "One row of conifers", speedRatios: [0.3, 0.5, 0.6, 0.75, 0.95] },
  { kind: "conifer-belt", name: "Belt of conifers", speedRatios: [0.25, 0.35, 0.65, 0.85, 0.95] },
  { kind: "solid", name: "Wall or solid fence", speedRatios: [0.25, 0.7, 0.9, 0.95, 1] },
];
