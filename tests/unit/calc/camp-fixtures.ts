import { buildShelter, defaultShelterSpec, referenceHeightM } from "@/lib/calc/shelter-kinds";
import type {
  AnchorSpec,
  CampInput,
  GroundState,
  PitchedShelter,
  Placement,
  ShelterAnalysis,
  ShelterKind,
  ShelterResponse,
  ShelterSpec,
  TrayAnchor,
  WindInput,
} from "@/lib/calc/types";
import { windAtShelter } from "@/lib/calc/wind";

/** Camps made by hand: pulls are written down, not computed, so that every margin can be checked with a pencil. */

export const WIND: WindInput = {
  strength: { kind: "gust", speedMs: 20 },
  fromDeg: 225,
  toDeg: 315,
  exposure: "II",
  altitudeM: 400,
  temperatureC: null,
  hill: null,
  windbreak: null,
  underTreesSpeedRatio: null,
};

export const LOAM: GroundState = {
  kind: "firm-moist-loam",
  wetness: "usual",
  looseTopM: null,
  stoneDepthM: null,
  slopeDeg: 0,
  learned: null,
};

export function specOf(kind: ShelterKind): ShelterSpec {
  // A line that never governs.
  return { ...defaultShelterSpec(kind), line: { material: "uhmwpe", diameterMm: 5 } };
}

export function tieOutIds(kind: ShelterKind): string[] {
  return buildShelter(specOf(kind)).tieOuts.map((tieOut) => tieOut.id);
}

export function pressureOf(kind: ShelterKind, wind: WindInput = WIND): number {
  const found = windAtShelter(wind, referenceHeightM(specOf(kind)));
  if (found.status !== "ok") throw new Error("the fixture's wind has a gap");
  return found.wind.pressurePa;
}

/**
 * An analysis whose pulls are `pullsN` at the pressure of WIND and grow in proportion to the pressure; line angle 35°
 * or as given. `fallsAt`: multiples of that pressure from which there is no standing shape.
 */
export function analysisOf(
  kind: ShelterKind,
  pullsN: readonly number[],
  options: { anglesDeg?: readonly number[]; consequences?: readonly number[]; fallsAt?: number } = {},
): ShelterAnalysis {
  const ids = tieOutIds(kind);
  const designPa = pressureOf(kind);
  const responseAt = (share: number): ShelterResponse => ({
    pressurePa: designPa * share,
    tieOuts: ids.map((tieOutId, index) => ({
      tieOutId,
      pullN: (pullsN[index % pullsN.length] ?? 0) * share,
      lineAngleDeg: options.anglesDeg?.[index % options.anglesDeg.length] ?? 35,
      relativeWindDeg: 0,
      loadCase: "lifting",
    })),
    poles: [],
    standing: share < (options.fallsAt ?? Infinity),
    withoutShape: share < (options.fallsAt ?? Infinity) ? [] : [{ relativeWindDeg: 0, loadCase: "pressing" }],
    largestMovementM: 0.05,
    residualN: 0.01,
  });
  return {
    design: responseAt(1),
    levels: [0, 0.25, 0.5, 0.75, 1, 1.5, 2, 3, 4, 6, 10, 40].map(responseAt),
    consequences: ids.map((tieOutId, index) => ({
      tieOutId,
      consequence: options.consequences?.[index % options.consequences.length] ?? 1,
      standing: true,
      sentence: "",
    })),
    workings: [],
  };
}

export function pitchOf(
  pitchId: string,
  kind: ShelterKind,
  pullsN: readonly number[],
  options: Parameters<typeof analysisOf>[2] & { patch?: "main" | "second" } = {},
): PitchedShelter {
  return {
    pitchId,
    name: `Shelter ${pitchId}`,
    spec: specOf(kind),
    headingDeg: 270,
    patch: options.patch ?? "main",
    analysis: analysisOf(kind, pullsN, options),
  };
}

/** An anchor that holds its rating whatever the ground and the angle. */
export const ringOf = (ratingN: number): AnchorSpec => ({ class: "fixed", ratingN });

export function trayOf(id: string, spec: AnchorSpec, count: number, massKg = 0.01, found = false): TrayAnchor {
  return { id, name: `Anchor ${id}`, spec, count, massKg, found };
}

export const BLADE: AnchorSpec = {
  class: "stake",
  section: { shape: "three-blade", bladeM: 0.018, thicknessM: 0.002 },
  lengthM: 0.2,
  material: "aluminium-7075",
  headRatingN: null,
};

export const SHORT_HOOK: AnchorSpec = {
  class: "stake",
  section: { shape: "round", diameterM: 0.006 },
  lengthM: 0.16,
  material: "aluminium-6061",
  headRatingN: null,
};

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
    leanDeg: 0,
    depthOutM: 0,
    tandem: null,
    rockKg: 0,
    shockCord: false,
    knot: "figure-eight-loop",
    pinned: false,
    ...more,
  };
}

export function campOf(more: Partial<CampInput>): CampInput {
  return {
    wind: WIND,
    ground: LOAM,
    secondGround: null,
    strongWindHours: 0,
    rocksAvailable: false,
    shelters: [],
    tray: [],
    placements: [],
    ...more,
  };
}

/** A small generator, so that larger instances are the same on every machine. */
export function createDraws(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 4294967296;
  };
}
