import "./database";
import { defaultShelterSpec } from "@/lib/calc/shelter-kinds";
import { builtInAnchor } from "@/lib/calc/tables/anchors";
import type { Placement, ShelterKind } from "@/lib/calc/types";
import { blankCamp, type CampDetails } from "@/lib/domain/camp/schema";
import type { KitItemDetails } from "@/lib/domain/kit/schema";
import type { ShelterDetails } from "@/lib/domain/shelter/schema";
import { createCamp } from "@/lib/services/camps/create-camp";
import type { Context } from "@/lib/services/context/context";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { createPitch } from "@/lib/services/pitches/create-pitch";
import { createShelter } from "@/lib/services/shelters/create-shelter";

/** A camp with everything that a calculation needs: 20 m/s from W to NW on firm loam. */
export function windyCamp(overrides: Partial<CampDetails> = {}): CampDetails {
  return {
    ...blankCamp("Otter Flat"),
    altitudeM: 300,
    ground: { kind: "firm-moist-loam", wetness: "usual", looseTopM: null, stoneDepthM: null },
    exposure: "II",
    wind: { kind: "gust", speedMs: 20 },
    windFromDeg: 270,
    windToDeg: 315,
    strongWindHours: 4,
    ...overrides,
  };
}

export function shelterOf(kind: ShelterKind, overrides: Partial<ShelterDetails> = {}): ShelterDetails {
  return { name: "Ridge tarp", sleeps: 3, massKg: 0.75, spec: defaultShelterSpec(kind), ...overrides };
}

export function anchorOf(id: string, count: number): KitItemDetails {
  const { name, spec, massKg } = builtInAnchor(id);
  return { type: "anchor", name, spec, massKg, count };
}

export function placementOf(
  pitchId: string,
  tieOutId: string,
  anchorId: string,
  more: Partial<Placement> = {},
): Placement {
  return {
    pitchId,
    tieOutId,
    anchorId,
    leanDeg: 10,
    depthOutM: 0,
    tandem: null,
    rockKg: 0,
    shockCord: false,
    knot: "two-half-hitches",
    pinned: false,
    ...more,
  };
}

/** One camp with a ridge tarp (8 tie-outs) and a kit of three-blades and sand stakes. */
export async function makeCampKit(ctx: Context, tripId: string, camp: Partial<CampDetails> = {}) {
  const { campId } = await createCamp({ ctx, input: { tripId, details: windyCamp(camp) } });
  const { shelterId } = await createShelter({ ctx, input: { tripId, details: shelterOf("ridge-tarp") } });
  const { pitchId } = await createPitch({ ctx, input: { tripId, campId, shelterId } });
  const { kitItemId: bladeId } = await createKitItem({
    ctx,
    input: { tripId, details: anchorOf("three-blade-200", 6) },
  });
  const { kitItemId: wideId } = await createKitItem({ ctx, input: { tripId, details: anchorOf("wide-sand-300", 3) } });
  return { campId, shelterId, pitchId, bladeId, wideId };
}
