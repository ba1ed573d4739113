import type { Metadata } from "next";
import { LinkButton } from "@/components/ui/button";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { TextField } from "@/components/ui/fields";
import { getContext } from "@/lib/auth/session";
import { AppError } from "@/lib/errors";
import { getInvitation, type InvitationView } from "@/lib/services/invitations/get-invitation";
import { acceptInvitationAction, signOutAction, signUpWithInvitationAction } from "../../actions";
import { AuthHeading } from "../../_components/auth-heading";
import { NewPasswordField } from "../../_components/new-password-field";

export const metadata: Metadata = { title: "Invitation" };

interface InvitationPageProps {
  readonly params: Promise<{ token: string }>;
}

async function readInvitation(token: string): Promise<InvitationView | string> {
  try {
    return await getInvitation({ input: { token } });
  } catch (error) {
    if (error instanceof AppError) return error.userMessage;
    throw error;
  }
}

export default async function InvitationPage({ params }: InvitationPageProps) {
  const { token } = await params;
  const invitation = await readInvitation(token);
  const ctx = await getContext();
  if (typeof invitation === "string") {
    return (
      <>
        <AuthHeading title="This invitation can't be used">{invitation}</AuthHeading>
        <LinkButton href={ctx ? "/trips" : "/sign-in"}>{ctx ? "To your trips" : "To sign in"}</LinkButton>
      </>
    );
  }
  const { tripName, personName, email, hasAccount } = invitation;
  const path = `/invitation/${token}`;
  if (ctx && ctx.actor.email.toLowerCase() === email) {
    return (
      <>
        <AuthHeading title={`Join “${tripName}”`}>You are signed in as {email}.</AuthHeading>
        <ActionForm action={acceptInvitationAction} doneText={null}>
          <input type="hidden" name="token" value={token} />
          <SubmitButton>Join the trip</SubmitButton>
        </ActionForm>
      </>
    );
  }
  if (ctx) {
    return (
      <>
        <AuthHeading title={`Join “${tripName}”`}>
          This invitation is for {email}; you are signed in as {ctx.actor.email}. Sign out to use it.
        </AuthHeading>
        <ActionForm action={signOutAction} doneText={null}>
          <input type="hidden" name="next" value={path} />
          <SubmitButton>Sign out</SubmitButton>
        </ActionForm>
      </>
    );
  }
  if (hasAccount) {
    return (
      <>
        <AuthHeading title={`Join “${tripName}”`}>You have an account with {email}. Sign in to join.</AuthHeading>
        <LinkButton look="primary" href={`/sign-in?next=${encodeURIComponent(path)}`}>
          Sign in
        </LinkButton>
      </>
    );
  }
  return (
    <>
      <AuthHeading title={`Join “${tripName}”`}>
        Make an account for {email}. Your address counts as confirmed, since this link came to it.
      </AuthHeading>
      <ActionForm action={signUpWithInvitationAction} doneText={null} className="flex flex-col gap-4">
        <input type="hidden" name="token" value={token} />
        <input type="hidden" name="email" value={email} autoComplete="username" />
        <TextField label="Name" name="name" defaultValue={personName} autoComplete="name" required />
        <NewPasswordField label="Password" name="password" />
        <SubmitButton>Join the trip</SubmitButton>
      </ActionForm>
    </>
  );
}
