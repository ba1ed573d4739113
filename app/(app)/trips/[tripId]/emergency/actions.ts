"use server";

import { revalidatePath } from "next/cache";
import { emergencyPlanInput, emergencySendInput } from "@/lib/domain/emergency/schema";
import { action } from "@/lib/http/action";
import { saveEmergencyPlan } from "@/lib/services/emergency/save-emergency-plan";
import { sendEmergencyPlan, tellBackSafely } from "@/lib/services/emergency/send-emergency-plan";
import { saveOver } from "../../../_forms/save-over";

const refresh = (tripId: unknown) => revalidatePath(`/trips/${String(tripId)}`, "layout");

export const saveEmergencyPlanAction = action(async ({ ctx, input }) => {
  await saveOver(input, (version) =>
    saveEmergencyPlan({ ctx, input: emergencyPlanInput.parse({ ...input, version }) }),
  );
  refresh(input.tripId);
  return { message: "Saved. It goes to nobody until you send it." };
});

export const sendEmergencyPlanAction = action(async ({ ctx, input }) => {
  const { to } = await sendEmergencyPlan({ ctx, input: emergencySendInput.parse(input) });
  refresh(input.tripId);
  return { message: `On its way to ${to}.` };
});

export const tellBackSafelyAction = action(async ({ ctx, input }) => {
  const { to } = await tellBackSafely({ ctx, input: emergencySendInput.parse(input) });
  refresh(input.tripId);
  return { message: `${to} is told that everybody is back.` };
});
