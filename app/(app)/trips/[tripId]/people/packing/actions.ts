"use server";

import { revalidatePath } from "next/cache";
import { carrySaveInput, packItemsSaveInput } from "@/lib/domain/pack/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { action } from "@/lib/http/action";
import { assignCarry } from "@/lib/services/pack/assign-carry";
import { savePackItems } from "@/lib/services/pack/save-pack-items";
import { shareOutEvenly } from "@/lib/services/pack/share-out-evenly";

const refresh = (tripId: unknown) => revalidatePath(`/trips/${String(tripId)}`, "layout");

export const savePackItemsAction = action(async ({ ctx, input }) => {
  await savePackItems({ ctx, input: packItemsSaveInput.parse(input) });
  refresh(input.tripId);
});

export const assignCarryAction = action(async ({ ctx, input }) => {
  await assignCarry({ ctx, input: carrySaveInput.parse(input) });
  refresh(input.tripId);
});

export const shareOutEvenlyAction = action(async ({ ctx, input }) => {
  await shareOutEvenly({ ctx, input: tripRefInput.parse(input) });
  refresh(input.tripId);
  return { message: "Shared out." };
});
