import type { Metadata } from "next";
import { LinkButton } from "@/components/ui/button";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { resetPasswordAction } from "../actions";
import { AuthHeading } from "../_components/auth-heading";
import { NewPasswordField } from "../_components/new-password-field";

export const metadata: Metadata = { title: "New password" };

interface ResetPasswordPageProps {
  readonly searchParams: Promise<{ token?: string | string[] }>;
}

export default async function ResetPasswordPage({ searchParams }: ResetPasswordPageProps) {
  const { token } = await searchParams;
  if (typeof token !== "string" || token === "") {
    return (
      <>
        <AuthHeading title="This link is not complete">Open it from the mail, or ask for a new one.</AuthHeading>
        <LinkButton href="/forgot-password">Ask for a new link</LinkButton>
      </>
    );
  }
  return (
    <>
      <AuthHeading title="Choose a new password">It signs you out everywhere else.</AuthHeading>
      <ActionForm action={resetPasswordAction} doneText={null} className="flex flex-col gap-4">
        <input type="hidden" name="token" value={token} />
        <NewPasswordField label="New password" name="password" />
        <SubmitButton>Set the password</SubmitButton>
      </ActionForm>
    </>
  );
}
