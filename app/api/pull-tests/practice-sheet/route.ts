import { practiceSheetQuery } from "@/lib/domain/pull-test/practice-sheet";
import { pdfResponse } from "@/lib/http/pdf-response";
import { route } from "@/lib/http/route";
import { makePracticeSheet } from "@/lib/services/pull-tests/make-practice-sheet";

/** ?ground=firm-moist-loam&scale=50&unit=kgf&count=12&size=A4|LETTER */
export const GET = route({
  query: practiceSheetQuery,
  handler: async ({ ctx, query }) => pdfResponse(await makePracticeSheet({ ctx, input: query })),
});
