"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { CheckField, TextArea, TextField } from "@/components/ui/fields";
import { Section } from "@/components/ui/layout";
import type { TripView } from "@/lib/domain/views";
import { ConflictChoice } from "./conflict-choice";
import { ContactFields } from "./contact-fields";
import { clockNow, SaveBar, type SaveState } from "./save-bar";
import { TimeZoneField } from "./time-zone-field";

export function TripSettingsForm({
  action,
  trip,
  zones,
}: {
  readonly action: FormAction<null>;
  readonly trip: TripView;
  readonly zones: readonly string[];
}) {
  const [state, setState] = useState<SaveState>({ kind: "clean" });
  const touch = () => setState({ kind: "dirty" });
  return (
    <ActionForm
      action={action}
      doneText={null}
      onDone={() => setState({ kind: "saved", at: clockNow() })}
      onChange={touch}
    >
      <input type="hidden" name="tripId" value={trip.id} />
      <input type="hidden" name="version:number" value={trip.version} />
      <ConflictChoice href={`/trips/${trip.id}/settings`} />
      <Section title="The trip">
        <div className="flex max-w-[40rem] flex-col gap-5">
          <TextField name="name" label="Name of the trip" maxLength={100} defaultValue={trip.name} />
          <div className="grid items-start gap-5 sm:grid-cols-2">
            <TextField
              name="startDate"
              label="First night"
              type="date"
              defaultValue={trip.startDate}
              hint="All camps move with it."
            />
            <TimeZoneField zones={zones} chosen={trip.timeZone} />
          </div>
          <TextArea name="notes" label="Notes" maxLength={4000} defaultValue={trip.notes} />
        </div>
      </Section>
      <Section title="Contacts" lead="Printed on every card. Write numbers as they are dialled from the trip.">
        <ContactFields contacts={trip.contacts} onChanged={touch} />
      </Section>
      <SaveBar state={state} label="Save settings" />
    </ActionForm>
  );
}

export function CopyTripForm({ action, trip }: { readonly action: FormAction<null>; readonly trip: TripView }) {
  return (
    <ActionForm action={action} className="flex max-w-[40rem] flex-col gap-4">
      <input type="hidden" name="tripId" value={trip.id} />
      <div className="grid items-start gap-5 sm:grid-cols-2">
        <TextField
          name="name"
          label="Name of the copy"
          maxLength={100}
          defaultValue={`${trip.name.slice(0, 90)} again`}
        />
        <TextField name="startDate" label="First night of the copy" type="date" />
      </div>
      <CheckField
        name="withPeople"
        label="Take the people along"
        hint="Names, addresses and roles; nobody is invited until you do."
      />
      <div>
        <SubmitButton look="outline">Copy the trip</SubmitButton>
      </div>
    </ActionForm>
  );
}

export function DeleteTripForm({ action, trip }: { readonly action: FormAction<null>; readonly trip: TripView }) {
  return (
    <ActionForm action={action} className="flex max-w-[40rem] flex-col gap-4">
      <input type="hidden" name="tripId" value={trip.id} />
      <TextField
        name="confirmName"
        label={`Type "${trip.name}" to delete it`}
        autoComplete="off"
        hint="Camps, shelters, kit, plans, people's roles and messages go with it. There is no way back."
      />
      <div>
        <SubmitButton look="danger">Delete the trip</SubmitButton>
      </div>
    </ActionForm>
  );
}
