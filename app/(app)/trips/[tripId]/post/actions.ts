"use server";

import { revalidatePath } from "next/cache";
import { callOffInput, messageRefInput, plannedSendRefInput, templateRefInput } from "@/lib/domain/post/schema";
import { plural } from "@/lib/format/words";
import { action } from "@/lib/http/action";
import { cancelPlannedSend } from "@/lib/services/planned-sends/cancel-planned-send";
import { callOffTrip } from "@/lib/services/post/call-off-trip";
import { deleteTemplate } from "@/lib/services/templates/delete-template";
import { retryMessage } from "@/lib/services/post/retry-message";

export const retryMessageAction = action(async ({ ctx, input }) => {
  const message = messageRefInput.parse(input);
  await retryMessage({ ctx, input: message });
  revalidatePath(`/trips/${message.tripId}/post`);
  return { message: "It is tried again now." };
});

export const cancelPlannedSendAction = action(async ({ ctx, input }) => {
  const planned = plannedSendRefInput.parse(input);
  await cancelPlannedSend({ ctx, input: planned });
  revalidatePath(`/trips/${planned.tripId}/post`);
  return { message: "It does not go out." };
});

export const deleteTemplateAction = action(async ({ ctx, input }) => {
  const template = templateRefInput.parse(input);
  await deleteTemplate({ ctx, input: template });
  revalidatePath(`/trips/${template.tripId}`, "layout");
});

export const callOffTripAction = action(async ({ ctx, input }) => {
  const given = callOffInput.parse(input);
  const { count } = await callOffTrip({ ctx, input: given });
  revalidatePath(`/trips/${given.tripId}`, "layout");
  return { message: `${plural(count, "person is", "people are")} told by mail.` };
});
