import { ChoiceField } from "@/components/ui/fields";
import type { PatchLearningView } from "@/lib/domain/pull-test/views";

const PATCH_NAMES = { main: "Main ground", second: "Second patch" } as const;

/** Which patch was pulled; hidden where the camp has only one. */
export function PatchField({
  patches,
  defaultPatch,
}: {
  readonly patches: readonly PatchLearningView[];
  readonly defaultPatch: "main" | "second";
}) {
  const [only, second] = patches;
  if (!second) return <input type="hidden" name="reading.patch" value={only?.patch ?? "main"} />;
  return (
    <ChoiceField
      legend="Ground"
      name="reading.patch"
      options={patches.map(({ patch, groundName }) => ({
        value: patch,
        label: groundName,
        detail: PATCH_NAMES[patch],
      }))}
      defaultValue={defaultPatch}
    />
  );
}
