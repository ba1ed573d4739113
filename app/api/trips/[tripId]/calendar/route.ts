import { tripRefInput } from "@/lib/domain/trip/schema";
import { contentDisposition } from "@/lib/http/content-disposition";
import { route } from "@/lib/http/route";
import { getCalendarFile } from "@/lib/services/post/calendar";

export const GET = route({
  params: tripRefInput,
  handler: async ({ ctx, params }) => {
    const { fileName, content } = await getCalendarFile({ ctx, input: params });
    return new Response(content, {
      headers: {
        "Content-Type": "text/calendar; charset=utf-8",
        "Content-Disposition": contentDisposition("attachment", fileName),
        "X-Content-Type-Options": "nosniff",
      },
    });
  },
});
