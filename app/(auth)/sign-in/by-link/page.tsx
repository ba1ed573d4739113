import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { TextField } from "@/components/ui/fields";
import { requestSignInLinkAction, signInByLinkAction } from "../../actions";
import { AuthHeading } from "../../_components/auth-heading";

export const metadata: Metadata = { title: "Sign in by a link" };

interface ByLinkPageProps {
  readonly searchParams: Promise<{ token?: string | string[] }>;
}

/** With a button, so that a mail scanner that opens every link uses none up. */
export default async function SignInByLinkPage({ searchParams }: ByLinkPageProps) {
  const { token } = await searchParams;
  if (typeof token === "string" && token !== "") {
    return (
      <>
        <AuthHeading title="Sign in">The link from your mail signs this device in.</AuthHeading>
        <ActionForm action={signInByLinkAction} doneText={null}>
          <input type="hidden" name="token" value={token} />
          <SubmitButton>Sign in</SubmitButton>
        </ActionForm>
        <p className="mt-6">
          <Link href="/sign-in/by-link" className="inline-flex min-h-11 items-center text-spruce underline">
            Ask for a new link
          </Link>
        </p>
      </>
    );
  }
  return (
    <>
      <AuthHeading title="Sign in by a link">
        You get a mail with a link that works once, for 15 minutes. No password is needed.
      </AuthHeading>
      <ActionForm action={requestSignInLinkAction} doneText={null} className="flex flex-col gap-4">
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
