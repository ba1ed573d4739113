import { requireInRange } from "./constants";
import { itemAt } from "./indexed";
import { BEAUFORT } from "./tables/beaufort";
import { EXPOSURES, type ExposureRow } from "./tables/exposure";
import { WINDBREAK_DISTANCES_H, WINDBREAKS } from "./tables/windbreaks";
import type { ExposureCategory, Gap, Hill, Windbreak, WindAtShelter, WindInput, WindStrength, Working } from "./types";

const EN = "EN 1991-1-4:2005+A1";

/** Specific gas constant of dry air, J/(kg·K) (ICAO Doc 7488/3). */
const GAS_CONSTANT_AIR = 287.053;
const ISA_SEA_LEVEL_TEMPERATURE_K = 288.15;
const ISA_SEA_LEVEL_PRESSURE_PA = 101325;
const ISA_LAPSE_K_PER_M = 0.0065;
const ISA_EXPONENT = 5.25588;
const ZERO_CELSIUS_K = 273.15;

/**
 * Gust factor from the 10-minute mean to the 3-second gust over open land.
 * Source: Harper, Kepert & Ginger (2010), WMO/TD-No. 1555, "in-land" 1.66 (from memory). EN 1991-1-4 gives 1.52 for
 * category II at 10 m and the Durst curve 1.43; the largest of the three is used, so that a mean never understates.
 */
export const GUST_FACTOR_MEAN_TO_GUST = 1.66;

/** ISA temperature, K, at an altitude of −500…11 000 m (ICAO Doc 7488/3). */
export function isaTemperatureK(altitudeM: number): number {
  requireInRange("altitudeM", altitudeM, -500, 11_000);
  return ISA_SEA_LEVEL_TEMPERATURE_K - ISA_LAPSE_K_PER_M * altitudeM;
}

/** ISA pressure, Pa, at an altitude of −500…11 000 m (ICAO Doc 7488/3). */
export function isaPressurePa(altitudeM: number): number {
  return ISA_SEA_LEVEL_PRESSURE_PA * (isaTemperatureK(altitudeM) / ISA_SEA_LEVEL_TEMPERATURE_K) ** ISA_EXPONENT;
}

/**
 * Density of dry air, kg/m³: ISA pressure of the altitude with the given temperature.
 * @param altitudeM −500…11 000 m
 * @param temperatureC −60…60 °C; null takes the ISA temperature of the altitude
 * @throws RangeError outside these ranges. Source: ICAO Doc 7488/3 (ISO 2533), ρ = p/(R·T).
 */
export function airDensityKgM3(altitudeM: number, temperatureC: number | null): number {
  if (temperatureC !== null) requireInRange("temperatureC", temperatureC, -60, 60);
  const temperatureK = temperatureC === null ? isaTemperatureK(altitudeM) : temperatureC + ZERO_CELSIUS_K;
  return isaPressurePa(altitudeM) / (GAS_CONSTANT_AIR * temperatureK);
}

/** Velocity pressure q = ½ρV², Pa (EN 1991-1-4 §4.5, eq. 4.10). */
export function velocityPressurePa(densityKgM3: number, speedMs: number): number {
  return 0.5 * densityKgM3 * speedMs * speedMs;
}

function exposureRow(category: ExposureCategory): ExposureRow {
  const row = EXPOSURES.find((each) => each.category === category);
  if (row === undefined) throw new RangeError(`exposure must be one of 0, I, II, III, IV, got ${String(category)}`);
  return row;
}

/** Terrain factor k_r = 0.19 (z0/0.05)^0.07 (EN 1991-1-4 eq. 4.5). */
export function terrainFactor(category: ExposureCategory): number {
  return 0.19 * (exposureRow(category).roughnessLengthM / 0.05) ** 0.07;
}

function heightUsedM(row: ExposureRow, heightM: number): number {
  requireInRange("heightM", heightM, 0, 200);
  return Math.max(heightM, row.minHeightM);
}

/** Roughness factor c_r(z) (EN 1991-1-4 eq. 4.4), z 0…200 m; below z_min the value at z_min. */
export function roughnessFactor(category: ExposureCategory, heightM: number): number {
  const row = exposureRow(category);
  return terrainFactor(category) * Math.log(heightUsedM(row, heightM) / row.roughnessLengthM);
}

/** Turbulence intensity I_v(z) with k_I = 1 (EN 1991-1-4 eq. 4.7); `orographyFactor` c_o ≥ 1. */
export function turbulenceIntensity(category: ExposureCategory, heightM: number, orographyFactor = 1): number {
  const row = exposureRow(category);
  return 1 / (orographyFactor * Math.log(heightUsedM(row, heightM) / row.roughnessLengthM));
}

/**
 * Exposure factor c_e(z) = [1 + 7 I_v]·c_r²·c_o² (EN 1991-1-4 eq. 4.8 and 4.9).
 * @param heightM 0…200 m
 * @param orographyFactor c_o, 1 on flat ground
 */
export function exposureFactor(category: ExposureCategory, heightM: number, orographyFactor = 1): number {
  const meanRatio = roughnessFactor(category, heightM) * orographyFactor;
  return (1 + 7 * turbulenceIntensity(category, heightM, orographyFactor)) * meanRatio * meanRatio;
}

/** s at the windward side and the crest: A·e^(B·x/L_u) (EN 1991-1-4 eq. A.4…A.6). */
function windwardLocation(zeta: number, distanceRatio: number): number {
  const a = 0.1552 * zeta ** 4 - 0.8575 * zeta ** 3 + 1.8133 * zeta ** 2 - 1.9115 * zeta + 1.0124;
  const b = 0.3542 * zeta ** 2 - 1.0577 * zeta + 2.6456;
  return a * Math.exp(b * distanceRatio);
}

/** s on the lee side of a hill or ridge; the distance is divided by L_d, not L_u (EN 1991-1-4 eq. A.7, A.8). */
function leeHillLocation(zeta: number, distanceRatio: number): number {
  const a = 0.1552 * zeta ** 4 - 0.8575 * zeta ** 3 + 1.8133 * zeta ** 2 - 1.9115 * zeta + 1.0124;
  const b = -0.3056 * zeta ** 2 + 1.0212 * zeta - 1.7637;
  return a * Math.exp(b * distanceRatio);
}

/** s behind the edge of a cliff, x/L_e 0.1…3.5 (EN 1991-1-4 eq. A.9…A.12). */
function leeCliffLocation(zeta: number, distanceRatio: number): number {
  const l = Math.log10(Math.max(zeta, 0.1));
  const k = Math.log10(distanceRatio);
  const a = -1.342 * l ** 3 - 0.8222 * l ** 2 + 0.4609 * l - 0.0791;
  const b = -1.0196 * l ** 3 - 0.891 * l ** 2 + 0.5343 * l - 0.1156;
  const c = 0.803 * l ** 3 + 0.4236 * l ** 2 - 0.5738 * l + 0.1606;
  return a * k * k + b * k + c;
}

/**
 * Orographic location factor s, ≥ 0 (EN 1991-1-4 Annex A.3). Outside the range of the formulas s = 0.
 * @param heightM height above the ground, 0…200 m
 * @throws RangeError for a hill with lengths or height ≤ 0
 */
export function orographicLocationFactor(hill: Hill, heightM: number): number {
  requireInRange("hill.heightM", hill.heightM, 0.1, 4000);
  requireInRange("hill.upwindLengthM", hill.upwindLengthM, 0.1, 50_000);
  requireInRange("hill.fromCrestM", hill.fromCrestM, -100_000, 100_000);
  const steepness = hill.heightM / hill.upwindLengthM;
  const effectiveLengthM = steepness < 0.3 ? hill.upwindLengthM : hill.heightM / 0.3;
  const zeta = heightM / effectiveLengthM;
  if (zeta > 2) return 0;
  if (hill.fromCrestM <= 0) {
    const ratio = hill.fromCrestM / hill.upwindLengthM;
    return ratio < -1.5 ? 0 : Math.max(0, windwardLocation(zeta, ratio));
  }
  if (hill.shape === "hill") {
    requireInRange("hill.downwindLengthM", hill.downwindLengthM, 0.1, 50_000);
    const ratio = hill.fromCrestM / hill.downwindLengthM;
    return ratio > 2 ? 0 : Math.max(0, leeHillLocation(zeta, ratio));
  }
  const ratio = hill.fromCrestM / effectiveLengthM;
  if (ratio > 3.5) return 0;
  if (ratio >= 0.1) return Math.max(0, leeCliffLocation(zeta, ratio));
  const atCrest = windwardLocation(zeta, 0);
  return Math.max(0, atCrest + (leeCliffLocation(zeta, 0.1) - atCrest) * (ratio / 0.1));
}

/** Orography factor c_o(z) ≥ 1 for the mean wind speed (EN 1991-1-4 eq. A.1…A.3). */
export function orographyFactor(hill: Hill, heightM: number): number {
  const s = orographicLocationFactor(hill, heightM);
  const steepness = hill.heightM / hill.upwindLengthM;
  if (steepness < 0.05) return 1;
  return steepness < 0.3 ? 1 + 2 * s * steepness : 1 + 0.6 * s;
}

/**
 * Share of the wind speed left behind a windbreak, 0…1.
 * Closer than five heights the value at five heights is held down to one height; from there to the windbreak itself the
 * shelter is faded out, because wind jets under bare trunks and branches fall (judgement). A shelter higher than half
 * the windbreak gets less, one as high as the windbreak gets nothing (judgement).
 * @param windbreak heightM 0.3…60 m, distanceM 0…5000 m
 * @param referenceHeightM height of the shelter, 0…200 m
 * @throws RangeError outside these ranges. Source: Brandle & Finch, EC91-1763-B (from memory).
 */
export function windbreakSpeedRatio(windbreak: Windbreak, referenceHeightM: number): number {
  requireInRange("windbreak.heightM", windbreak.heightM, 0.3, 60);
  requireInRange("windbreak.distanceM", windbreak.distanceM, 0, 5000);
  const row = WINDBREAKS.find((each) => each.kind === windbreak.kind);
  if (row === undefined) throw new RangeError(`windbreak.kind is not known: ${String(windbreak.kind)}`);
  const heights = windbreak.distanceM / windbreak.heightM;
  const openRatio = tableSpeedRatio(row.speedRatios, heights);
  const cover = Math.min(1, Math.max(0, 2 - (2 * referenceHeightM) / windbreak.heightM));
  return 1 - (1 - openRatio) * cover;
}

function tableSpeedRatio(speedRatios: readonly number[], heights: number): number {
  const first = itemAt(speedRatios, 0);
  if (heights <= 1) return 1 - (1 - first) * heights;
  const firstDistance = itemAt(WINDBREAK_DISTANCES_H, 0);
  if (heights <= firstDistance) return first;
  for (let i = 1; i < WINDBREAK_DISTANCES_H.length; i += 1) {
    const x1 = itemAt(WINDBREAK_DISTANCES_H, i);
    if (heights > x1) continue;
    const x0 = itemAt(WINDBREAK_DISTANCES_H, i - 1);
    const y0 = itemAt(speedRatios, i - 1);
    const y1 = itemAt(speedRatios, i);
    return y0 + ((y1 - y0) * (heights - x0)) / (x1 - x0);
  }
  return 1;
}

/** Beaufort number of a 10-minute mean speed at 10 m, m/s ≥ 0 (WMO No. 306 Code table 1100). */
export function beaufortFromSpeed(speedMs: number): number {
  requireInRange("speedMs", speedMs, 0, 200);
  let number = 0;
  for (const row of BEAUFORT) if (speedMs >= row.fromMs) number = row.number;
  return number;
}

/**
 * 10-minute mean speed for a Beaufort number, m/s: the *upper* end of its band, on the safe side of the middle value
 * 0.836·B^1.5 (at force 8: 20.7 against 18.9 m/s).
 * @throws RangeError unless a whole number 0…12. Source: WMO No. 306 Code table 1100.
 */
export function beaufortSpeedMs(number: number): number {
  const row = BEAUFORT.find((each) => each.number === number);
  if (row === undefined) throw new RangeError(`Beaufort number must be a whole number from 0 to 12, got ${number}`);
  return row.toMs;
}

/** 3-second gust at 10 m over open ground from what was entered, with its working. */
function openGust(strength: WindStrength): { gustMs: number; workings: Working[] } {
  if (strength.kind === "gust") {
    requireInRange("strength.speedMs", strength.speedMs, 0, 90);
    return {
      gustMs: strength.speedMs,
      workings: [working("V", "3-second gust at 10 m over open ground", strength.speedMs, "m/s", "input")],
    };
  }
  const workings: Working[] = [];
  let meanMs: number;
  if (strength.kind === "mean") {
    requireInRange("strength.speedMs", strength.speedMs, 0, 60);
    meanMs = strength.speedMs;
    workings.push(working("V_m", "10-minute mean wind at 10 m over open ground", meanMs, "m/s", "input"));
  } else {
    meanMs = beaufortSpeedMs(strength.number);
    workings.push(
      working("B", "Beaufort number", strength.number, "", "input"),
      working(
        "V_m",
        "10-minute mean wind, upper end of that Beaufort band",
        meanMs,
        "m/s",
        "WMO No. 306 Code table 1100; upper end of the band is judgement, on the safe side",
      ),
    );
  }
  const gustMs = meanMs * GUST_FACTOR_MEAN_TO_GUST;
  workings.push(
    working(
      "G",
      "gust factor, 10-minute mean to 3-second gust, inland",
      GUST_FACTOR_MEAN_TO_GUST,
      "",
      "WMO/TD-No. 1555 (2010), from memory",
    ),
    working("V", "3-second gust at 10 m over open ground, G·V_m", gustMs, "m/s", "WMO/TD-No. 1555 (2010)"),
  );
  return { gustMs, workings };
}

function working(symbol: string, meaning: string, value: number | string, unit: string, source: string): Working {
  return { symbol, meaning, value, unit, source };
}

/** What is missing before a wind at the shelter can be given. */
function windGaps(input: WindInput): Gap[] {
  const gaps: Gap[] = [];
  if (input.strength === null) {
    gaps.push({ field: "camp.gust", message: "Enter a gust, a mean wind or a Beaufort number." });
  }
  if (input.exposure === null)
    gaps.push({ field: "camp.exposure", message: "Choose how open the camp is to the wind." });
  if (input.altitudeM === null) gaps.push({ field: "camp.altitude", message: "Enter the altitude of the camp." });
  return gaps;
}

/**
 * Velocity pressure of the gust at the shelter: q = ½ρV²·c_e(category, z, c_o)/c_e(II, 10 m)·(shelter speed ratio)².
 * The forecast gust already is a peak, so the peak factor 1 + 7 I_v enters only as the ratio of the two exposure
 * factors, never by itself. Behind a windbreak and under trees at once, the better of the two counts, not their product.
 * @param input as typed in; missing strength, exposure or altitude give gaps instead of numbers
 * @param referenceHeightM height of the shelter's top above the ground, 0…200 m
 * @throws RangeError for a value outside its range, naming it
 * Source: EN 1991-1-4:2005+A1 §4.3–4.5 and Annex A.3; ICAO Doc 7488/3; EC91-1763-B; under trees: the leader's judgement.
 */
export function windAtShelter(
  input: WindInput,
  referenceHeightM: number,
):
  | { readonly status: "ok"; readonly wind: WindAtShelter }
  | { readonly status: "unknown"; readonly gaps: readonly Gap[] } {
  requireInRange("referenceHeightM", referenceHeightM, 0, 200);
  const { strength, exposure, altitudeM } = input;
  if (strength === null || exposure === null || altitudeM === null) return { status: "unknown", gaps: windGaps(input) };

  const { gustMs: openGustMs, workings } = openGust(strength);
  const density = airDensityKgM3(altitudeM, input.temperatureC);
  workings.push(
    working(
      "ρ",
      input.temperatureC === null
        ? "air density, ISA at the camp's altitude"
        : "air density at altitude and temperature",
      density,
      "kg/m³",
      "ICAO Doc 7488/3 (ISO 2533)",
    ),
  );
  const orography = input.hill === null ? 1 : orographyFactor(input.hill, referenceHeightM);
  if (input.hill !== null) {
    workings.push(
      working("s", "place on the hill", orographicLocationFactor(input.hill, referenceHeightM), "", `${EN} Annex A.3`),
      working("c_o", "hill factor on the mean wind", orography, "", `${EN} Annex A.3, eq. A.1–A.3`),
    );
  }
  const atShelter = exposureFactor(exposure, referenceHeightM, orography);
  const open = exposureFactor("II", 10);
  workings.push(
    working("z", "height of the shelter", referenceHeightM, "m", "input"),
    working("c_e(z)", `exposure factor, category ${exposure}, at the shelter`, atShelter, "", `${EN} eq. 4.8, 4.9`),
    working("c_e(10)", "exposure factor, category II, at 10 m", open, "", `${EN} eq. 4.8, 4.9`),
  );
  const coverRatio = coverSpeedRatio(input, referenceHeightM, workings);
  const pressureRatio = (atShelter / open) * coverRatio * coverRatio;
  const pressurePerGustSquared = 0.5 * density * pressureRatio;
  const pressurePa = pressurePerGustSquared * openGustMs * openGustMs;
  const gustMs = openGustMs * Math.sqrt(pressureRatio);
  workings.push(
    working("q", "velocity pressure of the gust at the shelter", pressurePa, "Pa", `${EN} eq. 4.8, 4.10`),
    working("V_s", "gust at the shelter with this pressure", gustMs, "m/s", "√(2q/ρ)"),
  );
  return { status: "ok", wind: { pressurePa, gustMs, openGustMs, pressurePerGustSquared, workings } };
}

function coverSpeedRatio(input: WindInput, referenceHeightM: number, workings: Working[]): number {
  let ratio = 1;
  if (input.windbreak !== null) {
    ratio = windbreakSpeedRatio(input.windbreak, referenceHeightM);
    workings.push(
      working(
        "r_w",
        "share of the wind speed left behind the windbreak",
        ratio,
        "",
        "Brandle & Finch, EC91-1763-B, from memory",
      ),
    );
  }
  if (input.underTreesSpeedRatio !== null) {
    requireInRange("underTreesSpeedRatio", input.underTreesSpeedRatio, 0.3, 1);
    ratio = Math.min(ratio, input.underTreesSpeedRatio);
    workings.push(
      working(
        "r_t",
        "share of the wind speed that the trees over the camp leave",
        input.underTreesSpeedRatio,
        "",
        "judgement of the leader",
      ),
    );
  }
  return ratio;
}

/**
 * Compass directions to calculate for, clockwise from `fromDeg` to `toDeg`, both ends included, evenly spaced by at
 * most `stepDeg`. All round when either end is null or the range is a full turn.
 * @param stepDeg 1…90
 * @throws RangeError for an end outside −360…720 or a step outside its range
 */
export function windDirections(fromDeg: number | null, toDeg: number | null, stepDeg = 15): number[] {
  requireInRange("stepDeg", stepDeg, 1, 90);
  if (fromDeg !== null) requireInRange("fromDeg", fromDeg, -360, 720);
  if (toDeg !== null) requireInRange("toDeg", toDeg, -360, 720);
  const isAllRound = fromDeg === null || toDeg === null || Math.abs(toDeg - fromDeg) >= 360;
  const start = isAllRound || fromDeg === null ? 0 : wrapDegrees(fromDeg);
  const span = isAllRound || toDeg === null ? 360 : wrapDegrees(toDeg - start);
  const steps = Math.ceil(span / stepDeg - 1e-9);
  const count = isAllRound ? steps : steps + 1;
  return Array.from({ length: count }, (_, i) => wrapDegrees(start + (steps === 0 ? 0 : (span * i) / steps)));
}

function wrapDegrees(angleDeg: number): number {
  const wrapped = angleDeg % 360;
  return wrapped < 0 ? wrapped + 360 : wrapped + 0;
}
