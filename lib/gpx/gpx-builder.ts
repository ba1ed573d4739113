import { normaliseLongitude } from "@/lib/calc/places/utm";
import { cleanLine } from "@/lib/domain/clean-text";
import { GpxFault, type GpxFile, type GpxLine, type GpxSegment, type GpxWaypoint } from "./types";

export type PointTag = "trkpt" | "rtept" | "wpt";

export const MAX_POINTS = 200_000;
export const MAX_WAYPOINTS = 1000;
/** More breaks than any day of a device that stops at each rest. */
export const MAX_SEGMENTS = 900;

/** A plain decimal: no exponent, no plus, no superfluous zero, no comma. */
const DECIMAL = /^-?(?:0|[1-9]\d*|(?=\.))(?:\.\d+)?$/;
const MAX_DIGITS = 60;
const LOWEST_M = -500;
const HIGHEST_M = 9000;

const LINE_TAGS = { trkpt: "track", rtept: "route", wpt: "place" } as const;

interface OpenLine {
  readonly kind: "track" | "route";
  name: string;
  readonly segments: GpxSegment[];
}

const emptySegment = (): GpxSegment => ({ latitudes: [], longitudes: [], heightsM: [] });

/** Gathers the lines and places of one file, checking each number as it comes. */
export class GpxBuilder {
  private readonly lines: GpxLine[] = [];
  private readonly waypoints: GpxWaypoint[] = [];
  private readonly remarks: string[] = [];
  private name = "";
  private line: OpenLine | null = null;
  private point: { latitude: number; longitude: number; heightM: number; name: string; note: string } | null = null;
  private tag: PointTag = "trkpt";
  private pointCount = 0;
  private segmentCount = 0;
  private oddHeights = 0;
  private lonelyPoints = 0;

  remark(sentence: string): void {
    if (this.remarks.length < 20) this.remarks.push(sentence);
  }

  openLine(tag: "trk" | "rte"): void {
    this.line = { kind: tag === "trk" ? "track" : "route", name: "", segments: [] };
    if (tag === "rte") this.openSegment();
  }

  openSegment(): void {
    if (!this.line) throw new GpxFault("A <trkseg> stands outside of a <trk>.");
    this.segmentCount += 1;
    if (this.segmentCount > MAX_SEGMENTS) throw new GpxFault(`The lines have more than ${MAX_SEGMENTS} pieces.`);
    this.line.segments.push(emptySegment());
  }

  closeLine(): void {
    const { line } = this;
    this.line = null;
    if (!line) return;
    this.lonelyPoints += line.segments.filter((segment) => segment.latitudes.length === 1).length;
    const segments = line.segments.filter((segment) => segment.latitudes.length > 1);
    if (segments.length > 0) this.lines.push({ ...line, segments });
  }

  /** "Point 17 of the track": people count from one. */
  private placeName(): string {
    return this.tag === "wpt"
      ? `Place ${this.waypoints.length + 1}`
      : `Point ${this.pointCount} of the ${LINE_TAGS[this.tag]}s`;
  }

  private readDegrees(text: string | undefined, what: string, limit: number, lineNumber: number): number {
    const trimmed = (text ?? "").trim();
    const where = `${this.placeName()} (line ${lineNumber})`;
    if (trimmed === "") throw new GpxFault(`${where} has no ${what}.`);
    const value = trimmed.length <= MAX_DIGITS && DECIMAL.test(trimmed) ? Number(trimmed) : Number.NaN;
    if (Number.isNaN(value)) {
      throw new GpxFault(`${where}: "${trimmed.slice(0, 30)}" is not a ${what}. Use a plain decimal such as 61.2.`);
    }
    if (Math.abs(value) > limit) throw new GpxFault(`${where}: ${what} ${trimmed.slice(0, 30)} is not on the globe.`);
    return value;
  }

  openPoint(tag: PointTag, attributes: Readonly<Record<string, string>>, lineNumber: number): void {
    this.tag = tag;
    if (this.point) throw new GpxFault(`Line ${lineNumber} has a point inside a point.`);
    if (tag === "wpt") {
      if (this.waypoints.length >= MAX_WAYPOINTS) throw new GpxFault(`The file has more than ${MAX_WAYPOINTS} places.`);
    } else {
      this.pointCount += 1;
      if (this.pointCount > MAX_POINTS) throw new GpxFault(`The lines have more than ${MAX_POINTS} points.`);
      if (!this.line?.segments.length)
        throw new GpxFault(`Line ${lineNumber} has a point outside of a track or route.`);
    }
    this.point = {
      latitude: this.readDegrees(attributes.lat, "latitude", 90, lineNumber),
      longitude: normaliseLongitude(this.readDegrees(attributes.lon, "longitude", 180, lineNumber)),
      heightM: Number.NaN,
      name: "",
      note: "",
    };
  }

  setHeight(text: string, lineNumber: number): void {
    if (!this.point || text === "") return;
    const value = text.length <= MAX_DIGITS && DECIMAL.test(text) ? Number(text) : Number.NaN;
    if (Number.isNaN(value)) {
      this.oddHeights += 1;
      return;
    }
    if (value < LOWEST_M || value > HIGHEST_M) {
      throw new GpxFault(
        `${this.placeName()} (line ${lineNumber}): a height of ${text.slice(0, 20)} m is not on land.`,
      );
    }
    this.point.heightM = value;
  }

  setName(parent: string, text: string, isOfRoot: boolean): void {
    const name = cleanLine(text).slice(0, 80);
    if (this.point && (parent === "wpt" || parent === "rtept" || parent === "trkpt")) this.point.name = name;
    else if (this.line && (parent === "trk" || parent === "rte")) this.line.name = name;
    else if (parent === "metadata" || isOfRoot) this.name = name;
  }

  setNote(text: string): void {
    if (this.point && this.point.note === "") this.point.note = cleanLine(text).slice(0, 200);
  }

  closePoint(): void {
    const { point } = this;
    this.point = null;
    if (!point) return;
    const { latitude, longitude, heightM } = point;
    if (this.tag === "wpt") {
      const height = Number.isNaN(heightM) ? null : heightM;
      const name = point.name || `Place ${this.waypoints.length + 1}`;
      this.waypoints.push({ name, note: point.note, latitude, longitude, heightM: height });
      return;
    }
    const segment = this.line?.segments[this.line.segments.length - 1];
    if (!segment) return;
    segment.latitudes.push(latitude);
    segment.longitudes.push(longitude);
    segment.heightsM.push(heightM);
  }

  finish(): GpxFile {
    if (this.oddHeights > 0) {
      this.remark(`${this.oddHeights} of its heights are no plain numbers; they count as not known.`);
    }
    if (this.lonelyPoints > 0) this.remark(`${this.lonelyPoints} pieces have one point only and were left out.`);
    return { name: this.name, lines: this.lines, waypoints: this.waypoints, remarks: this.remarks };
  }
}
