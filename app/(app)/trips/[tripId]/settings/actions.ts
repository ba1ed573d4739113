"use server";

import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { tripDeleteInput, tripUpdateInput } from "@/lib/domain/trip/schema";
import { action } from "@/lib/http/action";
import { deleteTrip } from "@/lib/services/trips/delete-trip";
import { updateTrip } from "@/lib/services/trips/update-trip";
import { saveOver } from "../../../_forms/save-over";

export const updateTripAction = action(async ({ ctx, input }) => {
  await saveOver(input, (version) => updateTrip({ ctx, input: tripUpdateInput.parse({ ...input, version }) }));
  revalidatePath(`/trips/${String(input.tripId)}`, "layout");
});

export const deleteTripAction = action(async ({ ctx, input }) => {
  await deleteTrip({ ctx, input: tripDeleteInput.parse(input) });
  redirect("/trips");
});
