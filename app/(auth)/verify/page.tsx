import type { Metadata } from "next";
import { LinkButton } from "@/components/ui/button";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { verifyAction } from "../actions";
import { AuthHeading } from "../_components/auth-heading";

export const metadata: Metadata = { title: "Confirm your address" };

interface VerifyPageProps {
  readonly searchParams: Promise<{ token?: string | string[] }>;
}

/** With a button, so that a mail scanner that opens every link confirms nothing. */
export default async function VerifyPage({ searchParams }: VerifyPageProps) {
  const { token } = await searchParams;
  if (typeof token !== "string" || token === "") {
    return (
      <>
        <AuthHeading title="This link is not complete">
          Open it from the mail. Signing in sends a new one while your address is not confirmed.
        </AuthHeading>
        <LinkButton href="/sign-in">To sign in</LinkButton>
      </>
    );
  }
  return (
    <>
      <AuthHeading title="Confirm your address">
        Only if it was you who made the account. If not, close this page: nothing happens.
      </AuthHeading>
      <ActionForm action={verifyAction} doneText={null}>
        <input type="hidden" name="token" value={token} />
        <SubmitButton>Confirm my address</SubmitButton>
      </ActionForm>
    </>
  );
}
