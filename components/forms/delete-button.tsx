"use client";

import { useState, type ReactNode } from "react";
import { ActionForm, SubmitButton, useFieldErrors, type FormAction } from "@/components/ui/action-form";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";

interface DeleteButtonProps {
  /** What is deleted, by name: "Otter Flat". */
  readonly name: string;
  readonly label?: string;
  readonly confirmLabel?: string;
  /** What happens when nothing depends on it. */
  readonly children: ReactNode;
  readonly action: FormAction<null>;
  readonly values: Readonly<Record<string, string>>;
  readonly look?: "danger" | "quiet";
}

/** Deletes in two steps: the server says what depends on it, and only a second yes takes that along. */
export function DeleteButton({
  name,
  label = "Delete",
  confirmLabel = "Delete",
  children,
  action,
  values,
  look = "quiet",
}: DeleteButtonProps) {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <Button look={look} onClick={() => setIsOpen(true)}>
        {label} <span className="sr-only">{name}</span>
      </Button>
      <Dialog isOpen={isOpen} onClose={() => setIsOpen(false)} title={`${label} ${name}?`}>
        <div className="mb-5 text-15">{children}</div>
        <ActionForm action={action} onDone={() => setIsOpen(false)}>
          {Object.entries(values).map(([key, value]) => (
            <input key={key} type="hidden" name={key} value={value} />
          ))}
          <div className="flex flex-wrap gap-3">
            <ConfirmSubmit label={confirmLabel} />
            <Button look="outline" onClick={() => setIsOpen(false)}>
              Keep it
            </Button>
          </div>
        </ActionForm>
      </Dialog>
    </>
  );
}

function ConfirmSubmit({ label }: { readonly label: string }) {
  const hasDependents = useFieldErrors("confirmed").length > 0;
  return (
    <>
      <input type="hidden" name="confirmed:boolean" value={hasDependents ? "true" : "false"} />
      <SubmitButton look="danger">{hasDependents ? `${label} all of it` : label}</SubmitButton>
    </>
  );
}
