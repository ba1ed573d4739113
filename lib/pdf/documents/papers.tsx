import { cloneElement } from "react";
import { Document } from "@react-pdf/renderer";
import type { Preferences } from "@/lib/domain/preferences";
import type { PaperDocument } from "@/lib/domain/views";
import { printable } from "../glyphs";
import type { Sheet } from "../theme";
import { bookletPages } from "./booklet";
import { contactSheetPages } from "./contact-sheet";
import { fieldCardPages } from "./field-card";
import { packListPages } from "./pack-list";
import { pitchAndPackPages, type NumberedPage } from "./pitch-and-pack";
import { pitchCardPages } from "./pitch-card";

function pagesOf(paper: PaperDocument, sheet: Sheet, preferences: Preferences): NumberedPage[] {
  switch (paper.kind) {
    case "field-card":
      return fieldCardPages({ ...paper, sheet, preferences });
    case "pitch-card":
      return paper.camp.pitches
        .filter((pitch) => paper.pitchIds.includes(pitch.id))
        .flatMap((pitch) => pitchCardPages({ ...paper, sheet, preferences }, pitch));
    case "contact-sheet":
      return contactSheetPages(paper.header, paper.sheet, sheet);
    case "pack-list":
      return packListPages(paper.header, paper.list, sheet);
    case "pitch-and-pack":
      return pitchAndPackPages(paper, sheet);
    case "booklet":
      return bookletPages(paper, sheet, preferences);
  }
}

const NAMES = {
  "field-card": "field card",
  "pitch-card": "pitch card",
  "pack-list": "pack list",
  "contact-sheet": "contact sheet",
  "pitch-and-pack": "pitch and pack",
  booklet: "booklet",
} as const;

function titleOf(paper: PaperDocument): string {
  const what =
    paper.kind === "pack-list" || paper.kind === "pitch-and-pack"
      ? paper.list.person.name
      : paper.kind === "booklet" || paper.kind === "contact-sheet"
        ? null
        : paper.camp.camp.details.name;
  return [paper.header.tripName, what, NAMES[paper.kind]].filter(Boolean).join(": ");
}

/** Any number of papers as one document, in order. */
export function papersDocument(papers: readonly PaperDocument[], sheet: Sheet, preferences: Preferences) {
  const [first] = papers;
  const title = first ? printable(titleOf(first)) : "";
  const pages = papers.flatMap((paper) => pagesOf(paper, sheet, preferences));
  return (
    <Document
      title={title}
      author="Leestead"
      creator="Leestead"
      producer="Leestead"
      subject={first ? `Version ${first.header.version}, printed ${printable(first.header.printedAt)}` : undefined}
      language="en-GB"
      pageMode={papers.some((paper) => paper.kind === "booklet") ? "useOutlines" : "useNone"}
    >
      {pages.map((page, index) => cloneElement(page, { key: index, page: index + 1, pageCount: pages.length }))}
    </Document>
  );
}
