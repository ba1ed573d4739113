import { z } from "zod";
import { PAPER_SIZES } from "@/lib/domain/paper/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { contentDisposition } from "@/lib/http/content-disposition";
import { route } from "@/lib/http/route";
import { renderContactSheet } from "@/lib/services/details/render-contact-sheet";

export const GET = route({
  params: tripRefInput,
  query: z.object({ size: z.enum(PAPER_SIZES, { error: "Choose A4 or LETTER." }).optional() }),
  handler: async ({ ctx, params, query }) => {
    const { fileName, content } = await renderContactSheet({ ctx, input: { ...params, ...query } });
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
