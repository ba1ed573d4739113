import { z } from "zod";
import { TRANTER_FITNESS } from "@/lib/calc/tables/tranter";
import { idSchema } from "../ids";
import { lineText, numberBetween } from "../text";

export const MAX_GPX_BYTES = 12 * 1024 * 1024;
export const MAX_DRAWN_POINTS = 500;

export const WALKING_RULES = ["slowest", "naismith", "langmuir", "tobler", "din"] as const;
export type WalkingRule = (typeof WALKING_RULES)[number];
export const TERRAINS = ["path", "rough", "soft"] as const;
export const HEATS = ["cool", "warm", "hot", "very-hot", "severe", "extreme"] as const;

export interface RouteBreak {
  readonly atM: number;
  readonly lengthM: number;
}

/** A place that the file names. */
export interface RoutePlace {
  readonly name: string;
  readonly note: string;
  readonly latitude: number;
  readonly longitude: number;
  readonly heightM: number | null;
  /** Nearest place of the line, m along it and m away. */
  readonly atM: number;
  readonly offM: number;
}

/** [latitude, longitude, place along the line] of what is left of each piece. */
export type SimplifiedLine = readonly (readonly (readonly [number, number, number])[])[];

const minuteOfDay = numberBetween("the time of setting off", 0, 1439).int();

/** How the group walks. Null: not said, and what rests on it stays open. */
export const routeSettingsSchema = z.object({
  rule: z.enum(WALKING_RULES, { error: "Choose a rule." }),
  /** Share of the rule's own speed. */
  paceRatio: numberBetween("the group's pace", 0.3, 2).nullable(),
  fitness: z
    .number({ error: "Choose a fitness." })
    .refine((value) => TRANTER_FITNESS.some((one) => one === value), "Choose a fitness.")
    .nullable(),
  linesLower: numberBetween("the allowance for packs", 0, 3).int(),
  breakMinPerHour: numberBetween("the breaks", 0, 60, "min").nullable(),
  setOffMinute: minuteOfDay.nullable(),
  pitchingMin: numberBetween("the time for pitching", 0, 240, "min").nullable(),
  isOffPath: z.boolean(),
  bodyKg: numberBetween("the body mass", 30, 200, "kg").nullable(),
  packKg: numberBetween("the pack's mass", 0, 60, "kg").nullable(),
  terrain: z.enum(TERRAINS, { error: "Choose the ground of the way." }).nullable(),
  heat: z.enum(HEATS, { error: "Choose how hot the days are." }).nullable(),
});
export type RouteSettings = z.infer<typeof routeSettingsSchema>;

export const BLANK_SETTINGS: RouteSettings = {
  rule: "slowest",
  paceRatio: null,
  fitness: null,
  linesLower: 0,
  breakMinPerHour: null,
  setOffMinute: null,
  pitchingMin: null,
  isOffPath: false,
  bodyKg: null,
  packKg: null,
  terrain: null,
  heat: null,
};

/** What is typed of a leg: measured on a map where there is no line, and its own time of setting off. */
export const typedLegSchema = z.object({
  distanceM: numberBetween("the distance", 0, 200_000, "m").nullable(),
  ascentM: numberBetween("the ascent", 0, 10_000, "m").nullable(),
  descentM: numberBetween("the descent", 0, 10_000, "m").nullable(),
  setOffMinute: minuteOfDay.nullable(),
});
export type TypedLeg = z.infer<typeof typedLegSchema>;

export const BLANK_LEG: TypedLeg = { distanceM: null, ascentM: null, descentM: null, setOffMinute: null };

const latitude = numberBetween("the latitude", -90, 90, "°");
const longitude = numberBetween("the longitude", -180, 180, "°");

export const routeRefInput = z.object({ tripId: idSchema });

export const routeSettingsInput = z.object({
  tripId: idSchema,
  version: z.number().int().min(0),
  settings: routeSettingsSchema,
  /** By the camp to which each leg leads. */
  legs: z.array(z.object({ campId: idSchema, leg: typedLegSchema })).max(60),
  homeLeg: typedLegSchema,
});

export const drawRouteInput = z.object({
  tripId: idSchema,
  points: z
    .array(z.object({ latitude, longitude }))
    .min(2, "A way needs two points.")
    .max(MAX_DRAWN_POINTS, `At most ${MAX_DRAWN_POINTS} points.`),
});

export const placeCampInput = z.object({
  tripId: idSchema,
  campId: idSchema,
  version: z.number().int().min(1),
  atM: numberBetween("the place along the way", 0, 1e7, "m").nullable(),
  /** Where the camp is then: at that place of the line, where it was, or where it is said. */
  position: z.union([
    z.literal("line"),
    z.literal("keep"),
    z.object({
      latitude: latitude.nullable(),
      longitude: longitude.nullable(),
      altitudeM: numberBetween("the altitude", -430, 8850, "m").nullable(),
    }),
  ]),
});

export const campsFromPlacesInput = z.object({
  tripId: idSchema,
  /** Numbers of the file's places, from 0. */
  places: z.array(z.number().int().min(0).max(1000)).min(1, "Choose at least one place.").max(60),
});

export const importGpxInput = z.object({ tripId: idSchema, fileName: lineText("the name of the file", 200) });
