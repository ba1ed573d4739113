import { renderPaper, type PaperOptions } from "@/lib/pdf/render";
import type { PaperDocument } from "@/lib/domain/views";
import { serveWorker } from "./serve-worker";

serveWorker(({ papers, options }: { papers: readonly PaperDocument[]; options: PaperOptions }) =>
  renderPaper(papers, options),
);
