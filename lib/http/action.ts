import "server-only";
import { unstable_rethrow } from "next/navigation";
import { getContext } from "@/lib/auth/session";
import type { ActionState } from "@/lib/domain/action-state";
import { readFormData } from "@/lib/domain/form-data";
import { newId } from "@/lib/domain/ids";
import { toAppError } from "@/lib/errors";
import { log } from "@/lib/log";
import type { Context } from "@/lib/services/context/context";

interface Done<Data> {
  /** For people: "Saved." */
  readonly message?: string;
  readonly data?: Data;
}

/** Any error as the state that a form shows; redirects and not-found of Next.js pass through. */
export function toRefusedState(error: unknown, requestId: string): ActionState<never> {
  unstable_rethrow(error);
  const known = toAppError(error);
  if (!known || known.code === "unavailable") log.error("action failed", error, { requestId });
  const generic = `Something went wrong on our side (number ${requestId}). Nothing was saved; what you typed is still here.`;
  return { status: "refused", formError: known?.userMessage ?? generic, fieldErrors: known?.fieldErrors ?? {} };
}

/**
 * A server action for people who are signed in: `(state, form) => state`, as ActionForm wants it. The handler gets
 * the form read by `readFormData` (or whatever object it was called with) and calls one service.
 */
export function action<Data = null>(
  handler: (given: { readonly ctx: Context; readonly input: Record<string, unknown> }) => Promise<Done<Data> | void>,
) {
  return async (_state: ActionState<Data>, given: FormData | object): Promise<ActionState<Data>> => {
    let requestId = newId();
    try {
      const ctx = await getContext();
      if (!ctx) {
        const formError = "You are signed out. Sign in in another tab, then save again: what you typed is still here.";
        return { status: "refused", formError, fieldErrors: {} };
      }
      requestId = ctx.requestId;
      const input = given instanceof FormData ? readFormData(given) : { ...given };
      const done = (await handler({ ctx, input })) ?? {};
      return { status: "done", message: done.message ?? "Saved.", data: (done.data ?? null) as Data };
    } catch (error) {
      return toRefusedState(error, requestId);
    }
  };
}
