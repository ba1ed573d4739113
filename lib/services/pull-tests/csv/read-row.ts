import {
  campReadingSchema,
  practiceReadingSchema,
  type CampReading,
  type PracticeReading,
} from "@/lib/domain/pull-test/schema";
import { unguardText, type Column } from "./columns";
import type { TableRow } from "./decode-table";

export interface CellFault {
  readonly row: number;
  readonly column: Column;
  readonly message: string;
}

/** Which column of the table a field of the reading stands in. */
export const COLUMN_OF: Readonly<Record<string, Column>> = {
  pulledAt: "pulled_at",
  place: "place",
  patch: "patch",
  kind: "ground",
  wetness: "wetness",
  looseTopM: "loose_top_m",
  stoneDepthM: "stone_depth_m",
  slopeDeg: "slope_deg",
  leanDeg: "lean_deg",
  lineAngleDeg: "line_angle_deg",
  depthOutM: "depth_out_m",
  force: "force",
  forceUnit: "unit",
  outcome: "outcome",
  note: "note",
};

const DECIMAL = /^[+-]?\d+(\.\d+)?(e[+-]?\d{1,3})?$/i;
const DAY = /^\d{4}-\d{2}-\d{2}$/;

interface Read {
  readonly value: number | null;
  readonly fault: string | null;
}

function readNumber(cell: string): Read {
  const text = cell.trim();
  if (text === "") return { value: null, fault: null };
  if (DECIMAL.test(text)) return { value: Number(text), fault: null };
  const isComma = /^[+-]?\d+,\d+$/.test(text);
  return {
    value: null,
    fault: isComma ? `Use a decimal point: ${text.replace(",", ".")}, not ${text}.` : "That is not a number.",
  };
}

/** A day alone stands for its noon in UTC. */
const readInstant = (cell: string) => (DAY.test(cell.trim()) ? `${cell.trim()}T12:00:00Z` : cell.trim());

const NUMBERS = ["looseTopM", "stoneDepthM", "slopeDeg", "leanDeg", "lineAngleDeg", "depthOutM", "force"] as const;

export interface ReadRow {
  readonly row: number;
  readonly reading: CampReading | PracticeReading;
  readonly anchor: string;
  readonly isOff: boolean;
  /** Null: the ground of the camp's patch. */
  readonly ground: string | null;
  readonly slopeDeg: number;
  readonly looseTopM: number | null;
  readonly stoneDepthM: number | null;
}

/** One row as a reading, or what is wrong with each of its cells. */
export function readRow({ row, cells }: TableRow, place: "camp" | "practice"): ReadRow | readonly CellFault[] {
  const faults: CellFault[] = [];
  const text = (field: string) => cells[COLUMN_OF[field] ?? "note"] ?? "";
  const numbers: Record<string, number | null> = {};
  for (const field of NUMBERS) {
    const { value, fault } = readNumber(text(field));
    numbers[field] = value;
    if (fault) faults.push({ row, column: COLUMN_OF[field] ?? "note", message: fault });
  }
  const counts = (cells.counts ?? "").trim().toLowerCase() || "yes";
  if (counts !== "yes" && counts !== "no") faults.push({ row, column: "counts", message: "Say yes or no." });
  const anchor = unguardText(cells.anchor ?? "").trim();
  if (anchor === "") faults.push({ row, column: "anchor", message: "Name the anchor." });
  const common = {
    leanDeg: numbers.leanDeg,
    lineAngleDeg: numbers.lineAngleDeg,
    depthOutM: numbers.depthOutM ?? 0,
    force: numbers.force,
    forceUnit: text("forceUnit").trim(),
    outcome: text("outcome").trim(),
    wetness: text("wetness").trim(),
    note: unguardText(text("note")),
    pulledAt: readInstant(text("pulledAt")),
  };
  const { looseTopM = null, stoneDepthM = null } = numbers;
  const ground = text("kind").trim();
  const parsed =
    place === "camp"
      ? campReadingSchema.safeParse({ ...common, patch: text("patch").trim() || "main" })
      : practiceReadingSchema.safeParse({
          ...common,
          place: unguardText(text("place")),
          kind: ground,
          looseTopM,
          stoneDepthM,
        });
  const known = new Set(faults.map((fault) => fault.column));
  for (const issue of parsed.error?.issues ?? []) {
    const column = COLUMN_OF[String(issue.path[0])] ?? "note";
    if (!known.has(column)) faults.push({ row, column, message: issue.message });
    known.add(column);
  }
  if (faults.length > 0 || !parsed.success) return faults;
  const slopeDeg = numbers.slopeDeg ?? 0;
  const isOff = counts === "no";
  return { row, reading: parsed.data, anchor, isOff, ground: ground || null, slopeDeg, looseTopM, stoneDepthM };
}
