import { requireInRange, WATER_UNIT_WEIGHT_NM3 } from "./constants";
import { GROUNDS, type GroundRow } from "./tables/grounds";
import type { GroundKind, GroundState, Working } from "./types";

/** Numbers that every anchor in this ground needs, whatever it is made of. */
interface GroundCommon {
  /** Unit weight that counts, N/m³: bulk, or submerged when saturated and frictional. */
  readonly unitWeightNm3: number;
  /** σ of the logarithm of what an anchor holds in it. */
  readonly scatter: number;
  /** Depth of the loose top layer that carries nothing, m. */
  readonly looseTopM: number;
  /** Depth at which a driven stake stops, m; Infinity when nothing stops it. */
  readonly stopDepthM: number;
  readonly slopeDeg: number;
  /** Friction coefficient of a weight lying on it, wetness counted. */
  readonly surfaceFriction: number;
  /** Multiplies every resistance of the ground, from pull tests; 1 = as the table says. */
  readonly strengthFactor: number;
}

export type GroundNumbers = GroundCommon &
  (
    | { readonly kind: "undrained"; readonly shearStrengthPa: number }
    | { readonly kind: "frictional"; readonly frictionAngleDeg: number; readonly cohesionPa: number }
    | { readonly kind: "snow"; readonly bearingPa: number; readonly shaftAdhesionPa: number }
    | { readonly kind: "undriveable"; readonly reason: string; readonly instead: readonly string[] }
  );

export type GroundStrength = GroundNumbers & { readonly workings: readonly Working[] };

const ROW_BY_KIND: ReadonlyMap<GroundKind, GroundRow> = new Map(GROUNDS.map((row) => [row.kind, row]));

/** The table row of a ground kind. @throws RangeError when the kind is not known. */
export function groundRow(kind: GroundKind): GroundRow {
  const row = ROW_BY_KIND.get(kind);
  if (row === undefined) throw new RangeError(`ground.kind is not known: ${String(kind)}`);
  return row;
}

/**
 * Strength of this ground at this camp, without the working (the planner's fast path; `groundStrength` adds it).
 * Wetness lowers the undrained strength or the bearing of snow by the row's factor; in frictional ground it lowers the
 * apparent cohesion, and when saturated the submerged unit weight γ' = γ_sat − γ_w counts and the cohesion is gone.
 * A factor learned from pull tests multiplies every resistance and brings its own scatter.
 * @throws RangeError for looseTopM outside 0…1 m, stoneDepthM outside 0…5 m, slopeDeg outside 0…35°, a learned factor
 *   outside 0.02…50 or a learned scatter outside 0…2, or an unknown wetness
 * Source: rows of tables/grounds.ts.
 */
export function groundNumbers(state: GroundState): GroundNumbers {
  const row = groundRow(state.kind);
  const looseTopM = state.looseTopM ?? row.looseTopM;
  requireInRange("ground.looseTopM", looseTopM, 0, 1);
  const stopDepthM = state.stoneDepthM ?? Infinity;
  if (state.stoneDepthM !== null) requireInRange("ground.stoneDepthM", stopDepthM, 0, 5);
  requireInRange("ground.slopeDeg", state.slopeDeg, 0, 35);
  const wetness = row.wetnessFactors[state.wetness];
  if (wetness === undefined) throw new RangeError(`ground.wetness is not known: ${String(state.wetness)}`);
  const strengthFactor = state.learned?.factor ?? 1;
  requireInRange("ground.learned.factor", strengthFactor, 0.02, 50);
  const scatter = state.learned?.scatter ?? row.scatter;
  requireInRange("ground.learned.scatter", scatter, 0, 2);

  const isSubmerged = state.wetness === "saturated" && row.model.kind === "frictional";
  const unitWeightNm3 = isSubmerged ? row.saturatedUnitWeightNm3 - WATER_UNIT_WEIGHT_NM3 : row.unitWeightNm3;
  const surfaceFriction = row.surfaceFriction * SURFACE_WETNESS[state.wetness];
  const { slopeDeg } = state;
  // Written out rather than spread from a common part: this runs many thousand times for one plan.
  switch (row.model.kind) {
    case "undrained":
      return {
        kind: "undrained",
        shearStrengthPa: row.model.shearStrengthPa * wetness,
        unitWeightNm3,
        scatter,
        looseTopM,
        stopDepthM,
        slopeDeg,
        surfaceFriction,
        strengthFactor,
      };
    case "frictional":
      return {
        kind: "frictional",
        frictionAngleDeg: row.model.frictionAngleDeg,
        cohesionPa: row.model.cohesionPa * wetness,
        unitWeightNm3,
        scatter,
        looseTopM,
        stopDepthM,
        slopeDeg,
        surfaceFriction,
        strengthFactor,
      };
    case "snow":
      return {
        kind: "snow",
        bearingPa: row.model.bearingPa * wetness,
        shaftAdhesionPa: row.model.shaftAdhesionPa * wetness,
        unitWeightNm3,
        scatter,
        looseTopM,
        stopDepthM,
        slopeDeg,
        surfaceFriction,
        strengthFactor,
      };
    case "undriveable":
      return {
        kind: "undriveable",
        reason: row.model.reason,
        instead: row.model.instead,
        unitWeightNm3,
        scatter,
        looseTopM,
        stopDepthM,
        slopeDeg,
        surfaceFriction,
        strengthFactor,
      };
  }
}

/** Friction of a weight lying on wet ground (judgement: water and mud take up to a third of it). */
const SURFACE_WETNESS = { dry: 1, usual: 1, wet: 0.8, saturated: 0.65 } as const;

/** As `groundNumbers`, with the working of each number. */
export function groundStrength(state: GroundState): GroundStrength {
  const row = groundRow(state.kind);
  const numbers = groundNumbers(state);
  const workings: Working[] = [
    { symbol: "", meaning: "ground", value: row.name, unit: "", source: "input" },
    { symbol: "", meaning: "wetness", value: state.wetness, unit: "", source: "input" },
  ];
  switch (numbers.kind) {
    case "undrained":
      workings.push({
        symbol: "s_u",
        meaning: "undrained shear strength, wetness counted",
        value: numbers.shearStrengthPa,
        unit: "Pa",
        source: row.source,
      });
      break;
    case "frictional":
      workings.push(
        { symbol: "φ", meaning: "angle of friction", value: numbers.frictionAngleDeg, unit: "°", source: row.source },
        {
          symbol: "c",
          meaning: "apparent cohesion, wetness counted",
          value: numbers.cohesionPa,
          unit: "Pa",
          source: row.source,
        },
      );
      break;
    case "snow":
      workings.push({
        symbol: "σ_c",
        meaning: "bearing strength of the snow, wetness counted",
        value: numbers.bearingPa,
        unit: "Pa",
        source: row.source,
      });
      break;
    case "undriveable":
      workings.push({ symbol: "", meaning: "driving", value: numbers.reason, unit: "", source: row.source });
      break;
  }
  workings.push({
    symbol: "γ",
    meaning: state.wetness === "saturated" && numbers.kind === "frictional" ? "unit weight under water" : "unit weight",
    value: numbers.unitWeightNm3,
    unit: "N/m³",
    source: row.source,
  });
  if (state.learned !== null) {
    workings.push({
      symbol: "f",
      meaning: "strength factor learned from pull tests here",
      value: numbers.strengthFactor,
      unit: "",
      source: "pull tests",
    });
  }
  workings.push({
    symbol: "σ_ln",
    meaning: "scatter of the ground (σ of the logarithm)",
    value: numbers.scatter,
    unit: "",
    source: state.learned === null ? row.source : "pull tests",
  });
  if (numbers.looseTopM > 0) {
    workings.push({
      symbol: "t",
      meaning: "loose top layer that carries nothing",
      value: numbers.looseTopM,
      unit: "m",
      source: state.looseTopM === null ? row.source : "input",
    });
  }
  if (state.stoneDepthM !== null) {
    workings.push({
      symbol: "z_s",
      meaning: "depth at which stones stop a driven stake",
      value: state.stoneDepthM,
      unit: "m",
      source: "input",
    });
  }
  if (state.slopeDeg > 0) {
    workings.push({
      symbol: "ω",
      meaning: "slope of the ground; the pull is taken downhill",
      value: state.slopeDeg,
      unit: "°",
      source: "input",
    });
  }
  return { ...numbers, workings };
}
