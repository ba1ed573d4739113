import { campRefInput } from "@/lib/domain/camp/schema";
import { csvResponse } from "@/lib/http/csv-response";
import { readBytes } from "@/lib/http/read-body";
import { route } from "@/lib/http/route";
import { MAX_CSV_BYTES } from "@/lib/services/pull-tests/csv/columns";
import { exportCampPullTests } from "@/lib/services/pull-tests/csv/export-pull-tests";
import { importCampPullTests } from "@/lib/services/pull-tests/csv/import-pull-tests";

/** The camp's readings as a table: DEVELOPERS.md describes its columns. */
export const GET = route({
  params: campRefInput,
  handler: async ({ ctx, params }) => csvResponse(await exportCampPullTests({ ctx, input: params })),
});

/** A table as the body: all of it is added, or nothing. */
export const POST = route({
  params: campRefInput,
  handler: async ({ ctx, params, request }) => {
    const content = await readBytes(request, MAX_CSV_BYTES);
    return importCampPullTests({ ctx, input: params, content });
  },
});
