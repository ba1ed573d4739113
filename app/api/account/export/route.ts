import { contentDisposition } from "@/lib/http/content-disposition";
import { route } from "@/lib/http/route";
import { exportAccount } from "@/lib/services/account/export-account";

export const GET = route({
  handler: async ({ ctx }) =>
    new Response(JSON.stringify(await exportAccount({ ctx }), null, 2), {
      headers: {
        "Content-Type": "application/json; charset=utf-8",
        "Content-Disposition": contentDisposition("attachment", "leestead-account.json"),
        "X-Content-Type-Options": "nosniff",
      },
    }),
});
