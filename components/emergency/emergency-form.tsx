"use client";

import { useState } from "react";
import { ConflictChoice } from "@/components/forms/conflict-choice";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";
import { SelectField, TextArea, TextField } from "@/components/ui/fields";
import type { EmergencyPlanView } from "@/lib/domain/people-views";

const MOST = 12;
const WAITS = [0, 30, 60, 120, 180, 240, 360, 480, 720, 1080, 1440, 2160, 2880];

function nameWait(minutes: number): string {
  if (minutes === 0) return "at the time due back";
  if (minutes < 60 || minutes % 60 !== 0) return `${minutes} min after`;
  return `${minutes / 60} h after`;
}

function waitOptions(current: number) {
  return [...new Set([...WAITS, current])]
    .sort((a, b) => a - b)
    .map((minutes) => ({ value: String(minutes), label: nameWait(minutes) }));
}

interface Step {
  readonly afterMinutes: number;
  readonly who: string;
  readonly phone: string;
  readonly action: string;
}

const BLANK: Step = { afterMinutes: 60, who: "", phone: "", action: "" };

/** When the group is due back, who watches, and what happens step by step when it is not. */
export function EmergencyForm({
  action,
  tripId,
  plan,
}: {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly plan: EmergencyPlanView;
}) {
  return (
    <ActionForm action={action} className="flex max-w-[52rem] flex-col gap-8">
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="version:number" value={plan.version} />
      <ConflictChoice href={`/trips/${tripId}/emergency`} />
      <div className="grid items-start gap-4 sm:grid-cols-3">
        <TextField name="dueBackDay" label="Due back, day" type="date" defaultValue={plan.dueBackDay} />
        <TextField
          name="dueBackTime"
          label="Time"
          type="time"
          defaultValue={plan.dueBackTime}
          hint="On the trip's clock."
        />
        <TextField
          name="groupPhone"
          label="Telephone of the group"
          type="tel"
          maxLength={30}
          defaultValue={plan.groupPhone}
        />
      </div>
      <fieldset>
        <legend className="mb-2 text-15 font-semibold">Contact outside the group</legend>
        <div className="grid items-start gap-4 sm:grid-cols-3">
          <TextField name="outsideName" label="Name" maxLength={80} defaultValue={plan.outsideName} />
          <TextField name="outsideEmail" label="E-mail address" type="email" defaultValue={plan.outsideEmail} />
          <TextField name="outsidePhone" label="Telephone" type="tel" maxLength={30} defaultValue={plan.outsidePhone} />
        </div>
      </fieldset>
      <Steps initial={plan.steps} />
      <TextArea
        name="meetingPoints"
        label="Meeting points"
        rows={3}
        maxLength={2000}
        defaultValue={plan.meetingPoints}
        hint="Where people gather when they have lost each other, with times."
      />
      <TextArea
        name="wayOut"
        label="Way out"
        rows={3}
        maxLength={2000}
        defaultValue={plan.wayOut}
        hint="The shortest safe ways to a road, a hut or a signal."
      />
      <div>
        <SubmitButton>Save</SubmitButton>
      </div>
    </ActionForm>
  );
}

function Steps({ initial }: { readonly initial: readonly Step[] }) {
  const [rows, setRows] = useState(() => initial.map((step, index) => ({ key: index, step })));
  const [nextKey, setNextKey] = useState(initial.length);
  return (
    <fieldset className="flex flex-col gap-5">
      <legend className="mb-2 text-15 font-semibold">If nobody has heard from the group</legend>
      {rows.length === 0 && (
        <p className="text-15 text-pencil">
          No steps yet: call the group, call the hut, then mountain rescue, each with its time.
        </p>
      )}
      {rows.map(({ key, step }, index) => (
        <div
          key={key}
          role="group"
          aria-label={`Step ${index + 1}`}
          className="grid items-end gap-4 border-t border-hair pt-4 sm:grid-cols-2 lg:grid-cols-[11rem_1fr_11rem]"
        >
          <SelectField
            name={`steps.${index}.afterMinutes:number`}
            label="When"
            options={waitOptions(step.afterMinutes)}
            defaultValue={String(step.afterMinutes)}
          />
          <TextField name={`steps.${index}.who`} label="Who is told" maxLength={80} defaultValue={step.who} />
          <TextField
            name={`steps.${index}.phone`}
            label="Telephone"
            type="tel"
            maxLength={30}
            defaultValue={step.phone}
          />
          <div className="sm:col-span-2">
            <TextField name={`steps.${index}.action`} label="What to do" maxLength={300} defaultValue={step.action} />
          </div>
          <Button look="quiet" onClick={() => setRows(rows.filter((row) => row.key !== key))}>
            Remove <span className="sr-only">{`step ${index + 1}`}</span>
          </Button>
        </div>
      ))}
      {rows.length < MOST && (
        <div>
          <Button
            onClick={() => {
              setRows([...rows, { key: nextKey, step: BLANK }]);
              setNextKey(nextKey + 1);
            }}
          >
            Add a step
          </Button>
        </div>
      )}
    </fieldset>
  );
}
