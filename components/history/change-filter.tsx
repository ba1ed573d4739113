import { buttonClass } from "@/components/ui/button";
import { SelectField } from "@/components/ui/fields";

/** Narrows the history down by camp and by person; works without JavaScript. */
export function ChangeFilter({
  camps,
  people,
  campId,
  userId,
}: {
  readonly camps: readonly { readonly id: string; readonly name: string }[];
  readonly people: readonly { readonly userId: string; readonly name: string }[];
  readonly campId: string | undefined;
  readonly userId: string | undefined;
}) {
  return (
    <form method="get" className="mb-8 flex flex-wrap items-end gap-4">
      <div className="w-full sm:w-56">
        <SelectField
          name="camp"
          label="Camp"
          placeholder="The whole trip"
          defaultValue={campId ?? ""}
          options={camps.map(({ id, name }) => ({ value: id, label: name }))}
        />
      </div>
      <div className="w-full sm:w-56">
        <SelectField
          name="by"
          label="By"
          placeholder="Everybody"
          defaultValue={userId ?? ""}
          options={people.map((one) => ({ value: one.userId, label: one.name }))}
        />
      </div>
      <button type="submit" className={buttonClass("outline")}>
        Show
      </button>
    </form>
  );
}
