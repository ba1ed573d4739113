"use client";

import { useRef, useState } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { ChoiceField, TextField, type Option } from "@/components/ui/fields";

/** Somebody new by name and address. Who has no account gets an invitation by mail. */
export function AddPersonForm({
  action,
  tripId,
  roles,
}: {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly roles: readonly (Option & { readonly detail: string })[];
}) {
  const [round, setRound] = useState(0);
  const box = useRef<HTMLDivElement>(null);
  return (
    <ActionForm
      action={action}
      onDone={() => {
        setRound(round + 1);
        box.current?.querySelector("input")?.focus();
      }}
    >
      <input type="hidden" name="tripId" value={tripId} />
      <div key={round} ref={box} className="flex max-w-[46rem] flex-col gap-5">
        <div className="grid items-start gap-4 sm:grid-cols-2">
          <TextField name="name" label="Name" maxLength={80} autoComplete="off" />
          <TextField name="email" label="E-mail address" type="email" autoComplete="off" />
        </div>
        <ChoiceField legend="Role" name="role" options={roles} defaultValue="participant" />
      </div>
      <div className="mt-5">
        <SubmitButton>Add and invite</SubmitButton>
      </div>
    </ActionForm>
  );
}
