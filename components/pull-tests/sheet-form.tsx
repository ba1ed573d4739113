import { SelectField, TextField, type Option } from "@/components/ui/fields";
import { buttonClass } from "@/components/ui/button";
import { FORCE_UNITS, type Preferences } from "@/lib/domain/preferences";

interface SheetFormProps {
  /** Address of the PDF. */
  readonly action: string;
  readonly forceUnit: Preferences["forceUnit"];
  /** The field that says which ground: patches of a camp, or kinds. Null where there is only one. */
  readonly ground: { readonly name: string; readonly options: readonly Option[]; readonly value: string } | null;
}

const UNITS = FORCE_UNITS.map((unit) => ({ value: unit, label: unit }));

/** Opens the practice sheet as a PDF: a plain form, so that it works everywhere. */
export function SheetForm({ action, forceUnit, ground }: SheetFormProps) {
  return (
    <form method="get" action={action} target="_blank" className="flex max-w-[46rem] flex-wrap items-end gap-4">
      {ground && (
        <div className="w-56">
          <SelectField name={ground.name} label="Ground" options={ground.options} defaultValue={ground.value} />
        </div>
      )}
      <div className="w-36">
        <TextField name="scale" label="Scale ends at" inputMode="decimal" />
      </div>
      <div className="w-24">
        <SelectField name="unit" label="Unit" options={UNITS} defaultValue={forceUnit} />
      </div>
      <div className="w-32">
        <SelectField
          name="count"
          label="Pulls"
          options={[8, 12, 16, 20].map((count) => ({ value: String(count), label: String(count) }))}
          defaultValue="12"
        />
      </div>
      <button type="submit" className={buttonClass("outline")}>
        Open the practice sheet
      </button>
    </form>
  );
}
