import { isInBand, parseMgrs, type GridFault } from "./mgrs";
import { fromUtm, normaliseLongitude, UTM_BANDS, type LatLon } from "./utm";

export interface ParsedPosition {
  readonly place: LatLon;
  readonly kind: "degrees" | "utm" | "mgrs";
  /** Side of the square that was named, m; 0 for a point. */
  readonly sideM: number;
}

export interface PositionProblem {
  /** For people. */
  readonly problem: string;
}

const GRID_PROBLEMS: Readonly<Record<GridFault, string>> = {
  form: "A grid reference looks like 32V NM 12345 67890.",
  zone: "Zones go from 1 to 60.",
  square: "There is no such square in that zone.",
  outside: "That square is not in that band of latitude.",
};
const FORMS = "Enter degrees (61.93, 8.72), UTM (32V 512345 6789012) or a grid reference (32V NM 12345 67890).";
const LONGEST = 80;

/** Degrees, optionally minutes and seconds, with N, S, E, W before or after. */
const ANGLE =
  /^([NSEW])?\s*([+-]?\d{1,3}(?:\.\d+)?)\s*(?:°\s*)?(?:(\d{1,2}(?:\.\d+)?)\s*['′]\s*(?:(\d{1,2}(?:\.\d+)?)\s*(?:"|″|'')\s*)?)?([NSEW])?$/i;
const UTM = /^(\d{1,2})\s*([A-Z])\s*(\d{6}(?:\.\d+)?)\s*(?:m?\s*E)?[\s,]+(\d{1,8}(?:\.\d+)?)\s*(?:m?\s*N)?$/i;

interface Angle {
  readonly degrees: number;
  readonly side: string;
}

function readAngle(text: string): Angle | null {
  const [found, before = "", whole = "", minutes = "0", seconds = "0", after = ""] = ANGLE.exec(text.trim()) ?? [];
  if (found === undefined || (before !== "" && after !== "")) return null;
  const side = (before || after).toUpperCase();
  if (Number(minutes) >= 60 || Number(seconds) >= 60) return null;
  const size = Math.abs(Number(whole)) + Number(minutes) / 60 + Number(seconds) / 3600;
  const isNegative = whole.startsWith("-");
  if (isNegative && side !== "") return null;
  return { degrees: isNegative || side === "S" || side === "W" ? -size : size, side };
}

/** Two angles: parted by a comma or semicolon, else after the letter of the first or at the space between them. */
function splitAngles(text: string): readonly [string, string] | null {
  const parts = text.split(/\s*[;,]\s*/);
  if (parts.length === 2) return [parts[0] ?? "", parts[1] ?? ""];
  // A decimal comma on both sides: "61,93 8,72".
  const spaced = text.trim().split(/\s+/);
  if (spaced.length === 2) return [(spaced[0] ?? "").replace(",", "."), (spaced[1] ?? "").replace(",", ".")];
  const lettered = /^(.*?\d[^A-Z]*[NS])\s+(.*[EW])$/i.exec(text) ?? /^([NS].*?)\s+([EW].*)$/i.exec(text);
  return lettered ? [lettered[1] ?? "", lettered[2] ?? ""] : null;
}

function parseDegrees(text: string): ParsedPosition | PositionProblem | null {
  const parts = splitAngles(text);
  const first = parts && readAngle(parts[0]);
  const second = parts && readAngle(parts[1]);
  if (!first || !second) return null;
  const isTurned = /[EW]/.test(first.side) && !/[EW]/.test(second.side);
  const [north, east] = isTurned ? [second, first] : [first, second];
  if (/[EW]/.test(north.side) || /[NS]/.test(east.side)) return { problem: "Enter one latitude and one longitude." };
  if (Math.abs(north.degrees) > 90) return { problem: "A latitude lies between 90° south and 90° north." };
  if (Math.abs(east.degrees) > 180) return { problem: "A longitude lies between 180° west and 180° east." };
  const place = { latitude: north.degrees, longitude: normaliseLongitude(east.degrees) };
  return { place, kind: "degrees", sideM: 0 };
}

function parseUtm(text: string): ParsedPosition | PositionProblem | null {
  const [found, zoneText = "", letter = "", east = "", north = ""] = UTM.exec(text) ?? [];
  if (found === undefined) return null;
  const zone = Number(zoneText);
  const band = letter.toUpperCase();
  const eastingM = Number(east);
  const northingM = Number(north);
  if (zone < 1 || zone > 60) return { problem: GRID_PROBLEMS.zone };
  if (!UTM_BANDS.includes(band))
    return { problem: "The letter after the zone is a band from C to X, without I and O." };
  if (eastingM < 100_000 || eastingM > 900_000) return { problem: "An easting lies between 100000 and 900000 m." };
  if (northingM > 10_000_000) return { problem: "A northing lies between 0 and 10000000 m." };
  const place = fromUtm({ zone, isNorth: UTM_BANDS.indexOf(band) >= 10, eastingM, northingM });
  if (!isInBand(band, place.latitude)) {
    return {
      problem: `That northing is not in band ${band}. Use the letter of the band, not N or S for the half of the globe.`,
    };
  }
  return { place, kind: "utm", sideM: 0 };
}

/** A position as people write it: degrees (with minutes and seconds or without), UTM or a grid reference. */
export function parsePosition(typed: string): ParsedPosition | PositionProblem {
  const text = typed
    .replace(/[\u2212]/g, "-")
    .replace(/[\u2018\u2019\u02BC]/g, "'")
    .replace(/[\u201C\u201D]/g, '"')
    .trim();
  if (text === "") return { problem: FORMS };
  if (text.length > LONGEST) return { problem: FORMS };
  const known = parseUtm(text) ?? parseDegrees(text);
  if (known) return known;
  if (!/^\d{1,2}\s*[A-Z]/i.test(text)) return { problem: FORMS };
  const grid = parseMgrs(text);
  if (typeof grid === "string") return { problem: GRID_PROBLEMS[grid] };
  return { place: grid.place, kind: "mgrs", sideM: grid.sideM };
}
