import type { AnchorSpec, StakeSection } from "@/lib/calc/types";
import { circlePath, clamp, formatCoordinate, linePath, polar, type MarkPath, type Point } from "./path";

/** Cross-section of an anchor as a draughtsman would cut it, in a box of 24 × 24, drawn for a pull towards the top. */
export interface AnchorMark {
  /** What it is, in a word or two, for people who cannot see the mark. */
  readonly name: string;
  readonly paths: readonly MarkPath[];
  /** True when the section faces its pull: turn the mark by the paper bearing of the line from the anchor. */
  readonly turnsWithPull: boolean;
}

const MIDDLE: Point = [12, 12];

/** Larger sections are drawn larger, but far less than to scale: a nail must be seen beside a log. */
function sized(sizeM: number, typicalM: number, typical: number, min: number, max: number): number {
  return clamp(typical * Math.sqrt(sizeM / typicalM), min, max);
}

function stakeMark(section: StakeSection): AnchorMark {
  switch (section.shape) {
    case "three-blade": {
      const blade = sized(section.bladeM, 0.013, 8.2, 6, 10.5);
      const strokeWidth = clamp((section.thicknessM / section.bladeM) * blade * 1.6, 2.2, 3.4);
      const d = [0, 120, 240].map((bearing) => linePath([MIDDLE, polar(MIDDLE, blade, bearing)])).join("");
      return { name: "three blades", paths: [{ d, stroke: true, strokeWidth }], turnsWithPull: false };
    }
    case "v": {
      const leg = sized(section.legM, 0.02, 11, 8, 14);
      const half = leg * Math.SQRT1_2;
      const top = 12 - half / 2;
      const d = linePath([
        [12 - half, top],
        [12, top + half],
        [12 + half, top],
      ]);
      return { name: "V", paths: [{ d, stroke: true, strokeWidth: 2.6 }], turnsWithPull: true };
    }
    case "round": {
      const radius = sized(section.diameterM, 0.006, 4, 3, 7);
      return { name: "round bar", paths: [{ d: circlePath(12, 12, radius), fill: true }], turnsWithPull: false };
    }
    case "tube": {
      const radius = sized(section.diameterM, 0.012, 6, 4.5, 9);
      const strokeWidth = clamp((section.wallM / section.diameterM) * radius * 4, 1.8, 3);
      const d = circlePath(12, 12, radius);
      return { name: "tube", paths: [{ d, stroke: true, strokeWidth }], turnsWithPull: false };
    }
    case "wide": {
      const half = sized(section.widthM, 0.05, 9.5, 7, 11);
      const sag = clamp((section.depthM / section.widthM) * half * 2, 1.5, 8);
      const radius = (half * half + sag * sag) / (2 * sag);
      const r = formatCoordinate(radius);
      const y = 12 - sag / 2;
      const start = `${formatCoordinate(12 - half)} ${formatCoordinate(y)}`;
      const end = `${formatCoordinate(12 + half)} ${formatCoordinate(y)}`;
      const d = `M${start}A${r} ${r} 0 0 0 ${end}`;
      return { name: "wide blade", paths: [{ d, stroke: true, strokeWidth: 2.8 }], turnsWithPull: true };
    }
    case "t": {
      const half = sized(section.widthM, 0.025, 7.5, 6, 10);
      const depth = clamp((section.depthM / section.widthM) * half * 2, 6, 14);
      const top = 12 - depth / 2;
      const d = `${linePath([
        [12 - half, top],
        [12 + half, top],
      ])}${linePath([
        [12, top],
        [12, top + depth],
      ])}`;
      return { name: "T", paths: [{ d, stroke: true, strokeWidth: 3 }], turnsWithPull: true };
    }
  }
}

function helixPath(turns: number, inner: number, outer: number): string {
  const steps = Math.round(turns * 24);
  return linePath(
    Array.from({ length: steps + 1 }, (_, i) => polar(MIDDLE, inner + ((outer - inner) * i) / steps, (i * 360) / 24)),
  );
}

const ROCK: readonly Point[] = [
  [3, 18],
  [4.2, 10.5],
  [9, 6],
  [16.5, 7.2],
  [20.6, 12.4],
  [21, 18],
];
const BOULDER: readonly Point[] = [
  [1.6, 16.4],
  [4, 8],
  [11, 3],
  [18.6, 5.4],
  [22.4, 12],
  [20.6, 19.6],
  [12.4, 22],
  [4.4, 20.6],
];

const TREE: readonly MarkPath[] = [
  { d: circlePath(12, 12, 9.6), stroke: true, strokeWidth: 2.4 },
  { d: circlePath(12.4, 11.8, 6), stroke: true, strokeWidth: 1.1 },
  { d: circlePath(12.7, 11.6, 2.9), stroke: true, strokeWidth: 1.1 },
];

export function anchorMark(spec: AnchorSpec): AnchorMark {
  switch (spec.class) {
    case "stake":
      return stakeMark(spec.section);
    case "screw-in": {
      const outer = sized(spec.helixDiameterM, 0.04, 9, 7.5, 10.5);
      return {
        name: "screw",
        paths: [
          { d: helixPath(1.75, 3.2, outer), stroke: true, strokeWidth: 1.9 },
          { d: circlePath(12, 12, 2.6), fill: true },
        ],
        turnsWithPull: false,
      };
    }
    case "deadman":
      return {
        name: "buried log",
        paths: [
          { d: "M2 9.5H22V16.5H2Z", stroke: true, strokeWidth: 2.2 },
          { d: "M5 12H14M9 14.2H19", stroke: true, strokeWidth: 1.1 },
          { d: "M2.5 20.5L5.5 17.5M8.5 20.5L11.5 17.5M14.5 20.5L17.5 17.5", stroke: true, strokeWidth: 1.3 },
        ],
        turnsWithPull: true,
      };
    case "surface-weight":
      return {
        name: "rock",
        paths: [
          { d: linePath(ROCK, true), stroke: true, strokeWidth: 2.2 },
          { d: "M9 6L11 12L20 12.4M11 12L8.6 17.6", stroke: true, strokeWidth: 1.1 },
        ],
        turnsWithPull: false,
      };
    case "snow-plate":
      return {
        name: "snow plate",
        paths: [
          { d: "M2.5 8.5L4.5 14.5H19.5L21.5 8.5", stroke: true, strokeWidth: 2.6 },
          { d: circlePath(9, 10.6, 1.2) + circlePath(15, 10.6, 1.2), fill: true },
        ],
        turnsWithPull: true,
      };
    case "natural":
      return spec.kind === "tree"
        ? { name: "tree", paths: TREE, turnsWithPull: false }
        : {
            name: "boulder",
            paths: [
              { d: linePath(BOULDER, true), stroke: true, strokeWidth: 2.4 },
              { d: "M11 3L13.2 11L22.4 12M13.2 11L9 15.5L4.4 20.6M9 15.5L1.6 16.4", stroke: true, strokeWidth: 1.1 },
            ],
            turnsWithPull: false,
          };
    case "fixed":
      return {
        name: "fixing",
        paths: [
          { d: circlePath(12, 8, 5), stroke: true, strokeWidth: 2.2 },
          { d: "M12 13V17", stroke: true, strokeWidth: 2.6 },
          { d: "M4 17H20V21H4Z", fill: true },
        ],
        turnsWithPull: false,
      };
  }
}

const stake = (section: StakeSection): AnchorSpec => ({
  class: "stake",
  section,
  lengthM: 0.2,
  material: "mild-steel",
  headRatingN: null,
});

/** A typical anchor of each kind, for legends. */
const TYPICAL: Readonly<Record<string, AnchorSpec>> = {
  "three-blade": stake({ shape: "three-blade", bladeM: 0.013, thicknessM: 0.002 }),
  v: stake({ shape: "v", legM: 0.02, thicknessM: 0.002 }),
  round: stake({ shape: "round", diameterM: 0.006 }),
  tube: stake({ shape: "tube", diameterM: 0.012, wallM: 0.001 }),
  wide: stake({ shape: "wide", widthM: 0.05, depthM: 0.012, thicknessM: 0.001 }),
  t: stake({ shape: "t", widthM: 0.025, depthM: 0.02, thicknessM: 0.003 }),
  "screw-in": { class: "screw-in", helixDiameterM: 0.04, depthM: 0.3, shaftDiameterM: 0.01, material: "mild-steel" },
  deadman: { class: "deadman", widthM: 0.4, heightM: 0.1, depthM: 0.3 },
  "surface-weight": { class: "surface-weight", massKg: 25 },
  "snow-plate": { class: "snow-plate", widthM: 0.1, lengthM: 0.3, material: "aluminium-6061" },
  tree: { class: "natural", kind: "tree", checked: true },
  boulder: { class: "natural", kind: "boulder", checked: true },
  fixed: { class: "fixed", ratingN: null },
};

export const ANCHOR_MARKS: readonly { readonly key: string; readonly mark: AnchorMark }[] = Object.entries(TYPICAL).map(
  ([key, spec]) => ({ key, mark: anchorMark(spec) }),
);
