/** An invented round of five nights: no such places, no such forecast. */
import { defaultShelterSpec } from "@/lib/calc/shelter-kinds";
import { builtInAnchor } from "@/lib/calc/tables/anchors";
import type { ShelterKind } from "@/lib/calc/types";
import { blankCamp, type CampDetails } from "@/lib/domain/camp/schema";
import type { KitItemDetails } from "@/lib/domain/kit/schema";
import type { ShelterDetails } from "@/lib/domain/shelter/schema";

export const TRIP = {
  name: "Skarn Edge round",
  timeZone: "Europe/Oslo",
  notes:
    "Five nights out and back over the edge. Meet at the Alder Bottom bridge at 9:30. If the ridge night looks worse than planned, we stay at Otterbed and walk out.",
};

export const CONTACTS = [
  { name: "Emergency call", phone: "112", note: "Say: Skarn Edge round, party of eight" },
  { name: "Valley warden", phone: "+99 000 01 42", note: "Knows our plan; expects a call by noon on the last day" },
];

const ground = (kind: NonNullable<CampDetails["ground"]>["kind"], stoneDepthM: number | null = null) => ({
  kind,
  wetness: "usual" as const,
  looseTopM: null,
  stoneDepthM,
});

export const CAMPS: readonly CampDetails[] = [
  {
    ...blankCamp("Alder Bottom"),
    latitude: 61.9312,
    longitude: 8.7215,
    altitudeM: 312,
    ground: ground("litter-over-loam"),
    slopeDeg: 2,
    exposure: "III",
    underTreesSpeedRatio: 0.8,
    temperatureC: 9,
    wind: { kind: "gust", speedMs: 15 },
    windFromDeg: 225,
    windToDeg: 270,
    strongWindHours: 3,
    hasTrees: true,
    hasSticks: true,
    water: "Stream to the east, boil it.",
    waterDistanceM: 60,
    wayOut: "Forest road down the valley, 5 km to the bridge and the first house.",
    meetingPoint: "The third cairn, by the leaning alder.",
    notes: "Old alders: look up before you pitch. Flat places between the second and third cairn.",
    hazards: ["dead-limbs"],
  },
  {
    ...blankCamp("Otterbed"),
    latitude: 61.9874,
    longitude: 8.8041,
    altitudeM: 364,
    ground: ground("moist-sandy-flat"),
    secondGround: ground("firm-moist-loam"),
    slopeDeg: 1,
    exposure: "II",
    temperatureC: 8,
    wind: { kind: "gust", speedMs: 17 },
    windFromDeg: 240,
    windToDeg: 290,
    strongWindHours: 4,
    hasRocks: true,
    hasSticks: true,
    water: "River beside camp.",
    waterDistanceM: 30,
    wayOut: "Back down the valley path, 11 km to Alder Bottom. The ford is shut after heavy rain.",
    meetingPoint: "The terrace above the bend.",
    notes: "Sand by the bend, loam on the terrace above. Keep 2 m above the water line.",
    hazards: ["flood-plain"],
  },
  {
    ...blankCamp("Skarn Edge"),
    nights: 2,
    latitude: 62.0431,
    longitude: 8.9127,
    altitudeM: 742,
    ground: ground("hard-trodden-loam", 0.2),
    slopeDeg: 3,
    exposure: "II",
    temperatureC: 3,
    wind: { kind: "gust", speedMs: 21 },
    windFromDeg: 270,
    windToDeg: 315,
    strongWindHours: 6,
    hasRocks: true,
    water: "Carry it up from the tarn.",
    notes: "Thin turf over rock, open to the west. The second day is a rest day. Way down: the cairned path south.",
    waterDistanceM: 900,
    wayOut: "Cairned path south, 6 km down to Otterbed. Not along the edge in wind.",
    meetingPoint: "The big boulder south of the camp.",
    hazards: ["ridge", "lightning"],
  },
  {
    ...blankCamp("Marrow Tarn"),
    latitude: 61.9926,
    longitude: 8.8893,
    altitudeM: 455,
    ground: ground("firm-moist-loam"),
    slopeDeg: 1,
    exposure: "II",
    temperatureC: 7,
    wind: { kind: "gust", speedMs: 13 },
    windFromDeg: 290,
    windToDeg: 340,
    strongWindHours: 2,
    hasRocks: true,
    water: "Tarn, from the outlet side.",
    waterDistanceM: 80,
    wayOut: "Track from the outlet, 7 km to the road.",
    meetingPoint: "The boathouse wall at the outlet.",
    notes: "Meadow on the lee side of the tarn.",
  },
];

const shelter = (kind: ShelterKind, name: string, sleeps: number, massKg: number): ShelterDetails => ({
  name,
  sleeps,
  massKg,
  spec: defaultShelterSpec(kind),
});

export const SHELTERS: readonly ShelterDetails[] = [
  shelter("ridge-tarp", "Ridge tarp", 3, 0.76),
  shelter("half-pyramid", "Half pyramid", 2, 0.88),
  shelter("pyramid", "Pyramid", 3, 1.34),
  shelter("tunnel", "Tunnel", 2, 2.15),
];

/** Who sleeps in which of the shelters, by place in the lists of people and shelters. */
export const SLEEPS_IN: readonly number[] = [0, 1, 2, 0, 2, 3, 3, 1];

const anchor = (id: string, count: number): KitItemDetails => {
  const { name, spec, massKg } = builtInAnchor(id);
  return { type: "anchor", name, spec, massKg, count };
};

/** What is neither shelter nor kit. */
export const GROUP_THINGS = [
  { id: null, name: "Stove and wind shield", massKg: 0.42 },
  { id: null, name: "Gas, two cartridges", massKg: 0.76 },
  { id: null, name: "Pots and lids", massKg: 0.68 },
  { id: null, name: "First aid", massKg: 0.54 },
  { id: null, name: "Water filter", massKg: 0.31 },
  { id: null, name: "Trowel and repair things", massKg: 0.36 },
];

/** What each carries of their own, and the most that they carry, kg; by place in the list of people. */
export const CARRY_LIMITS: readonly { readonly baseMassKg: number; readonly limitKg: number }[] = [
  { baseMassKg: 9.4, limitKg: 16 },
  { baseMassKg: 10.1, limitKg: 18 },
  { baseMassKg: 8.2, limitKg: 12.5 },
  { baseMassKg: 9.8, limitKg: 17 },
  { baseMassKg: 8.9, limitKg: 14 },
  { baseMassKg: 9.1, limitKg: 15 },
  { baseMassKg: 8.6, limitKg: 13 },
  { baseMassKg: 10.4, limitKg: 19 },
];

/** Forty-four stakes for forty-four tie-outs: just enough, and mixed. */
export const KIT: readonly KitItemDetails[] = [
  anchor("three-blade-200", 18),
  anchor("three-blade-150", 8),
  anchor("wide-sand-300", 10),
  anchor("v-160", 8),
  { type: "shock-cord", name: "Shock cord loop", lengthM: 0.4, massKg: 0.006, count: 6 },
  { type: "cord", name: "Spare guy line", material: "polyester", diameterMm: 2, lengthM: 4, massKg: 0.014, count: 8 },
];
