import Papa from "papaparse";
import { AppError } from "@/lib/errors";
import { COLUMNS, MAX_ROWS, type Column } from "./columns";

const refuse = (sentence: string): never => {
  throw new AppError("bad-input", `${sentence} Nothing was saved.`);
};

const REQUIRED: readonly Column[] = [
  "pulled_at",
  "wetness",
  "anchor",
  "lean_deg",
  "line_angle_deg",
  "force",
  "unit",
  "outcome",
];

/** The text of a file, or a refusal that says how to save it. A byte-order mark of UTF-8 is fine. */
function decodeText(bytes: Uint8Array): string {
  const [a, b] = bytes;
  const isUtf16 = (a === 0xff && b === 0xfe) || (a === 0xfe && b === 0xff) || bytes.subarray(0, 200).includes(0);
  if (isUtf16) refuse("This file is UTF-16 or no text at all. Save it as CSV in UTF-8.");
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    return refuse("This file is not UTF-8 text. Save it as CSV in UTF-8.");
  }
}

function checkHeader(header: readonly string[]): readonly Column[] {
  const [only = ""] = header;
  if (header.length === 1 && /[;\t|]/.test(only)) {
    refuse("The columns are not separated by commas. Save it with commas between columns and points in numbers.");
  }
  const names = header.map((name) => name.trim().toLowerCase());
  const unknown = names.filter((name) => !(COLUMNS as readonly string[]).includes(name));
  if (unknown.length > 0) {
    refuse(`Row 1: there is no column “${unknown[0]?.slice(0, 40) ?? ""}”. The columns are ${COLUMNS.join(", ")}.`);
  }
  const twice = names.find((name, index) => names.indexOf(name) !== index);
  if (twice !== undefined) refuse(`Row 1: the column ${twice} is there twice.`);
  const missing = REQUIRED.filter((name) => !names.includes(name));
  if (missing.length > 0)
    refuse(`Row 1: the ${missing.length === 1 ? "column" : "columns"} ${missing.join(", ")} are missing.`);
  return names as readonly Column[];
}

export interface TableRow {
  /** As a spreadsheet counts: the heading is row 1. */
  readonly row: number;
  readonly cells: Readonly<Partial<Record<Column, string>>>;
}

/** A file as rows of named cells; nothing in the cells is read yet. */
export function decodeTable(bytes: Uint8Array): readonly TableRow[] {
  const text = decodeText(bytes);
  if (text.trim() === "") refuse("This file is empty.");
  const parsed = Papa.parse<string[]>(text, { delimiter: ",", preview: MAX_ROWS + 2 });
  const [header = [], ...rows] = parsed.data;
  const columns = checkHeader(header);
  const [fault] = parsed.errors;
  if (fault) refuse(`Row ${(fault.row ?? 0) + 1}: a quotation mark is not closed.`);
  const filled = rows.flatMap((cells, index) => (cells.every((cell) => cell.trim() === "") ? [] : [{ cells, index }]));
  if (filled.length === 0) refuse("There is no reading below the heading.");
  if (filled.length > MAX_ROWS) refuse(`There are more than ${MAX_ROWS} readings. Split the file.`);
  return filled.map(({ cells, index }) => {
    if (cells.length !== columns.length) {
      refuse(
        `Row ${index + 2} has ${cells.length} cells; the heading has ${columns.length}. Is a decimal comma in it?`,
      );
    }
    return { row: index + 2, cells: Object.fromEntries(columns.map((column, at) => [column, cells[at] ?? ""])) };
  });
}
