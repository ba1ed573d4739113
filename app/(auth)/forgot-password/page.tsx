import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { TextField } from "@/components/ui/fields";
import { requestResetAction } from "../actions";
import { AuthHeading } from "../_components/auth-heading";

export const metadata: Metadata = { title: "Forgotten password" };

export default function ForgotPasswordPage() {
  return (
    <>
      <AuthHeading title="Choose a new password">You get a mail with a link that works for one hour.</AuthHeading>
      <ActionForm action={requestResetAction} doneText={null} className="flex flex-col gap-4">
        <TextField label="E-mail" name="email" type="email" autoComplete="username" required />
        <SubmitButton>Send the link</SubmitButton>
      </ActionForm>
      <p className="mt-6">
        <Link href="/sign-in" className="inline-flex min-h-11 items-center text-spruce underline">
          Back to sign in
        </Link>
      </p>
    </>
  );
}
