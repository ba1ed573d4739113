"use server";

import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { campAlternativeInput, campRefInput } from "@/lib/domain/camp/schema";
import { forecastAcceptInput, forecastFetchInput } from "@/lib/domain/forecast/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { AppError } from "@/lib/errors";
import { action } from "@/lib/http/action";
import { createAlternative } from "@/lib/services/camps/create-alternative";
import { switchToAlternative } from "@/lib/services/camps/switch-to-alternative";
import { acceptForecast } from "@/lib/services/forecast/accept-forecast";
import { checkAllCamps } from "@/lib/services/forecast/check-all-camps";
import { fetchForecast } from "@/lib/services/forecast/fetch-forecast";

const pageOf = (tripId: unknown) => `/trips/${String(tripId)}`;

export const fetchForecastAction = action(async ({ ctx, input }) => {
  const { outcome, sentence } = await fetchForecast({ ctx, input: forecastFetchInput.parse(input) });
  revalidatePath(pageOf(input.tripId), "layout");
  if (outcome === "failed") throw new AppError("unavailable", `${sentence} Nothing of the plan has changed.`);
  return { message: sentence };
});

export const checkAllCampsAction = action(async ({ ctx, input }) => {
  const { sentence } = await checkAllCamps({ ctx, input: tripRefInput.parse(input) });
  revalidatePath(pageOf(input.tripId), "layout");
  return { message: sentence };
});

export const acceptForecastAction = action(async ({ ctx, input }) => {
  await acceptForecast({ ctx, input: forecastAcceptInput.parse(input) });
  revalidatePath(pageOf(input.tripId), "layout");
  return { message: "Accepted. The plan now stands on this forecast." };
});

export const createAlternativeAction = action(async ({ ctx, input }) => {
  const { campId } = await createAlternative({ ctx, input: campAlternativeInput.parse(input) });
  revalidatePath(pageOf(input.tripId), "layout");
  redirect(`${pageOf(input.tripId)}/camps/${campId}/place`);
});

export const switchToAlternativeAction = action(async ({ ctx, input }) => {
  const { name, replaced } = await switchToAlternative({ ctx, input: campRefInput.parse(input) });
  revalidatePath(pageOf(input.tripId), "layout");
  return { message: `${name} has the nights now; ${replaced} is kept beside.` };
});
