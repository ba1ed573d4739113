import { analyseShelter } from "@/lib/calc/analyse-shelter";
import { designAnalysisRequest } from "@/lib/calc/camp";
import { plainPlacement } from "@/lib/calc/rig-anchor";
import { defaultShelterSpec } from "@/lib/calc/shelter-kinds";
import { builtInAnchor } from "@/lib/calc/tables/anchors";
import type { Placement, ShelterKind, TrayAnchor } from "@/lib/calc/types";
import { blankCamp, type CampDetails } from "@/lib/domain/camp/schema";
import { toWindInput } from "@/lib/domain/plan/to-camp-input";
import { NOTHING_LEARNED } from "@/lib/domain/pull-test/learned-grounds";
import type { CampPlanView, PitchView } from "@/lib/domain/views";

export const TRIP_ID = "trip00000000000000000001";
export const CAMP_ID = "camp00000000000000000001";
export const USER_ID = "user00000000000000000001";

export function makeTray(): TrayAnchor[] {
  const carried = (id: string, count: number): TrayAnchor => {
    const { name, spec, massKg, found } = builtInAnchor(id);
    return { id: `${id}-kit0000000000`, name, spec, massKg, found, count };
  };
  return [
    carried("three-blade-200", 3),
    carried("three-blade-150", 6),
    carried("round-hook-180", 4),
    carried("wide-sand-300", 2),
    carried("v-160", 2),
  ];
}

export const WINDY_CAMP: CampDetails = {
  ...blankCamp("Sill Ridge"),
  altitudeM: 742,
  ground: { kind: "firm-moist-loam", wetness: "usual", looseTopM: null, stoneDepthM: null },
  exposure: "II",
  wind: { kind: "gust", speedMs: 20.8 },
  windFromDeg: 270,
  windToDeg: 315,
  strongWindHours: 6,
  hasRocks: true,
};

export function makePitch(kind: ShelterKind, camp: CampDetails, over: Partial<PitchView> = {}): PitchView {
  const spec = defaultShelterSpec(kind);
  const id = over.id ?? `pitch-${kind}`.replaceAll("-", "0").padEnd(20, "0");
  const details = over.details ?? { headingDeg: 0, patch: "main" as const, dimensions: {}, lineLengthsM: {} };
  const name = over.name ?? "Ridge tarp";
  const request = designAnalysisRequest(
    { wind: toWindInput(camp) },
    { pitchId: id, name, spec, headingDeg: details.headingDeg, patch: details.patch, analysis: null },
  );
  return {
    id,
    shelterId: `shelter0000000000000`,
    name,
    sleeps: 3,
    position: 0,
    details,
    version: 1,
    spec,
    analysis: "gaps" in request ? null : analyseShelter(request),
    sleeperIds: [],
    ...over,
  };
}

export function makeView(over: Partial<CampPlanView> = {}, camp: CampDetails = WINDY_CAMP): CampPlanView {
  return {
    trip: {
      id: TRIP_ID,
      name: "Sill Ridge traverse",
      startDate: "2026-06-12",
      endDate: "2026-06-17",
      timeZone: "Europe/London",
      notes: "",
      contacts: [],
      version: 1,
      paperVersion: 1,
      role: "leader",
    },
    camp: { id: CAMP_ID, position: 0, days: ["2026-06-14"], alternativeTo: null, details: camp, version: 1 },
    camps: [],
    pitches: over.pitches ?? [makePitch("ridge-tarp", camp)],
    tray: makeTray(),
    shockCordCount: 2,
    placements: [],
    learned: NOTHING_LEARNED,
    planVersion: 3,
    savedAt: "2026-06-10T09:42:00.000Z",
    savedByName: "Rena Amsel",
    people: [],
    ...over,
  };
}

export function place(pitch: PitchView, tieOutId: string, anchorId: string, over: Partial<Placement> = {}): Placement {
  return { ...plainPlacement(pitch.id, tieOutId, anchorId), ...over };
}
