"use server";

import { revalidatePath } from "next/cache";
import { action } from "@/lib/http/action";
import { restorePlanVersion, restorePlanVersionInput } from "@/lib/services/plan/restore-plan-version";

export const restorePlanVersionAction = action(async ({ ctx, input }) => {
  const { planVersion } = await restorePlanVersion({ ctx, input: restorePlanVersionInput.parse(input) });
  revalidatePath(`/trips/${String(input.tripId)}`, "layout");
  return { message: `Brought back as version ${planVersion}.` };
});
