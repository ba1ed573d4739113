"use client";

import { useEffect, type ReactNode } from "react";
import { SubmitButton } from "@/components/ui/action-form";

export type SaveState =
  { readonly kind: "clean" } | { readonly kind: "dirty" } | { readonly kind: "saved"; at: string };

/** Stays at the foot of a long form: what the state is, and the button. Leaving with unsaved text asks first. */
export function SaveBar({
  state,
  label = "Save",
  children,
}: {
  readonly state: SaveState;
  readonly label?: string;
  readonly children?: ReactNode;
}) {
  const isDirty = state.kind === "dirty";
  useEffect(() => {
    if (!isDirty) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [isDirty]);
  return (
    <div className="no-print sticky bottom-0 z-20 -mx-4 mt-8 flex flex-wrap items-center gap-x-5 gap-y-2 border-t border-hair bg-paper px-4 py-3 sm:-mx-8 sm:px-8">
      <SubmitButton>{label}</SubmitButton>
      {children}
      <p role="status" className={`text-15 ${isDirty ? "font-semibold text-ember" : "text-pencil"}`}>
        {state.kind === "clean" && "Nothing changed yet."}
        {state.kind === "dirty" && "Not saved yet."}
        {state.kind === "saved" && `Saved ${state.at}.`}
      </p>
    </div>
  );
}

/** The clock on this device, for "saved 10:42". */
export function clockNow(): string {
  return new Date().toLocaleTimeString("en-GB", { hour: "2-digit", minute: "2-digit" });
}
