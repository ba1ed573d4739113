"use client";

import { useState, type ReactNode } from "react";
import { ConflictChoice } from "@/components/forms/conflict-choice";
import { clockNow, SaveBar, type SaveState } from "@/components/forms/save-bar";
import { ActionForm, type FormAction } from "@/components/ui/action-form";
import type { AnchorChoice } from "@/lib/domain/pull-test/views";
import { PullFields, type PullStart } from "./pull-fields";

interface PullEditFormProps {
  readonly action: FormAction<null>;
  readonly values: Readonly<Record<string, string>>;
  readonly anchors: readonly AnchorChoice[];
  readonly start: PullStart;
  readonly conflictHref: string;
  readonly children?: ReactNode;
}

/** Corrects a reading that was logged. */
export function PullEditForm({ action, values, anchors, start, conflictHref, children }: PullEditFormProps) {
  const [state, setState] = useState<SaveState>({ kind: "clean" });
  return (
    <ActionForm
      action={action}
      onDone={() => setState({ kind: "saved", at: clockNow() })}
      doneText={null}
      onChange={() => setState({ kind: "dirty" })}
    >
      {Object.entries(values).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      <ConflictChoice href={conflictHref} />
      <div className="flex max-w-[26rem] flex-col gap-4">
        {children}
        <PullFields anchors={anchors} start={start} isNew={false} />
      </div>
      <SaveBar state={state} label="Save this reading" />
    </ActionForm>
  );
}
