import { campRefInput } from "@/lib/domain/camp/schema";
import { campSheetQuery } from "@/lib/domain/pull-test/practice-sheet";
import { pdfResponse } from "@/lib/http/pdf-response";
import { route } from "@/lib/http/route";
import { makeCampSheet } from "@/lib/services/pull-tests/make-practice-sheet";

/** ?patch=main|second&scale=50&unit=kgf&count=12&size=A4|LETTER */
export const GET = route({
  params: campRefInput,
  query: campSheetQuery,
  handler: async ({ ctx, params, query }) => pdfResponse(await makeCampSheet({ ctx, input: { ...params, ...query } })),
});
