"use server";

import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { invitationAnswerInput } from "@/lib/domain/answer/schema";
import { answerInvitation } from "@/lib/services/answers/answer-invitation";
import { acceptInvitation } from "@/lib/services/invitations/accept-invitation";
import { signUpWithInvitation } from "@/lib/services/invitations/sign-up-with-invitation";
import { callAuth } from "@/lib/auth/call-auth";
import { toOwnPath } from "@/lib/auth/next-path";
import {
  emailFormSchema,
  newPasswordFormSchema,
  signInFormSchema,
  signUpFormSchema,
  signUpWithInvitationFormSchema,
  tokenFormSchema,
} from "@/lib/domain/account/schema";
import { action } from "@/lib/http/action";
import { publicAction } from "@/lib/http/public-action";

export const signInAction = publicAction(async ({ input }) => {
  const { email, password } = signInFormSchema.parse(input);
  await callAuth("/sign-in/email", { body: { email, password } });
  redirect(toOwnPath(input.next));
});

export const requestSignInLinkAction = publicAction(async ({ input }) => {
  await callAuth("/sign-in/magic-link", { body: emailFormSchema.parse(input) });
  redirect("/check-mail?for=link");
});

export const signInByLinkAction = publicAction(async ({ input }) => {
  const { token } = tokenFormSchema.parse(input);
  await callAuth(`/magic-link/verify?token=${encodeURIComponent(token)}`, { method: "GET" });
  redirect("/trips");
});

export const signUpAction = publicAction(async ({ input }) => {
  await callAuth("/sign-up/email", { body: signUpFormSchema.parse(input), passwordField: "password" });
  redirect("/check-mail?for=confirm");
});

export const requestResetAction = publicAction(async ({ input }) => {
  await callAuth("/request-password-reset", { body: emailFormSchema.parse(input) });
  redirect("/check-mail?for=reset");
});

export const resetPasswordAction = publicAction(async ({ input }) => {
  const { token, password } = newPasswordFormSchema.parse(input);
  await callAuth("/reset-password", { body: { token, newPassword: password }, passwordField: "password" });
  redirect("/sign-in?done=reset");
});

export const verifyAction = publicAction(async ({ input }) => {
  const { token } = tokenFormSchema.parse(input);
  await callAuth(`/verify-email?token=${encodeURIComponent(token)}`, { method: "GET" });
  redirect("/sign-in?done=verified");
});

export const signOutAction = publicAction(async ({ input }) => {
  await callAuth("/sign-out", { body: {} });
  redirect(input.next ? toOwnPath(input.next) : "/sign-in?done=signed-out");
});

export const acceptInvitationAction = action(async ({ ctx, input }) => {
  const { tripId } = await acceptInvitation({ ctx, input: tokenFormSchema.parse(input) });
  redirect(`/trips/${tripId}`);
});

export const answerInvitationAction = publicAction(async ({ input }) => {
  const { token, value, note } = invitationAnswerInput.parse(input);
  await answerInvitation({ input: { token, value, note } });
  revalidatePath(`/invitation/${token}`);
  return { message: "Thank you. The leader sees your answer." };
});

export const signUpWithInvitationAction = publicAction(async ({ input }) => {
  const form = signUpWithInvitationFormSchema.parse(input);
  const { tripId, email } = await signUpWithInvitation({ input: form });
  if (form.password === "") {
    await callAuth("/sign-in/magic-link", { body: { email } });
    redirect("/check-mail?for=link");
  }
  await callAuth("/sign-in/email", { body: { email, password: form.password } });
  redirect(`/trips/${tripId}`);
});
