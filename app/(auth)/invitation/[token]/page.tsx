import type { Metadata } from "next";
import type { ReactNode } from "react";
import { LinkButton } from "@/components/ui/button";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { TextField } from "@/components/ui/fields";
import { getContext } from "@/lib/auth/session";
import { AppError } from "@/lib/errors";
import { getInvitation, type InvitationView } from "@/lib/services/invitations/get-invitation";
import { AnswerForm } from "@/components/answers/answer-form";
import { describeOwnAnswer } from "@/components/answers/answer-words";
import {
  acceptInvitationAction,
  answerInvitationAction,
  signOutAction,
  signUpWithInvitationAction,
} from "../../actions";
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
  const { tripName, dates, own } = invitation;
  return (
    <>
      <AuthHeading title={tripName}>
        {dates}. {describeOwnAnswer(own)}
      </AuthHeading>
      {!own.isCalledOff && <AnswerForm action={answerInvitationAction} hidden={{ token }} own={own} />}
      {own.answer?.value !== "no" && !own.isCalledOff && (
        <div className="mt-8 border-t border-hair pt-6">
          <Join invitation={invitation} token={token} signedInAs={ctx?.actor.email.toLowerCase() ?? null} />
        </div>
      )}
    </>
  );
}

/** The way onto the trip: with the account that is signed in, another that has to sign in, or a new one. */
function Join({
  invitation: { personName, email, hasAccount },
  token,
  signedInAs,
}: {
  readonly invitation: InvitationView;
  readonly token: string;
  readonly signedInAs: string | null;
}) {
  const path = `/invitation/${token}`;
  if (signedInAs === email) {
    return (
      <>
        <JoinHeading>You are signed in as {email}.</JoinHeading>
        <ActionForm action={acceptInvitationAction} doneText={null}>
          <input type="hidden" name="token" value={token} />
          <SubmitButton>Join the trip</SubmitButton>
        </ActionForm>
      </>
    );
  }
  if (signedInAs !== null) {
    return (
      <>
        <JoinHeading>
          This invitation is for {email}; you are signed in as {signedInAs}. Sign out to use it.
        </JoinHeading>
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
        <JoinHeading>You have an account with {email}. Sign in to join.</JoinHeading>
        <LinkButton look="primary" href={`/sign-in?next=${encodeURIComponent(path)}`}>
          Sign in
        </LinkButton>
      </>
    );
  }
  return (
    <>
      <JoinHeading>
        Make an account for {email} to see where you sleep, how your shelter is pitched and what you carry. Your address
        counts as confirmed, since this link came to it.
      </JoinHeading>
      <ActionForm action={signUpWithInvitationAction} doneText={null} className="flex flex-col gap-4">
        <input type="hidden" name="token" value={token} />
        <input type="hidden" name="email" value={email} autoComplete="username" />
        <TextField label="Name" name="name" defaultValue={personName} autoComplete="name" required />
        <NewPasswordField label="Password" name="password" isOptional />
        <SubmitButton>Join the trip</SubmitButton>
      </ActionForm>
    </>
  );
}

function JoinHeading({ children }: { readonly children: ReactNode }) {
  return (
    <>
      <h2 className="text-18 font-bold">Join the trip</h2>
      <p className="mt-1 mb-4 text-15 text-pencil">{children}</p>
    </>
  );
}
