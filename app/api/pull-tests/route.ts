import { csvResponse } from "@/lib/http/csv-response";
import { readBytes } from "@/lib/http/read-body";
import { route } from "@/lib/http/route";
import { MAX_CSV_BYTES } from "@/lib/services/pull-tests/csv/columns";
import { exportPracticePullTests } from "@/lib/services/pull-tests/csv/export-pull-tests";
import { importPracticePullTests } from "@/lib/services/pull-tests/csv/import-pull-tests";

/** The person's own practice readings as a table. */
export const GET = route({
  handler: async ({ ctx }) => csvResponse(await exportPracticePullTests({ ctx })),
});

export const POST = route({
  handler: async ({ ctx, request }) => {
    const content = await readBytes(request, MAX_CSV_BYTES);
    return importPracticePullTests({ ctx, content });
  },
});
