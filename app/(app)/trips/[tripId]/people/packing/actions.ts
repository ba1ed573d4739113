"use server";

import { revalidatePath } from "next/cache";
import {
  carrySaveInput,
  groupThingsSaveInput,
  limitSaveInput,
  packItemsSaveInput,
  shelterSplitSaveInput,
} from "@/lib/domain/pack/schema";
import { seasonAddInput } from "@/lib/domain/pack/seasons";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { action } from "@/lib/http/action";
import { addSeasonItems } from "@/lib/services/pack/add-season-items";
import { assignCarry } from "@/lib/services/pack/assign-carry";
import { saveGroupThings } from "@/lib/services/pack/save-group-things";
import { savePackItems } from "@/lib/services/pack/save-pack-items";
import { saveLimit } from "@/lib/services/pack/save-person-load";
import { saveShelterSplit } from "@/lib/services/pack/save-shelter-split";
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

export const saveGroupThingsAction = action(async ({ ctx, input }) => {
  await saveGroupThings({ ctx, input: groupThingsSaveInput.parse(input) });
  refresh(input.tripId);
});

export const saveShelterSplitAction = action(async ({ ctx, input }) => {
  await saveShelterSplit({ ctx, input: shelterSplitSaveInput.parse(input) });
  refresh(input.tripId);
});

export const saveLimitAction = action(async ({ ctx, input }) => {
  await saveLimit({ ctx, input: limitSaveInput.parse(input) });
  refresh(input.tripId);
});

export const addSeasonItemsAction = action(async ({ ctx, input }) => {
  const { added } = await addSeasonItems({ ctx, input: seasonAddInput.parse(input) });
  refresh(input.tripId);
  return { message: added === 0 ? "All of it is on the list already." : `${added} lines added.` };
});
