/** The table of readings: its columns, in the order in which they are written. DEVELOPERS.md describes each. */
export const COLUMNS = [
  "pulled_at",
  "place",
  "patch",
  "ground",
  "wetness",
  "loose_top_m",
  "stone_depth_m",
  "slope_deg",
  "anchor",
  "lean_deg",
  "line_angle_deg",
  "depth_out_m",
  "force",
  "unit",
  "outcome",
  "counts",
  "note",
] as const;
export type Column = (typeof COLUMNS)[number];

export const MAX_ROWS = 20_000;
export const MAX_CSV_BYTES = 8 * 1024 * 1024;

/** What a spreadsheet would take for a formula, also in its full-width form, and the mark that keeps it from doing so. */
const FORMULA_START = /^[=+\-@\t\r'＝＋－＠]/;

/** A cell of text: never a formula. Numbers are written as they are, so that −5 stays a number. */
export function guardText(text: string): string {
  return FORMULA_START.test(text) ? `'${text}` : text;
}

/** The text as it was before it was guarded. */
export function unguardText(cell: string): string {
  return cell.startsWith("'") && FORMULA_START.test(cell.slice(1)) ? cell.slice(1) : cell;
}
