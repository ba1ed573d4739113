import type { AnchorSpec, StakeSection } from "@/lib/calc/types";

/** What an anchor's form asks for, by class and section; lengths in millimetres. */
export interface PartField {
  readonly key: string;
  readonly label: string;
}

export const CLASSES: readonly { readonly value: Exclude<AnchorSpec["class"], "natural">; readonly label: string }[] = [
  { value: "stake", label: "Stake" },
  { value: "screw-in", label: "Screw-in" },
  { value: "deadman", label: "Buried body (deadman)" },
  { value: "surface-weight", label: "Weight on the ground" },
  { value: "snow-plate", label: "Snow plate" },
  { value: "fixed", label: "Ring, cleat or hook at the place" },
];

export const CLASS_FIELDS: Readonly<Record<AnchorSpec["class"], readonly PartField[]>> = {
  stake: [{ key: "lengthM", label: "Length in the ground" }],
  "screw-in": [
    { key: "helixDiameterM", label: "Helix diameter" },
    { key: "depthM", label: "Depth of the helix" },
    { key: "shaftDiameterM", label: "Shaft diameter" },
  ],
  deadman: [
    { key: "widthM", label: "Width across the pull" },
    { key: "heightM", label: "Height of the body" },
    { key: "depthM", label: "Depth to its lower edge" },
  ],
  "surface-weight": [],
  "snow-plate": [
    { key: "widthM", label: "Width" },
    { key: "lengthM", label: "Length" },
  ],
  natural: [],
  fixed: [],
};

export const CLASSES_WITH_MATERIAL: readonly AnchorSpec["class"][] = ["stake", "screw-in", "snow-plate"];

export const SECTIONS: readonly { readonly value: StakeSection["shape"]; readonly label: string }[] = [
  { value: "three-blade", label: "Three-blade" },
  { value: "v", label: "V" },
  { value: "round", label: "Round: hook, nail, rod" },
  { value: "tube", label: "Tube" },
  { value: "wide", label: "Wide, curved or flat" },
  { value: "t", label: "T" },
];

export const SECTION_FIELDS: Readonly<Record<StakeSection["shape"], readonly PartField[]>> = {
  "three-blade": [
    { key: "bladeM", label: "Blade, from the middle" },
    { key: "thicknessM", label: "Thickness" },
  ],
  v: [
    { key: "legM", label: "Leg" },
    { key: "thicknessM", label: "Thickness" },
  ],
  round: [{ key: "diameterM", label: "Diameter" }],
  tube: [
    { key: "diameterM", label: "Diameter" },
    { key: "wallM", label: "Wall" },
  ],
  wide: [
    { key: "widthM", label: "Width" },
    { key: "depthM", label: "Depth of the curve" },
    { key: "thicknessM", label: "Thickness" },
  ],
  t: [
    { key: "widthM", label: "Width" },
    { key: "depthM", label: "Depth" },
    { key: "thicknessM", label: "Thickness" },
  ],
};

/** Reads a number of a spec by its key, whatever the class; null when it has none. */
export function partM(part: object | undefined, key: string): number | null {
  const value: unknown = part ? Reflect.get(part, key) : null;
  return typeof value === "number" ? value : null;
}

export function inMillimetres(metres: number | null): string {
  return metres === null ? "" : String(Math.round(metres * 1e5) / 100);
}
