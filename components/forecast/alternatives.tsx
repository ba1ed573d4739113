"use client";

import Link from "next/link";
import { DeleteButton } from "@/components/forms/delete-button";
import { CampVerdict } from "@/components/trip/camp-verdict";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { TextField } from "@/components/ui/fields";
import type { Preferences } from "@/lib/domain/preferences";
import type { AlternativeSummary } from "@/lib/domain/views";

/** Places kept beside a camp for bad weather, each with its verdict and the way to use it. */
export function Alternatives({
  tripId,
  alternatives,
  unit,
  switchAction,
  deleteAction,
}: {
  readonly tripId: string;
  readonly alternatives: readonly AlternativeSummary[];
  readonly unit: Preferences["speedUnit"];
  readonly switchAction: FormAction<null>;
  /** Left out for who may not delete camps. */
  readonly deleteAction?: FormAction<null>;
}) {
  return (
    <ul>
      {alternatives.map((camp) => (
        <li key={camp.id} className="flex flex-wrap items-center gap-x-6 gap-y-2 border-t border-hair py-3">
          <div className="min-w-[11rem] flex-1">
            <Link
              href={`/trips/${tripId}/camps/${camp.id}`}
              className="inline-flex min-h-11 items-center text-15 font-bold hover:text-spruce hover:underline sm:min-h-0"
            >
              {camp.name}
            </Link>
            <span className="block text-13 text-pencil">in place of {camp.alternativeTo.name}</span>
          </div>
          <div className="min-w-[11rem] text-15">
            <CampVerdict camp={camp} unit={unit} />
          </div>
          <div className="flex flex-wrap gap-2">
            <SwitchButton tripId={tripId} camp={camp} action={switchAction} />
            {deleteAction && (
              <DeleteButton name={camp.name} action={deleteAction} values={{ tripId, campId: camp.id }}>
                Its ground, wind, staking plan and sleeping places go with it. {camp.alternativeTo.name} stays.
              </DeleteButton>
            )}
          </div>
        </li>
      ))}
    </ul>
  );
}

export function SwitchButton({
  tripId,
  camp,
  action,
}: {
  readonly tripId: string;
  readonly camp: Pick<AlternativeSummary, "id" | "name" | "alternativeTo">;
  readonly action: FormAction<null>;
}) {
  return (
    <ActionForm action={action}>
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="campId" value={camp.id} />
      <SubmitButton look="outline">
        Use it<span className="sr-only">: {camp.name}</span> instead
      </SubmitButton>
    </ActionForm>
  );
}

export function NewAlternativeForm({
  action,
  tripId,
  campId,
}: {
  readonly action: FormAction<null>;
  readonly tripId: string;
  readonly campId: string;
}) {
  return (
    <ActionForm action={action} className="flex max-w-[34rem] flex-wrap items-end gap-4">
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="campId" value={campId} />
      <div className="min-w-[14rem] flex-1">
        <TextField name="name" label="Name of the alternative" maxLength={80} />
      </div>
      <SubmitButton look="outline">Add an alternative</SubmitButton>
    </ActionForm>
  );
}
