import { measureGpx } from "./gpx-task";
import { serveWorker } from "./serve-worker";

serveWorker(measureGpx);
