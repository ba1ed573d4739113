import type { PaperDocument } from "@/lib/domain/views";
import { renderPaper, type PaperOptions } from "@/lib/pdf/render";

export interface PdfRequest {
  readonly papers: readonly PaperDocument[];
  readonly options: PaperOptions;
}

export function renderPdf({ papers, options }: PdfRequest): Promise<Uint8Array> {
  return renderPaper(papers, options);
}
