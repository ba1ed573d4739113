import Papa from "papaparse";
import { ROLE_NAMES, ROLES, type Role } from "@/lib/domain/permissions/permissions";
import { personNameSchema } from "@/lib/domain/person/schema";
import { emailSchema } from "@/lib/domain/text";

export const MAX_IMPORT = 60;
const MAX_COLUMNS = 40;

const COLUMNS: Readonly<Record<string, "name" | "email" | "role">> = {
  name: "name",
  email: "email",
  "e-mail": "email",
  "e-mail address": "email",
  "email address": "email",
  role: "role",
};

export interface CsvPerson {
  /** Of the file, as a spreadsheet counts. */
  readonly row: number;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
}

export interface CsvFault {
  readonly row: number;
  readonly column: "name" | "email" | "role" | null;
  readonly message: string;
}

/** What our own export puts in front of a cell that a spreadsheet would take for a formula. */
const GUARD = /^'(?=[=+\-@\t\r＝＋－＠])/;
/** Cells that a spreadsheet would work out: with the guard in front they are text. */
export const FORMULA_START = /^[=+\-@\t\r＝＋－＠].*$/s;

function readRole(text: string): Role | null {
  const plain = text.trim().toLowerCase();
  if (plain === "") return "participant";
  return ROLES.find((role) => role === plain || ROLE_NAMES[role].toLowerCase() === plain) ?? null;
}

const firstMessage = (error: { readonly issues: readonly { readonly message: string }[] }) =>
  error.issues[0]?.message ?? "Not accepted.";

function readRow(cells: readonly string[], at: Readonly<Record<string, number>>, row: number) {
  const cell = (column: "name" | "email" | "role") => (cells[at[column] ?? -1] ?? "").replace(GUARD, "");
  const faults: CsvFault[] = [];
  const name = personNameSchema.safeParse(cell("name"));
  if (!name.success) faults.push({ row, column: "name", message: firstMessage(name.error) });
  const email = emailSchema.safeParse(cell("email"));
  if (!email.success) faults.push({ row, column: "email", message: firstMessage(email.error) });
  const role = readRole(cell("role"));
  if (!role) {
    const known = ROLES.map((one) => ROLE_NAMES[one].toLowerCase()).join(", ");
    faults.push({ row, column: "role", message: `There is no such role; choose from ${known}, or leave it empty.` });
  }
  return name.success && email.success && role
    ? { person: { row, name: name.data, email: email.data, role }, faults }
    : { person: null, faults };
}

function readHeader(cells: readonly string[]): { at: Record<string, number>; faults: CsvFault[] } {
  const at: Record<string, number> = {};
  const faults: CsvFault[] = [];
  for (const [index, cell] of cells.entries()) {
    const key = cell.trim().toLowerCase();
    const column = Object.hasOwn(COLUMNS, key) ? COLUMNS[key] : undefined;
    if (!column) continue;
    if (at[column] !== undefined) faults.push({ row: 1, column, message: "This column is there twice." });
    at[column] = index;
  }
  for (const column of ["name", "email"] as const) {
    if (at[column] === undefined) {
      faults.push({ row: 1, column, message: `The first line has to name the columns; “${column}” is missing.` });
    }
  }
  return { at, faults };
}

/** People from a CSV file: everybody, or what is wrong in which row and column. Cells are text, never worked out. */
export function readPeopleCsv(text: string): { people: CsvPerson[]; faults: CsvFault[] } {
  const { data, errors } = Papa.parse<string[]>(text.replace(/^\uFEFF/, ""), {
    delimitersToGuess: [",", ";", "\t"],
    preview: MAX_IMPORT + 50,
  });
  const broken = errors.filter((error) => error.type === "Quotes");
  if (broken.length > 0) {
    const faults = broken
      .slice(0, 5)
      .map(({ row }) => ({ row: (row ?? 0) + 1, column: null, message: "A quote is not closed." }));
    return { people: [], faults };
  }
  const [header = [], ...rest] = data;
  if (header.length > MAX_COLUMNS) {
    return { people: [], faults: [{ row: 1, column: null, message: `At most ${MAX_COLUMNS} columns.` }] };
  }
  const { at, faults } = readHeader(header);
  if (faults.length > 0) return { people: [], faults };
  const people: CsvPerson[] = [];
  const seen = new Map<string, number>();
  for (const [index, cells] of rest.entries()) {
    const row = index + 2;
    if (cells.every((cell) => cell.trim() === "")) continue;
    if (people.length >= MAX_IMPORT) {
      faults.push({ row, column: null, message: `At most ${MAX_IMPORT} people in one file.` });
      break;
    }
    const read = readRow(cells, at, row);
    faults.push(...read.faults);
    if (!read.person) continue;
    const first = seen.get(read.person.email);
    if (first) faults.push({ row, column: "email", message: `The same address as in row ${first}.` });
    seen.set(read.person.email, row);
    people.push(read.person);
  }
  if (people.length === 0 && faults.length === 0)
    faults.push({ row: 1, column: null, message: "There is nobody in it." });
  return { people, faults };
}
