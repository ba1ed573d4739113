import { z } from "zod";
import { GROUND_KINDS } from "../camp/schema";
import { PAPER_SIZES } from "../paper/schema";
import { FORCE_UNITS } from "../preferences";
import { PATCHES } from "./schema";

const number = (what: string, min: number, max: number) =>
  z.coerce
    .number({ error: `${what} has to be a number.` })
    .min(min, `${what} has to be between ${min} and ${max}.`)
    .max(max, `${what} has to be between ${min} and ${max}.`);

/** An empty field of a form is one that was left out. */
const orNull = <Schema extends z.ZodType>(schema: Schema) =>
  z.preprocess((value) => (value === "" || value === undefined ? null : value), schema.nullable()).default(null);

const common = {
  /** What the scale ends at, in `unit`. */
  scale: orNull(number("The end of the scale", 1, 20_000)),
  unit: z.enum(FORCE_UNITS, { error: "Choose N, kgf or lbf." }).default("N"),
  count: z
    .preprocess((value) => (value === "" ? undefined : value), number("The number of pulls", 4, 24).int().default(12))
    .default(12),
  size: z.enum(PAPER_SIZES, { error: "Choose A4 or LETTER." }).optional(),
};

export const campSheetQuery = z.object({
  ...common,
  patch: z.enum(PATCHES, { error: "Choose the patch of ground." }).default("main"),
});
export const practiceSheetQuery = z.object({ ...common, ground: z.enum(GROUND_KINDS, { error: "Choose a ground." }) });

/** One page to write on: what to pull, in which order, and what the model expects. */
export interface PracticeSheetView {
  readonly kicker: string;
  readonly title: string;
  readonly groundName: string;
  readonly printedAt: string;
  readonly address: string;
  readonly forceUnit: (typeof FORCE_UNITS)[number];
  readonly scaleEndN: number | null;
  readonly rows: readonly {
    readonly anchorName: string;
    readonly leanDeg: number | null;
    readonly lineAngleDeg: number;
    readonly expectedN: number;
    readonly lowN: number;
    readonly highN: number;
    readonly chanceExact: number;
    /** What it adds, the first pull being 1. */
    readonly worth: number;
  }[];
}
