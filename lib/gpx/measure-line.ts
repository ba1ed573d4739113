import { itemAt } from "@/lib/calc/indexed";
import type { LatLon } from "@/lib/calc/places/utm";
import { normaliseLongitude } from "@/lib/calc/places/utm";
import { buildProfile } from "@/lib/calc/route/profile";
import { simplifyToCount } from "@/lib/calc/route/simplify";
import type { Profile } from "@/lib/calc/route/types";
import { distanceM } from "@/lib/places/geodesic";
import type { GpxFile, GpxSegment } from "./types";
import { GpxFault } from "./types";

export const MAX_SIMPLIFIED = 2000;
/** Pieces whose ends lie closer than this, m, are one line: days of one walk, a pause. */
const JOIN_M = 1;
const DEGREE_M = 111_320;

/** The way as it is walked: every point of every piece, one after the other. */
export interface LineData {
  readonly latitudes: Float64Array;
  readonly longitudes: Float64Array;
  /** NaN where not known. */
  readonly heightsM: Float64Array;
  /** Distance walked to each point, m; breaks between pieces are not walked. */
  readonly atM: Float64Array;
  /** Index of the first point of each piece. */
  readonly starts: readonly number[];
}

export interface Break {
  readonly atM: number;
  readonly lengthM: number;
}

/** [latitude, longitude, place along the line] of each point that is left; pieces stay apart. */
export type SimplifiedLine = readonly (readonly (readonly [number, number, number])[])[];

export interface MeasuredRoute {
  readonly line: LineData;
  readonly lengthM: number;
  readonly breaks: readonly Break[];
  readonly simplified: SimplifiedLine;
  readonly profile: Profile;
}

/** Pieces put together; where one begins where the last ended, they become one. */
export function joinSegments(segments: readonly GpxSegment[]): { line: LineData; breaks: Break[] } {
  const count = segments.reduce((sum, segment) => sum + segment.latitudes.length, 0);
  const latitudes = new Float64Array(count);
  const longitudes = new Float64Array(count);
  const heightsM = new Float64Array(count);
  const atM = new Float64Array(count);
  const starts: number[] = [];
  const breaks: Break[] = [];
  let size = 0;
  const placeAt = (index: number): LatLon => ({
    latitude: itemAt(latitudes, index),
    longitude: itemAt(longitudes, index),
  });
  for (const segment of segments) {
    segment.latitudes.forEach((latitude, index) => {
      const place = { latitude, longitude: itemAt(segment.longitudes, index) };
      const stepM = size > 0 ? distanceM(placeAt(size - 1), place) : 0;
      const isJoint = index === 0 && size > 0;
      if (isJoint && stepM <= JOIN_M) return;
      if (index === 0) starts.push(size);
      if (isJoint) breaks.push({ atM: itemAt(atM, size - 1), lengthM: stepM });
      latitudes[size] = latitude;
      longitudes[size] = place.longitude;
      heightsM[size] = itemAt(segment.heightsM, index);
      atM[size] = size === 0 ? 0 : itemAt(atM, size - 1) + (isJoint ? 0 : stepM);
      size += 1;
    });
  }
  const cut = (all: Float64Array) => all.slice(0, size);
  return {
    line: { latitudes: cut(latitudes), longitudes: cut(longitudes), heightsM: cut(heightsM), atM: cut(atM), starts },
    breaks,
  };
}

/** Metres on a plane that touches the middle of the line; longitudes run on across the antimeridian. */
function onPlane(line: LineData): { x: Float64Array; y: Float64Array } {
  const middle = itemAt(line.latitudes, Math.floor(line.latitudes.length / 2));
  const eastM = DEGREE_M * Math.max(0.01, Math.cos((middle * Math.PI) / 180));
  let east = 0;
  let before = itemAt(line.longitudes, 0);
  const x = line.longitudes.map((longitude) => {
    east += normaliseLongitude(longitude - before);
    before = longitude;
    return east * eastM;
  });
  return { x, y: line.latitudes.map((latitude) => latitude * DEGREE_M) };
}

function pieces(line: LineData): readonly (readonly [number, number])[] {
  return line.starts.map((start, index) => [start, line.starts[index + 1] ?? line.latitudes.length] as const);
}

export function simplifyLine(line: LineData): SimplifiedLine {
  const { x, y } = onPlane(line);
  const spans = pieces(line);
  const room = Math.max(2, MAX_SIMPLIFIED - 2 * spans.length);
  const total = line.latitudes.length;
  return spans.map(([from, to]) => {
    const share = 2 + Math.floor((room * (to - from)) / total);
    const indices = simplifyToCount(x.subarray(from, to), y.subarray(from, to), share);
    return indices.map((index) => {
      const point = from + index;
      return [itemAt(line.latitudes, point), itemAt(line.longitudes, point), itemAt(line.atM, point)] as const;
    });
  });
}

/** Length, breaks, simplified line and profile of pieces. Throws GpxFault where there is no way to walk. */
export function measureSegments(segments: readonly GpxSegment[]): MeasuredRoute {
  const { line, breaks } = joinSegments(segments);
  const lengthM = line.atM.length > 0 ? itemAt(line.atM, line.atM.length - 1) : 0;
  if (line.atM.length < 2 || lengthM < 1) {
    throw new GpxFault("The line has no length: a way needs two points that lie apart.");
  }
  return { line, lengthM, breaks, simplified: simplifyLine(line), profile: buildProfile(line) };
}

/** The way of a file: its tracks one after the other or, without any, its routes. */
export function measureFile(file: GpxFile): MeasuredRoute & { readonly remarks: readonly string[] } {
  const tracks = file.lines.filter((line) => line.kind === "track");
  const routes = file.lines.filter((line) => line.kind === "route");
  const used = tracks.length > 0 ? tracks : routes;
  if (used.length === 0) {
    throw new GpxFault(
      file.waypoints.length > 0
        ? "The file has places but no track or route with two points."
        : "The file has no track or route with two points.",
    );
  }
  const remarks = [...file.remarks];
  if (tracks.length > 0 && routes.length > 0) {
    remarks.push(
      `It has tracks and routes; the ${routes.length === 1 ? "route was" : `${routes.length} routes were`} left out.`,
    );
  }
  return { ...measureSegments(used.flatMap((line) => line.segments)), remarks };
}

/** The simplified line as a line of its own, without heights: two thousand points instead of fifty thousand. */
export function simplifiedLine(simplified: SimplifiedLine): LineData {
  const points = simplified.flat();
  const starts: number[] = [];
  let size = 0;
  for (const piece of simplified) {
    starts.push(size);
    size += piece.length;
  }
  return {
    latitudes: Float64Array.from(points, ([latitude]) => latitude),
    longitudes: Float64Array.from(points, ([, longitude]) => longitude),
    heightsM: new Float64Array(points.length).fill(Number.NaN),
    atM: Float64Array.from(points, ([, , atM]) => atM),
    starts,
  };
}
