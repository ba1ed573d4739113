"use client";

import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";
import { ChoiceField, TextArea } from "@/components/ui/fields";
import { ANSWER_NAMES, ANSWER_VALUES } from "@/lib/domain/answer/names";
import type { OwnAnswerView } from "@/lib/domain/people-views";

const OPTIONS = ANSWER_VALUES.map((value) => ({ value, label: ANSWER_NAMES[value] }));

/** Yes, maybe or no, with a note for the leader. */
export function AnswerForm({
  action,
  hidden,
  own,
}: {
  readonly action: FormAction<null>;
  /** What says who answers: the trip, or the token of an invitation. */
  readonly hidden: Readonly<Record<string, string>>;
  readonly own: OwnAnswerView;
}) {
  const options = own.isClosed ? OPTIONS.filter((option) => option.value === "no") : OPTIONS;
  const saysFull = own.isFull && own.answer?.value !== "yes" && !own.isClosed;
  return (
    <ActionForm action={action} className="flex max-w-[40rem] flex-col gap-4">
      {Object.entries(hidden).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      <ChoiceField
        legend="Do you come?"
        name="value"
        options={options}
        defaultValue={own.answer?.value}
        hint={
          saysFull
            ? "Every place is taken. A yes goes on the waiting list; you get a mail when a place is free."
            : undefined
        }
      />
      <TextArea
        name="note"
        label="Note for the leader"
        rows={2}
        maxLength={500}
        defaultValue={own.answer?.note}
        hint="May stay empty. Nothing about your health here: that has its own page."
      />
      <div>
        <SubmitButton>{own.answer ? "Change my answer" : "Answer"}</SubmitButton>
      </div>
    </ActionForm>
  );
}
