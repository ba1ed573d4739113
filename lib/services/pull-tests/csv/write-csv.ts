import Papa from "papaparse";
import type { PullTestRow } from "../internal";
import { COLUMNS, guardText, type Column } from "./columns";

type CsvRow = Pick<
  PullTestRow,
  | "pulledAt"
  | "place"
  | "patch"
  | "ground"
  | "anchorName"
  | "leanDeg"
  | "lineAngleDeg"
  | "depthOutM"
  | "force"
  | "forceUnit"
  | "outcome"
  | "isOff"
  | "note"
>;

const number = (value: number | null) => (value === null ? "" : String(value));

/** One reading as cells, before any is guarded; two readings with the same cells are the same reading. */
export function toCells(row: CsvRow): Readonly<Record<Column, string>> {
  return {
    pulled_at: row.pulledAt.toISOString(),
    place: row.place,
    patch: row.patch ?? "",
    ground: row.ground.kind,
    wetness: row.ground.wetness,
    loose_top_m: number(row.ground.looseTopM),
    stone_depth_m: number(row.ground.stoneDepthM),
    slope_deg: number(row.ground.slopeDeg),
    anchor: row.anchorName,
    lean_deg: number(row.leanDeg),
    line_angle_deg: number(row.lineAngleDeg),
    depth_out_m: number(row.depthOutM),
    force: number(row.force),
    unit: row.forceUnit,
    outcome: row.outcome,
    counts: row.isOff ? "no" : "yes",
    note: row.note,
  };
}

const TEXTS: ReadonlySet<Column> = new Set(["place", "anchor", "note"]);

/** Readings as a table (RFC 4180, UTF-8), oldest first. */
export function writeCsv(rows: readonly CsvRow[]): string {
  const data = rows.map((row) => {
    const cells = toCells(row);
    return COLUMNS.map((column) => (TEXTS.has(column) ? guardText(cells[column]) : cells[column]));
  });
  return `${Papa.unparse({ fields: [...COLUMNS], data }, { newline: "\r\n" })}\r\n`;
}
