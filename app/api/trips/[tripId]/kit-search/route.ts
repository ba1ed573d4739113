import { z } from "zod";
import { kitSearchSettingsSchema } from "@/lib/domain/kit/search-schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { route } from "@/lib/http/route";
import { cancelKitSearch } from "@/lib/services/kit-search/cancel-kit-search";
import { getKitProgress } from "@/lib/services/kit-search/get-kit-progress";
import { startKitSearch } from "@/lib/services/kit-search/start-kit-search";

export const GET = route({
  params: tripRefInput,
  handler: ({ ctx, params }) => getKitProgress({ ctx, input: params }),
});

export const POST = route({
  params: tripRefInput,
  body: z.object({ settings: kitSearchSettingsSchema }),
  handler: ({ ctx, params, body }) => startKitSearch({ ctx, input: { ...params, ...body } }),
});

export const DELETE = route({
  params: tripRefInput,
  handler: ({ ctx, params }) => cancelKitSearch({ ctx, input: params }),
});
