/**
 * Broms' ultimate lateral loads of short free-head piles: the independent comparison for stake.ts. Not used for results.
 * Source: Broms (1964), J. Soil Mech. Found. Div. ASCE 90, SM2 (clay) and SM3 (sand).
 */

/**
 * Clay: no reaction above 1.5 D, 9·s_u·D below. H = k[√((2e'+a)² + a²) − (2e'+a)], k = 9·s_u·D, a = L − 1.5D,
 * e' = e + 1.5D (closed form of the paper's equilibrium equations).
 * @returns ultimate load, N, depth f below 1.5 D of the largest moment, m, and that moment, N·m
 */
export function bromsClay(
  shearStrengthPa: number,
  diameterM: number,
  lengthM: number,
  eccentricityM: number,
): { readonly ultimateN: number; readonly momentDepthM: number; readonly momentNm: number } {
  const perLength = 9 * shearStrengthPa * diameterM;
  const a = lengthM - 1.5 * diameterM;
  const arm = 2 * (eccentricityM + 1.5 * diameterM) + a;
  const ultimateN = perLength * (Math.sqrt(arm * arm + a * a) - arm);
  const momentDepthM = ultimateN / perLength;
  return {
    ultimateN,
    momentDepthM,
    momentNm: ultimateN * (eccentricityM + 1.5 * diameterM + 0.5 * momentDepthM),
  };
}

/**
 * Sand: H = ½·γ·D·L³·Kp/(e + L); largest moment at f = √(2H/(3·D·Kp·γ)), M = H(e + ⅔f).
 * @returns ultimate load, N, and largest moment, N·m
 */
export function bromsSand(
  unitWeightNm3: number,
  passive: number,
  diameterM: number,
  lengthM: number,
  eccentricityM: number,
): { readonly ultimateN: number; readonly momentDepthM: number; readonly momentNm: number } {
  const ultimateN = (0.5 * unitWeightNm3 * diameterM * lengthM ** 3 * passive) / (eccentricityM + lengthM);
  const momentDepthM = Math.sqrt((2 * ultimateN) / (3 * diameterM * passive * unitWeightNm3));
  return { ultimateN, momentDepthM, momentNm: ultimateN * (eccentricityM + (2 / 3) * momentDepthM) };
}
