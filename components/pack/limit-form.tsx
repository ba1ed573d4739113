import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { NumberField } from "@/components/ui/fields";
import type { LoadPersonView } from "@/lib/domain/pack/load-view";

/** What a leader enters for somebody: own things and a plain limit. */
export function LimitForm({
  person,
  tripId,
  action,
}: {
  readonly person: LoadPersonView;
  readonly tripId: string;
  readonly action: FormAction<null>;
}) {
  const asText = (value: number | null) => (value === null ? "" : String(Math.round(value * 10) / 10));
  return (
    <ActionForm action={action} className="border-t border-hair py-3">
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="personId" value={person.id} />
      <div className="grid items-end gap-x-6 gap-y-2 sm:grid-cols-[minmax(0,1fr)_9rem_9rem_auto]">
        <p className="text-15 font-semibold sm:pb-3">{person.name}</p>
        <NumberField name="baseMassKg" label="Own things" unit="kg" defaultValue={asText(person.baseMassKg)} />
        <NumberField name="limitKg" label="Limit" unit="kg" defaultValue={asText(person.limitKg)} />
        <SubmitButton look="outline">
          Save<span className="sr-only"> for {person.name}</span>
        </SubmitButton>
      </div>
    </ActionForm>
  );
}
