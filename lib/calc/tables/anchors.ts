import { materialRow } from "../materials";
import { sectionProperties } from "../section";
import type { AnchorSpec, MaterialId, StakeSection } from "../types";

export interface BuiltInAnchor {
  readonly id: string;
  readonly name: string;
  readonly spec: AnchorSpec;
  /** Mass of one, kg; 0 for what is found at the camp. */
  readonly massKg: number;
  readonly note: string;
  readonly found: boolean;
}

/** Head, hook, point and cord loop on top of the bare section (judgement). */
const HEAD_ALLOWANCE = 1.15;

/** Mass from geometry × density with an allowance for head and loop, rounded up to the gram. */
export function stakeMassKg(section: StakeSection, lengthM: number, material: MaterialId): number {
  const bareKg = sectionProperties(section).areaM2 * lengthM * materialRow(material).densityKgM3;
  return Math.ceil(bareKg * HEAD_ALLOWANCE * 1000) / 1000;
}

function stake(
  id: string,
  name: string,
  section: StakeSection,
  lengthM: number,
  material: MaterialId,
  note: string,
): BuiltInAnchor {
  return {
    id,
    name,
    spec: { class: "stake", section, lengthM, material, headRatingN: null },
    massKg: stakeMassKg(section, lengthM, material),
    note,
    found: false,
  };
}

function found(id: string, name: string, spec: AnchorSpec, note: string): BuiltInAnchor {
  return { id, name, spec, massKg: 0, note, found: true };
}

/**
 * Generic anchors. Sizes are typical of their kind (judgement); masses of stakes are geometry × density with 15 % for
 * head and loop, those of plates, screws and bags are given in their note.
 */
export const BUILT_IN_ANCHORS: readonly BuiltInAnchor[] = [
  stake(
    "three-blade-150",
    "Three-blade, 150 mm",
    { shape: "three-blade", bladeM: 0.0095, thicknessM: 0.0015 },
    0.15,
    "aluminium-7075",
    "Good all-round stake for loam.",
  ),
  stake(
    "three-blade-200",
    "Three-blade, 200 mm",
    { shape: "three-blade", bladeM: 0.0105, thicknessM: 0.0017 },
    0.2,
    "aluminium-7075",
    "Longer; for main lines and softer ground.",
  ),
  stake(
    "v-160",
    "V, 160 mm",
    { shape: "v", legM: 0.0125, thicknessM: 0.0011 },
    0.16,
    "aluminium-7075",
    "Nests; the sheet bends in hard ground.",
  ),
  stake(
    "v-titanium-165",
    "Titanium V, 165 mm",
    { shape: "v", legM: 0.013, thicknessM: 0.0009 },
    0.165,
    "titanium-alloy",
    "Light and stiff; takes blows.",
  ),
  stake(
    "round-hook-180",
    "Round hook, 180 mm",
    { shape: "round", diameterM: 0.006 },
    0.18,
    "aluminium-6061",
    "For hems and soft pulls; little hold by itself.",
  ),
  stake(
    "titanium-rod-165",
    "Titanium rod, 165 mm",
    { shape: "round", diameterM: 0.0045 },
    0.165,
    "titanium-grade-2",
    "For stony ground and light pulls; bends.",
  ),
  stake(
    "titanium-nail-200",
    "Titanium nail, 200 mm",
    { shape: "round", diameterM: 0.006 },
    0.2,
    "titanium-alloy",
    "For hard and stony ground.",
  ),
  stake(
    "long-nail-230",
    "Long nail, 230 mm",
    { shape: "round", diameterM: 0.008 },
    0.23,
    "spring-steel",
    "Goes into hard ground; heavy.",
  ),
  stake(
    "steel-rod-300",
    "Steel rod, 300 mm",
    { shape: "round", diameterM: 0.01 },
    0.3,
    "mild-steel",
    "For baked and gravelly pitches.",
  ),
  stake(
    "steel-pin-450",
    "Steel pin, 450 mm",
    { shape: "round", diameterM: 0.014 },
    0.45,
    "mild-steel",
    "For bell tents and group shelters.",
  ),
  stake(
    "tube-peg-230",
    "Tube peg, 230 mm",
    { shape: "tube", diameterM: 0.013, wallM: 0.0012 },
    0.23,
    "aluminium-7075",
    "Light for its length; the wall buckles under blows.",
  ),
  stake(
    "wide-sand-300",
    "Wide sand stake, 300 mm",
    { shape: "wide", widthM: 0.04, depthM: 0.014, thicknessM: 0.0015 },
    0.3,
    "aluminium-6061",
    "For sand and snow.",
  ),
  stake(
    "wide-sand-240",
    "Wide sand stake, 240 mm",
    { shape: "wide", widthM: 0.03, depthM: 0.012, thicknessM: 0.0013 },
    0.24,
    "aluminium-6061",
    "For sand and soft ground.",
  ),
  stake(
    "plastic-t-230",
    "Plastic T, 230 mm",
    { shape: "t", widthM: 0.02, depthM: 0.015, thicknessM: 0.003 },
    0.23,
    "plastic-abs",
    "For soft ground only.",
  ),
  stake(
    "hardwood-250",
    "Hardwood peg, 250 mm",
    { shape: "round", diameterM: 0.022 },
    0.25,
    "hardwood",
    "Can be cut at camp; wide enough for soft ground.",
  ),
  stake(
    "snow-stake-300",
    "Snow stake, 300 mm",
    { shape: "wide", widthM: 0.05, depthM: 0.016, thicknessM: 0.0015 },
    0.3,
    "aluminium-6061",
    "Perforated blade for snow; bury it crosswise where it does not hold upright.",
  ),
  {
    id: "screw-in-200",
    name: "Screw-in, 200 mm",
    spec: {
      class: "screw-in",
      helixDiameterM: 0.05,
      depthM: 0.2,
      shaftDiameterM: 0.01,
      material: "aluminium-6061",
    },
    massKg: 0.075,
    note: "Turns into turf and moist loam without a mallet. Mass: shaft and one turn of 3 mm flight.",
    found: false,
  },
  {
    id: "screw-in-400",
    name: "Screw-in, 400 mm",
    spec: { class: "screw-in", helixDiameterM: 0.08, depthM: 0.4, shaftDiameterM: 0.012, material: "mild-steel" },
    massKg: 0.55,
    note: "For group shelters on turf. Mass: 12 mm rod and one turn of 4 mm plate.",
    found: false,
  },
  {
    id: "snow-plate-200",
    name: "Snow plate, 200 mm",
    spec: { class: "snow-plate", widthM: 0.14, lengthM: 0.2, material: "aluminium-6061" },
    massKg: 0.12,
    note: "Buried in trodden snow, pulled from its middle. Mass: 1.5 mm sheet with holes, and its sling.",
    found: false,
  },
  {
    id: "bag-deadman",
    name: "Bag as deadman",
    spec: { class: "deadman", widthM: 0.3, heightM: 0.15, depthM: 0.35 },
    massKg: 0.04,
    note: "Filled with sand, snow or stones and buried. Mass: empty bag with its sling.",
    found: false,
  },
  found("rock-20", "Rock, 20 kg", { class: "surface-weight", massKg: 20 }, "About 27 cm across."),
  found("rock-40", "Rock, 40 kg", { class: "surface-weight", massKg: 40 }, "About 34 cm across; two people roll it."),
  found(
    "sticks-buried",
    "Bundle of sticks, buried",
    { class: "deadman", widthM: 0.4, heightM: 0.1, depthM: 0.38 },
    "As thick as a thigh, two hands deep and more; trench dug square to the pull.",
  ),
  found(
    "log-buried",
    "Log, buried",
    { class: "deadman", widthM: 0.6, heightM: 0.12, depthM: 0.45 },
    "Dead wood only; dig where it is allowed.",
  ),
  found(
    "tree",
    "Tree",
    { class: "natural", kind: "tree", checked: false },
    "Alive, rooted firmly, at least 15 cm thick; wide strap, low down.",
  ),
  found(
    "boulder",
    "Boulder",
    { class: "natural", kind: "boulder", checked: false },
    "At least ten times the pull; does not rock.",
  ),
  found(
    "fixing",
    "Cleat, hook or ring",
    { class: "fixed", ratingN: null },
    "In a deck or rock; needs its rating or a pull test.",
  ),
];

/** A built-in anchor by its id. @throws RangeError when there is none. */
export function builtInAnchor(id: string): BuiltInAnchor {
  const anchor = BUILT_IN_ANCHORS.find((each) => each.id === id);
  if (anchor === undefined) throw new RangeError(`no built-in anchor has the id ${id}`);
  return anchor;
}

const SECTION_NAMES: Readonly<Record<StakeSection["shape"], string>> = {
  "three-blade": "Three-blade",
  v: "V",
  round: "Round",
  tube: "Tube",
  wide: "Wide",
  t: "T",
};

/** What kind of anchor it is, for lists: the section of a stake, else its class. */
export function anchorSectionName(spec: AnchorSpec): string {
  switch (spec.class) {
    case "stake":
      return SECTION_NAMES[spec.section.shape];
    case "screw-in":
      return "Screw-in";
    case "deadman":
      return "Deadman";
    case "surface-weight":
      return "Surface weight";
    case "snow-plate":
      return "Snow plate";
    case "natural":
      return spec.kind === "tree" ? "Tree" : "Boulder";
    case "fixed":
      return "Fixing";
  }
}
