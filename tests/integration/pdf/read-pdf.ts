import { inflateSync } from "node:zlib";
import { getDocumentProxy } from "unpdf";

export interface PlacedText {
  readonly text: string;
  readonly x: number;
  /** From the top of the page. */
  readonly baseline: number;
  readonly width: number;
  readonly size: number;
}

export interface ReadPage {
  readonly width: number;
  readonly height: number;
  readonly items: readonly PlacedText[];
  /** All words of the page in drawing order, single spaces. */
  readonly text: string;
}

export interface ReadPdf {
  readonly pages: readonly ReadPage[];
  readonly info: Readonly<Record<string, unknown>>;
  readonly text: string;
}

/** Pages of a PDF with each piece of text and its place, read by a library that had no part in writing it. */
export async function readPdf(pdf: Uint8Array): Promise<ReadPdf> {
  const document = await getDocumentProxy(new Uint8Array(pdf), { verbosity: 0 });
  const pages: ReadPage[] = [];
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const { width, height } = page.getViewport({ scale: 1 });
    const content = await page.getTextContent({ disableNormalization: true });
    const items = content.items.flatMap((item) => {
      if (!("str" in item) || item.str.trim() === "") return [];
      const [a = 0, b = 0, , , x = 0, y = 0] = item.transform as number[];
      return [{ text: item.str, x, baseline: height - y, width: item.width, size: Math.hypot(a, b) }];
    });
    const text = items.map((item) => item.text).join(" ");
    pages.push({ width, height, items, text: text.replace(/\s+/g, " ") });
  }
  const { info } = await document.getMetadata();
  await document.destroy();
  return { pages, info: info as Record<string, unknown>, text: pages.map((page) => page.text).join(" ") };
}

export interface EmbeddedFont {
  readonly glyphBytes: number;
}

/** The TrueType files inside a PDF and how many bytes of outlines each has; none means text that cannot be seen. */
export function embeddedFonts(pdf: Uint8Array): EmbeddedFont[] {
  const bytes = Buffer.from(pdf);
  const fonts: EmbeddedFont[] = [];
  for (let at = bytes.indexOf("stream\n"); at >= 0; at = bytes.indexOf("stream\n", at + 7)) {
    if (bytes.subarray(at - 3, at).toString("latin1") === "end") continue;
    const end = bytes.indexOf("endstream", at);
    const plain = tryInflate(bytes.subarray(at + 7, end));
    if (!plain || plain.length < 12 || !["true", "\0\x01\0\0"].includes(plain.toString("latin1", 0, 4))) continue;
    const count = plain.readUInt16BE(4);
    for (let i = 0; i < count; i += 1) {
      const entry = 12 + i * 16;
      if (plain.toString("latin1", entry, entry + 4) === "glyf")
        fonts.push({ glyphBytes: plain.readUInt32BE(entry + 12) });
    }
  }
  return fonts;
}

function tryInflate(data: Buffer): Buffer | null {
  try {
    return inflateSync(data);
  } catch {
    return null;
  }
}

/** Pairs of texts of a page that lie over each other by more than a hair. */
export function overlapsOf(page: ReadPage): string[] {
  const boxes = page.items.map((item) => ({
    text: item.text,
    left: item.x,
    right: item.x + item.width,
    top: item.baseline - item.size * 0.7,
    bottom: item.baseline,
  }));
  const found: string[] = [];
  boxes.forEach((a, index) => {
    for (const b of boxes.slice(index + 1)) {
      const across = Math.min(a.right, b.right) - Math.max(a.left, b.left);
      const down = Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top);
      if (across > 1 && down > 1) found.push(`"${a.text}" over "${b.text}"`);
    }
  });
  return found;
}
