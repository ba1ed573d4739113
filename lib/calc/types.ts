/**
 * The words of the calculation: what goes into each step and what comes out.
 *
 * SI inside (metres, newtons, pascals, kilograms, seconds), angles in degrees because leaders and instruments read
 * degrees. Conversions to other units happen only at the edges of the program.
 *
 * Frames. Shelter frame: +y is the shelter's front, +x its right, z up, origin on the ground under its centre.
 * `headingDeg` is the compass bearing (true, clockwise) of the shelter's +y axis. Wind directions are where the wind
 * comes FROM. A *relative* wind direction is measured clockwise from the shelter's +y axis: relative = compass − heading.
 * Line angle θ: above the ground. Lean β: of the stake from upright, positive when its head leans away from the pull.
 */

/** One line of the working of a result: what was computed, its value, and where the relation is published. */
export interface Working {
  /** Short symbol, e.g. "q", "N_n". */
  readonly symbol: string;
  /** What it is, in words a leader understands. */
  readonly meaning: string;
  /** A finite number, or a short text where the step is a choice rather than a number. */
  readonly value: number | string;
  /** Unit of `value`, "" where it has none. */
  readonly unit: string;
  /** Document, edition, clause, table or equation; "judgement" where it is ours; "input" where it was typed in. */
  readonly source: string;
}

/** An input that is missing. There is never a number in its place. */
export interface Gap {
  /** Dotted path of the input, e.g. "camp.gust", "camp.ground". */
  readonly field: string;
  /** A sentence that says what to enter, e.g. "Enter a gust, a mean wind or a Beaufort number." */
  readonly message: string;
}

export interface Vec3 {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

// ---------------------------------------------------------------- wind

/** Terrain categories of EN 1991-1-4 Table 4.1. */
export type ExposureCategory = "0" | "I" | "II" | "III" | "IV";

export type WindStrength =
  /** 3-second gust at 10 m over open ground, m/s, 0…90. */
  | { readonly kind: "gust"; readonly speedMs: number }
  /** 10-minute mean at 10 m over open ground, m/s, 0…60. */
  | { readonly kind: "mean"; readonly speedMs: number }
  /** Beaufort number 0…12. */
  | { readonly kind: "beaufort"; readonly number: number };

export interface Hill {
  readonly shape: "hill" | "cliff";
  /** Height of the feature, m. */
  readonly heightM: number;
  /** Horizontal length of the slope on the windward side, m. */
  readonly upwindLengthM: number;
  /** Horizontal length of the slope on the lee side, m (hills and ridges). */
  readonly downwindLengthM: number;
  /** Distance of the camp from the crest, m; negative on the windward side. */
  readonly fromCrestM: number;
}

export interface Windbreak {
  readonly kind: "deciduous-row" | "conifer-row" | "conifer-belt" | "solid";
  /** Height of the windbreak, m. */
  readonly heightM: number;
  /** Distance from the windbreak to the shelter, downwind, m. */
  readonly distanceM: number;
}

export interface WindInput {
  /** Null when nobody has entered it: then there is a gap, and no number. */
  readonly strength: WindStrength | null;
  /** Wind range: from this compass direction clockwise to the next; both null when it may come from anywhere. */
  readonly fromDeg: number | null;
  readonly toDeg: number | null;
  readonly exposure: ExposureCategory | null;
  readonly altitudeM: number | null;
  /** Air temperature, °C; null means the ISA temperature of the altitude. */
  readonly temperatureC: number | null;
  readonly hill: Hill | null;
  readonly windbreak: Windbreak | null;
  /** Share of the wind speed that the trees over the camp leave, 0.3…1; a judgement by the leader; null = no trees. */
  readonly underTreesSpeedRatio: number | null;
}

export interface WindAtShelter {
  /** Velocity pressure of the gust at the shelter, Pa. */
  readonly pressurePa: number;
  /** Gust speed that has this pressure at the air density of the camp, m/s. */
  readonly gustMs: number;
  /** 3-second gust at 10 m over open ground from which it was derived, m/s. */
  readonly openGustMs: number;
  /** pressurePa = pressurePerGustSquared · openGustMs²; lets "holds to" be solved back to a forecast gust. */
  readonly pressurePerGustSquared: number;
  readonly workings: readonly Working[];
}

// ---------------------------------------------------------------- shelters

export type ShelterKind =
  | "ridge-tarp"
  | "poncho-lean-to"
  | "diamond"
  | "flying-tarp"
  | "half-pyramid"
  | "pyramid"
  | "ridge-tent"
  | "tunnel"
  | "dome"
  | "bell";

export type FabricId = "nylon-light" | "polyester-light" | "polyester-heavy" | "cotton-canvas" | "laminate";
export type LineMaterialId = "polyester" | "nylon" | "uhmwpe";
export type KnotId =
  | "bowline"
  | "two-half-hitches"
  | "round-turn-two-half-hitches"
  | "clove-hitch"
  | "timber-hitch"
  | "sheet-bend"
  | "figure-eight-loop"
  | "taut-line-hitch"
  | "truckers-hitch"
  | "anchor-bend";

/** What a shelter is made of and how it is pitched. */
export interface ShelterSpec {
  readonly kind: ShelterKind;
  /** Metres; the keys and ranges are those of the kind's definition in SHELTER_KINDS; a missing key takes its typical value. */
  readonly dimensions: Readonly<Record<string, number>>;
  readonly fabric: FabricId;
  readonly line: { readonly material: LineMaterialId; readonly diameterMm: number };
  /** Line length by tie-out id, m; a missing one takes the kind's typical length. */
  readonly lineLengthsM: Readonly<Record<string, number>>;
}

export interface ShelterDimension {
  readonly key: string;
  readonly label: string;
  readonly typicalM: number;
  readonly minM: number;
  readonly maxM: number;
  /** True when it is chosen at each pitch (pitch height …) rather than when the shelter is made. */
  readonly pitched: boolean;
}

export interface ShelterKindDefinition {
  readonly kind: ShelterKind;
  readonly name: string;
  /** One or two sentences: what it is and what holds it up. */
  readonly description: string;
  readonly dimensions: readonly ShelterDimension[];
  readonly typicalSleeps: number;
  readonly typicalMassKg: number;
  /** Open shelters take canopy coefficients, closed ones pitched-roof and wall coefficients. */
  readonly form: "open" | "closed";
  /** What holds it up. */
  readonly support: "poles" | "hoops" | "trees-or-poles";
}

export type TieOutKind = "ridge-end" | "corner" | "hem" | "side-pull-out" | "guy";

export interface TieOut {
  /** Stable for the kind whatever its dimensions, e.g. "ridge-front", "hem-left-2". */
  readonly id: string;
  /** Number printed on drawings and cards, from 1, clockwise from the front. */
  readonly number: number;
  /** Plain name in the shelter's own frame, e.g. "Ridge end, front". */
  readonly name: string;
  readonly kind: TieOutKind;
  /** Where the line leaves the fabric or pole, shelter frame, m. */
  readonly point: Vec3;
  /** Where the line meets the ground, shelter frame, m (z = 0). Equal to `point` at ground level for a pegged hem. */
  readonly anchor: Vec3;
  readonly lineLengthM: number;
  /** Line angle above the ground as drawn (unloaded), degrees. */
  readonly lineAngleDeg: number;
}

/** The discretised shelter. `nodes` are indexed by `links`, `poles` and `panels`. */
export interface ShelterModel {
  readonly kind: ShelterKind;
  readonly nodes: readonly { readonly position: Vec3; readonly fixed: boolean }[];
  readonly links: readonly {
    readonly a: number;
    readonly b: number;
    readonly restLengthM: number;
    /** Axial stiffness EA, N. */
    readonly stiffnessN: number;
    readonly role: "fabric" | "edge" | "ridge" | "line";
    /** Set on the last link of a line: the tie-out it belongs to. */
    readonly tieOutId: string | null;
  }[];
  readonly poles: readonly {
    readonly id: string;
    readonly name: string;
    readonly foot: number;
    readonly head: number;
    readonly lengthM: number;
    readonly stiffnessN: number;
  }[];
  /** Bent poles: chains of nodes from foot to foot with axial stiffness EA (N) and bending stiffness EI (N·m²). */
  readonly hoops: readonly {
    readonly id: string;
    readonly name: string;
    readonly nodes: readonly number[];
    readonly stiffnessN: number;
    readonly bendingStiffnessNm2: number;
  }[];
  /** Quads of the fabric (a triangle repeats its last node), corner nodes in order, outward normal by the right-hand rule. */
  readonly panels: readonly { readonly nodes: readonly [number, number, number, number]; readonly zone: string }[];
  readonly tieOuts: readonly TieOut[];
  /** For drawing: plan outline (closed), ridge and seam lines, pole feet, and places where people lie. */
  readonly drawing: {
    readonly outline: readonly Vec3[];
    readonly ridges: readonly (readonly [Vec3, Vec3])[];
    readonly seams: readonly (readonly [Vec3, Vec3])[];
    readonly poleFeet: readonly Vec3[];
    /** Centre and bearing (degrees clockwise from +y, towards the head) of each sleeping place, best place first. */
    readonly sleepingPlaces: readonly { readonly centre: Vec3; readonly bearingDeg: number }[];
  };
}

// ---------------------------------------------------------------- demand

export type LoadCase = "pressing" | "lifting";

export interface TieOutDemand {
  readonly tieOutId: string;
  /** Tension in the line in its governing case, N. */
  readonly pullN: number;
  /** Line angle above the ground under load, degrees, 0…90. */
  readonly lineAngleDeg: number;
  /** Governing wind direction relative to the shelter, degrees, and case. */
  readonly relativeWindDeg: number;
  readonly loadCase: LoadCase;
}

export interface ShelterResponse {
  /** Velocity pressure at the shelter, Pa. */
  readonly pressurePa: number;
  /** Envelope over all directions and cases, one per tie-out in the model's order. */
  readonly tieOuts: readonly TieOutDemand[];
  readonly poles: readonly { readonly poleId: string; readonly compressionN: number }[];
  /** False when in some case the solution does not settle or the head-room falls by more than a third. */
  readonly standing: boolean;
  /** The cases without a standing shape, for people: "wind from the left, pressing". */
  readonly withoutShape: readonly { readonly relativeWindDeg: number; readonly loadCase: LoadCase }[];
  readonly largestMovementM: number;
  /** Largest out-of-balance force, N, over the cases that settled. */
  readonly residualN: number;
}

export interface TieOutConsequence {
  readonly tieOutId: string;
  /** 1…2: how much worse it gets for the rest when this one goes; 2 = the shelter then has no standing shape. */
  readonly consequence: number;
  readonly standing: boolean;
  /** In words: "Without it: no standing shape." or "Without it the ridge end, rear takes 1.4 times its pull." */
  readonly sentence: string;
}

/** Everything that the plan needs to know of a pitched shelter in a wind; depends on geometry and wind only. */
export interface ShelterAnalysis {
  /** The response at the design pressure. */
  readonly design: ShelterResponse;
  /** Responses at rising pressures around and above the design one (governing cases), for "holds to". */
  readonly levels: readonly ShelterResponse[];
  readonly consequences: readonly TieOutConsequence[];
  readonly workings: readonly Working[];
}

// ---------------------------------------------------------------- ground

export type GroundKind =
  | "soft-wet-clay"
  | "firm-moist-loam"
  | "hard-trodden-loam"
  | "baked-clay"
  | "litter-over-loam"
  | "peat"
  | "dry-loose-sand"
  | "moist-sandy-flat"
  | "dense-sand-gravel"
  | "shingle"
  | "settled-snow"
  | "wind-packed-snow"
  | "frozen-or-ice"
  | "rock-slab"
  | "deck";

/** "usual" is the state that the ground's row describes. */
export type Wetness = "dry" | "usual" | "wet" | "saturated";

export interface GroundState {
  readonly kind: GroundKind;
  readonly wetness: Wetness;
  /** Depth of a loose top layer that carries nothing, m; null takes the kind's own (litter 0.04 m, others 0). */
  readonly looseTopM: number | null;
  /** Depth at which stones or rock stop a driven stake, m; null = none met. */
  readonly stoneDepthM: number | null;
  /** Slope of the ground, degrees 0…35; the worse of pulls along it is used. */
  readonly slopeDeg: number;
  /** From pull tests: multiplies the strength, with its own scatter (σ of the logarithm); null = the table's. */
  readonly learned: { readonly factor: number; readonly scatter: number } | null;
}

// ---------------------------------------------------------------- anchors

export type MaterialId =
  | "aluminium-7075"
  | "aluminium-6061"
  | "titanium-alloy"
  | "titanium-grade-2"
  | "mild-steel"
  | "spring-steel"
  | "plastic-abs"
  | "polycarbonate"
  | "hardwood";

export type StakeSection =
  /** Three blades at 120°, each `bladeM` long from the centre, `thicknessM` thick. */
  | { readonly shape: "three-blade"; readonly bladeM: number; readonly thicknessM: number }
  /** Thin right-angled V with legs `legM`. */
  | { readonly shape: "v"; readonly legM: number; readonly thicknessM: number }
  | { readonly shape: "round"; readonly diameterM: number }
  | { readonly shape: "tube"; readonly diameterM: number; readonly wallM: number }
  /** Curved or flat wide blade. */
  | { readonly shape: "wide"; readonly widthM: number; readonly depthM: number; readonly thicknessM: number }
  | { readonly shape: "t"; readonly widthM: number; readonly depthM: number; readonly thicknessM: number };

export type AnchorSpec =
  | {
      readonly class: "stake";
      readonly section: StakeSection;
      /** Length that goes into the ground when driven home, m. */
      readonly lengthM: number;
      readonly material: MaterialId;
      /** Rating of the head, hook or loop printed by the maker, N; null = not given. */
      readonly headRatingN: number | null;
    }
  | {
      readonly class: "screw-in";
      readonly helixDiameterM: number;
      readonly depthM: number;
      readonly shaftDiameterM: number;
      readonly material: MaterialId;
    }
  /** A body buried crosswise: `widthM` across the pull, `heightM` high, `depthM` to its lower edge. */
  | { readonly class: "deadman"; readonly widthM: number; readonly heightM: number; readonly depthM: number }
  /** Rock, log or bag of stones lying on the ground. */
  | { readonly class: "surface-weight"; readonly massKg: number }
  /** Plate or wide stake buried in snow, pulled from its middle. */
  | { readonly class: "snow-plate"; readonly widthM: number; readonly lengthM: number; readonly material: MaterialId }
  | { readonly class: "natural"; readonly kind: "tree" | "boulder"; readonly checked: boolean }
  /** Cleat, hook or nail in a deck, or ring in rock: rated by its maker or tested on site. */
  | { readonly class: "fixed"; readonly ratingN: number | null };

export interface Rigging {
  /** Drive lean, degrees, −10…60; ignored by anchors that are not driven. */
  readonly leanDeg: number;
  /** Length of the stake left standing out of the ground, m. */
  readonly depthOutM: number;
  /** Second anchor in line behind, by its spec, and the distance between the two, m. */
  readonly tandem: { readonly anchor: AnchorSpec; readonly spacingM: number } | null;
  /** Rock on the front lip of the stake, kg; 0 = none. */
  readonly rockKg: number;
  readonly shockCord: boolean;
  readonly line: { readonly material: LineMaterialId; readonly diameterMm: number };
  readonly knot: KnotId;
}

export type CapacityMode =
  "pulls-out" | "tips-over" | "bends" | "line-breaks" | "head-gives" | "slides" | "lifts" | "rated";

export type Capacity =
  | {
      readonly status: "ok";
      readonly medianN: number;
      /** σ of the logarithm. */
      readonly scatter: number;
      /** 5 % fractile, N. */
      readonly dependableN: number;
      readonly mode: CapacityMode;
      /** "the hook bends", "pulls out of the ground" … */
      readonly sentence: string;
      readonly workings: readonly Working[];
    }
  /** This anchor can't be used in this ground. */
  | { readonly status: "unusable"; readonly reason: string; readonly instead: readonly string[] }
  | { readonly status: "unknown"; readonly gaps: readonly Gap[] };

// ---------------------------------------------------------------- camp and plan

export type Verdict = "holds" | "thin" | "gives-way" | "unknown";

/** A kind of anchor that is in the tray of a camp. */
export interface TrayAnchor {
  readonly id: string;
  readonly name: string;
  readonly spec: AnchorSpec;
  /** How many the group has with it; for things found at the camp, how many the leader allows. */
  readonly count: number;
  /** Mass of one, kg; 0 for things found at the camp. */
  readonly massKg: number;
  /** Found at the camp (tree, rock, sticks) rather than carried. */
  readonly found: boolean;
}

export interface Placement {
  readonly pitchId: string;
  readonly tieOutId: string;
  readonly anchorId: string;
  readonly leanDeg: number;
  readonly depthOutM: number;
  readonly tandem: { readonly anchorId: string; readonly spacingM: number } | null;
  readonly rockKg: number;
  readonly shockCord: boolean;
  readonly knot: KnotId;
  /** A pinned placement is left alone by the proposal. */
  readonly pinned: boolean;
}

export interface PitchedShelter {
  readonly pitchId: string;
  readonly name: string;
  readonly spec: ShelterSpec;
  readonly headingDeg: number;
  readonly patch: "main" | "second";
  /** Null while it is being worked out or when wind is missing. */
  readonly analysis: ShelterAnalysis | null;
}

export interface CampInput {
  readonly wind: WindInput;
  readonly ground: GroundState | null;
  readonly secondGround: GroundState | null;
  /** Hours of strong wind in the night, 0…24; null = not said (counted as a gap for the morning value only). */
  readonly strongWindHours: number | null;
  readonly rocksAvailable: boolean;
  readonly shelters: readonly PitchedShelter[];
  readonly tray: readonly TrayAnchor[];
  readonly placements: readonly Placement[];
}

export interface TieOutResult {
  readonly pitchId: string;
  readonly tieOutId: string;
  readonly number: number;
  /** "Windward hem, south" once wind and heading are known, else the plain name. */
  readonly name: string;
  readonly verdict: Verdict;
  /** Missing inputs, in words; empty when there are none. */
  readonly gaps: readonly Gap[];
  /** Demand in the design gust, N; null with a gap. */
  readonly demandN: number | null;
  readonly lineAngleDeg: number | null;
  /** 0…100 within the camp; null with a gap. */
  readonly priority: number | null;
  readonly consequence: TieOutConsequence | null;
  /** Null when there is no anchor there. */
  readonly placement: Placement | null;
  readonly capacity: Capacity | null;
  /** dependable ÷ demand at nightfall, and after the windy night; null with a gap or no anchor. */
  readonly margin: number | null;
  readonly morningMargin: number | null;
  readonly chanceHolds: number | null;
  /** 3-second gust at 10 m over open ground at which this tie-out's margin is 1, m/s. */
  readonly holdsToGustMs: number | null;
}

export interface ShelterResult {
  readonly pitchId: string;
  readonly name: string;
  readonly verdict: Verdict;
  readonly gaps: readonly Gap[];
  readonly holdsToGustMs: number | null;
  /** True when nothing gave way up to the strongest wind that was calculated: read "or more". */
  readonly isHoldsToOpen?: boolean;
  /** Ranked by priority, highest first. */
  readonly tieOuts: readonly TieOutResult[];
  /** The tie-out that decides the verdict. */
  readonly weakestTieOutId: string | null;
  readonly standing: boolean | null;
}

export interface CampResult {
  readonly verdict: Verdict;
  readonly gaps: readonly Gap[];
  readonly designGustMs: number | null;
  readonly wind: WindAtShelter | null;
  readonly holdsToGustMs: number | null;
  /** True when nothing gave way up to the strongest wind that was calculated: read "or more". */
  readonly isHoldsToOpen?: boolean;
  readonly weakest: { readonly pitchId: string; readonly tieOutId: string } | null;
  readonly shelters: readonly ShelterResult[];
  /** Count still free in the tray by anchor id (negative never happens: a placement that would do it is refused). */
  readonly left: Readonly<Record<string, number>>;
  /** When to re-tension, in words; null when the night is not windy or hours are not said. */
  readonly retension: string | null;
}

export interface Mend {
  readonly kind:
    | "best-lean"
    | "longer-line"
    | "swap"
    | "shock-cord"
    | "rock"
    | "tandem"
    | "weight-or-deadman"
    | "lower-pitch"
    | "turn-shelter"
    | "other-patch";
  /** "Swap with the wide sand stake", "Lengthen the line to 1.6 m". */
  readonly title: string;
  /** "one left in the tray", "line falls to 29°". */
  readonly detail: string;
  readonly margin: number;
  readonly holdsToGustMs: number;
  /** The change to apply: placements to put, or a change of the pitch. */
  readonly placements: readonly Placement[];
  readonly pitchChange: {
    readonly headingDeg?: number;
    readonly dimensions?: Readonly<Record<string, number>>;
    readonly lineLengthsM?: Readonly<Record<string, number>>;
    readonly patch?: "main" | "second";
  } | null;
}
