"use server";

import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import {
  shelterCreateInput,
  shelterDeleteInput,
  shelterRefInput,
  shelterUpdateInput,
} from "@/lib/domain/shelter/schema";
import { action } from "@/lib/http/action";
import { copyShelter } from "@/lib/services/shelters/copy-shelter";
import { createShelter } from "@/lib/services/shelters/create-shelter";
import { deleteShelter } from "@/lib/services/shelters/delete-shelter";
import { updateShelter } from "@/lib/services/shelters/update-shelter";
import { readShelterDetails } from "../../../_forms/read-shelter-details";
import { deleteConfirmed, saveOver } from "../../../_forms/save-over";

const refresh = (tripId: unknown) => revalidatePath(`/trips/${String(tripId)}`, "layout");

export const createShelterAction = action(async ({ ctx, input }) => {
  const details = readShelterDetails(input.details, input.lengthUnit);
  await createShelter({ ctx, input: shelterCreateInput.parse({ ...input, details }) });
  refresh(input.tripId);
  redirect(`/trips/${String(input.tripId)}/shelters`);
});

export const updateShelterAction = action(async ({ ctx, input }) => {
  const details = readShelterDetails(input.details, input.lengthUnit);
  await saveOver(input, (version) =>
    updateShelter({ ctx, input: shelterUpdateInput.parse({ ...input, details, version }) }),
  );
  refresh(input.tripId);
});

export const copyShelterAction = action(async ({ ctx, input }) => {
  await copyShelter({ ctx, input: shelterRefInput.parse(input) });
  refresh(input.tripId);
  return { message: "Copied." };
});

export const deleteShelterAction = action(async ({ ctx, input }) => {
  await deleteConfirmed(deleteShelter({ ctx, input: shelterDeleteInput.parse(input) }));
  refresh(input.tripId);
});
