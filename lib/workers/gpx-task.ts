import { measureFile, type MeasuredRoute } from "@/lib/gpx/measure-line";
import { readGpx } from "@/lib/gpx/read-gpx";
import { GpxFault, type GpxWaypoint } from "@/lib/gpx/types";

export type GpxAnswer =
  | { readonly refused: string }
  | {
      readonly refused: null;
      readonly name: string;
      readonly waypoints: readonly GpxWaypoint[];
      readonly remarks: readonly string[];
      readonly route: MeasuredRoute;
    };

/** Reads and measures a file: some hundred milliseconds for ten megabytes. What is wrong with it comes back as a sentence. */
export function measureGpx(bytes: Uint8Array): GpxAnswer {
  try {
    const file = readGpx(bytes);
    const { remarks, ...route } = measureFile(file);
    const name = file.name || (file.lines[0]?.name ?? "");
    return { refused: null, name, waypoints: file.waypoints, remarks, route };
  } catch (error) {
    if (error instanceof GpxFault) return { refused: error.message };
    throw error;
  }
}
