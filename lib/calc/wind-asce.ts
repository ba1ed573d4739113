import { requireInRange } from "./constants";
import { itemAt } from "./indexed";

/**
 * Wind relations of ASCE/SEI 7-16: the independent comparison for wind.ts. Not used for results.
 */

/** Exposure constants α and z_g, m (ASCE/SEI 7-16 Table 26.11-1). */
const ASCE_EXPOSURES = {
  B: { alpha: 7, gradientM: 365.76 },
  C: { alpha: 9.5, gradientM: 274.32 },
  D: { alpha: 11.5, gradientM: 213.36 },
} as const;
export type AsceExposure = keyof typeof ASCE_EXPOSURES;

/** Below this height the coefficient at it is used, m (ASCE/SEI 7-16 Table 26.10-1, 15 ft). */
const ASCE_LEAST_HEIGHT_M = 4.6;

/** K_z = 2.01·(z/z_g)^(2/α) (ASCE/SEI 7-16 Table 26.10-1). @param heightM 0…200 m */
export function asceExposureCoefficient(exposure: AsceExposure, heightM: number): number {
  requireInRange("heightM", heightM, 0, 200);
  const { alpha, gradientM } = ASCE_EXPOSURES[exposure];
  return 2.01 * (Math.max(heightM, ASCE_LEAST_HEIGHT_M) / gradientM) ** (2 / alpha);
}

/** q_z = 0.613·K_z·K_zt·K_d·K_e·V², Pa (ASCE/SEI 7-16 eq. 26.10-1.si). */
export function asceVelocityPressurePa(
  speedMs: number,
  factors: { readonly kz: number; readonly kzt: number; readonly kd: number; readonly ke: number },
): number {
  return 0.613 * factors.kz * factors.kzt * factors.kd * factors.ke * speedMs * speedMs;
}

/** K_e = e^(−0.000119·z_g), z_g ground elevation, m (ASCE/SEI 7-16 Table 26.9-1). */
export function asceElevationFactor(elevationM: number): number {
  return Math.exp(-0.000119 * elevationM);
}

/** Attenuation constants γ, μ upwind and downwind (ASCE/SEI 7-16 Fig. 26.8-1), and K1/(H/L_h) in exposure C. */
const ASCE_HILLS = {
  ridge: { gamma: 3, upwind: 1.5, downwind: 1.5, k1Slope: 1.45 },
  escarpment: { gamma: 2.5, upwind: 1.5, downwind: 4, k1Slope: 0.85 },
  hill: { gamma: 4, upwind: 1.5, downwind: 1.5, k1Slope: 1.05 },
} as const;

/**
 * K_zt = (1 + K1·K2·K3)² on the pressure, exposure C (ASCE/SEI 7-16 §26.8); H/L_h above 0.5 counts as 0.5 with L_h = 2H.
 * @param fromCrestM negative upwind
 */
export function asceTopographicFactor(
  shape: keyof typeof ASCE_HILLS,
  heightM: number,
  halfLengthM: number,
  fromCrestM: number,
  aboveGroundM: number,
): number {
  const row = ASCE_HILLS[shape];
  const ratio = Math.min(0.5, heightM / halfLengthM);
  const lengthM = heightM / halfLengthM > 0.5 ? 2 * heightM : halfLengthM;
  const mu = fromCrestM <= 0 ? row.upwind : row.downwind;
  const k2 = Math.max(0, 1 - Math.abs(fromCrestM) / (mu * lengthM));
  const k3 = Math.exp((-row.gamma * aboveGroundM) / lengthM);
  return (1 + row.k1Slope * ratio * k2 * k3) ** 2;
}

/** Durst curve: largest t-second mean over the hourly mean (ASCE/SEI 7-16 Fig. C26.5-1; 3 and 45 s read, others from memory). */
export const DURST: readonly (readonly [number, number])[] = [
  [1, 1.57],
  [3, 1.53],
  [10, 1.43],
  [45, 1.28],
  [60, 1.25],
  [600, 1.07],
  [3600, 1],
];

/** Durst ratio by interpolation in the logarithm of the time. @param seconds 1…3600 */
export function durstRatio(seconds: number): number {
  requireInRange("seconds", seconds, 1, 3600);
  for (let i = 1; i < DURST.length; i += 1) {
    const [t1, r1] = itemAt(DURST, i);
    const [t0, r0] = itemAt(DURST, i - 1);
    if (seconds <= t1) return r0 + ((r1 - r0) * Math.log(seconds / t0)) / Math.log(t1 / t0);
  }
  return 1;
}
