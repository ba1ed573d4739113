import { builtInAnchor, BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import { GROUNDS } from "@/lib/calc/tables/grounds";
import type { Capacity, GroundKind, GroundState, Rigging, Wetness } from "@/lib/calc/types";
import { anchorCapacity } from "@/lib/calc/capacity";

/** What a quick check asks; kept in the address, so that it can be sent to somebody. */
export interface CheckState {
  readonly anchorId: string;
  readonly ground: GroundKind;
  readonly wetness: Wetness;
  readonly lineAngleDeg: number;
  readonly leanDeg: number;
}

export const WETNESS_NAMES: readonly { readonly value: Wetness; readonly label: string }[] = [
  { value: "dry", label: "Dry" },
  { value: "usual", label: "As usual for it" },
  { value: "wet", label: "Wet" },
  { value: "saturated", label: "Saturated" },
];

const FIRST: CheckState = {
  anchorId: "three-blade-150",
  ground: "firm-moist-loam",
  wetness: "usual",
  lineAngleDeg: 45,
  leanDeg: 0,
};

/** Reads an address; what it does not understand takes the first example. */
export function readCheck(query: Readonly<Record<string, string | string[] | undefined>>): CheckState {
  const text = (key: string) => (typeof query[key] === "string" ? query[key] : undefined);
  const number = (key: string, min: number, max: number, otherwise: number) => {
    const value = Number(text(key) ?? Number.NaN);
    return value >= min && value <= max ? value : otherwise;
  };
  return {
    anchorId: BUILT_IN_ANCHORS.find((one) => one.id === text("anchor"))?.id ?? FIRST.anchorId,
    ground: GROUNDS.find((one) => one.kind === text("ground"))?.kind ?? FIRST.ground,
    wetness: WETNESS_NAMES.find((one) => one.value === text("wetness"))?.value ?? FIRST.wetness,
    lineAngleDeg: number("line", 0, 90, FIRST.lineAngleDeg),
    leanDeg: number("lean", -10, 60, FIRST.leanDeg),
  };
}

export function writeCheck(check: CheckState): string {
  return new URLSearchParams({
    anchor: check.anchorId,
    ground: check.ground,
    wetness: check.wetness,
    line: String(check.lineAngleDeg),
    lean: String(check.leanDeg),
  }).toString();
}

/** As the documented endpoint takes it when nothing is said: 3 mm polyester with a bowline, driven home, single. */
const PLAIN: Omit<Rigging, "leanDeg"> = {
  depthOutM: 0,
  tandem: null,
  rockKg: 0,
  shockCord: false,
  line: { material: "polyester", diameterMm: 3 },
  knot: "bowline",
};

export function runCheck(check: CheckState): Capacity {
  const ground: GroundState = {
    kind: check.ground,
    wetness: check.wetness,
    looseTopM: null,
    stoneDepthM: null,
    slopeDeg: 0,
    learned: null,
  };
  return anchorCapacity({
    anchor: builtInAnchor(check.anchorId).spec,
    ground,
    lineAngleDeg: check.lineAngleDeg,
    rigging: { ...PLAIN, leanDeg: check.leanDeg },
  });
}

const holds = (check: CheckState) => {
  const capacity = runCheck(check);
  return capacity.status === "ok" ? capacity.dependableN : null;
};

export const LEANS_DEG = Array.from({ length: 15 }, (_, i) => -10 + i * 5);
export const LINE_ANGLES_DEG = Array.from({ length: 19 }, (_, i) => i * 5);

export function sweepLean(check: CheckState, lineAngleDeg: number) {
  return LEANS_DEG.map((leanDeg) => ({ x: leanDeg, newtons: holds({ ...check, lineAngleDeg, leanDeg }) }));
}

export function sweepLineAngle(check: CheckState, leanDeg: number) {
  return LINE_ANGLES_DEG.map((lineAngleDeg) => ({
    x: lineAngleDeg,
    newtons: holds({ ...check, lineAngleDeg, leanDeg }),
  }));
}
