"use client";

import { useState } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";
import { SelectField, TextField, type Option } from "@/components/ui/fields";
import { ConflictChoice } from "@/components/forms/conflict-choice";
import { DeleteButton } from "@/components/forms/delete-button";
import type { PersonView } from "@/lib/domain/views";

const STATES: Readonly<Record<PersonView["state"], string>> = {
  joined: "has joined",
  invited: "invited, has not joined",
  expired: "invitation has expired",
  none: "not invited yet",
};

function describeAnswer({ answer, role }: PersonView): string {
  if (!answer) return role === "participant" ? "no answer yet" : "";
  if (answer.isWaiting) return "yes, on the waiting list";
  return { yes: "comes along", maybe: "may come along", no: "does not come" }[answer.value];
}

interface PersonRowProps {
  readonly tripId: string;
  readonly person: PersonView;
  readonly roleName: string;
  readonly roles: readonly Option[];
  /** Null for who may only look. */
  readonly actions: {
    readonly update: FormAction<null>;
    readonly invite: FormAction<null>;
    readonly remove: FormAction<null>;
  } | null;
}

export function PersonRow({ tripId, person, roleName, roles, actions }: PersonRowProps) {
  const [isEditing, setIsEditing] = useState(false);
  const ids = { tripId, personId: person.id };
  const isOpen = person.state !== "joined";
  return (
    <li className="border-t border-hair py-4">
      <div className="grid items-center gap-x-6 gap-y-2 sm:grid-cols-[minmax(0,1fr)_12rem] lg:grid-cols-[minmax(0,1fr)_12rem_21rem]">
        <div className="min-w-0">
          <p className="text-15 font-bold">
            {person.name}
            {person.isSelf && <span className="font-normal text-pencil"> (you)</span>}
          </p>
          <p className="text-13 break-all text-pencil">{person.email}</p>
          {person.answer?.note && <p className="mt-1 text-13 break-words">“{person.answer.note}”</p>}
        </div>
        <div>
          <p className="text-15">{roleName}</p>
          <p className={`text-13 ${isOpen ? "font-semibold text-ember" : "text-pencil"}`}>{STATES[person.state]}</p>
          <p className="text-13">{describeAnswer(person)}</p>
        </div>
        {actions && (
          <div className="-ml-4 flex flex-wrap gap-1 sm:col-span-2 lg:col-span-1 lg:ml-0 lg:justify-end">
            {isOpen && (
              <ActionForm action={actions.invite}>
                <input type="hidden" name="tripId" value={tripId} />
                <input type="hidden" name="personId" value={person.id} />
                <SubmitButton look="quiet">
                  {person.state === "none" ? "Invite" : "Send a new link"}{" "}
                  <span className="sr-only">to {person.name}</span>
                </SubmitButton>
              </ActionForm>
            )}
            <Button look="quiet" aria-expanded={isEditing} onClick={() => setIsEditing(!isEditing)}>
              {isEditing ? "Close" : "Change"} <span className="sr-only">{person.name}</span>
            </Button>
            {!person.isSelf && (
              <DeleteButton
                name={person.name}
                label="Remove"
                confirmLabel="Remove"
                action={actions.remove}
                values={ids}
              >
                They no longer see the trip. Their sleeping places, pack list and loads become free.
              </DeleteButton>
            )}
          </div>
        )}
      </div>
      {actions && isEditing && (
        <ActionForm
          action={actions.update}
          className="mt-4 border-l-2 border-hair pl-5"
          onDone={() => setIsEditing(false)}
        >
          <input type="hidden" name="tripId" value={tripId} />
          <input type="hidden" name="personId" value={person.id} />
          <input type="hidden" name="version:number" value={person.version} />
          <ConflictChoice href={`/trips/${tripId}/people`} />
          <div className="grid max-w-[40rem] items-start gap-4 sm:grid-cols-2">
            <TextField name="name" label="Name" maxLength={80} defaultValue={person.name} />
            <SelectField name="role" label="Role" options={roles} defaultValue={person.role} />
          </div>
          <div className="mt-4">
            <SubmitButton look="outline">Save</SubmitButton>
          </div>
        </ActionForm>
      )}
    </li>
  );
}
