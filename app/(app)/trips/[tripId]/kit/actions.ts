"use server";

import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { kitItemCreateInput, kitItemDeleteInput, kitItemUpdateInput } from "@/lib/domain/kit/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { AppError } from "@/lib/errors";
import { action } from "@/lib/http/action";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { deleteKitItem } from "@/lib/services/kit/delete-kit-item";
import { listKit } from "@/lib/services/kit/list-kit";
import { updateKitItem } from "@/lib/services/kit/update-kit-item";
import { readKitItemDetails } from "../../../_forms/read-kit-details";
import { deleteConfirmed, saveOver } from "../../../_forms/save-over";

const refresh = (tripId: unknown) => revalidatePath(`/trips/${String(tripId)}`, "layout");

export const createKitItemAction = action(async ({ ctx, input }) => {
  const details = readKitItemDetails(input.details);
  await createKitItem({ ctx, input: kitItemCreateInput.parse({ ...input, details }) });
  refresh(input.tripId);
  redirect(`/trips/${String(input.tripId)}/kit`);
});

export const addKitItemAction = action(async ({ ctx, input }) => {
  const item = kitItemCreateInput.parse(input);
  await createKitItem({ ctx, input: item });
  refresh(input.tripId);
  return { message: `${item.details.name} is in the kit.` };
});

export const updateKitItemAction = action(async ({ ctx, input }) => {
  const details = readKitItemDetails(input.details);
  await saveOver(input, (version) =>
    updateKitItem({ ctx, input: kitItemUpdateInput.parse({ ...input, details, version }) }),
  );
  refresh(input.tripId);
});

export const countKitItemAction = action<{ readonly version: number }>(async ({ ctx, input }) => {
  const kit = await listKit({ ctx, input: tripRefInput.parse(input) });
  const item = kit.find((one) => one.id === input.kitItemId);
  if (!item) throw new AppError("not-found", "It is no longer in the kit. Load the page again.");
  const details = { ...item.details, count: input.count };
  const data = await updateKitItem({ ctx, input: kitItemUpdateInput.parse({ ...input, details }) });
  refresh(input.tripId);
  return { data };
});

export const deleteKitItemAction = action(async ({ ctx, input }) => {
  await deleteConfirmed(deleteKitItem({ ctx, input: kitItemDeleteInput.parse(input) }));
  refresh(input.tripId);
});
