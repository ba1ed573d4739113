import { z } from "zod";
import { idSchema } from "../ids";
import { blockText, lineText, numberBetween } from "../text";

export const GROUND_KINDS = [
  "soft-wet-clay",
  "firm-moist-loam",
  "hard-trodden-loam",
  "baked-clay",
  "litter-over-loam",
  "peat",
  "dry-loose-sand",
  "moist-sandy-flat",
  "dense-sand-gravel",
  "shingle",
  "settled-snow",
  "wind-packed-snow",
  "frozen-or-ice",
  "rock-slab",
  "deck",
] as const;
export const WETNESSES = ["dry", "usual", "wet", "saturated"] as const;
export const EXPOSURES = ["0", "I", "II", "III", "IV"] as const;

export const groundPatchSchema = z.object({
  kind: z.enum(GROUND_KINDS, { error: "Choose a ground." }),
  wetness: z.enum(WETNESSES, { error: "Choose how wet the ground is." }),
  looseTopM: numberBetween("the loose top layer", 0, 0.5, "m").nullable(),
  stoneDepthM: numberBetween("the depth to stones", 0.02, 2, "m").nullable(),
});
export type GroundPatch = z.infer<typeof groundPatchSchema>;

export const windStrengthSchema = z.discriminatedUnion(
  "kind",
  [
    z.object({ kind: z.literal("gust"), speedMs: numberBetween("the gust", 0, 90, "m/s") }),
    z.object({ kind: z.literal("mean"), speedMs: numberBetween("the mean wind", 0, 60, "m/s") }),
    z.object({ kind: z.literal("beaufort"), number: numberBetween("the Beaufort number", 0, 12).int() }),
  ],
  { error: "Choose gust, mean wind or Beaufort number." },
);

export const hillSchema = z.object({
  shape: z.enum(["hill", "cliff"]),
  heightM: numberBetween("the height of the hill", 1, 3000, "m"),
  upwindLengthM: numberBetween("the length of the windward slope", 1, 20000, "m"),
  downwindLengthM: numberBetween("the length of the lee slope", 1, 20000, "m"),
  fromCrestM: numberBetween("the distance from the crest", -20000, 20000, "m"),
});

export const windbreakSchema = z.object({
  kind: z.enum(["deciduous-row", "conifer-row", "conifer-belt", "solid"]),
  heightM: numberBetween("the height of the windbreak", 0.5, 60, "m"),
  distanceM: numberBetween("the distance to the windbreak", 0, 3000, "m"),
});

/** What a camp's place can do to people, and what to do about it: common practice, no source. */
export const HAZARDS = [
  {
    key: "dead-limbs",
    name: "Dead limbs overhead",
    caution: "Look up before you pitch: nothing dead or hung up above a shelter, nor within its fall.",
  },
  {
    key: "flood-plain",
    name: "Flood plain or stream bed",
    caution: "Pitch above the last flood mark. Rain far upstream counts. Know the way up in the dark.",
  },
  {
    key: "ridge",
    name: "Ridge or summit in thunder",
    caution: "More wind than below, and first to be struck. Go down before thunder, not in it.",
  },
  {
    key: "lightning",
    name: "Lightning ground",
    caution:
      "Keep off lone trees, open water and wire. In thunder crouch apart on dry mats, away from poles and lines.",
  },
  {
    key: "avalanche",
    name: "Avalanche slope above",
    caution: "Camp outside the run of every slope above, also with new snow or wind. Read the day's bulletin.",
  },
  {
    key: "rockfall",
    name: "Rockfall",
    caution: "Stay clear of fresh stones and of what is above them, most of all in thaw and rain.",
  },
  {
    key: "tide",
    name: "Tide",
    caution: "Pitch above the highest drift line. Look up high water for each night; wind on the shore adds to it.",
  },
  { key: "fire", name: "Fire danger", caution: "No open fire. Stoves on bare ground or rock, water at hand." },
] as const;
export const HAZARD_KEYS = HAZARDS.map((hazard) => hazard.key);

const directionDeg = numberBetween("the wind direction", 0, 360, "°");

/** Everything that a leader or co-leader says about a camp. Null means: not said yet. */
export const campDetailsSchema = z
  .object({
    name: lineText("a name for the camp", 80),
    nights: numberBetween("the number of nights", 1, 14).int(),
    latitude: numberBetween("the latitude", -90, 90, "°").nullable(),
    longitude: numberBetween("the longitude", -180, 180, "°").nullable(),
    altitudeM: numberBetween("the altitude", -430, 8850, "m").nullable(),
    ground: groundPatchSchema.nullable(),
    secondGround: groundPatchSchema.nullable(),
    slopeDeg: numberBetween("the slope", 0, 35, "°"),
    exposure: z.enum(EXPOSURES, { error: "Choose how open the camp is." }).nullable(),
    hill: hillSchema.nullable(),
    windbreak: windbreakSchema.nullable(),
    underTreesSpeedRatio: numberBetween("the share of wind left under the trees", 0.3, 1).nullable(),
    temperatureC: numberBetween("the temperature", -60, 50, "°C").nullable(),
    wind: windStrengthSchema.nullable(),
    windFromDeg: directionDeg.nullable(),
    windToDeg: directionDeg.nullable(),
    strongWindHours: numberBetween("the hours of strong wind", 0, 24, "h").nullable(),
    hasRocks: z.boolean(),
    hasTrees: z.boolean(),
    hasSticks: z.boolean(),
    water: blockText("the note on water", 500),
    waterDistanceM: numberBetween("the distance to water", 0, 20000, "m").nullable(),
    wayOut: blockText("the way out", 500),
    meetingPoint: blockText("the meeting point", 500),
    notes: blockText("the notes", 4000),
    hazards: z.array(z.enum(HAZARD_KEYS)).max(HAZARD_KEYS.length),
  })
  .refine((camp) => (camp.latitude === null) === (camp.longitude === null), {
    path: ["longitude"],
    error: "Enter both latitude and longitude, or neither.",
  })
  .refine((camp) => (camp.windFromDeg === null) === (camp.windToDeg === null), {
    path: ["windToDeg"],
    error: "Enter both ends of the wind range, or neither.",
  });
export type CampDetails = z.infer<typeof campDetailsSchema>;

export const campCreateInput = z.object({ tripId: idSchema, details: campDetailsSchema });
export const campUpdateInput = z.object({
  tripId: idSchema,
  campId: idSchema,
  version: z.number().int().min(1),
  details: campDetailsSchema,
});
export const campReorderInput = z.object({ tripId: idSchema, campIds: z.array(idSchema).min(1).max(60) });

export const campRefInput = z.object({ tripId: idSchema, campId: idSchema });
export const campAlternativeInput = campRefInput.extend({ name: lineText("a name for the alternative", 80) });
export const campCopyInput = campRefInput.extend({ withSleepers: z.boolean().default(false) });
/** Without confirmation, what depends on it is said first and nothing is deleted. */
export const campDeleteInput = campRefInput.extend({ confirmed: z.boolean().default(false) });

/** A camp about which nothing is known but its name. */
export function blankCamp(name: string): CampDetails {
  return {
    name,
    nights: 1,
    latitude: null,
    longitude: null,
    altitudeM: null,
    ground: null,
    secondGround: null,
    slopeDeg: 0,
    exposure: null,
    hill: null,
    windbreak: null,
    underTreesSpeedRatio: null,
    temperatureC: null,
    wind: null,
    windFromDeg: null,
    windToDeg: null,
    strongWindHours: null,
    hasRocks: false,
    hasTrees: false,
    hasSticks: false,
    water: "",
    waterDistanceM: null,
    wayOut: "",
    meetingPoint: "",
    notes: "",
    hazards: [],
  };
}
