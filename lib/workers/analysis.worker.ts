import { computeAnalysis } from "./analysis-task";
import { serveWorker } from "./serve-worker";

serveWorker(computeAnalysis);
