import type { GroundKind, Wetness } from "../types";

/**
 * What a ground is made of. Exactly one strength model per row:
 * - undrained: a gust lasts seconds, so wet and fine grounds fail at their undrained shear strength;
 * - frictional: sand and gravel, angle of friction with a small apparent cohesion;
 * - snow: bearing strength by hand hardness;
 * - undriveable: no stake goes in.
 */
export type GroundModel =
  | { readonly kind: "undrained"; readonly shearStrengthPa: number }
  | { readonly kind: "frictional"; readonly frictionAngleDeg: number; readonly cohesionPa: number }
  | { readonly kind: "snow"; readonly bearingPa: number; readonly shaftAdhesionPa: number }
  | { readonly kind: "undriveable"; readonly reason: string; readonly instead: readonly string[] };

export interface GroundRow {
  readonly kind: GroundKind;
  readonly name: string;
  readonly description: string;
  readonly model: GroundModel;
  /** Bulk unit weight in its usual state, N/m³. */
  readonly unitWeightNm3: number;
  /** Unit weight when the pores are full of water, N/m³. */
  readonly saturatedUnitWeightNm3: number;
  /** σ of the natural logarithm of what an anchor holds: ground, place in the camp and model together. */
  readonly scatter: number;
  /** Depth of a loose layer on top that carries nothing, m. */
  readonly looseTopM: number;
  /** Strength by wetness, 1 = as the row says; for frictional grounds it acts on the cohesion only. */
  readonly wetnessFactors: Readonly<Record<Wetness, number>>;
  /** Friction coefficient of a rock, log or bag lying on it. */
  readonly surfaceFriction: number;
  /** True where plastic and thin-walled stakes break or buckle when driven. */
  readonly isHardToDrive: boolean;
  /** Exponent factor of loosening under repeated pulls, F_D (1 = medium). */
  readonly looseningFactor: number;
  readonly signs: { readonly thumb: string; readonly heel: string; readonly rod: string };
  readonly source: string;
}

const UNDRAINED: Readonly<Record<Wetness, number>> = { dry: 1.2, usual: 1, wet: 0.75, saturated: 0.5 };
const FRICTIONAL: Readonly<Record<Wetness, number>> = { dry: 1, usual: 1, wet: 0.5, saturated: 0 };
const SNOW: Readonly<Record<Wetness, number>> = { dry: 1, usual: 1, wet: 0.6, saturated: 0.3 };

const CLAY_SOURCE =
  "consistency class TM 5-818-1 Table 2-2; point inside the class, scatter and wetness factors are judgement";
const SAND_SOURCE =
  "density class by the half-inch rod test (DOT geotechnical manual Table 4-1), φ after NAVFAC DM-7 (from memory); point inside the class, cohesion and scatter are judgement";
const SNOW_SOURCE =
  "hand hardness classes of ICSSG (Fierz et al. 2009) with the pressure equivalents of an older field sheet (1F 10, P 49 kPa); point and scatter are judgement";
const HARD_SOURCE = "no stake is driven; friction after NAVFAC DM-7.02 Table 1 (1986) or judgement";

/** Every kind of ground. Sources: see each row; wetness: saturated ≈ half (tent-stake study of the industrial-fabrics association; FM 5-125 wet-earth factor 0.5). */
export const GROUNDS: readonly GroundRow[] = [
  {
    kind: "soft-wet-clay",
    name: "Soft wet clay",
    description: "Wet meadow, river bank or ploughed clay; boots sink in.",
    model: { kind: "undrained", shearStrengthPa: 18_000 },
    unitWeightNm3: 17_000,
    saturatedUnitWeightNm3: 17_500,
    scatter: 0.4,
    looseTopM: 0,
    wetnessFactors: UNDRAINED,
    surfaceFriction: 0.25,
    isHardToDrive: false,
    looseningFactor: 1.1,
    signs: {
      thumb: "The thumb goes in several inches with ease.",
      heel: "The heel sinks in under your weight.",
      rod: "A 12 mm rod goes in by hand to its full length.",
    },
    source: CLAY_SOURCE,
  },
  {
    kind: "firm-moist-loam",
    name: "Firm moist loam",
    description: "Lawn, meadow or woodland soil in its usual moist state.",
    model: { kind: "undrained", shearStrengthPa: 36_000 },
    unitWeightNm3: 18_000,
    saturatedUnitWeightNm3: 19_000,
    scatter: 0.4,
    looseTopM: 0,
    wetnessFactors: UNDRAINED,
    surfaceFriction: 0.35,
    isHardToDrive: false,
    looseningFactor: 1,
    signs: {
      thumb: "The thumb goes in several inches with moderate effort.",
      heel: "The heel leaves a clear dent.",
      rod: "A 12 mm rod goes in a hand's length by hand.",
    },
    source: CLAY_SOURCE,
  },
  {
    kind: "hard-trodden-loam",
    name: "Hard trodden loam",
    description: "Worn pitch or woodland path, trodden for years.",
    model: { kind: "undrained", shearStrengthPa: 120_000 },
    unitWeightNm3: 18_500,
    saturatedUnitWeightNm3: 19_500,
    scatter: 0.5,
    looseTopM: 0,
    wetnessFactors: UNDRAINED,
    surfaceFriction: 0.35,
    isHardToDrive: false,
    looseningFactor: 0.9,
    signs: {
      thumb: "Only the thumbnail marks it.",
      heel: "The heel leaves no dent.",
      rod: "A 12 mm rod needs blows.",
    },
    source: CLAY_SOURCE,
  },
  {
    kind: "baked-clay",
    name: "Baked clay",
    description: "Dry clay or gravelled pitch in a hot summer; stakes bend or will not go in.",
    model: { kind: "undrained", shearStrengthPa: 180_000 },
    unitWeightNm3: 19_000,
    saturatedUnitWeightNm3: 20_000,
    scatter: 0.5,
    looseTopM: 0,
    wetnessFactors: { dry: 1, usual: 1, wet: 0.6, saturated: 0.3 },
    surfaceFriction: 0.45,
    isHardToDrive: true,
    looseningFactor: 0.8,
    signs: {
      thumb: "The thumbnail marks it with difficulty.",
      heel: "The heel rings; no dent.",
      rod: "A 12 mm rod goes in only with hard blows.",
    },
    source: CLAY_SOURCE,
  },
  {
    kind: "litter-over-loam",
    name: "Litter over loam",
    description: "Leaf or needle litter on moist woodland soil; the top carries nothing.",
    model: { kind: "undrained", shearStrengthPa: 36_000 },
    unitWeightNm3: 18_000,
    saturatedUnitWeightNm3: 19_000,
    scatter: 0.45,
    looseTopM: 0.04,
    wetnessFactors: UNDRAINED,
    surfaceFriction: 0.3,
    isHardToDrive: false,
    looseningFactor: 1,
    signs: {
      thumb: "The thumb goes through the litter at once, then needs effort.",
      heel: "The heel pushes the litter aside.",
      rod: "A 12 mm rod drops through the litter, then needs a push.",
    },
    source: `${CLAY_SOURCE}; depth of the litter is judgement`,
  },
  {
    kind: "peat",
    name: "Peat",
    description: "Bog or moor; springy, dark, full of roots and water.",
    model: { kind: "undrained", shearStrengthPa: 8_000 },
    unitWeightNm3: 11_000,
    saturatedUnitWeightNm3: 11_500,
    scatter: 0.5,
    looseTopM: 0,
    wetnessFactors: { dry: 1, usual: 1, wet: 0.8, saturated: 0.5 },
    surfaceFriction: 0.3,
    isHardToDrive: false,
    looseningFactor: 1.1,
    signs: {
      thumb: "The fist goes in; water runs out when you squeeze it.",
      heel: "The ground shakes when you stamp.",
      rod: "A 12 mm rod sinks by its own weight.",
    },
    source: "s_u 5–20 kPa for organic topsoil and peat (NAVFAC DM-7, from memory); point and scatter are judgement",
  },
  {
    kind: "dry-loose-sand",
    name: "Dry loose sand",
    description: "Dune or dry beach; runs through the fingers.",
    model: { kind: "frictional", frictionAngleDeg: 29, cohesionPa: 300 },
    unitWeightNm3: 15_500,
    saturatedUnitWeightNm3: 18_500,
    scatter: 0.35,
    looseTopM: 0,
    wetnessFactors: FRICTIONAL,
    surfaceFriction: 0.45,
    isHardToDrive: false,
    looseningFactor: 1.1,
    signs: {
      thumb: "The thumb goes in with no effort; the hole falls in.",
      heel: "The heel sinks in and slides.",
      rod: "A 12 mm rod goes in by hand, a foot or more.",
    },
    source: SAND_SOURCE,
  },
  {
    kind: "moist-sandy-flat",
    name: "Moist sandy flat",
    description: "River flat or damp beach with some roots. Once it has dried out, choose dry loose sand.",
    model: { kind: "frictional", frictionAngleDeg: 33, cohesionPa: 5_000 },
    unitWeightNm3: 17_000,
    saturatedUnitWeightNm3: 19_500,
    scatter: 0.45,
    looseTopM: 0,
    wetnessFactors: FRICTIONAL,
    surfaceFriction: 0.45,
    isHardToDrive: false,
    looseningFactor: 1,
    signs: {
      thumb: "The thumb leaves a hole that stands.",
      heel: "The heel leaves a sharp print.",
      rod: "A 12 mm rod goes in several inches by hand.",
    },
    source: SAND_SOURCE,
  },
  {
    kind: "dense-sand-gravel",
    name: "Dense sand and gravel",
    description: "Old river terrace, moraine or packed track.",
    model: { kind: "frictional", frictionAngleDeg: 39, cohesionPa: 1_000 },
    unitWeightNm3: 19_500,
    saturatedUnitWeightNm3: 21_000,
    scatter: 0.4,
    looseTopM: 0,
    wetnessFactors: FRICTIONAL,
    surfaceFriction: 0.55,
    isHardToDrive: true,
    looseningFactor: 0.8,
    signs: {
      thumb: "The thumb does not go in.",
      heel: "The heel scratches it.",
      rod: "A 12 mm rod is driven a foot with difficulty.",
    },
    source: SAND_SOURCE,
  },
  {
    kind: "shingle",
    name: "Shingle",
    description: "Beach or river pebbles without fines. Enter the depth at which stones stop the stake.",
    model: { kind: "frictional", frictionAngleDeg: 38, cohesionPa: 0 },
    unitWeightNm3: 18_000,
    saturatedUnitWeightNm3: 20_500,
    scatter: 0.45,
    looseTopM: 0,
    wetnessFactors: FRICTIONAL,
    surfaceFriction: 0.55,
    isHardToDrive: true,
    looseningFactor: 1,
    signs: {
      thumb: "Stones move under the thumb.",
      heel: "The heel grinds in and stones roll.",
      rod: "A 12 mm rod works in between stones and stops.",
    },
    source: SAND_SOURCE,
  },
  {
    kind: "settled-snow",
    name: "Settled snow",
    description: "Snow some days old, trodden down and left to set before you anchor in it.",
    model: { kind: "snow", bearingPa: 10_000, shaftAdhesionPa: 300 },
    unitWeightNm3: 2_500,
    saturatedUnitWeightNm3: 4_500,
    scatter: 0.5,
    looseTopM: 0,
    wetnessFactors: SNOW,
    surfaceFriction: 0.25,
    isHardToDrive: false,
    looseningFactor: 1.1,
    signs: {
      thumb: "One finger in a glove goes in.",
      heel: "The heel sinks to the ankle.",
      rod: "A ski pole without its basket goes in to the grip.",
    },
    source: SNOW_SOURCE,
  },
  {
    kind: "wind-packed-snow",
    name: "Wind-packed snow",
    description: "Hard snow on ridges and open ground.",
    model: { kind: "snow", bearingPa: 35_000, shaftAdhesionPa: 1_500 },
    unitWeightNm3: 3_800,
    saturatedUnitWeightNm3: 5_500,
    scatter: 0.5,
    looseTopM: 0,
    wetnessFactors: SNOW,
    surfaceFriction: 0.25,
    isHardToDrive: false,
    looseningFactor: 1,
    signs: {
      thumb: "A finger does not go in; a pencil does.",
      heel: "The heel leaves a print.",
      rod: "A ski pole goes in with a push.",
    },
    source: SNOW_SOURCE,
  },
  {
    kind: "frozen-or-ice",
    name: "Frozen ground or ice",
    description: "Hard frost or ice. Thaw turns it into very soft ground.",
    model: {
      kind: "undriveable",
      reason: "Frozen ground lets no stake in.",
      instead: ["surface weight", "tree or boulder", "deadman frozen into snow", "tested fixing"],
    },
    unitWeightNm3: 9_000,
    saturatedUnitWeightNm3: 9_000,
    scatter: 0.4,
    looseTopM: 0,
    wetnessFactors: { dry: 1, usual: 1, wet: 0.6, saturated: 0.5 },
    surfaceFriction: 0.15,
    isHardToDrive: true,
    looseningFactor: 1,
    signs: {
      thumb: "The thumbnail leaves no mark.",
      heel: "The heel rings.",
      rod: "A 12 mm rod bounces.",
    },
    source: HARD_SOURCE,
  },
  {
    kind: "rock-slab",
    name: "Rock slab",
    description: "Bare rock, or rock under a thin skin of soil.",
    model: {
      kind: "undriveable",
      reason: "Rock lets no stake in.",
      instead: ["surface weight", "tree or boulder", "ring or tested fixing"],
    },
    unitWeightNm3: 26_000,
    saturatedUnitWeightNm3: 26_000,
    scatter: 0.25,
    looseTopM: 0,
    wetnessFactors: { dry: 1, usual: 1, wet: 0.8, saturated: 0.7 },
    surfaceFriction: 0.6,
    isHardToDrive: true,
    looseningFactor: 1,
    signs: {
      thumb: "Rock.",
      heel: "Rock.",
      rod: "A 12 mm rod rings and stops at once.",
    },
    source: HARD_SOURCE,
  },
  {
    kind: "deck",
    name: "Deck or platform",
    description: "Boards. Fix to cleats, hooks or between boards.",
    model: {
      kind: "undriveable",
      reason: "A deck takes no stakes.",
      instead: ["cleat or hook in the deck", "surface weight", "tree"],
    },
    unitWeightNm3: 6_000,
    saturatedUnitWeightNm3: 6_000,
    scatter: 0.25,
    looseTopM: 0,
    wetnessFactors: { dry: 1, usual: 1, wet: 0.75, saturated: 0.7 },
    surfaceFriction: 0.45,
    isHardToDrive: true,
    looseningFactor: 1,
    signs: { thumb: "Boards.", heel: "Boards.", rod: "Boards." },
    source: HARD_SOURCE,
  },
];
