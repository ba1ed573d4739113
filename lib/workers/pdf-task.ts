import type { PaperSize } from "@/lib/domain/paper/schema";
import type { PracticeSheetView } from "@/lib/domain/pull-test/practice-sheet";
import type { PaperDocument } from "@/lib/domain/views";
import { renderPaper, renderPracticeSheet, type PaperOptions } from "@/lib/pdf/render";

export interface PdfRequest {
  readonly papers: readonly PaperDocument[];
  readonly options: PaperOptions;
}

export interface PracticeSheetRequest {
  readonly practiceSheet: PracticeSheetView;
  readonly size: PaperSize;
}

export function renderPdf(request: PdfRequest | PracticeSheetRequest): Promise<Uint8Array> {
  if ("practiceSheet" in request) return renderPracticeSheet(request.practiceSheet, request.size);
  return renderPaper(request.papers, request.options);
}
