import type { AnchorSpec } from "@/lib/calc/types";
import { formatForce } from "./forces";
import { formatMillimetres } from "./lengths";
import { formatMass } from "./masses";

const SECTION_NAMES = {
  "three-blade": "three-blade",
  v: "V section",
  round: "round",
  tube: "tube",
  wide: "wide",
  t: "T section",
} as const;

const MATERIAL_NAMES: Readonly<Record<string, string>> = {
  "aluminium-7075": "aluminium 7075",
  "aluminium-6061": "aluminium 6061",
  "titanium-alloy": "titanium alloy",
  "titanium-grade-2": "titanium grade 2",
  "mild-steel": "mild steel",
  "spring-steel": "spring steel",
  "plastic-abs": "plastic (ABS)",
  polycarbonate: "polycarbonate",
  hardwood: "hardwood",
};

export function formatMaterial(id: string): string {
  return MATERIAL_NAMES[id] ?? id;
}

/** One line that tells an anchor from its neighbours: "three-blade, 200 mm, aluminium 7075". */
export function formatAnchorSpec(spec: AnchorSpec): string {
  switch (spec.class) {
    case "stake":
      return [SECTION_NAMES[spec.section.shape], formatMillimetres(spec.lengthM), formatMaterial(spec.material)].join(
        ", ",
      );
    case "screw-in":
      return `screw-in, ${formatMillimetres(spec.depthM)}, helix ${formatMillimetres(spec.helixDiameterM)}`;
    case "deadman":
      return `buried, ${formatMillimetres(spec.widthM)} wide, ${formatMillimetres(spec.depthM)} deep`;
    case "surface-weight":
      return `lies on the ground, ${formatMass(spec.massKg)}`;
    case "snow-plate":
      return `snow plate, ${formatMillimetres(spec.widthM)} × ${formatMillimetres(spec.lengthM)}`;
    case "natural":
      return spec.kind === "tree" ? "living tree" : "boulder";
    case "fixed":
      return spec.ratingN === null ? "fixed point, no rating" : `fixed point, rated ${formatForce(spec.ratingN)}`;
  }
}
