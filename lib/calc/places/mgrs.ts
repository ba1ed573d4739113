import { fromUtm, toUtm, UTM_BANDS, type LatLon, type Utm } from "./utm";

/**
 * Grid references of the Military Grid Reference System on WGS 84 within the reach of UTM.
 * Source: NGA.STND.0037 (2014), lettering scheme AA. Places nearer the poles have letters of another scheme, which is
 * not used here.
 */
const COLUMNS = ["ABCDEFGH", "JKLMNPQR", "STUVWXYZ"] as const;
const ROWS = "ABCDEFGHJKLMNPQRSTUV";
const SQUARE_M = 100_000;

/** The two letters of the 100 km square: columns go round every three zones, rows start at F in even ones. */
function squareOf({ zone, eastingM, northingM }: Utm): string | null {
  const columns = COLUMNS[(zone - 1) % 3] ?? COLUMNS[0];
  const column = columns.charAt(Math.floor(eastingM / SQUARE_M) - 1);
  const shift = zone % 2 === 0 ? 5 : 0;
  const row = ROWS.charAt((Math.floor(northingM / SQUARE_M) + shift) % 20);
  return column === "" || row === "" ? null : column + row;
}

/**
 * "32V NM 12345 67890": zone and band, square, easting and northing within it, cut (never rounded) to `digits` each.
 * @param digits 1 (10 km) … 5 (1 m) @returns null where UTM does not reach
 */
export function toMgrs(place: LatLon, digits = 5): string | null {
  const found = toUtm(place);
  if (!found) return null;
  // A hair south of the equator the northing rounds up to the equator's, which has no square in the south.
  const utm = found.isNorth ? found : { ...found, northingM: Math.min(found.northingM, 9_999_999.999) };
  const square = squareOf(utm);
  if (!square) return null;
  const part = (metres: number) =>
    String(Math.min(SQUARE_M - 1, Math.floor((metres % SQUARE_M) + 1e-6)))
      .padStart(5, "0")
      .slice(0, digits);
  return `${utm.zone}${utm.band} ${square} ${part(utm.eastingM)} ${part(utm.northingM)}`;
}

export interface ParsedGrid {
  readonly place: LatLon;
  /** Side of the square that the reference names; the place is its middle, for 1 m its corner. m */
  readonly sideM: number;
}

export type GridFault = "form" | "zone" | "square" | "outside";

const REFERENCE = /^(\d{1,2})([C-HJ-NP-X])([A-HJ-NP-Z])([A-HJ-NP-V])(\d*)$/;

/** The place of a grid reference, spaces and case as one likes; or what is wrong with it. */
export function parseMgrs(text: string): ParsedGrid | GridFault {
  const found = REFERENCE.exec(text.replace(/\s+/g, "").toUpperCase());
  const [, zoneText = "", band = "", columnLetter = "", rowLetter = "", numbers = ""] = found ?? [];
  if (!found || numbers.length % 2 !== 0 || numbers.length > 10 || numbers.length === 0) return "form";
  const zone = Number(zoneText);
  if (zone < 1 || zone > 60) return "zone";
  const column = (COLUMNS[(zone - 1) % 3] ?? "").indexOf(columnLetter);
  if (column < 0) return "square";
  const half = numbers.length / 2;
  const sideM = 10 ** (5 - half);
  const middle = sideM > 1 ? sideM / 2 : 0;
  const eastingM = (column + 1) * SQUARE_M + Number(numbers.slice(0, half)) * sideM + middle;
  const inRow = Number(numbers.slice(half)) * sideM + middle;
  const shift = zone % 2 === 0 ? 5 : 0;
  const rowM = ((ROWS.indexOf(rowLetter) - shift + 20) % 20) * SQUARE_M + inRow;
  const place = placeInBand(zone, band, eastingM, rowM);
  return place ? { place, sideM } : "outside";
}

function bandEdges(band: string): readonly [southDeg: number, northDeg: number] {
  const south = UTM_BANDS.indexOf(band) * 8 - 80;
  return [south, band === "X" ? 84 : south + 8];
}

/** Rows repeat every 2000 km: the one whose latitude lies in the band, or within the square across its edge. */
function placeInBand(zone: number, band: string, eastingM: number, rowM: number): LatLon | null {
  const isNorth = UTM_BANDS.indexOf(band) >= 10;
  const candidates = [0, 1, 2, 3, 4].flatMap((cycle) => {
    const northingM = rowM + cycle * 2_000_000;
    if (northingM > 10_000_000) return [];
    const place = fromUtm({ zone, isNorth, eastingM, northingM });
    return place.latitude >= -80.2 && place.latitude <= 84.2 ? [place] : [];
  });
  const distance = (place: LatLon) => {
    const [south, north] = bandEdges(band);
    return Math.max(south - place.latitude, place.latitude - north, 0);
  };
  const [best] = candidates.sort((a, b) => distance(a) - distance(b));
  return best && distance(best) < 1 ? best : null;
}

/** Whether a latitude lies in the band that stands beside a UTM position, or less than a degree outside it. */
export function isInBand(band: string, latitude: number): boolean {
  const [south, north] = bandEdges(band);
  return latitude > south - 1 && latitude < north + 1;
}
