"use server";

import { revalidatePath } from "next/cache";
import { pitchCreateInput, pitchDeleteInput, pitchUpdateInput, sleepersSaveInput } from "@/lib/domain/shelter/schema";
import { action } from "@/lib/http/action";
import { createPitch } from "@/lib/services/pitches/create-pitch";
import { deletePitch } from "@/lib/services/pitches/delete-pitch";
import { updatePitch } from "@/lib/services/pitches/update-pitch";
import { saveSleepers } from "@/lib/services/sleepers/save-sleepers";
import { readPitchDetails } from "../../../../../_forms/read-shelter-details";
import { deleteConfirmed, saveOver } from "../../../../../_forms/save-over";

const refresh = (tripId: unknown) => revalidatePath(`/trips/${String(tripId)}`, "layout");

export const createPitchAction = action(async ({ ctx, input }) => {
  await createPitch({ ctx, input: pitchCreateInput.parse(input) });
  refresh(input.tripId);
  return { message: "Pitched here." };
});

export const updatePitchAction = action(async ({ ctx, input }) => {
  const details = readPitchDetails(input.details, input.lengthUnit);
  await saveOver(input, (version) =>
    updatePitch({ ctx, input: pitchUpdateInput.parse({ ...input, details, version }) }),
  );
  refresh(input.tripId);
});

export const deletePitchAction = action(async ({ ctx, input }) => {
  await deleteConfirmed(deletePitch({ ctx, input: pitchDeleteInput.parse(input) }));
  refresh(input.tripId);
});

export const saveSleepersAction = action(async ({ ctx, input }) => {
  await saveSleepers({ ctx, input: sleepersSaveInput.parse(input) });
  refresh(input.tripId);
});
