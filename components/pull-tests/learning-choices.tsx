import { OneButtonForm } from "@/components/forms/one-button-form";
import type { FormAction } from "@/components/ui/action-form";
import { ConfirmButton } from "@/components/ui/confirm-button";
import type { PatchLearningView } from "@/lib/domain/pull-test/views";

interface LearningChoicesProps {
  /** Trip, camp and patch. */
  readonly values: Readonly<Record<string, string>>;
  readonly view: PatchLearningView;
  readonly elsewhereAction: FormAction<null>;
  readonly startAgainAction: FormAction<null>;
}

/** Whether readings elsewhere count for this patch, and the way back to the table. */
export function LearningChoices({ values, view, elsewhereAction, startAgainAction }: LearningChoicesProps) {
  const hasSomething = view.ownCount > 0 || view.elsewhereCount > 0;
  return (
    <div className="mt-3 flex flex-wrap gap-2">
      {(view.elsewhereCount > 0 || !view.usesElsewhere) && (
        <OneButtonForm
          action={elsewhereAction}
          values={{ ...values, "usesElsewhere:boolean": String(!view.usesElsewhere) }}
        >
          {view.usesElsewhere ? "Leave readings elsewhere out" : "Count readings elsewhere"}
        </OneButtonForm>
      )}
      {hasSomething && (
        <ConfirmButton
          label="Start again from the table"
          look="quiet"
          title="Start again from the table?"
          confirmLabel="Start again"
          action={startAgainAction}
          values={values}
        >
          The readings of this ground here are switched off and those from elsewhere left out. None is lost: each can be
          switched on again.
        </ConfirmButton>
      )}
    </div>
  );
}
