import type { CampInput, GroundState, Placement, TrayAnchor, WindInput } from "@/lib/calc/types";
import type { CampDetails, GroundPatch } from "../camp/schema";
import type { LearnedGrounds } from "../pull-test/learned-grounds";
import type { PitchView } from "../views";

function toGround(patch: GroundPatch | null, slopeDeg: number, learned: GroundState["learned"]): GroundState | null {
  return patch && { ...patch, slopeDeg, learned };
}

export function toWindInput(camp: CampDetails): WindInput {
  return {
    strength: camp.wind,
    fromDeg: camp.windFromDeg,
    toDeg: camp.windToDeg,
    exposure: camp.exposure,
    altitudeM: camp.altitudeM,
    temperatureC: camp.temperatureC,
    hill: camp.hill,
    windbreak: camp.windbreak,
    underTreesSpeedRatio: camp.underTreesSpeedRatio,
  };
}

/** The camp as the calculation reads it; the same on the server, in the browser and on paper. */
export function toCampInput(
  camp: CampDetails,
  pitches: readonly Pick<PitchView, "id" | "name" | "spec" | "details" | "analysis">[],
  tray: readonly TrayAnchor[],
  placements: readonly Placement[],
  learned: LearnedGrounds,
): CampInput {
  return {
    wind: toWindInput(camp),
    ground: toGround(camp.ground, camp.slopeDeg, learned.main),
    secondGround: toGround(camp.secondGround, camp.slopeDeg, learned.second),
    strongWindHours: camp.strongWindHours,
    rocksAvailable: camp.hasRocks,
    shelters: pitches.map((pitch) => ({
      pitchId: pitch.id,
      name: pitch.name,
      spec: pitch.spec,
      headingDeg: pitch.details.headingDeg,
      patch: pitch.details.patch,
      analysis: pitch.analysis,
    })),
    tray,
    placements,
  };
}
