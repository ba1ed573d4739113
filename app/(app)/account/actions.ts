"use server";

import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { callAuth } from "@/lib/auth/call-auth";
import {
  changePasswordFormSchema,
  deleteAccountFormSchema,
  deleteAccountWithoutPasswordSchema,
  nameFormSchema,
  sessionRefInput,
} from "@/lib/domain/account/schema";
import { preferencesSchema } from "@/lib/domain/preferences";
import { action } from "@/lib/http/action";
import { hasPassword } from "@/lib/services/account/has-password";
import { endSession } from "@/lib/services/account/end-session";
import { savePreferences } from "@/lib/services/preferences/save-preferences";

export const saveNameAction = action(async ({ input }) => {
  await callAuth("/update-user", { body: nameFormSchema.parse(input) });
  revalidatePath("/account");
  return { message: "Saved. On trips you keep the name that the leader entered." };
});

export const changePasswordAction = action(async ({ input }) => {
  await callAuth("/change-password", { body: changePasswordFormSchema.parse(input), passwordField: "newPassword" });
  revalidatePath("/account");
  return { message: "Your new password is set. Every other device is signed out." };
});

export const savePreferencesAction = action(async ({ ctx, input }) => {
  await savePreferences({ ctx, input: preferencesSchema.parse(input) });
  revalidatePath("/", "layout");
  return { message: "Saved." };
});

export const endSessionAction = action(async ({ ctx, input }) => {
  await endSession({ ctx, input: sessionRefInput.parse(input) });
  revalidatePath("/account");
  return { message: "That device is signed out." };
});

export const signOutAction = action(async () => {
  await callAuth("/sign-out", { body: {} });
  redirect("/sign-in?done=signed-out");
});

export const deleteAccountAction = action(async ({ ctx, input }) => {
  const schema = (await hasPassword({ ctx })) ? deleteAccountFormSchema : deleteAccountWithoutPasswordSchema;
  await callAuth("/delete-user", { body: schema.parse(input) });
  redirect("/sign-in?done=deleted");
});
