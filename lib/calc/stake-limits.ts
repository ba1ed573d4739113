import { obliqueTensionN, shaftResistance, type ShaftResistance } from "./axial";
import type { GroundNumbers } from "./ground";
import { type LeanFactors, leanFactors } from "./lean";
import { bendingStrength, sectionProperties, type SectionProperties } from "./section";
import {
  brinchHansenCoefficients,
  CRUSHING_COEFFICIENTS,
  pileResistance,
  type PileResistance,
  type PressureCoefficients,
} from "./stake";
import type { MaterialId, StakeSection } from "./types";
import { radiansFromDegrees, STANDARD_GRAVITY_MS2 } from "./units";

export type DrivableGround = Exclude<GroundNumbers, { kind: "undriveable" }>;

export interface DrivenInput {
  readonly section: StakeSection;
  readonly material: MaterialId;
  readonly lengthM: number;
  readonly depthOutM: number;
  readonly leanDeg: number;
  readonly lineAngleDeg: number;
  readonly rockKg: number;
  readonly ground: DrivableGround;
  /** Multiplies the resistance of the ground: pull tests and loosening. */
  readonly strengthFactor: number;
}

/** Everything found on the way to what a driven stake holds; the working is written from it. */
export interface DrivenDetail {
  readonly properties: SectionProperties;
  readonly embeddedM: number;
  readonly resistingM: number;
  readonly eccentricityM: number;
  readonly leanFactors: LeanFactors;
  readonly pile: PileResistance;
  readonly shaft: ShaftResistance;
  readonly rockNormalN: number;
  readonly rockAxialN: number;
  readonly normalN: number;
  readonly bendingNormalN: number | null;
  readonly ultimateNm: number;
  readonly firstYieldNm: number;
  readonly groundTensionN: number;
  readonly bendingTensionN: number | null;
  readonly bendingScatter: number;
  /** True when the part of the pull along the stake decides, not the part across it. */
  readonly isDrawnOut: boolean;
}

/** A slope of loose material cannot be steeper than its angle of friction; this much is kept between them, degrees. */
const SLOPE_CLEARANCE_DEG = 3;
/** Share of the ground's scatter that reaches a stake that bends: its pull goes about with the root of ground strength (judgement). */
const BENDING_GROUND_SHARE = 0.5;
/** Less ground than this along the stake holds nothing worth counting, m (judgement). */
export const LEAST_RESISTING_LENGTH_M = 0.03;

/** Length of the stake in the ground, along it, m: driven until the wanted length stands out or stones stop it. */
export function embeddedLengthM(lengthM: number, depthOutM: number, leanDeg: number, ground: DrivableGround): number {
  const stopM = ground.stopDepthM / Math.cos(radiansFromDegrees(leanDeg));
  return Math.max(0, Math.min(lengthM - depthOutM, stopM));
}

/** Length along the stake of the loose top layer, m. */
export function looseLengthM(leanDeg: number, ground: DrivableGround): number {
  return ground.looseTopM / Math.cos(radiansFromDegrees(leanDeg));
}

function coefficientsOf(ground: DrivableGround): PressureCoefficients {
  if (ground.kind === "snow") return CRUSHING_COEFFICIENTS;
  return brinchHansenCoefficients(ground.kind === "frictional" ? ground.frictionAngleDeg : 0);
}

function cohesionOf(ground: DrivableGround): number {
  switch (ground.kind) {
    case "undrained":
      return ground.shearStrengthPa;
    case "frictional":
      return ground.cohesionPa;
    case "snow":
      return ground.bearingPa;
  }
}

/**
 * Lean and slope factors of this ground on what it resists across the stake. A head leaning towards the pull would gain by
 * the wedge; driving loosens that side, so a gain is not counted (judgement).
 */
export function groundLeanFactors(ground: DrivableGround, leanDeg: number): LeanFactors {
  // Snow is crushed, not pushed out as a wedge: leaning back costs nothing; a slope does.
  const isSnow = ground.kind === "snow";
  const frictionAngleDeg = ground.kind === "frictional" ? ground.frictionAngleDeg : 0;
  const slopeDeg =
    ground.kind === "frictional" ? Math.min(ground.slopeDeg, frictionAngleDeg - SLOPE_CLEARANCE_DEG) : ground.slopeDeg;
  const { weight, cohesion } = leanFactors(frictionAngleDeg, isSnow ? 0 : leanDeg, slopeDeg);
  return { weight: Math.min(1, weight), cohesion: Math.min(1, cohesion) };
}

/**
 * What a driven stake holds in this ground, from its parts: the pile across its axis with lean factor, the shaft along
 * its axis, the stake's own bending strength, a rock on its front lip, and the two together at the line's angle.
 * Returns null when too little of it is in ground that resists.
 * Rock of weight W on the lip: + ½W·tan(π/4 + φ/2) across and + ½W along the stake (judgement).
 * Source: see stake.ts, lean.ts, axial.ts, section.ts.
 */
export function drivenDetail(input: DrivenInput): DrivenDetail | null {
  const { ground, leanDeg } = input;
  const properties = sectionProperties(input.section);
  const embeddedM = embeddedLengthM(input.lengthM, input.depthOutM, leanDeg, ground);
  const looseM = looseLengthM(leanDeg, ground);
  const resistingM = embeddedM - looseM;
  if (resistingM < LEAST_RESISTING_LENGTH_M) return null;
  const eccentricityM = input.lengthM - resistingM;
  const psi = groundLeanFactors(ground, leanDeg);
  const { ultimateNm, firstYieldNm, scatter: materialScatter } = bendingStrength(properties, input.material);
  const pile = pileResistance({
    coefficients: coefficientsOf(ground),
    widthM: properties.widthM,
    lengthM: resistingM,
    eccentricityM,
    unitWeightNm3: ground.kind === "frictional" ? ground.unitWeightNm3 * psi.weight * input.strengthFactor : 0,
    cohesionPa: cohesionOf(ground) * psi.cohesion * input.strengthFactor,
    bendingNm: ultimateNm,
  });
  const bare = shaftResistance({
    ground,
    perimeterM: properties.perimeterM,
    lengthM: resistingM,
    rotationDepthM: pile.rotationDepthM,
    leanDeg,
    isBladed: properties.isBladed,
    isWood: input.material === "hardwood",
    strengthFactor: input.strengthFactor,
  });
  const rockN = input.rockKg * STANDARD_GRAVITY_MS2;
  const phi = ground.kind === "frictional" ? radiansFromDegrees(ground.frictionAngleDeg) : 0;
  const rockNormalN = 0.5 * rockN * Math.tan(Math.PI / 4 + phi / 2);
  const rockAxialN = 0.5 * rockN;
  const shaft: ShaftResistance = { ...bare, axialN: bare.axialN + rockAxialN };
  const normalN = pile.groundN + rockNormalN;
  const angleDeg = input.lineAngleDeg - leanDeg;
  const form = ground.kind === "frictional" ? "linear-square" : "quadratic";
  const groundTensionN = obliqueTensionN(angleDeg, normalN, shaft, form);
  // The rock takes its share at the surface, so it does not bend the stake.
  const bendingNormalN = pile.bendingN === null ? null : pile.bendingN + rockNormalN;
  const bendingTensionN = bendingNormalN === null ? null : obliqueTensionN(angleDeg, bendingNormalN, shaft, form);
  const governingNormalN = bendingNormalN ?? normalN;
  const tensionN = bendingTensionN ?? groundTensionN;
  const angle = radiansFromDegrees(angleDeg);
  const drawn = Math.max(0, Math.sin(angle) - shaft.frictionCoefficient * Math.abs(Math.cos(angle))) / shaft.axialN;
  const across = Math.abs(Math.cos(angle)) / governingNormalN;
  const axialUse = form === "quadratic" ? (tensionN * drawn) ** 2 : tensionN * drawn;
  return {
    properties,
    embeddedM,
    resistingM,
    eccentricityM,
    leanFactors: psi,
    pile,
    shaft,
    rockNormalN,
    rockAxialN,
    normalN,
    bendingNormalN,
    ultimateNm,
    firstYieldNm,
    groundTensionN,
    bendingTensionN,
    bendingScatter: Math.sqrt((BENDING_GROUND_SHARE * ground.scatter) ** 2 + materialScatter ** 2),
    isDrawnOut: axialUse > (tensionN * across) ** 2,
  };
}
