"use server";

import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import {
  blankCamp,
  campCopyInput,
  campCreateInput,
  campDeleteInput,
  campReorderInput,
  campUpdateInput,
} from "@/lib/domain/camp/schema";
import { action } from "@/lib/http/action";
import { copyCamp } from "@/lib/services/camps/copy-camp";
import { createCamp } from "@/lib/services/camps/create-camp";
import { deleteCamp } from "@/lib/services/camps/delete-camp";
import { reorderCamps } from "@/lib/services/camps/reorder-camps";
import { updateCamp } from "@/lib/services/camps/update-camp";
import { readCampDetails } from "../../../_forms/read-camp-details";
import { deleteConfirmed, saveOver } from "../../../_forms/save-over";
import { asTyped } from "../../../_forms/typed-values";

const pageOf = (tripId: unknown) => `/trips/${String(tripId)}`;

export const createCampAction = action(async ({ ctx, input }) => {
  const details = { ...blankCamp(""), ...asTyped(input.details) };
  const { tripId } = input;
  const { campId } = await createCamp({ ctx, input: campCreateInput.parse({ tripId, details }) });
  revalidatePath(pageOf(tripId), "layout");
  redirect(`${pageOf(tripId)}/camps/${campId}/place`);
});

export const updateCampAction = action(async ({ ctx, input }) => {
  const details = readCampDetails(input);
  const { lifted } = await saveOver(input, (version) =>
    updateCamp({ ctx, input: campUpdateInput.parse({ ...input, details, version }) }),
  );
  revalidatePath(pageOf(input.tripId), "layout");
  return { message: lifted > 0 ? `${lifted} placed anchors are no longer found here and were lifted.` : "" };
});

export const copyCampAction = action(async ({ ctx, input }) => {
  await copyCamp({ ctx, input: campCopyInput.parse(input) });
  revalidatePath(pageOf(input.tripId), "layout");
  return { message: "Copied to the end." };
});

export const reorderCampsAction = action(async ({ ctx, input }) => {
  await reorderCamps({ ctx, input: campReorderInput.parse(input) });
  revalidatePath(pageOf(input.tripId), "layout");
});

export const deleteCampAction = action(async ({ ctx, input }) => {
  await deleteConfirmed(deleteCamp({ ctx, input: campDeleteInput.parse(input) }));
  revalidatePath(pageOf(input.tripId), "layout");
});
