import { measureGpx, type GpxAnswer } from "./gpx-task";
import { runInWorker } from "./run-in-worker";

/** A file read and measured without holding up other requests. */
export function measureGpxInWorker(bytes: Uint8Array): Promise<GpxAnswer> {
  return runInWorker("gpx", bytes, measureGpx);
}
