import type { Option } from "@/components/ui/fields";
import type { GroundPatch } from "@/lib/domain/camp/schema";
import type { LineMaterialId } from "@/lib/calc/types";

export const WETNESS_OPTIONS: readonly (Option & { readonly value: GroundPatch["wetness"] })[] = [
  { value: "dry", label: "Drier than usual" },
  { value: "usual", label: "As this ground usually is" },
  { value: "wet", label: "Wet" },
  { value: "saturated", label: "Saturated, water stands in it" },
];

export const LINE_MATERIAL_OPTIONS: readonly (Option & { readonly value: LineMaterialId })[] = [
  { value: "polyester", label: "Polyester" },
  { value: "nylon", label: "Nylon" },
  { value: "uhmwpe", label: "UHMWPE" },
];
