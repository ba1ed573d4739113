import { campRefInput } from "@/lib/domain/camp/schema";
import { route } from "@/lib/http/route";
import { analysePitchAs } from "@/lib/services/analysis/analyse-pitch-as";
import { analysePitchBody } from "@/lib/domain/shelter/schema";

/** The pull in the lines of a shelter pitched as the board would like it, for browsers without a worker of their own. */
export const POST = route({
  params: campRefInput,
  body: analysePitchBody,
  handler: ({ ctx, params, body }) => analysePitchAs({ ctx, input: { ...params, ...body } }),
});
