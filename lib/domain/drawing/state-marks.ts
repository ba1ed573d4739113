import type { Verdict } from "@/lib/calc/types";
import { arcPath, circlePath, type MarkPath } from "./path";

const MIDDLE = 12;
const RADIUS = 9;
const RING = 2.4;

function dashedRing(): string {
  const dashes = 8;
  return Array.from({ length: dashes }, (_, i) => {
    const start = (i * 360) / dashes;
    return arcPath([MIDDLE, MIDDLE], RADIUS, start, start + 25);
  }).join("");
}

/** Mark of each state in a box of 24 × 24. Always beside its word. */
export const STATE_MARKS: Readonly<Record<Verdict, { readonly word: string; readonly paths: readonly MarkPath[] }>> = {
  holds: { word: "holds", paths: [{ d: circlePath(MIDDLE, MIDDLE, RADIUS + RING / 2), fill: true }] },
  thin: {
    word: "thin",
    paths: [
      { d: circlePath(MIDDLE, MIDDLE, RADIUS), stroke: true, strokeWidth: RING },
      { d: "M12 3A9 9 0 0 0 12 21Z", fill: true },
    ],
  },
  "gives-way": {
    word: "gives way",
    paths: [
      { d: circlePath(MIDDLE, MIDDLE, RADIUS), stroke: true, strokeWidth: RING },
      { d: "M6.5 17.5L17.5 6.5", stroke: true, strokeWidth: RING + 0.4 },
    ],
  },
  unknown: { word: "unknown", paths: [{ d: dashedRing(), stroke: true, strokeWidth: RING }] },
};
