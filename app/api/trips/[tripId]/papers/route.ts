import { z } from "zod";
import { PAPER_FOLDS, paperSchema, PAPER_SIZES } from "@/lib/domain/paper/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { contentDisposition } from "@/lib/http/content-disposition";
import { route } from "@/lib/http/route";
import { renderPaperFile } from "@/lib/services/papers/render-paper-file";

const paperQuery = z.object({
  paper: z.string({ error: "Say which paper: field-card, pitch-card, pack-list, pitch-and-pack or booklet." }),
  campId: z.string().optional(),
  pitchId: z.string().optional(),
  personId: z.string().optional(),
  fold: z.enum(PAPER_FOLDS, { error: "Choose flat or pocket." }).optional(),
  size: z.enum(PAPER_SIZES, { error: "Choose A4 or LETTER." }).optional(),
});

/** ?paper=field-card|pitch-card|pack-list|pitch-and-pack|booklet with campId, pitchId, personId, fold, and size=A4|LETTER. */
export const GET = route({
  params: tripRefInput,
  query: paperQuery,
  handler: async ({ ctx, params, query: { paper: kind, size, ...ids } }) => {
    const paper = paperSchema.parse({ kind, ...ids });
    const { fileName, content } = await renderPaperFile({ ctx, input: { ...params, paper, size } });
    return new Response(new Uint8Array(content), {
      headers: {
        "Content-Type": "application/pdf",
        "Content-Disposition": contentDisposition("inline", fileName),
        "Content-Length": String(content.byteLength),
        "X-Content-Type-Options": "nosniff",
      },
    });
  },
});
