import { analyseShelter } from "@/lib/calc/analyse-shelter";
import { designAnalysisRequest, evaluateCamp } from "@/lib/calc/camp";
import { proposePlan } from "@/lib/calc/plan";
import { defaultShelterSpec, shelterKind } from "@/lib/calc/shelter-kinds";
import { BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import type { ShelterKind, TrayAnchor } from "@/lib/calc/types";
import { blankCamp, type CampDetails } from "@/lib/domain/camp/schema";
import { toCampInput } from "@/lib/domain/plan/to-camp-input";
import { NOTHING_LEARNED } from "@/lib/domain/pull-test/learned-grounds";
import type { PackListView, PaperCamp, PaperDocument, PaperHeader, PitchView, TripView } from "@/lib/domain/views";

/** An invented trip, worked out by the real calculation, in the shape that the services hand to the papers. */

export const HEADER: PaperHeader = {
  tripName: "Harrow Fell traverse",
  version: 5,
  printedAt: "9 June 18:20",
  address: "https://leestead.example/trips/q3VtYx0sZbJw8nRk2LhPaE/camps/7GmTfd1uXcKe5oWi9NzSyB",
};

export const CONTACTS = [
  { name: "Mountain rescue", phone: "112", note: "say the position first" },
  { name: "Ines Marlow, at home", phone: "+44 1632 960 117", note: "" },
];

export const PEOPLE = [
  "Runa Amsel",
  "Tobi Oduya",
  "Łucja Żółtowska",
  "Никита Щеглов",
  "Γιώργος Αυγουλάς",
  "Maëlle Ó Ciardha",
  "Ngô Thị Ánh Nguyệt",
  "Jörn Åkesson",
];

export const TRAY: readonly TrayAnchor[] = BUILT_IN_ANCHORS.filter((anchor) => anchor.spec.class !== "snow-plate").map(
  (anchor) => ({ ...anchor, count: anchor.found ? 6 : 8 }),
);

export const CAMP: CampDetails = {
  ...blankCamp("Sill Ridge"),
  latitude: 54.21348,
  longitude: -3.10112,
  altitudeM: 742,
  ground: { kind: "firm-moist-loam", wetness: "wet", looseTopM: 0.03, stoneDepthM: 0.25 },
  secondGround: { kind: "dense-sand-gravel", wetness: "usual", looseTopM: null, stoneDepthM: null },
  slopeDeg: 4,
  exposure: "II",
  wind: { kind: "gust", speedMs: 20.8 },
  windFromDeg: 250,
  windToDeg: 315,
  strongWindHours: 5,
  hasRocks: true,
  hasTrees: true,
  water: "Spring 120 m east, below the wall. Boil it.",
  notes: "Pitch on the lee side of the wall, not in the gap.",
  hazards: ["dead-limbs", "ridge"],
};

export interface PitchRequest {
  readonly kind: ShelterKind;
  readonly name?: string;
  readonly headingDeg?: number;
  readonly sleepers?: readonly string[];
}

export function paperCamp(requests: readonly PitchRequest[], details: CampDetails = CAMP, id = "camp-1"): PaperCamp {
  const bare = requests.map((request, index) => {
    const spec = defaultShelterSpec(request.kind);
    const name = request.name ?? shelterKind(request.kind).name;
    return {
      id: `${id}-pitch-${index + 1}`,
      shelterId: `shelter-${request.kind}`,
      name,
      sleeps: shelterKind(request.kind).typicalSleeps,
      position: index,
      details: { headingDeg: request.headingDeg ?? 350, patch: "main", dimensions: {}, lineLengthsM: {} },
      version: 1,
      spec,
      analysis: null,
      sleeperIds: [],
    } satisfies PitchView;
  });
  const blank = toCampInput(details, bare, TRAY, [], NOTHING_LEARNED);
  const pitches: PitchView[] = bare.map((pitch, index) => {
    const shelter = blank.shelters[index];
    const request = shelter && designAnalysisRequest(blank, shelter);
    return request && "spec" in request ? { ...pitch, analysis: analyseShelter(request) } : pitch;
  });
  const input = toCampInput(details, pitches, TRAY, [], NOTHING_LEARNED);
  const { placements } = proposePlan(input, { allowFound: true, allowDoubling: true });
  const result = evaluateCamp({ ...input, placements });
  return {
    camp: { id, position: 0, days: ["2026-06-14"], alternativeTo: null, details, version: 3 },
    forecast: null,
    nightNumbers: "3 of 5",
    pitches,
    tray: TRAY,
    placements,
    result,
    sleeperNames: Object.fromEntries(requests.map((one, i) => [`${id}-pitch-${i + 1}`, one.sleepers ?? []])),
    way: [
      "From Otter Flat: 10.4\u2009km, 430\u2009m up, 50\u2009m down.",
      "9:30 to 15:56. Pitching begins 44\u2009min before dark.",
    ],
    fallbacks: Object.fromEntries(
      pitches.map((pitch) => [
        pitch.id,
        [
          "Tie-outs 3, 8 and 2: a second stake in line, 0.6\u2009m behind the first.",
          "Lengthen the lines of 1 and 5 to 2.4\u2009m.",
          "Bury a bundle of sticks crosswise, forearm deep, at 3.",
          "Drop the ridge to 0.9\u2009m. Above 80\u2009km/h go down to the hut.",
        ],
      ]),
    ),
  };
}

export const TRIP: TripView = {
  id: "trip-1",
  name: HEADER.tripName,
  startDate: "2026-06-12",
  endDate: "2026-06-17",
  timeZone: "Europe/London",
  notes: "Meet at the bridge at 9:00. Last bus back at 18:40.",
  contacts: CONTACTS,
  version: 4,
  paperVersion: 5,
  role: "leader",
};

export function packList(name: string, index = 1): PackListView {
  return {
    person: { id: `person-${index}`, name },
    own: [
      "Sleeping bag to 0 °C",
      "Mat",
      "Rain jacket and trousers",
      "Head torch and spare battery",
      "Mug, bowl, spoon",
      "Two litres of water",
      "Warm hat and gloves",
      "Map and compass",
      "Sun cream",
    ].map((thing, i) => ({
      key: `item:${i}`,
      name: thing,
      detail: i === 4 ? "no glass" : "",
      massKg: null,
      isTicked: i < 2,
    })),
    group: [
      { key: "shelter:1", name: "Ridge tarp", detail: "fabric, lines and two poles", massKg: 1.15, isTicked: false },
      { key: "kit:1", name: "Three-blade 200", detail: "8 of 16", massKg: 0.19, isTicked: true },
      { key: "kit:2", name: "Wide sand stake", detail: "all 4", massKg: 0.42, isTicked: false },
    ],
    groupMassKg: 1.76,
    nights: ["2026-06-12", "2026-06-13", "2026-06-14"].map((day, i) => ({
      campId: `camp-${i}`,
      campName: ["Alder Bank", "Quarry Flat", "Sill Ridge"][i] ?? "",
      day,
      shelterName: i === 1 ? null : "Ridge tarp",
      pitchId: i === 1 ? null : `camp-${i}-pitch-1`,
      withNames: i === 1 ? [] : ["Tobi Oduya", "Łucja Żółtowska"],
    })),
  };
}

export function pitchCard(
  kind: ShelterKind,
  camp = paperCamp([{ kind, sleepers: PEOPLE.slice(0, 3) }]),
): PaperDocument {
  return {
    kind: "pitch-card",
    header: HEADER,
    contacts: CONTACTS,
    camp,
    pitchIds: camp.pitches.map((pitch) => pitch.id),
  };
}

export function fieldCard(camp: PaperCamp): PaperDocument {
  return { kind: "field-card", header: HEADER, contacts: CONTACTS, camp };
}

export function booklet(camps: readonly PaperCamp[], packLists: readonly PackListView[]): PaperDocument {
  return { kind: "booklet", header: HEADER, trip: TRIP, contacts: CONTACTS, camps, packLists };
}
