"use server";

import { redirect } from "next/navigation";
import { tripCopyInput, tripCreateInput } from "@/lib/domain/trip/schema";
import { action } from "@/lib/http/action";
import { copyTrip } from "@/lib/services/trips/copy-trip";
import { createTrip } from "@/lib/services/trips/create-trip";

export const createTripAction = action(async ({ ctx, input }) => {
  const { tripId } = await createTrip({ ctx, input: tripCreateInput.parse(input) });
  redirect(`/trips/${tripId}`);
});

export const copyTripAction = action(async ({ ctx, input }) => {
  const { tripId } = await copyTrip({ ctx, input: tripCopyInput.parse(input) });
  redirect(`/trips/${tripId}`);
});
