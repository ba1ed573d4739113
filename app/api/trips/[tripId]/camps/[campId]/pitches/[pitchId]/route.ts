import { pitchUpdateInput } from "@/lib/domain/shelter/schema";
import { route } from "@/lib/http/route";
import { updatePitch } from "@/lib/services/pitches/update-pitch";

/** Heading, patch, heights and line lengths, as the board sets them. */
export const PATCH = route({
  params: pitchUpdateInput.pick({ tripId: true, campId: true, pitchId: true }),
  body: pitchUpdateInput.pick({ version: true, details: true }),
  handler: ({ ctx, params, body }) => updatePitch({ ctx, input: { ...params, ...body } }),
});
