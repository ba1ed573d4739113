/** One piece of a line without a break. Heights are NaN where the file has none. */
export interface GpxSegment {
  readonly latitudes: number[];
  readonly longitudes: number[];
  readonly heightsM: number[];
}

export interface GpxLine {
  readonly kind: "track" | "route";
  readonly name: string;
  readonly segments: readonly GpxSegment[];
}

export interface GpxWaypoint {
  readonly name: string;
  readonly note: string;
  readonly latitude: number;
  readonly longitude: number;
  readonly heightM: number | null;
}

export interface GpxFile {
  readonly name: string;
  readonly lines: readonly GpxLine[];
  readonly waypoints: readonly GpxWaypoint[];
  /** What was odd and how it was taken, in sentences for people. */
  readonly remarks: readonly string[];
}

/** Why a file is not read, in a sentence for people that names the line or the point. */
export class GpxFault extends Error {
  constructor(message: string) {
    super(message);
    this.name = "GpxFault";
  }
}
