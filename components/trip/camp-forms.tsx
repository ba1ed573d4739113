"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { CheckField, NumberField, TextField } from "@/components/ui/fields";

/** Name and nights; the rest is asked on the camp's own page. */
export function NewCampForm({ action, tripId }: { readonly action: FormAction<null>; readonly tripId: string }) {
  return (
    <ActionForm action={action} className="flex max-w-[34rem] flex-col gap-5">
      <input type="hidden" name="tripId" value={tripId} />
      <div className="grid items-start gap-5 sm:grid-cols-[minmax(0,1fr)_8rem]">
        <TextField name="details.name" label="Name of the camp" maxLength={80} />
        <NumberField name="details.nights" label="Nights" defaultValue="1" inputMode="numeric" />
      </div>
      <div>
        <SubmitButton>Add the camp</SubmitButton>
      </div>
    </ActionForm>
  );
}

export function CopyCampForm({
  action,
  values,
  name,
}: {
  readonly action: FormAction<null>;
  readonly values: Readonly<Record<string, string>>;
  readonly name: string;
}) {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <Button look="quiet" onClick={() => setIsOpen(true)}>
        Copy <span className="sr-only">{name}</span>
      </Button>
      <Dialog isOpen={isOpen} onClose={() => setIsOpen(false)} title={`Copy ${name}`}>
        <p className="mb-4 text-15">Ground, wind, shelters and staking plan are copied to a new camp at the end.</p>
        <ActionForm action={action} onDone={() => setIsOpen(false)}>
          {Object.entries(values).map(([key, value]) => (
            <input key={key} type="hidden" name={key} value={value} />
          ))}
          <CheckField name="withSleepers" label="The same people in the same shelters" />
          <div className="mt-4">
            <SubmitButton>Copy the camp</SubmitButton>
          </div>
        </ActionForm>
      </Dialog>
    </>
  );
}
