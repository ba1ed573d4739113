/** What a server action answers; the form shows it without losing what was typed. */
export type ActionState<Data = null> =
  | { readonly status: "idle" }
  | { readonly status: "done"; readonly message: string; readonly data: Data }
  | {
      readonly status: "refused";
      /** A sentence above the form: what happened, what is safe, what to do. */
      readonly formError: string;
      /** By dotted path of the input, e.g. "details.name". */
      readonly fieldErrors: Readonly<Record<string, readonly string[]>>;
    };

export const IDLE: ActionState<never> = { status: "idle" };
