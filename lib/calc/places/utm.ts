import { requireInRange } from "../constants";
import { RADIANS_PER_DEGREE } from "../units";

/**
 * Universal Transverse Mercator on WGS 84, by Krüger's series in the third flattening to the sixth order.
 * Source: C. F. F. Karney, Transverse Mercator with an accuracy of a few nanometers, J. Geodesy 85 (2011) 475,
 * eqs. (7)–(36); zones and their exceptions: NGA.SIG.0012 (2014). The error is below 5 nm within 3000 km of the meridian.
 */
const SEMI_MAJOR_M = 6378137;
const FLATTENING = 1 / 298.257223563;
const SCALE = 0.9996;
const FALSE_EASTING_M = 500_000;
const FALSE_NORTHING_M = 10_000_000;

const n = FLATTENING / (2 - FLATTENING);
const ECCENTRICITY = Math.sqrt(FLATTENING * (2 - FLATTENING));
/** Radius of the rectifying circle (eq. 14). */
const RECTIFYING_M = (SEMI_MAJOR_M / (1 + n)) * (1 + n ** 2 / 4 + n ** 4 / 64 + n ** 6 / 256);

/** Coefficients α₁…α₆ (eq. 35). */
const ALPHA: readonly number[] = [
  n / 2 - (2 / 3) * n ** 2 + (5 / 16) * n ** 3 + (41 / 180) * n ** 4 - (127 / 288) * n ** 5 + (7891 / 37800) * n ** 6,
  (13 / 48) * n ** 2 - (3 / 5) * n ** 3 + (557 / 1440) * n ** 4 + (281 / 630) * n ** 5 - (1983433 / 1935360) * n ** 6,
  (61 / 240) * n ** 3 - (103 / 140) * n ** 4 + (15061 / 26880) * n ** 5 + (167603 / 181440) * n ** 6,
  (49561 / 161280) * n ** 4 - (179 / 168) * n ** 5 + (6601661 / 7257600) * n ** 6,
  (34729 / 80640) * n ** 5 - (3418889 / 1995840) * n ** 6,
  (212378941 / 319334400) * n ** 6,
];

/** Coefficients β₁…β₆ (eq. 36). */
const BETA: readonly number[] = [
  n / 2 - (2 / 3) * n ** 2 + (37 / 96) * n ** 3 - (1 / 360) * n ** 4 - (81 / 512) * n ** 5 + (96199 / 604800) * n ** 6,
  (1 / 48) * n ** 2 + (1 / 15) * n ** 3 - (437 / 1440) * n ** 4 + (46 / 105) * n ** 5 - (1118711 / 3870720) * n ** 6,
  (17 / 480) * n ** 3 - (37 / 840) * n ** 4 - (209 / 4480) * n ** 5 + (5569 / 90720) * n ** 6,
  (4397 / 161280) * n ** 4 - (11 / 504) * n ** 5 - (830251 / 7257600) * n ** 6,
  (4583 / 161280) * n ** 5 - (108847 / 3991680) * n ** 6,
  (20648693 / 638668800) * n ** 6,
];

export interface Utm {
  readonly zone: number;
  readonly band: string;
  readonly isNorth: boolean;
  readonly eastingM: number;
  readonly northingM: number;
}

export interface LatLon {
  readonly latitude: number;
  readonly longitude: number;
}

/** Bands of 8° from 80° south; the last has 12° (to 84° north). I and O are left out. */
export const UTM_BANDS = "CDEFGHJKLMNPQRSTUVWX";
export const UTM_SOUTH_DEG = -80;
export const UTM_NORTH_DEG = 84;

/** −180 ≤ longitude < 180. */
export function normaliseLongitude(longitude: number): number {
  const turned = (((longitude + 180) % 360) + 360) % 360;
  return turned - 180;
}

/** The letter of the band of a latitude, −80…84°. */
export function bandOf(latitude: number): string {
  return UTM_BANDS.charAt(Math.min(19, Math.floor((latitude - UTM_SOUTH_DEG) / 8)));
}

/** The zone, with the exceptions of south-west Norway (32V) and Svalbard (31X, 33X, 35X, 37X). */
export function zoneOf(latitude: number, longitude: number): number {
  const east = normaliseLongitude(longitude);
  const zone = Math.floor((east + 180) / 6) + 1;
  const band = bandOf(latitude);
  if (band === "V" && zone === 31 && east >= 3) return 32;
  if (band !== "X" || east < 0 || east >= 42) return zone;
  if (east < 9) return 31;
  if (east < 21) return 33;
  return east < 33 ? 35 : 37;
}

const meridianOf = (zone: number) => zone * 6 - 183;

/** Krüger's forward series: metres east of the meridian and north of the equator, unscaled by the zone's factor. */
function project(latitudeDeg: number, fromMeridianDeg: number): { readonly x: number; readonly y: number } {
  const phi = latitudeDeg * RADIANS_PER_DEGREE;
  const lambda = fromMeridianDeg * RADIANS_PER_DEGREE;
  const tau = Math.tan(phi);
  const sigma = Math.sinh(ECCENTRICITY * Math.atanh((ECCENTRICITY * tau) / Math.hypot(1, tau)));
  const conformal = tau * Math.hypot(1, sigma) - sigma * Math.hypot(1, tau); // eqs. (7)–(9)
  const xi = Math.atan2(conformal, Math.cos(lambda));
  const eta = Math.asinh(Math.sin(lambda) / Math.hypot(conformal, Math.cos(lambda))); // eq. (10)
  let x = eta;
  let y = xi;
  ALPHA.forEach((alpha, index) => {
    const order = 2 * (index + 1);
    y += alpha * Math.sin(order * xi) * Math.cosh(order * eta);
    x += alpha * Math.cos(order * xi) * Math.sinh(order * eta); // eq. (11)
  });
  return { x: x * RECTIFYING_M, y: y * RECTIFYING_M };
}

/**
 * UTM of a place; null outside 80° south to 84° north, where UTM does not reach.
 * @param zone another zone than its own, where a neighbour is wanted
 */
export function toUtm({ latitude, longitude }: LatLon, zone = zoneOf(latitude, longitude)): Utm | null {
  requireInRange("latitude", latitude, -90, 90);
  requireInRange("longitude", longitude, -540, 540);
  if (latitude < UTM_SOUTH_DEG || latitude > UTM_NORTH_DEG) return null;
  const { x, y } = project(latitude, normaliseLongitude(longitude - meridianOf(zone)));
  const band = bandOf(latitude);
  const isNorth = band >= "N";
  const northM = y * SCALE;
  return {
    zone,
    band,
    isNorth,
    eastingM: x * SCALE + FALSE_EASTING_M,
    northingM: isNorth ? Math.max(0, northM) : northM + FALSE_NORTHING_M,
  };
}

/**
 * Place of a UTM position. Throws RangeError outside zones 1…60, eastings of 100…900 km and the globe.
 * @param position northing counted from the equator, or with 10,000 km added in the south
 */
export function fromUtm(position: Pick<Utm, "zone" | "isNorth" | "eastingM" | "northingM">): LatLon {
  requireInRange("zone", position.zone, 1, 60);
  requireInRange("eastingM", position.eastingM, 100_000, 900_000);
  requireInRange("northingM", position.northingM, 0, 10_000_000);
  const xi = (position.northingM - (position.isNorth ? 0 : FALSE_NORTHING_M)) / SCALE / RECTIFYING_M;
  const eta = (position.eastingM - FALSE_EASTING_M) / SCALE / RECTIFYING_M;
  let xiPrime = xi;
  let etaPrime = eta;
  BETA.forEach((beta, index) => {
    const order = 2 * (index + 1);
    xiPrime -= beta * Math.sin(order * xi) * Math.cosh(order * eta);
    etaPrime -= beta * Math.cos(order * xi) * Math.sinh(order * eta); // eq. (15)
  });
  const conformal = Math.sin(xiPrime) / Math.hypot(Math.sinh(etaPrime), Math.cos(xiPrime));
  const lambda = Math.atan2(Math.sinh(etaPrime), Math.cos(xiPrime)); // eq. (18)
  return {
    latitude: Math.atan(unconform(conformal)) / RADIANS_PER_DEGREE,
    longitude: normaliseLongitude(lambda / RADIANS_PER_DEGREE + meridianOf(position.zone)),
  };
}

/** τ from τ′ by Newton's method (eqs. 19–21); three rounds reach the last bit. */
function unconform(conformal: number): number {
  const flat = 1 - ECCENTRICITY ** 2;
  let tau = conformal / flat;
  for (let round = 0; round < 5; round += 1) {
    const sigma = Math.sinh(ECCENTRICITY * Math.atanh((ECCENTRICITY * tau) / Math.hypot(1, tau)));
    const guess = tau * Math.hypot(1, sigma) - sigma * Math.hypot(1, tau);
    tau += ((conformal - guess) / Math.hypot(1, guess)) * ((1 + flat * tau ** 2) / (flat * Math.hypot(1, tau)));
  }
  return tau;
}
