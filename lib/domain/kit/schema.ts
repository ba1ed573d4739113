import { z } from "zod";
import type { AnchorSpec, StakeSection } from "@/lib/calc/types";
import { idSchema } from "../ids";
import { lineText, numberBetween } from "../text";
import { LINE_MATERIAL_IDS } from "../shelter/schema";

export const MATERIAL_IDS = [
  "aluminium-7075",
  "aluminium-6061",
  "titanium-alloy",
  "titanium-grade-2",
  "mild-steel",
  "spring-steel",
  "plastic-abs",
  "polycarbonate",
  "hardwood",
] as const;

const materialSchema = z.enum(MATERIAL_IDS, { error: "Choose a material." });
const size = (what: string, min: number, max: number) => numberBetween(what, min, max, "m");

const sectionSchema: z.ZodType<StakeSection> = z.discriminatedUnion(
  "shape",
  [
    z.object({
      shape: z.literal("three-blade"),
      bladeM: size("the blade", 0.003, 0.06),
      thicknessM: size("the thickness", 0.0005, 0.01),
    }),
    z.object({
      shape: z.literal("v"),
      legM: size("the leg", 0.005, 0.08),
      thicknessM: size("the thickness", 0.0005, 0.01),
    }),
    z.object({ shape: z.literal("round"), diameterM: size("the diameter", 0.002, 0.06) }),
    z.object({
      shape: z.literal("tube"),
      diameterM: size("the diameter", 0.004, 0.08),
      wallM: size("the wall", 0.0003, 0.02),
    }),
    z.object({
      shape: z.literal("wide"),
      widthM: size("the width", 0.01, 0.3),
      depthM: size("the depth of the curve", 0.001, 0.1),
      thicknessM: size("the thickness", 0.0005, 0.02),
    }),
    z.object({
      shape: z.literal("t"),
      widthM: size("the width", 0.005, 0.1),
      depthM: size("the depth", 0.005, 0.1),
      thicknessM: size("the thickness", 0.001, 0.02),
    }),
  ],
  { error: "Choose the shape of the stake." },
);

export const anchorSpecSchema: z.ZodType<AnchorSpec> = z.discriminatedUnion(
  "class",
  [
    z.object({
      class: z.literal("stake"),
      section: sectionSchema,
      lengthM: size("the length", 0.08, 1.6),
      material: materialSchema,
      headRatingN: numberBetween("the head's rating", 1, 50000, "N").nullable(),
    }),
    z.object({
      class: z.literal("screw-in"),
      helixDiameterM: size("the helix diameter", 0.01, 0.4),
      depthM: size("the depth", 0.08, 1.6),
      shaftDiameterM: size("the shaft diameter", 0.004, 0.06),
      material: materialSchema,
    }),
    z.object({
      class: z.literal("deadman"),
      widthM: size("the width", 0.05, 2),
      heightM: size("the height", 0.02, 0.6),
      depthM: size("the depth", 0.05, 1.5),
    }),
    z.object({ class: z.literal("surface-weight"), massKg: numberBetween("the mass", 1, 500, "kg") }),
    z.object({
      class: z.literal("snow-plate"),
      widthM: size("the width", 0.02, 0.6),
      lengthM: size("the length", 0.05, 1),
      material: materialSchema,
    }),
    z.object({ class: z.literal("natural"), kind: z.enum(["tree", "boulder"]), checked: z.boolean() }),
    z.object({ class: z.literal("fixed"), ratingN: numberBetween("the rating", 1, 50000, "N").nullable() }),
  ],
  { error: "Choose a kind of anchor." },
);

export const kitItemDetailsSchema = z.discriminatedUnion(
  "type",
  [
    z.object({
      type: z.literal("anchor"),
      name: lineText("a name for the anchor", 60),
      spec: anchorSpecSchema,
      massKg: numberBetween("the mass of one", 0, 20, "kg"),
      count: numberBetween("the count", 0, 500).int(),
    }),
    z.object({
      type: z.literal("cord"),
      name: lineText("a name for the cord", 60),
      material: z.enum(LINE_MATERIAL_IDS, { error: "Choose a material." }),
      diameterMm: numberBetween("the diameter", 1, 12, "mm"),
      lengthM: numberBetween("the length of one piece", 0.1, 200, "m"),
      massKg: numberBetween("the mass of one", 0, 20, "kg"),
      count: numberBetween("the count", 0, 500).int(),
    }),
    z.object({
      type: z.literal("shock-cord"),
      name: lineText("a name for the shock cord", 60),
      lengthM: numberBetween("the length of one piece", 0.1, 5, "m"),
      massKg: numberBetween("the mass of one", 0, 20, "kg"),
      count: numberBetween("the count", 0, 500).int(),
    }),
  ],
  { error: "Choose an anchor, a cord or a shock cord." },
);
export type KitItemDetails = z.infer<typeof kitItemDetailsSchema>;

export const kitItemCreateInput = z.object({ tripId: idSchema, details: kitItemDetailsSchema });
export const kitItemUpdateInput = z.object({
  tripId: idSchema,
  kitItemId: idSchema,
  version: z.number().int().min(1),
  details: kitItemDetailsSchema,
});

export const kitItemRefInput = z.object({ tripId: idSchema, kitItemId: idSchema });
export const kitItemDeleteInput = kitItemRefInput.extend({ confirmed: z.boolean().default(false) });
/** Kinds of things in one trip's kit. */
export const MAX_KIT_ITEMS = 100;
