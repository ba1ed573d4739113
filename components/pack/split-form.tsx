import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { CheckField, NumberField } from "@/components/ui/fields";
import type { LoadPlanView } from "@/lib/domain/pack/load-view";
import { formatMass } from "@/lib/format/masses";

/** How one shelter is taken apart, and whether its sleepers carry it. */
export function SplitForm({
  shelter,
  tripId,
  action,
}: {
  readonly shelter: LoadPlanView["shelters"][number];
  readonly tripId: string;
  readonly action: FormAction<null>;
}) {
  return (
    <ActionForm action={action} className="border-t border-hair py-3">
      <input type="hidden" name="tripId" value={tripId} />
      <input type="hidden" name="shelterId" value={shelter.id} />
      <p className="text-15 font-semibold">
        {shelter.name}{" "}
        <span className="font-normal text-pencil">
          {shelter.massKg === null ? "not weighed" : formatMass(shelter.massKg)}
        </span>
      </p>
      <div className="mt-1 flex flex-wrap items-end gap-x-6 gap-y-2">
        {shelter.hasPoles ? (
          <div className="w-44">
            <NumberField
              name="polesMassKg"
              label="Poles on their own"
              unit="kg"
              defaultValue={shelter.polesMassKg === null ? "" : String(shelter.polesMassKg)}
            />
          </div>
        ) : (
          <input type="hidden" name="polesMassKg:number" value="" />
        )}
        <CheckField
          name="staysWithSleepers"
          label="Carried by who sleeps in it"
          defaultChecked={shelter.staysWithSleepers}
        />
        <SubmitButton look="outline">
          Save<span className="sr-only"> {shelter.name}</span>
        </SubmitButton>
      </div>
    </ActionForm>
  );
}
