import type { ExposureCategory } from "../types";

/**
 * Terrain categories. Source: EN 1991-1-4:2005+A1 Table 4.1 (roughness length z0, minimum height z_min).
 * `campSign` says in camp words where the category belongs (judgement).
 */
export interface ExposureRow {
  readonly category: ExposureCategory;
  readonly name: string;
  readonly roughnessLengthM: number;
  readonly minHeightM: number;
  readonly campSign: string;
}

export const EXPOSURES: readonly ExposureRow[] = [
  {
    category: "0",
    name: "Open sea coast",
    roughnessLengthM: 0.003,
    minHeightM: 1,
    campSign: "On the shore, wind straight off the sea.",
  },
  {
    category: "I",
    name: "Lake shore or bare flat",
    roughnessLengthM: 0.01,
    minHeightM: 1,
    campSign: "Lake shore, sand or snow flat, bare ridge: nothing that breaks the wind.",
  },
  {
    category: "II",
    name: "Open country",
    roughnessLengthM: 0.05,
    minHeightM: 2,
    campSign: "Grass, heath, single trees or huts at least twenty heights apart.",
  },
  {
    category: "III",
    name: "Scattered woods",
    roughnessLengthM: 0.3,
    minHeightM: 5,
    campSign: "Regular cover of trees, hedges or houses; a glade in a wood.",
  },
  {
    category: "IV",
    name: "Built up",
    roughnessLengthM: 1,
    minHeightM: 10,
    campSign: "At least a seventh of the ground covered by buildings higher than 15 m.",
  },
];
