import { and, asc, eq } from "drizzle-orm";
import { pitch } from "@/db/schema";
import { buildShelter, shelterKind } from "@/lib/calc/shelter-kinds";
import type { ShelterSpec } from "@/lib/calc/types";
import type { PitchDetails } from "@/lib/domain/shelter/schema";
import { AppError } from "@/lib/errors";
import type { Reader } from "../trips/internal";

export type PitchRow = typeof pitch.$inferSelect;

export async function listPitchRows(reader: Reader, tripId: string): Promise<PitchRow[]> {
  return reader.select().from(pitch).where(eq(pitch.tripId, tripId)).orderBy(asc(pitch.position), asc(pitch.id));
}

export async function loadPitchRow(
  reader: Reader,
  scope: { readonly tripId: string; readonly campId: string; readonly pitchId: string },
): Promise<PitchRow> {
  const [row] = await reader
    .select()
    .from(pitch)
    .where(and(eq(pitch.id, scope.pitchId), eq(pitch.tripId, scope.tripId), eq(pitch.campId, scope.campId)))
    .limit(1);
  if (!row) throw new AppError("not-found", "That shelter is not pitched at this camp.");
  return row;
}

export function toPitchDetails(row: PitchRow): PitchDetails {
  return {
    headingDeg: row.headingDeg,
    patch: row.patch,
    dimensions: row.dimensions,
    lineLengthsM: row.lineLengthsM,
  };
}

/** The shelter's own spec with what this pitch says laid over it. */
export function toPitchSpec(
  spec: ShelterSpec,
  over: { readonly dimensions: PitchDetails["dimensions"]; readonly lineLengthsM: PitchDetails["lineLengthsM"] },
): ShelterSpec {
  return {
    ...spec,
    dimensions: { ...spec.dimensions, ...over.dimensions },
    lineLengthsM: { ...spec.lineLengthsM, ...over.lineLengthsM },
  };
}

/** Only what the kind lets you choose at each pitch, and lines of tie-outs that it has. */
export function keepPitchedParts(spec: ShelterSpec, details: Pick<PitchDetails, "dimensions" | "lineLengthsM">) {
  const pitched = new Set(
    shelterKind(spec.kind)
      .dimensions.filter((one) => one.pitched)
      .map((one) => one.key),
  );
  const tieOuts = listTieOutIds(spec);
  const keep = (values: Readonly<Record<string, number>>, keys: ReadonlySet<string>) =>
    Object.fromEntries(Object.entries(values).filter(([key]) => keys.has(key)));
  return { dimensions: keep(details.dimensions, pitched), lineLengthsM: keep(details.lineLengthsM, tieOuts) };
}

/** Ids of the tie-outs of a shelter; they depend on its kind, not on how it is pitched. */
export function listTieOutIds(spec: ShelterSpec): ReadonlySet<string> {
  return new Set(buildShelter(spec).tieOuts.map((tieOut) => tieOut.id));
}
