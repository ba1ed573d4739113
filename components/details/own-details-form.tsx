"use client";

import { ActionForm, SubmitButton, useFieldErrors, type FormAction } from "@/components/ui/action-form";
import { FieldError, TextArea, TextField } from "@/components/ui/fields";
import type { OwnDetailsView } from "@/lib/domain/people-views";

const CONTACT_LINES = [0, 1, 2] as const;

/** Contact, emergency contacts, health and food of the person themselves. */
export function OwnDetailsForm({
  action,
  tripId,
  own,
}: {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly own: OwnDetailsView;
}) {
  const { details } = own;
  return (
    <ActionForm action={action} className="flex max-w-[46rem] flex-col gap-6" autoComplete="off">
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="version:number" value={own.version} />
      <div className="max-w-[20rem]">
        <TextField name="phone" label="Your telephone" type="tel" maxLength={30} defaultValue={details.phone} />
      </div>
      <fieldset className="flex flex-col gap-4">
        <legend className="mb-1 text-15 font-semibold">Whom to call in an emergency</legend>
        {CONTACT_LINES.map((index) => {
          const contact = details.emergencyContacts[index];
          const name = `emergencyContacts.${index}`;
          return (
            <div key={index} className="grid items-end gap-4 border-t border-hair pt-3 sm:grid-cols-3">
              <TextField
                name={`${name}.name`}
                label={`Name ${index + 1}`}
                maxLength={80}
                defaultValue={contact?.name}
              />
              <TextField
                name={`${name}.phone`}
                label={`Telephone ${index + 1}`}
                type="tel"
                maxLength={30}
                defaultValue={contact?.phone}
              />
              <TextField
                name={`${name}.relation`}
                label={`Who they are ${index + 1}`}
                maxLength={80}
                defaultValue={contact?.relation}
              />
            </div>
          );
        })}
      </fieldset>
      <TextArea
        name="health"
        label="Health"
        rows={4}
        maxLength={2000}
        defaultValue={details.health}
        hint="What a leader has to know: medicines, allergies, what to do. May stay empty."
      />
      <TextArea
        name="diet"
        label="Food"
        rows={2}
        maxLength={500}
        defaultValue={details.diet}
        hint="What you do not eat. May stay empty."
      />
      <Consent text={own.consentText} isGiven={own.consent?.text === own.consentText} />
      <div>
        <SubmitButton>Save</SubmitButton>
      </div>
    </ActionForm>
  );
}

function Consent({ text, isGiven }: { readonly text: string; readonly isGiven: boolean }) {
  const errors = useFieldErrors("hasConsent");
  return (
    <div>
      <label className="flex items-start gap-3 py-2">
        <input type="hidden" name="hasConsent:boolean" value="false" />
        <input
          type="checkbox"
          name="hasConsent:boolean"
          value="true"
          defaultChecked={isGiven}
          aria-invalid={errors.length > 0 || undefined}
          className="mt-0.5 size-5 shrink-0 accent-spruce"
        />
        <span className="text-15">{text}</span>
      </label>
      <FieldError errors={errors} />
    </div>
  );
}
