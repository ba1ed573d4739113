import { BELL } from "./shelters/bell";
import { DIAMOND } from "./shelters/diamond";
import { DOME } from "./shelters/dome";
import type { ShelterFamily, ShelterProblem } from "./shelters/family";
import { FLYING_TARP } from "./shelters/flying-tarp";
import { HALF_PYRAMID } from "./shelters/half-pyramid";
import { ShelterMesh } from "./shelters/mesh";
import { PONCHO_LEAN_TO } from "./shelters/poncho-lean-to";
import { PYRAMID } from "./shelters/pyramid";
import { RIDGE_TARP } from "./shelters/ridge-tarp";
import { RIDGE_TENT } from "./shelters/ridge-tent";
import { TUNNEL } from "./shelters/tunnel";
import { fabricRow } from "./tables/fabrics";
import { lineStiffnessN } from "./tables/line-stiffness";
import type { ShelterKind, ShelterKindDefinition, ShelterModel, ShelterSpec } from "./types";

const FAMILIES: Readonly<Record<ShelterKind, ShelterFamily>> = {
  "ridge-tarp": RIDGE_TARP,
  "poncho-lean-to": PONCHO_LEAN_TO,
  diamond: DIAMOND,
  "flying-tarp": FLYING_TARP,
  "half-pyramid": HALF_PYRAMID,
  pyramid: PYRAMID,
  "ridge-tent": RIDGE_TENT,
  tunnel: TUNNEL,
  dome: DOME,
  bell: BELL,
};

/** The built-in kinds, open shelters first. All dimensions are generic (judgement), no maker's product. */
export const SHELTER_KINDS: readonly ShelterKindDefinition[] = Object.values(FAMILIES).map(
  (family) => family.definition,
);

/** The definition of a kind. */
export function shelterKind(kind: ShelterKind): ShelterKindDefinition {
  return FAMILIES[kind].definition;
}

/** A shelter of this kind with typical dimensions, fabric, line and line lengths. */
export function defaultShelterSpec(kind: ShelterKind): ShelterSpec {
  const family = FAMILIES[kind];
  return {
    kind,
    dimensions: Object.fromEntries(family.definition.dimensions.map((row) => [row.key, row.typicalM])),
    fabric: family.fabric,
    line: { material: "polyester", diameterMm: family.lineDiameterMm },
    lineLengthsM: {},
  };
}

/** All dimensions of a spec, m; a missing one takes its typical value. */
function dimensionsOf(spec: ShelterSpec): Record<string, number> {
  return Object.fromEntries(
    FAMILIES[spec.kind].definition.dimensions.map((row) => [row.key, spec.dimensions[row.key] ?? row.typicalM]),
  );
}

function assemble(spec: ShelterSpec, refinement: number): { model: ShelterModel; problems: readonly ShelterProblem[] } {
  const family = FAMILIES[spec.kind];
  const fabric = fabricRow(spec.fabric);
  const mesh = new ShelterMesh(
    {
      fabricStiffnessNPerM: fabric.stiffnessNPerM,
      shearShare: fabric.shearShare,
      lineStiffnessN: lineStiffnessN(spec.line.material, spec.line.diameterMm),
      lineLengthsM: spec.lineLengthsM,
    },
    refinement,
  );
  const model = mesh.finish(spec.kind, family.build(dimensionsOf(spec), mesh));
  return { model, problems: mesh.problems };
}

/**
 * What is wrong with a spec, by field: dimensions out of range, dimensions that do not go together, lines too short to
 * reach the ground, names of dimensions or tie-outs that the kind does not have. Empty when it can be built.
 */
export function checkShelterSpec(spec: ShelterSpec): { field: string; message: string }[] {
  const { definition, check } = FAMILIES[spec.kind];
  const problems: ShelterProblem[] = [];
  for (const key of Object.keys(spec.dimensions)) {
    if (!definition.dimensions.some((row) => row.key === key))
      problems.push({ field: `dimensions.${key}`, message: `${definition.name} has no dimension "${key}".` });
  }
  const values = dimensionsOf(spec);
  for (const row of definition.dimensions) {
    const value = values[row.key] ?? Number.NaN;
    if (!(value >= row.minM && value <= row.maxM))
      problems.push({
        field: `dimensions.${row.key}`,
        message: `${row.label}: enter ${row.minM} to ${row.maxM} m.`,
      });
  }
  if (!(spec.line.diameterMm >= 0.5 && spec.line.diameterMm <= 20))
    problems.push({ field: "line.diameterMm", message: "Line diameter: enter 0.5 to 20 mm." });
  if (problems.length === 0) problems.push(...check(values));
  if (problems.length > 0) return problems;
  const { model, problems: lineProblems } = assemble(spec, 1);
  for (const id of Object.keys(spec.lineLengthsM)) {
    if (!model.tieOuts.some((tieOut) => tieOut.id === id))
      problems.push({ field: `lineLengthsM.${id}`, message: `${definition.name} has no tie-out "${id}".` });
  }
  return [...problems, ...lineProblems];
}

/**
 * The shelter as a cable net, with what is needed to draw it. Pure; well under a millisecond.
 *
 * @param spec dimensions in m; check it first with `checkShelterSpec`
 * @param refinement 1 = working mesh (40 to 90 nodes), 2 = every cell halved (for the check on mesh size)
 * @throws RangeError with the first problem when the spec can't be built
 */
export function buildShelter(spec: ShelterSpec, refinement: 1 | 2 = 1): ShelterModel {
  const [first] = checkShelterSpec(spec);
  if (first) throw new RangeError(`${first.field}: ${first.message}`);
  return assemble(spec, refinement).model;
}

/** Height at which the wind pressure is taken: the top of the shelter, m. */
export function referenceHeightM(spec: ShelterSpec): number {
  return FAMILIES[spec.kind].heightM(dimensionsOf(spec));
}
