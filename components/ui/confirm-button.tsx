"use client";

import { useState } from "react";
import type { ReactNode } from "react";
import { ActionForm, SubmitButton, type FormAction } from "./action-form";
import { Button } from "./button";
import { Dialog } from "./dialog";

interface ConfirmButtonProps<Data> {
  readonly label: string;
  readonly title: string;
  /** What will happen and what depends on it. */
  readonly children: ReactNode;
  readonly confirmLabel: string;
  readonly action: FormAction<Data>;
  /** Hidden values sent with the action. */
  readonly values: Readonly<Record<string, string>>;
  readonly look?: "danger" | "outline" | "quiet";
  readonly onDone?: (data: Data, message: string) => void;
}

/** Asks before something that can't be taken back. */
export function ConfirmButton<Data>(props: ConfirmButtonProps<Data>) {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <Button look={props.look ?? "danger"} onClick={() => setIsOpen(true)}>
        {props.label}
      </Button>
      <Dialog isOpen={isOpen} onClose={() => setIsOpen(false)} title={props.title}>
        <div className="mb-5 text-15">{props.children}</div>
        <ActionForm
          action={props.action}
          onDone={(data: Data, message) => {
            setIsOpen(false);
            props.onDone?.(data, message);
          }}
        >
          {Object.entries(props.values).map(([name, value]) => (
            <input key={name} type="hidden" name={name} value={value} />
          ))}
          <div className="flex flex-wrap gap-3">
            <SubmitButton look={props.look ?? "danger"}>{props.confirmLabel}</SubmitButton>
            <Button look="quiet" onClick={() => setIsOpen(false)}>
              Keep it
            </Button>
          </div>
        </ActionForm>
      </Dialog>
    </>
  );
}
