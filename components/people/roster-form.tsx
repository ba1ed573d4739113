"use client";

import { ConflictChoice } from "@/components/forms/conflict-choice";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { NumberField, TextField } from "@/components/ui/fields";
import type { RosterView } from "@/lib/domain/people-views";

/** Places, the last day for an answer, reminders, and how long own details are kept. */
export function RosterForm({
  action,
  tripId,
  roster,
}: {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly roster: RosterView;
}) {
  return (
    <ActionForm action={action} className="max-w-[46rem]">
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="version:number" value={roster.version} />
      <ConflictChoice href={`/trips/${tripId}/people`} />
      <div className="grid items-start gap-4 sm:grid-cols-2">
        <NumberField
          name="capacity"
          label="Places, leaders included"
          defaultValue={roster.capacity ?? ""}
          hint="Empty: no limit. When all are taken, a yes goes on the waiting list."
        />
        <TextField
          name="answerBy"
          label="Last day for an answer"
          type="date"
          defaultValue={roster.answerBy ?? ""}
          hint="Empty: until the trip is over."
        />
        <NumberField
          name="remindDaysBefore"
          label="Remind before that day"
          unit="days"
          defaultValue={roster.remindDaysBefore ?? ""}
          hint="One mail to whoever has not answered or said maybe. Empty: none."
        />
        <NumberField
          name="keepDetailsDays"
          label="Delete own details after the trip"
          unit="days"
          defaultValue={roster.keepDetailsDays}
          hint="Contacts and health notes; 1 to 365."
        />
      </div>
      <div className="mt-5">
        <SubmitButton look="outline">Save</SubmitButton>
      </div>
    </ActionForm>
  );
}
