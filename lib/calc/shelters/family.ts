import type { FabricId, ShelterKindDefinition, ShelterModel, Vec3 } from "../types";
import { vec } from "../vectors";
import type { ShelterDrawing, ShelterMesh } from "./mesh";

export interface ShelterProblem {
  readonly field: string;
  readonly message: string;
}

type Values<K extends string> = Readonly<Record<K, number>>;

/** What one kind of shelter has to say: its definition, which dimensions go together, and how its net is laid. */
export interface ShelterFamily {
  readonly definition: ShelterKindDefinition;
  readonly fabric: FabricId;
  readonly lineDiameterMm: number;
  /** Problems of dimensions that are each in range but do not go together. */
  readonly check: (values: Readonly<Record<string, number>>) => readonly ShelterProblem[];
  readonly heightM: (values: Readonly<Record<string, number>>) => number;
  readonly build: (values: Readonly<Record<string, number>>, mesh: ShelterMesh) => ShelterDrawing;
}

/** Types the dimensions of a family by their keys; the values always hold every key of the definition. */
export function defineFamily<K extends string>(family: {
  readonly definition: Omit<ShelterKindDefinition, "dimensions"> & {
    readonly dimensions: readonly (ShelterKindDefinition["dimensions"][number] & { readonly key: K })[];
  };
  readonly fabric: FabricId;
  readonly lineDiameterMm: number;
  readonly check: (values: Values<K>) => readonly ShelterProblem[];
  readonly heightM: (values: Values<K>) => number;
  readonly build: (values: Values<K>, mesh: ShelterMesh) => ShelterDrawing;
}): ShelterFamily {
  return {
    ...family,
    check: (values) => family.check(values as Values<K>),
    heightM: (values) => family.heightM(values as Values<K>),
    build: (values, mesh) => family.build(values as Values<K>, mesh),
  };
}

/** One dimension in metres: key, label, typical, smallest, largest, and whether it is chosen at each pitch. */
export const dimension = <K extends string>(
  key: K,
  label: string,
  typicalM: number,
  minM: number,
  maxM: number,
  pitched = false,
) => ({ key, label, typicalM, minM, maxM, pitched });

/** A pegged hem stands this high above the ground and hangs in a loop of this length, m (judgement). */
export const HEM_HEIGHT_M = 0.03;
export const HEM_LOOP_M = 0.08;

/** Room for one sleeper, m. */
const SLEEPER_WIDTH_M = 0.6;
const SLEEPER_LENGTH_M = 1.9;

/** As many sleepers side by side as fit in a rectangle, heads one way, the middle places first. */
export function placesSideBySide(
  centre: { readonly x: number; readonly y: number },
  roomM: number,
  bearing: 0 | 90 | 180 | 270,
  atLeast: number,
): ShelterModel["drawing"]["sleepingPlaces"] {
  const count = Math.max(atLeast, Math.floor(roomM / SLEEPER_WIDTH_M + 0.05));
  const step = Math.min(SLEEPER_WIDTH_M + 0.05, roomM / count);
  const offsets = Array.from({ length: count }, (_, index) => (index - (count - 1) / 2) * step);
  offsets.sort((a, b) => Math.abs(a) - Math.abs(b) || a - b);
  const isAcross = bearing === 90 || bearing === 270;
  return offsets.map((offset) => ({
    centre: isAcross ? vec(centre.x, centre.y + offset, 0) : vec(centre.x + offset, centre.y, 0),
    bearingDeg: bearing,
  }));
}

/** Sleepers like spokes, heads outward, from the rear round to the sides; the place at the front is left for the door. */
export function placesLikeSpokes(radiusM: number, atLeast: number): ShelterModel["drawing"]["sleepingPlaces"] {
  const spokes = Math.max(atLeast + 1, Math.floor((2 * Math.PI * Math.max(0.1, radiusM - 1.3)) / 0.55));
  const radius = Math.max(0.2, radiusM - SLEEPER_LENGTH_M / 2 - 0.08);
  const bearings = Array.from({ length: spokes - 1 }, (_, index) => ((index + 1) * 360) / spokes);
  bearings.sort((a, b) => Math.abs(a - 180) - Math.abs(b - 180) || a - b);
  return bearings.map((bearingDeg) => {
    const angle = (bearingDeg * Math.PI) / 180;
    return { centre: vec(radius * Math.sin(angle), radius * Math.cos(angle), 0), bearingDeg };
  });
}

/** Points of a rectangle on the ground, clockwise from front right. */
export const rectangle = (halfX: number, halfY: number, z: number): readonly [Vec3, Vec3, Vec3, Vec3] => [
  vec(halfX, halfY, z),
  vec(halfX, -halfY, z),
  vec(-halfX, -halfY, z),
  vec(-halfX, halfY, z),
];
