"use client";

import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { TextArea, TextField } from "@/components/ui/fields";
import { TimeZoneField } from "./time-zone-field";

/** A new trip: a name and the day of the first night are enough to start. */
export function TripForm({ action, zones }: { readonly action: FormAction<null>; readonly zones: readonly string[] }) {
  return (
    <ActionForm action={action} className="flex max-w-[34rem] flex-col gap-5">
      <TextField name="name" label="Name of the trip" maxLength={100} required />
      <div className="grid items-start gap-5 sm:grid-cols-2">
        <TextField name="startDate" label="First night" type="date" required />
        <TimeZoneField zones={zones} />
      </div>
      <TextArea name="notes" label="Notes" rows={3} maxLength={4000} hint="May stay empty." />
      <div>
        <SubmitButton look="primary">Start the trip</SubmitButton>
      </div>
    </ActionForm>
  );
}
