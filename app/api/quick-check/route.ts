import { quickCheckInput } from "@/lib/domain/quick-check/schema";
import { route } from "@/lib/http/route";
import { checkAnchor } from "@/lib/services/quick-check/check-anchor";

/** What one anchor holds: DEVELOPERS.md describes body and answer. */
export const POST = route({
  body: quickCheckInput,
  maxBytes: 16 * 1024,
  handler: ({ body }) => checkAnchor({ input: body }),
});
