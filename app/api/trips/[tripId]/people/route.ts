import { tripRefInput } from "@/lib/domain/trip/schema";
import { contentDisposition } from "@/lib/http/content-disposition";
import { route } from "@/lib/http/route";
import { exportPeople } from "@/lib/services/people/export-people";

export const GET = route({
  params: tripRefInput,
  handler: async ({ ctx, params }) => {
    const { fileName, content } = await exportPeople({ ctx, input: params });
    return new Response(content, {
      headers: {
        "Content-Type": "text/csv; charset=utf-8",
        "Content-Disposition": contentDisposition("attachment", fileName),
        "X-Content-Type-Options": "nosniff",
      },
    });
  },
});
