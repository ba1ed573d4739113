import { vi } from "vitest";
import type { Browser } from "../../helpers/browser";
import type { ActionState } from "@/lib/domain/action-state";

export type Action = (state: ActionState<never>, given: FormData | object) => Promise<ActionState<unknown>>;

const at = vi.hoisted(() => ({ browser: null as { headers(): Headers; jar: Map<string, string> } | null }));

// What Next.js gives to an action: the caller's headers and cookies. Session, permission and database are the real ones.
vi.mock("next/headers", () => ({
  headers: async () => at.browser?.headers() ?? new Headers(),
  cookies: async () => ({ set: () => undefined, get: () => undefined }),
}));
vi.mock("next/cache", () => ({ revalidatePath: () => undefined }));
vi.mock("@/lib/workers/render-pdf-in-worker", () => ({
  renderPdfInWorker: async () =>
    new TextEncoder().encode("%PDF-1.7 stands in for papers, which have tests of their own"),
}));

export function actAs(browser: Browser): void {
  at.browser = browser;
}

/** Every server action by the name that the role matrix has for it. */
export async function loadActions(): Promise<Readonly<Record<string, Action>>> {
  const modules = import.meta.glob<Record<string, Action>>("/app/**/actions.ts");
  const actions: Record<string, Action> = {};
  for (const [file, load] of Object.entries(modules)) {
    const folder = file.replace(/^\/app\/(\(app\)\/)?/, "").replace(/\/actions\.ts$/, "");
    for (const [name, action] of Object.entries(await load())) actions[`${folder}#${name}`] = action;
  }
  return actions;
}

export type Answer =
  | {
      readonly status: "done" | "refused";
      readonly formError: string;
      readonly fieldErrors: Readonly<Record<string, readonly string[]>>;
    }
  | { readonly status: "redirected"; readonly to: string };

/** Calls an action as the framework does; where it redirects, that is the answer. */
export async function callAction(action: Action, given: FormData | object): Promise<Answer> {
  try {
    const state = await action({ status: "idle" }, given);
    if (state.status === "refused") return state;
    if (state.status === "done") return { status: "done", formError: "", fieldErrors: {} };
    throw new Error("An action answered with nothing.");
  } catch (error) {
    const digest = error instanceof Error && "digest" in error ? String(error.digest) : "";
    const [kind, , to] = digest.split(";");
    if (kind === "NEXT_REDIRECT" && to) return { status: "redirected", to };
    throw error;
  }
}
