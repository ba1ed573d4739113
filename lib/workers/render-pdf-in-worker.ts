import { renderPdf, type PdfRequest, type PracticeSheetRequest } from "./pdf-task";
import { runInWorker } from "./run-in-worker";

/** One PDF of one or several papers, rendered without holding up other requests. */
export function renderPdfInWorker(request: PdfRequest): Promise<Uint8Array> {
  return runInWorker("pdf", request, renderPdf);
}

export function renderPracticeSheetInWorker(request: PracticeSheetRequest): Promise<Uint8Array> {
  return runInWorker("pdf", request, renderPdf);
}
