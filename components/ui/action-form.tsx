"use client";

import { createContext, startTransition, useActionState, useContext, useEffect, useRef } from "react";
import type { ComponentProps, ReactNode } from "react";
import type { ActionState } from "@/lib/domain/action-state";
import { Button } from "./button";

interface FormContextValue {
  readonly isPending: boolean;
  readonly fieldErrors: Readonly<Record<string, readonly string[]>>;
}

const FormContext = createContext<FormContextValue>({ isPending: false, fieldErrors: {} });

/** Errors of one field of the form around it, by its path. */
export function useFieldErrors(path: string): readonly string[] {
  return useContext(FormContext).fieldErrors[path] ?? [];
}

export type FormAction<Data> = (state: ActionState<Data>, form: FormData) => Promise<ActionState<Data>>;

interface ActionFormProps<Data> extends Omit<ComponentProps<"form">, "action" | "onSubmit"> {
  readonly action: FormAction<Data>;
  readonly children: ReactNode;
  /** Called once after each success. */
  readonly onDone?: (data: Data, message: string) => void;
  /** Shown in place of the action's own message; null shows nothing. */
  readonly doneText?: string | null;
}

/** A form over a server action. What was typed stays when the answer is no; works without JavaScript too. */
export function ActionForm<Data>({ action, children, onDone, doneText, ...rest }: ActionFormProps<Data>) {
  const [state, dispatch, isPending] = useActionState(action, { status: "idle" } as ActionState<Data>);
  const summary = useRef<HTMLDivElement>(null);
  const done = useRef(onDone);
  useEffect(() => {
    done.current = onDone;
  });
  useEffect(() => {
    if (state.status === "refused") summary.current?.focus();
    if (state.status === "done") done.current?.(state.data, state.message);
  }, [state]);

  const message = state.status === "done" ? (doneText === undefined ? state.message : doneText) : null;
  return (
    <FormContext value={{ isPending, fieldErrors: state.status === "refused" ? state.fieldErrors : {} }}>
      <form
        {...rest}
        action={dispatch}
        noValidate
        onSubmit={(event) => {
          // React empties a form after its action; a leader's half-typed camp has to stay.
          event.preventDefault();
          const form = new FormData(event.currentTarget, submitterOf(event.nativeEvent));
          startTransition(() => dispatch(form));
        }}
      >
        {state.status === "refused" && (
          <div
            ref={summary}
            tabIndex={-1}
            role="alert"
            className="mb-4 border-l-4 border-rowan bg-rowan-wash px-4 py-3 text-15"
          >
            {state.formError}
          </div>
        )}
        {children}
        <p role="status" className={message ? "mt-3 text-15 text-spruce" : "sr-only"}>
          {message}
        </p>
      </form>
    </FormContext>
  );
}

function submitterOf(event: Event): HTMLElement | null {
  return event instanceof SubmitEvent ? event.submitter : null;
}

export function SubmitButton({ children, look = "primary", ...rest }: ComponentProps<typeof Button>) {
  const { isPending } = useContext(FormContext);
  return (
    <Button {...rest} type="submit" look={look} aria-disabled={isPending} disabled={isPending}>
      {isPending ? "Saving…" : children}
    </Button>
  );
}
