import { radiansFromDegrees } from "./units";

/**
 * Earth pressure coefficients of Brinch Hansen for a rigid pile, in the form K(z/d) = (K⁰ + K^∞·α·z/d)/(1 + α·z/d).
 */
export interface PressureCoefficients {
  readonly kq0: number;
  readonly kqDeep: number;
  readonly alphaQ: number;
  readonly kc0: number;
  readonly kcDeep: number;
  readonly alphaC: number;
}

/** φ → 0 limits: Kc⁰ = 1 + π/2, Nc = 2 + π, d∞ = 1.58, no weight term. */
const UNDRAINED_COEFFICIENTS: PressureCoefficients = {
  kq0: 0,
  kqDeep: 0,
  alphaQ: 1,
  kc0: 1 + Math.PI / 2,
  kcDeep: (2 + Math.PI) * 1.58,
  alphaC: ((1 + Math.PI / 2) * Math.SQRT2) / ((2 + Math.PI) * 1.58 - (1 + Math.PI / 2)),
};

/** Snow crushes in front of the stake instead of rising as a wedge: one bearing pressure at every depth (judgement). */
export const CRUSHING_COEFFICIENTS: PressureCoefficients = {
  kq0: 0,
  kqDeep: 0,
  alphaQ: 1,
  kc0: 1,
  kcDeep: 1,
  alphaC: 1,
};

/**
 * Coefficients of Brinch Hansen for an angle of friction.
 * @param frictionAngleDeg 0…50°; below 1° the φ → 0 limit is used
 * Source: Brinch Hansen (1961), "The ultimate resistance of rigid piles against transversal forces", Danish Geotechnical
 * Institute Bulletin 12 (formulas from memory; a published worked sheet came out within 2.5 %).
 */
export function brinchHansenCoefficients(frictionAngleDeg: number): PressureCoefficients {
  if (frictionAngleDeg < 1) return UNDRAINED_COEFFICIENTS;
  const phi = radiansFromDegrees(frictionAngleDeg);
  const tanPhi = Math.tan(phi);
  const sinPhi = Math.sin(phi);
  const cosPhi = Math.cos(phi);
  const tanPlus = Math.tan(Math.PI / 4 + phi / 2);
  const passive = Math.exp((Math.PI / 2 + phi) * tanPhi) * cosPhi * tanPlus;
  const active = Math.exp(-(Math.PI / 2 - phi) * tanPhi) * cosPhi * Math.tan(Math.PI / 4 - phi / 2);
  const atRest = 1 - sinPhi;
  const nc = (Math.exp(Math.PI * tanPhi) * tanPlus * tanPlus - 1) / tanPhi;
  const kq0 = passive - active;
  const kc0 = (passive - 1) / tanPhi;
  const kcDeep = nc * (1.58 + 4.09 * tanPhi ** 4);
  const kqDeep = kcDeep * atRest * tanPhi;
  const sinPlus = Math.sin(Math.PI / 4 + phi / 2);
  return {
    kq0,
    kqDeep,
    alphaQ: (kq0 * atRest * sinPhi) / ((kqDeep - kq0) * sinPlus),
    kc0,
    kcDeep,
    alphaC: (kc0 * 2 * sinPlus) / (kcDeep - kc0),
  };
}

/** K(z/d) of the weight and cohesion terms at a depth of so many widths (Brinch Hansen 1961). */
export function pressureCoefficientsAt(
  coefficients: PressureCoefficients,
  depthInWidths: number,
): { readonly kq: number; readonly kc: number } {
  const { kq0, kqDeep, alphaQ, kc0, kcDeep, alphaC } = coefficients;
  return {
    kq: (kq0 + kqDeep * alphaQ * depthInWidths) / (1 + alphaQ * depthInWidths),
    kc: (kc0 + kcDeep * alphaC * depthInWidths) / (1 + alphaC * depthInWidths),
  };
}

/** A rigid stake in the ground, seen along its own length. */
export interface PileInput {
  readonly coefficients: PressureCoefficients;
  /** Width that presses on the ground, m, > 0. */
  readonly widthM: number;
  /** Length in ground that resists, m, > 0. */
  readonly lengthM: number;
  /** Distance along the stake from that ground's surface up to where the line pulls, m, ≥ 0. */
  readonly eccentricityM: number;
  /** γ and c that count, lean, slope, pull tests and loosening included, ≥ 0, not both 0. */
  readonly unitWeightNm3: number;
  readonly cohesionPa: number;
  /** Bending strength of the stake, N·m, > 0. */
  readonly bendingNm: number;
}

export interface PileResistance {
  /** Pull normal to the stake at which the ground gives, N. */
  readonly groundN: number;
  /** Depth of the point about which it turns, m. */
  readonly rotationDepthM: number;
  /** Largest moment in the stake at `groundN`, N·m. */
  readonly largestMomentNm: number;
  /** Depth of that moment, m. */
  readonly momentDepthM: number;
  /** Pull normal to the stake at which it bends, N, when that comes first; else null. */
  readonly bendingN: number | null;
}

/** Bounded iteration: 60 halvings reach the last bit of a double from any bracket; Newton steps make it about six. */
const MAX_ITERATIONS = 60;
/** Newton converges quadratically: a last step of 10⁻⁸ leaves an error of about 10⁻¹⁶. */
const DEPTH_TOLERANCE = 1e-8;

/**
 * Resistance of a short rigid pile normal to its axis: pressure p(z) = (γ·z·Kq + c·Kc)·d in front above the rotation
 * point and behind below it, with moment equilibrium about the point of pull; and the pull at which the stake itself
 * yields, with the ground fully mobilised above the plastic hinge. With K = K^∞ − (K^∞ − K⁰)/(1 + a·z), a = α/d, the
 * integrals of p are elementary.
 * Source: Brinch Hansen (1961), Danish Geotechnical Institute Bulletin 12; hinge as in Broms (1964) for piles of
 * intermediate length.
 */
export function pileResistance(input: PileInput): PileResistance {
  const { lengthM, eccentricityM: e } = input;
  const at = pressureOf(input);
  const whole = at(lengthM);
  const wholeMomentNm = whole.momentNm + e * whole.forceN;
  // Half the moment about the point of pull lies above the turning point.
  const turning = solveRising(
    at,
    (p) => p.momentNm + e * p.forceN - wholeMomentNm / 2,
    (p) => p.perLengthNm * (p.depthM + e),
    lengthM,
    0.75 * lengthM,
  );
  const groundN = Math.max(0, 2 * turning.forceN - whole.forceN);
  const largest = solveRising(
    at,
    (p) => p.forceN - groundN,
    (p) => p.perLengthNm,
    turning.depthM,
    0.5 * turning.depthM,
  );
  const largestMomentNm = groundN * e + largest.momentNm;
  let bendingN: number | null = null;
  if (input.bendingNm < largestMomentNm) {
    bendingN = solveRising(
      at,
      (p) => e * p.forceN + p.momentNm - input.bendingNm,
      (p) => p.perLengthNm * (p.depthM + e),
      largest.depthM,
      0.5 * largest.depthM,
    ).forceN;
  }
  return { groundN, rotationDepthM: turning.depthM, largestMomentNm, momentDepthM: largest.depthM, bendingN };
}

/** Pressure of the ground down to one depth. */
interface PressureTo {
  readonly depthM: number;
  /** p(z), N/m. */
  readonly perLengthNm: number;
  /** ∫₀ᶻ p, N. */
  readonly forceN: number;
  /** ∫₀ᶻ p·z, N·m. */
  readonly momentNm: number;
}

function pressureOf(input: PileInput): (depthM: number) => PressureTo {
  const { kq0, kqDeep, alphaQ, kc0, kcDeep, alphaC } = input.coefficients;
  const weight = input.unitWeightNm3 * input.widthM;
  const cohesion = input.cohesionPa * input.widthM;
  const aq = alphaQ / input.widthM;
  const ac = alphaC / input.widthM;
  const dq = kqDeep - kq0;
  const dc = kcDeep - kc0;
  return (z) => {
    const square = z * z;
    const lc = Math.log1p(ac * z) / ac;
    let perLengthNm = cohesion * (kcDeep - dc / (1 + ac * z));
    let forceN = cohesion * (kcDeep * z - dc * lc);
    let momentNm = cohesion * ((kcDeep * square) / 2 - (dc * (z - lc)) / ac);
    if (weight > 0) {
      const lq = (z - Math.log1p(aq * z) / aq) / aq;
      perLengthNm += weight * z * (kqDeep - dq / (1 + aq * z));
      forceN += weight * ((kqDeep * square) / 2 - dq * lq);
      momentNm += weight * ((kqDeep * square * z) / 3 - (dq * (square / 2 - lq)) / aq);
    }
    return { depthM: z, perLengthNm, forceN, momentNm };
  };
}

/** Where a rising function of depth crosses zero, 0…high: Newton steps kept inside a shrinking bracket. */
function solveRising(
  at: (depthM: number) => PressureTo,
  value: (p: PressureTo) => number,
  slope: (p: PressureTo) => number,
  high: number,
  start: number,
): PressureTo {
  let lo = 0;
  let hi = high;
  let p = at(start);
  for (let i = 0; i < MAX_ITERATIONS; i += 1) {
    const f = value(p);
    if (f > 0) hi = p.depthM;
    else lo = p.depthM;
    const newton = p.depthM - f / slope(p);
    const next = newton > lo && newton < hi ? newton : (lo + hi) / 2;
    const isClose = Math.abs(next - p.depthM) <= DEPTH_TOLERANCE * high;
    p = at(next);
    if (isClose) return p;
  }
  return p;
}
