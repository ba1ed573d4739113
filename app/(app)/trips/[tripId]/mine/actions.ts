"use server";

import { revalidatePath } from "next/cache";
import { packTickInput } from "@/lib/domain/pack/schema";
import { action } from "@/lib/http/action";
import { tickPackItem } from "@/lib/services/pack/tick-pack-item";

export const tickPackItemAction = action(async ({ ctx, input }) => {
  await tickPackItem({ ctx, input: packTickInput.parse(input) });
  revalidatePath(`/trips/${String(input.tripId)}/mine`);
});
