import type { MaterialId } from "../types";

/**
 * Materials of stakes. Legend: yield strength f_y (typical; modulus of rupture for wood), density, whether a plastic
 * hinge can form (metals) or the extreme fibre decides (plastics, wood), and scatter of the bending strength.
 * Source: handbook values (ASM/MMPDS typical for metals, supplier data for plastics, USDA Wood Handbook for oak, ash and
 * beech), all from memory. Plastics and wood carry a factor for notches, ageing and cold (judgement), given in `strengthFactor`.
 */
export interface MaterialRow {
  readonly id: MaterialId;
  readonly name: string;
  readonly yieldStrengthPa: number;
  readonly densityKgM3: number;
  readonly isDuctile: boolean;
  readonly strengthFactor: number;
  readonly scatter: number;
}

export const MATERIALS: readonly MaterialRow[] = [
  {
    id: "aluminium-7075",
    name: "Aluminium 7075-T6",
    yieldStrengthPa: 503e6,
    densityKgM3: 2810,
    isDuctile: true,
    strengthFactor: 1,
    scatter: 0.1,
  },
  {
    id: "aluminium-6061",
    name: "Aluminium 6061-T6",
    yieldStrengthPa: 276e6,
    densityKgM3: 2700,
    isDuctile: true,
    strengthFactor: 1,
    scatter: 0.1,
  },
  {
    id: "titanium-alloy",
    name: "Titanium alloy 6Al-4V",
    yieldStrengthPa: 880e6,
    densityKgM3: 4430,
    isDuctile: true,
    strengthFactor: 1,
    scatter: 0.1,
  },
  {
    id: "titanium-grade-2",
    name: "Titanium grade 2",
    yieldStrengthPa: 275e6,
    densityKgM3: 4510,
    isDuctile: true,
    strengthFactor: 1,
    scatter: 0.1,
  },
  {
    id: "mild-steel",
    name: "Mild steel",
    yieldStrengthPa: 250e6,
    densityKgM3: 7850,
    isDuctile: true,
    strengthFactor: 1,
    scatter: 0.1,
  },
  {
    id: "spring-steel",
    name: "Hardened spring steel",
    yieldStrengthPa: 1100e6,
    densityKgM3: 7850,
    isDuctile: true,
    strengthFactor: 1,
    scatter: 0.1,
  },
  {
    id: "plastic-abs",
    name: "ABS plastic",
    yieldStrengthPa: 40e6,
    densityKgM3: 1050,
    isDuctile: false,
    strengthFactor: 0.9,
    scatter: 0.2,
  },
  {
    id: "polycarbonate",
    name: "Polycarbonate",
    yieldStrengthPa: 62e6,
    densityKgM3: 1200,
    isDuctile: false,
    strengthFactor: 0.9,
    scatter: 0.2,
  },
  {
    id: "hardwood",
    name: "Hardwood, air-dry",
    yieldStrengthPa: 100e6,
    densityKgM3: 700,
    isDuctile: false,
    strengthFactor: 0.6,
    scatter: 0.25,
  },
];
