import { z } from "zod";
import { idSchema } from "../ids";

export const PAPER_SIZES = ["A4", "LETTER"] as const;
export type PaperSize = (typeof PAPER_SIZES)[number];

/** Full pages, or four small ones on one side of a sheet that is folded twice. */
export const PAPER_FOLDS = ["flat", "pocket"] as const;
export type PaperFold = (typeof PAPER_FOLDS)[number];

/** A piece of paper. `personId` of a pack list is and pitch-and-pack is whose it is. */
export const paperSchema = z.discriminatedUnion(
  "kind",
  [
    z.object({ kind: z.literal("field-card"), campId: idSchema }),
    z.object({ kind: z.literal("pitch-card"), campId: idSchema, pitchId: idSchema }),
    z.object({ kind: z.literal("pack-list"), personId: idSchema }),
    z.object({
      kind: z.literal("pitch-and-pack"),
      personId: idSchema,
      fold: z.enum(PAPER_FOLDS, { error: "Choose flat or pocket." }).default("flat"),
    }),
    z.object({ kind: z.literal("booklet") }),
  ],
  { error: "Say which paper: field-card, pitch-card, pack-list, pitch-and-pack or booklet." },
);
export type Paper = z.infer<typeof paperSchema>;
export const paperSizeSchema = z.enum(PAPER_SIZES).default("A4");
