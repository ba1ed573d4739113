import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { NumberField } from "@/components/ui/fields";

interface OwnLoad {
  readonly baseMassKg: number | null;
  readonly bodyMassKg: number | null;
  readonly limitShare: number | null;
  readonly limitKg: number | null;
}

const asText = (value: number | null, factor = 1) =>
  value === null ? "" : String(Math.round(value * factor * 10) / 10);

/** What somebody says of themselves, so that the group's things are shared fairly. */
export function OwnLoadForm({
  load,
  tripId,
  action,
}: {
  readonly load: OwnLoad;
  readonly tripId: string;
  readonly action: FormAction<null>;
}) {
  return (
    <ActionForm action={action} className="flex max-w-[46rem] flex-col gap-4">
      <input type="hidden" name="tripId" value={tripId} />
      <div className="grid items-start gap-4 sm:grid-cols-2">
        <NumberField
          name="baseMassKg"
          label="My own things"
          unit="kg"
          hint="Packed, with food and water for a day."
          defaultValue={asText(load.baseMassKg)}
        />
        <NumberField
          name="limitKg"
          label="The most I carry, all together"
          unit="kg"
          hint="Or leave it empty and give a share of your weight."
          defaultValue={asText(load.limitKg)}
        />
        <NumberField
          name="bodyMassKg"
          label="My weight"
          unit="kg"
          hint="Nobody else sees this."
          defaultValue={asText(load.bodyMassKg)}
        />
        <NumberField
          name="limitPercent"
          label="Of it I carry at most"
          unit="%"
          hint="Common practice for fit walkers, no source: a fifth to a quarter."
          defaultValue={asText(load.limitShare, 100)}
        />
      </div>
      <div>
        <SubmitButton look="outline">Save what I can carry</SubmitButton>
      </div>
    </ActionForm>
  );
}
