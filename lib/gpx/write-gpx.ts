import { itemAt } from "@/lib/calc/indexed";
import { pointBefore, placeOnLine } from "./line-places";
import type { LineData } from "./measure-line";
import type { GpxWaypoint } from "./types";

/** A place this close to a point of the line, m, is that point. */
const SAME_M = 1e-4;

export interface GpxTrackPiece {
  readonly name: string;
  readonly fromM: number;
  readonly toM: number;
}

function escape(text: string): string {
  return text
    .replace(/[^\t\n\r\u0020-\uD7FF\uE000-\uFFFD\u{10000}-\u{10FFFF}]/gu, "")
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;")
    .replaceAll('"', "&quot;");
}

/** Seven decimals of a degree are a centimetre; never "-0.0000000" nor a longitude of 180. */
function degrees(value: number): string {
  const text = value.toFixed(7);
  if (Number(text) === 0) return "0.0000000";
  return text === "180.0000000" ? "-180.0000000" : text;
}

const height = (metres: number | null | undefined) =>
  metres === null || metres === undefined || Number.isNaN(metres)
    ? ""
    : `<ele>${metres.toFixed(2).replace(/^-0\.00$/, "0.00")}</ele>`;

const point = (latitude: number, longitude: number, heightM: number | null | undefined) =>
  `      <trkpt lat="${degrees(latitude)}" lon="${degrees(longitude)}">${height(heightM)}</trkpt>`;

/** The points of a piece, its ends cut in where they fall between two points; breaks of the line stay breaks. */
function pieceSegments(line: LineData, fromM: number, toM: number): readonly string[][] {
  const starts = new Set(line.starts);
  const segments: string[][] = [];
  let current: string[] = [];
  const cutIn = (atM: number) => {
    const place = placeOnLine(line, atM);
    current.push(point(place.latitude, place.longitude, place.heightM));
  };
  const first = pointBefore(line, fromM);
  const isOnPoint = fromM - itemAt(line.atM, first) <= SAME_M;
  if (!isOnPoint && itemAt(line.atM, Math.min(first + 1, line.atM.length - 1)) - fromM > SAME_M) cutIn(fromM);
  for (let index = isOnPoint ? first : first + 1; index < line.atM.length; index += 1) {
    const atM = itemAt(line.atM, index);
    if (atM > toM + SAME_M) break;
    if (starts.has(index) && current.length > 0) {
      segments.push(current);
      current = [];
    }
    current.push(point(itemAt(line.latitudes, index), itemAt(line.longitudes, index), line.heightsM[index]));
  }
  const last = pointBefore(line, toM + SAME_M);
  if (toM - itemAt(line.atM, last) > SAME_M) cutIn(toM);
  segments.push(current);
  return segments.filter((segment) => segment.length > 1);
}

/** GPX 1.1: camps as waypoints, days as tracks. The same trip gives the same bytes. */
export function writeGpx(route: {
  readonly name: string;
  readonly waypoints: readonly GpxWaypoint[];
  readonly line: LineData | null;
  readonly pieces: readonly GpxTrackPiece[];
}): string {
  const { line } = route;
  const waypoints = route.waypoints.map((one) => {
    const note = one.note === "" ? "" : `<desc>${escape(one.note)}</desc>`;
    const inner = `${height(one.heightM)}<name>${escape(one.name)}</name>${note}`;
    return `  <wpt lat="${degrees(one.latitude)}" lon="${degrees(one.longitude)}">${inner}</wpt>`;
  });
  const tracks = line
    ? route.pieces.flatMap((piece) => {
        const segments = pieceSegments(line, piece.fromM, piece.toM);
        if (segments.length === 0) return [];
        const body = segments.map((points) => `    <trkseg>\n${points.join("\n")}\n    </trkseg>`).join("\n");
        return [`  <trk>\n    <name>${escape(piece.name)}</name>\n${body}\n  </trk>`];
      })
    : [];
  return [
    '<?xml version="1.0" encoding="UTF-8"?>',
    '<gpx version="1.1" creator="Leestead" xmlns="http://www.topografix.com/GPX/1/1">',
    `  <metadata><name>${escape(route.name)}</name></metadata>`,
    ...waypoints,
    ...tracks,
    "</gpx>",
    "",
  ].join("\n");
}
