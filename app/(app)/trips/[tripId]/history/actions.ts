"use server";

import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { action } from "@/lib/http/action";
import { restorePlanVersion, restorePlanVersionInput } from "@/lib/services/plan/restore-plan-version";

export const restorePlanVersionAction = action(async ({ ctx, input }) => {
  const wanted = restorePlanVersionInput.parse(input);
  await restorePlanVersion({ ctx, input: wanted });
  revalidatePath(`/trips/${wanted.tripId}`, "layout");
  // From here, not from the button: the preview has none any more once the plan is the same.
  redirect(`/trips/${wanted.tripId}/history?camp=${wanted.campId}`);
});
