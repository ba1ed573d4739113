"use server";

import { revalidatePath } from "next/cache";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { action } from "@/lib/http/action";
import { acceptKit } from "@/lib/services/kit-search/accept-kit";

export const acceptKitAction = action(async ({ ctx, input }) => {
  await acceptKit({ ctx, input: tripRefInput.parse(input) });
  revalidatePath(`/trips/${String(input.tripId)}`, "layout");
  return { message: "The kit and the staking plans are as found." };
});
