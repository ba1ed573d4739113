import { requireInRange } from "./constants";
import { materialRow } from "./materials";
import type { MaterialId, StakeSection } from "./types";

/** What the calculation needs of a stake's cross-section. Moduli are for the weaker way the pull can meet it. */
export interface SectionProperties {
  /** Width that presses on the ground, m. */
  readonly widthM: number;
  /** Outline of the shape that encloses it, where soil shears on soil or slides on the shaft, m. */
  readonly perimeterM: number;
  readonly areaM2: number;
  readonly secondMomentM4: number;
  /** Elastic modulus S = I / extreme fibre, m³. */
  readonly elasticModulusM3: number;
  /** Plastic modulus Z, m³. */
  readonly plasticModulusM3: number;
  /** True where ground is caught between blades or legs and shears with them. */
  readonly isBladed: boolean;
}

/**
 * Section properties from the geometry of thin plates and bars.
 * - Three-blade (Y): I = t·b³/2 in any direction, S = I/b, Z = √3/2·b²·t (smaller of the two main directions); width
 *   √3·b, the projected width with one blade in the line of pull; perimeter of the enclosing triangle.
 * - V: bending in its plane of symmetry (weaker), I = t·b³/12, S = I/(0.3536 b), Z = 0.3536 b²·t; width √2·b.
 * - Wide: a shallow parabolic arc of the given depth; T: flange pressed against the ground.
 * @throws RangeError naming a dimension that is not physical
 * Source: strength of materials (e.g. Roark, 7th ed., Appendix A for bars and tubes); thin Y, V and arc by integration.
 */
export function sectionProperties(section: StakeSection): SectionProperties {
  switch (section.shape) {
    case "three-blade":
      return threeBlade(section.bladeM, section.thicknessM);
    case "v":
      return thinV(section.legM, section.thicknessM);
    case "round":
      return tube(section.diameterM, section.diameterM / 2);
    case "tube":
      requireInRange("section.wallM", section.wallM, 1e-4, section.diameterM / 2);
      return tube(section.diameterM, section.wallM);
    case "wide":
      return arc(section.widthM, section.depthM, section.thicknessM);
    case "t":
      return tee(section.widthM, section.depthM, section.thicknessM);
  }
}

function threeBlade(b: number, t: number): SectionProperties {
  requireInRange("section.bladeM", b, 0.002, 0.2);
  requireInRange("section.thicknessM", t, 2e-4, b);
  const secondMomentM4 = (t * b ** 3) / 2;
  return {
    widthM: Math.sqrt(3) * b,
    perimeterM: 3 * Math.sqrt(3) * b,
    areaM2: 3 * b * t,
    secondMomentM4,
    elasticModulusM3: secondMomentM4 / b,
    plasticModulusM3: (Math.sqrt(3) / 2) * b * b * t,
    isBladed: true,
  };
}

function thinV(b: number, t: number): SectionProperties {
  requireInRange("section.legM", b, 0.002, 0.3);
  requireInRange("section.thicknessM", t, 2e-4, b);
  const secondMomentM4 = (t * b ** 3) / 12;
  return {
    widthM: Math.SQRT2 * b,
    perimeterM: (2 + Math.SQRT2) * b,
    areaM2: 2 * b * t,
    secondMomentM4,
    elasticModulusM3: secondMomentM4 / (b / (2 * Math.SQRT2)),
    plasticModulusM3: (b * b * t) / (2 * Math.SQRT2),
    isBladed: true,
  };
}

function tube(diameterM: number, wallM: number): SectionProperties {
  requireInRange("section.diameterM", diameterM, 0.001, 0.5);
  const inner = diameterM - 2 * wallM;
  const secondMomentM4 = (Math.PI / 64) * (diameterM ** 4 - inner ** 4);
  return {
    widthM: diameterM,
    perimeterM: Math.PI * diameterM,
    areaM2: (Math.PI / 4) * (diameterM ** 2 - inner ** 2),
    secondMomentM4,
    elasticModulusM3: (2 * secondMomentM4) / diameterM,
    plasticModulusM3: (diameterM ** 3 - inner ** 3) / 6,
    isBladed: false,
  };
}

/** Parabolic arc y = r(1 − u²): variance 4/45 r², mean 2/3 r, mean distance from the median line r/4; plus the plate's own. */
function arc(widthM: number, depthM: number, t: number): SectionProperties {
  requireInRange("section.widthM", widthM, 0.005, 0.5);
  requireInRange("section.thicknessM", t, 2e-4, 0.1);
  requireInRange("section.depthM", depthM, t, 0.3);
  const rise = depthM - t;
  const areaM2 = widthM * t;
  const secondMomentM4 = areaM2 * ((4 / 45) * rise * rise) + (widthM * t ** 3) / 12;
  return {
    widthM,
    perimeterM: 2 * (widthM + depthM),
    areaM2,
    secondMomentM4,
    elasticModulusM3: secondMomentM4 / ((2 / 3) * rise + t / 2),
    plasticModulusM3: Math.max((areaM2 * rise) / 4, (widthM * t * t) / 4),
    isBladed: depthM > 4 * t,
  };
}

function tee(widthM: number, depthM: number, t: number): SectionProperties {
  requireInRange("section.widthM", widthM, 0.004, 0.3);
  requireInRange("section.depthM", depthM, 0.004, 0.3);
  requireInRange("section.thicknessM", t, 2e-4, Math.min(widthM, depthM) * 0.999);
  const web = depthM - t;
  const flangeArea = widthM * t;
  const webArea = web * t;
  const areaM2 = flangeArea + webArea;
  const centroid = (flangeArea * (t / 2) + webArea * (t + web / 2)) / areaM2;
  const secondMomentM4 =
    (widthM * t ** 3) / 12 +
    flangeArea * (centroid - t / 2) ** 2 +
    (t * web ** 3) / 12 +
    webArea * (t + web / 2 - centroid) ** 2;
  // Equal-area axis: in the flange when the flange is the larger part, else in the web.
  const half = areaM2 / 2;
  const axis = flangeArea >= half ? half / widthM : t + (half - flangeArea) / t;
  const plasticModulusM3 =
    axis <= t
      ? (widthM * axis ** 2) / 2 + (widthM * (t - axis) ** 2) / 2 + webArea * (t + web / 2 - axis)
      : flangeArea * (axis - t / 2) + (t * (axis - t) ** 2) / 2 + (t * (depthM - axis) ** 2) / 2;
  return {
    widthM,
    perimeterM: 2 * (widthM + depthM),
    areaM2,
    secondMomentM4,
    elasticModulusM3: secondMomentM4 / Math.max(centroid, depthM - centroid),
    plasticModulusM3,
    isBladed: true,
  };
}

/**
 * Bending strength of a section, N·m: f_y·Z where the material can form a plastic hinge, else f_y·S, times the
 * material's factor for notches, ageing and cold; and the moment at first yield f_y·S.
 */
export function bendingStrength(
  properties: SectionProperties,
  material: MaterialId,
): { readonly ultimateNm: number; readonly firstYieldNm: number; readonly scatter: number } {
  const row = materialRow(material);
  const strengthPa = row.yieldStrengthPa * row.strengthFactor;
  const firstYieldNm = strengthPa * properties.elasticModulusM3;
  return {
    firstYieldNm,
    ultimateNm: row.isDuctile ? strengthPa * properties.plasticModulusM3 : firstYieldNm,
    scatter: row.scatter,
  };
}
