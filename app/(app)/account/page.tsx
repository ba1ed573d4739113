import type { Metadata } from "next";
import Link from "next/link";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { buttonClass } from "@/components/ui/button";
import { SelectField, TextField } from "@/components/ui/fields";
import { PageHeading, Section } from "@/components/ui/layout";
import { getSessionId, requireContext } from "@/lib/auth/session";
import { PAPER_SIZES } from "@/lib/domain/paper/schema";
import { FORCE_UNITS, LENGTH_UNITS, SPEED_UNITS } from "@/lib/domain/preferences";
import { hasPassword } from "@/lib/services/account/has-password";
import { listSessions } from "@/lib/services/account/list-sessions";
import { getPreferences } from "@/lib/services/preferences/get-preferences";
import { PlainPage } from "../_shell/plain-page";
import { DeleteAccount } from "./_components/delete-account";
import { SessionList } from "./_components/session-list";
import { changePasswordAction, saveNameAction, savePreferencesAction, signOutAction } from "./actions";

export const metadata: Metadata = { title: "Account and units" };

const toOptions = (values: readonly string[], names: Readonly<Record<string, string>> = {}) =>
  values.map((value) => ({ value, label: names[value] ?? value }));

export default async function AccountPage() {
  const ctx = await requireContext();
  const preferences = await getPreferences({ ctx });
  const sessions = await listSessions({ ctx });
  const isByPassword = await hasPassword({ ctx });
  return (
    <PlainPage>
      <PageHeading title="Account and units" lead={ctx.actor.email}>
        <ActionForm action={signOutAction} doneText={null}>
          <SubmitButton look="outline">Sign out</SubmitButton>
        </ActionForm>
      </PageHeading>
      <Section title="Units and paper" lead="For you alone: on the screen and on what you print.">
        <ActionForm action={savePreferencesAction} className="max-w-[40rem]">
          <div className="mb-4 grid gap-4 sm:grid-cols-2">
            <SelectField
              label="Wind"
              name="speedUnit"
              options={toOptions(SPEED_UNITS)}
              defaultValue={preferences.speedUnit}
            />
            <SelectField
              label="Forces"
              name="forceUnit"
              options={toOptions(FORCE_UNITS)}
              defaultValue={preferences.forceUnit}
            />
            <SelectField
              label="Lengths"
              name="lengthUnit"
              options={toOptions(LENGTH_UNITS)}
              defaultValue={preferences.lengthUnit}
            />
            <SelectField
              label="Paper"
              name="paperSize"
              options={toOptions(PAPER_SIZES, { LETTER: "US Letter" })}
              defaultValue={preferences.paperSize}
            />
          </div>
          <SubmitButton>Save</SubmitButton>
        </ActionForm>
      </Section>
      <Section title="Name">
        <ActionForm action={saveNameAction} className="flex max-w-[26rem] flex-col gap-4">
          <TextField label="Name" name="name" defaultValue={ctx.actor.name} autoComplete="name" required />
          <SubmitButton>Save</SubmitButton>
        </ActionForm>
      </Section>
      <Section title="Password">
        {isByPassword ? (
          <ActionForm action={changePasswordAction} className="flex max-w-[26rem] flex-col gap-4">
            <input type="hidden" name="username" value={ctx.actor.email} autoComplete="username" />
            <TextField
              label="Password now"
              name="currentPassword"
              type="password"
              autoComplete="current-password"
              required
            />
            <TextField
              label="New password"
              name="newPassword"
              type="password"
              autoComplete="new-password"
              required
              hint="At least 8 characters, better 15. Every other device is signed out."
            />
            <SubmitButton>Change the password</SubmitButton>
          </ActionForm>
        ) : (
          <p className="max-w-[46rem] text-15">
            You have none: you sign in by links to {ctx.actor.email}.{" "}
            <Link href="/forgot-password" className="text-spruce underline">
              Choose one
            </Link>
          </p>
        )}
      </Section>
      <Section title="Where you are signed in">
        <SessionList sessions={sessions} currentId={await getSessionId()} />
      </Section>
      <Section
        title="Your data"
        lead="Everything that is kept about you, your trips' own details included, as one file (JSON)."
      >
        <a href="/api/account/export" className={buttonClass("outline")}>
          Save my data
        </a>
      </Section>
      <Section title="Delete the account">
        <DeleteAccount hasPassword={isByPassword} />
      </Section>
    </PlainPage>
  );
}
