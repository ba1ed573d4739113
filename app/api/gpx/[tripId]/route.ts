import { z } from "zod";
import { lineText } from "@/lib/domain/text";
import { MAX_GPX_BYTES } from "@/lib/domain/route/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { contentDisposition } from "@/lib/http/content-disposition";
import { readBytes } from "@/lib/http/read-body";
import { route } from "@/lib/http/route";
import { exportGpx } from "@/lib/services/route/export-gpx";
import { importGpx } from "@/lib/services/route/import-gpx";

export const GET = route({
  params: tripRefInput,
  handler: async ({ ctx, params }) => {
    const { fileName, content } = await exportGpx({ ctx, input: params });
    return new Response(content, {
      headers: {
        "Content-Type": "application/gpx+xml; charset=utf-8",
        "Content-Disposition": contentDisposition("attachment", fileName),
      },
    });
  },
});

const fileQuery = z.object({ name: lineText("the name of the file", 200).default("Route") });

/** The body is the file itself, ?name= its name. */
export const POST = route({
  params: tripRefInput,
  query: fileQuery,
  handler: async ({ ctx, params, query, request }) => {
    const bytes = await readBytes(request, MAX_GPX_BYTES);
    return importGpx({ ctx, input: { ...params, fileName: query.name }, bytes });
  },
});
