"use client";

import type { ReactNode } from "react";
import { ActionForm, SubmitButton, type FormAction } from "@/components/ui/action-form";

/** An action that needs nothing but its ids. */
export function OneButtonForm({
  action,
  values,
  look = "quiet",
  children,
}: {
  readonly action: FormAction<null>;
  readonly values: Readonly<Record<string, string>>;
  readonly look?: "primary" | "outline" | "quiet";
  readonly children: ReactNode;
}) {
  return (
    <ActionForm action={action}>
      {Object.entries(values).map(([key, value]) => (
        <input key={key} type="hidden" name={key} value={value} />
      ))}
      <SubmitButton look={look}>{children}</SubmitButton>
    </ActionForm>
  );
}
