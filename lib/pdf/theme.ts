import type { PaperSize } from "@/lib/domain/paper/schema";

/** Black on white first: grey only helps, it never means anything. */
export const INK = "#000000";
export const GREY = "#4d4d4d";
export const HAIR = "#9a9a9a";
export const PALE = "#c9c9c9";

/** Type sizes, points. */
export const TYPE = { small: 9, body: 10, strong: 10.5, number: 14, fact: 22, title: 27 } as const;
export const LEADING = 1.3;

const MARGIN = 30;

/** Sheet sizes of react-pdf, points, and what is left inside the margins. */
const SHEETS: Readonly<Record<PaperSize, { readonly width: number; readonly height: number }>> = {
  A4: { width: 595.28, height: 841.89 },
  LETTER: { width: 612, height: 792 },
};

export interface Sheet {
  readonly size: PaperSize;
  readonly width: number;
  readonly height: number;
  readonly margin: number;
  /** Width between the margins. */
  readonly inner: number;
}

export function sheetOf(size: PaperSize): Sheet {
  const { width, height } = SHEETS[size];
  return { size, width, height, margin: MARGIN, inner: width - 2 * MARGIN };
}

export const CAUTIONS =
  "Estimates from typical ground: test on site. No shelter is safe in a storm: leave in time. Look up for dead limbs. " +
  "Keep clear of flood plains, lightning and avalanche ground. No flames or stoves inside. Local rules, land managers " +
  "and qualified guides come first.";
