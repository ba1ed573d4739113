import { renderPdf } from "./pdf-task";
import { serveWorker } from "./serve-worker";

serveWorker(renderPdf);
