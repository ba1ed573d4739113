import "server-only";
import { headers } from "next/headers";
import { REQUEST_ID_HEADER } from "@/lib/auth/session";
import type { ActionState } from "@/lib/domain/action-state";
import { readFormData } from "@/lib/domain/form-data";
import { newId } from "@/lib/domain/ids";
import { toRefusedState } from "./action";

/** A server action for whoever is not signed in. */
export function publicAction(
  handler: (given: { readonly input: Record<string, unknown> }) => Promise<{ readonly message: string }>,
) {
  return async (_state: ActionState<null>, form: FormData): Promise<ActionState<null>> => {
    const requestId = (await headers()).get(REQUEST_ID_HEADER) ?? newId();
    try {
      const { message } = await handler({ input: form instanceof FormData ? readFormData(form) : {} });
      return { status: "done", message, data: null };
    } catch (error) {
      return toRefusedState(error, requestId);
    }
  };
}
