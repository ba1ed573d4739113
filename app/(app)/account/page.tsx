import type { Metadata } from "next";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { SelectField, TextField } from "@/components/ui/fields";
import { PageHeading, Section } from "@/components/ui/layout";
import { getSessionId, requireContext } from "@/lib/auth/session";
import { PAPER_SIZES } from "@/lib/domain/paper/schema";
import { FORCE_UNITS, LENGTH_UNITS, SPEED_UNITS } from "@/lib/domain/preferences";
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
      </Section>
      <Section title="Where you are signed in">
        <SessionList sessions={sessions} currentId={await getSessionId()} />
      </Section>
      <Section title="Delete the account">
        <DeleteAccount />
      </Section>
    </PlainPage>
  );
}
