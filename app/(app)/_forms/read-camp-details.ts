import { METRES_PER_SECOND } from "@/lib/format/factors";
import { asTyped, metresPerUnit, scale, type Typed } from "./typed-values";

const METRES_PER_CENTIMETRE = 0.01;

/** The form of a camp in the shape of its schema: SI units, and null for what was not said. */
export function readCampDetails(input: Typed): Typed {
  const typed = asTyped(input.details);
  const metres = metresPerUnit(input.lengthUnit);
  return {
    ...typed,
    altitudeM: scale(typed.altitudeM, metres),
    waterDistanceM: scale(typed.waterDistanceM, metres),
    ground: readPatch(typed.ground),
    secondGround: readPatch(typed.secondGround),
    wind: readWind(asTyped(typed.wind), input.speedUnit),
    hill: input.hasHill === true ? readHill(asTyped(typed.hill), metres) : null,
    windbreak: input.hasWindbreak === true ? readWindbreak(asTyped(typed.windbreak), metres) : null,
    underTreesSpeedRatio: scale(typed.underTreesSpeedRatio ?? null, 0.01),
    hazards: typed.hazards ?? [],
  };
}

function readPatch(value: unknown): Typed | null {
  const patch = asTyped(value);
  if (patch.kind === undefined || patch.kind === "") return null;
  return {
    ...patch,
    looseTopM: scale(patch.looseTopM ?? null, METRES_PER_CENTIMETRE),
    stoneDepthM: scale(patch.stoneDepthM ?? null, METRES_PER_CENTIMETRE),
  };
}

function readWind(wind: Typed, unit: unknown): Typed | null {
  if (wind.kind === undefined || wind.kind === "") return null;
  if (wind.kind === "beaufort") return { kind: "beaufort", number: wind.number };
  const factor = Object.entries(METRES_PER_SECOND).find(([name]) => name === unit)?.[1] ?? 1;
  return { kind: wind.kind, speedMs: scale(wind.speedMs, factor) };
}

function readHill(hill: Typed, metres: number): Typed {
  const upwindLengthM = scale(hill.upwindLengthM, metres);
  // A cliff has no lee slope: its length plays no part, and the form does not insist on one.
  const lee = hill.shape === "cliff" && hill.downwindLengthM === null ? upwindLengthM : null;
  return {
    shape: hill.shape,
    heightM: scale(hill.heightM, metres),
    upwindLengthM,
    downwindLengthM: lee ?? scale(hill.downwindLengthM, metres),
    fromCrestM: scale(hill.fromCrestM, metres),
  };
}

function readWindbreak(windbreak: Typed, metres: number): Typed {
  return {
    kind: windbreak.kind,
    heightM: scale(windbreak.heightM, metres),
    distanceM: scale(windbreak.distanceM, metres),
  };
}
