import { campRefInput } from "@/lib/domain/camp/schema";
import { planIntentsBody } from "@/lib/domain/plan/schema";
import { route } from "@/lib/http/route";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";

export const GET = route({
  params: campRefInput,
  handler: ({ ctx, params }) => getCampPlan({ ctx, input: params }),
});

export const POST = route({
  params: campRefInput,
  body: planIntentsBody,
  maxBytes: 1024 * 1024,
  handler: ({ ctx, params, body }) => savePlanIntents({ ctx, input: { ...params, ...body } }),
});
