import { MATERIALS, type MaterialRow } from "./tables/materials";
import type { MaterialId } from "./types";

const ROW_BY_ID: ReadonlyMap<MaterialId, MaterialRow> = new Map(MATERIALS.map((row) => [row.id, row]));

/** The table row of a material. @throws RangeError when it is not known. */
export function materialRow(id: MaterialId): MaterialRow {
  const row = ROW_BY_ID.get(id);
  if (row === undefined) throw new RangeError(`material is not known: ${String(id)}`);
  return row;
}
