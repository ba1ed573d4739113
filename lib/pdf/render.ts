import { renderToBuffer } from "@react-pdf/renderer";
import type { PaperSize } from "@/lib/domain/paper/schema";
import { METRIC, type Preferences } from "@/lib/domain/preferences";
import type { PracticeSheetView } from "@/lib/domain/pull-test/practice-sheet";
import type { PaperDocument } from "@/lib/domain/views";
import { papersDocument } from "./documents/papers";
import { practiceSheetDocument } from "./documents/practice-sheet";
import { registerFonts } from "./fonts";
import { sheetOf } from "./theme";

export interface PaperOptions {
  readonly size: PaperSize;
  readonly preferences?: Preferences;
}

/** One PDF of one or several papers, in order. Depends on nothing but what it is given. */
export async function renderPaper(
  papers: PaperDocument | readonly PaperDocument[],
  { size, preferences = METRIC }: PaperOptions,
): Promise<Uint8Array> {
  registerFonts();
  const list = "kind" in papers ? [papers] : papers;
  if (list.length === 0) throw new Error("There is no paper to render.");
  return renderToBuffer(papersDocument(list, sheetOf(size), preferences));
}

/** The practice sheet of a training day. */
export async function renderPracticeSheet(view: PracticeSheetView, size: PaperSize): Promise<Uint8Array> {
  registerFonts();
  return renderToBuffer(practiceSheetDocument(view, sheetOf(size)));
}
