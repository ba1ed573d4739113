"use server";

import { revalidatePath } from "next/cache";
import {
  campsFromPlacesInput,
  drawRouteInput,
  placeCampInput,
  routeRefInput,
  routeSettingsInput,
} from "@/lib/domain/route/schema";
import { action } from "@/lib/http/action";
import { createCampsFromPlaces } from "@/lib/services/route/create-camps-from-places";
import { deleteRoute } from "@/lib/services/route/delete-route";
import { drawRoute } from "@/lib/services/route/draw-route";
import { placeCamp } from "@/lib/services/route/place-camp";
import { saveRouteSettings } from "@/lib/services/route/save-route-settings";
import { readRouteSettings } from "../../../_forms/read-route-settings";
import { saveOver } from "../../../_forms/save-over";

const refresh = (tripId: unknown) => revalidatePath(`/trips/${String(tripId)}`, "layout");

export const saveRouteSettingsAction = action(async ({ ctx, input }) => {
  const read = readRouteSettings(input);
  await saveOver(input, (version) =>
    saveRouteSettings({ ctx, input: routeSettingsInput.parse({ ...input, ...read, version }) }),
  );
  refresh(input.tripId);
});

export const placeCampAction = action(async ({ ctx, input }) => {
  await placeCamp({ ctx, input: placeCampInput.parse(input) });
  refresh(input.tripId);
});

export const drawRouteAction = action(async ({ ctx, input }) => {
  await drawRoute({ ctx, input: drawRouteInput.parse(input) });
  refresh(input.tripId);
});

export const deleteRouteAction = action(async ({ ctx, input }) => {
  await deleteRoute({ ctx, input: routeRefInput.parse(input) });
  refresh(input.tripId);
  return { message: "The line is deleted." };
});

export const createCampsFromPlacesAction = action(async ({ ctx, input }) => {
  const { campIds } = await createCampsFromPlaces({ ctx, input: campsFromPlacesInput.parse(input) });
  refresh(input.tripId);
  return { message: `${campIds.length} camps added.` };
});
