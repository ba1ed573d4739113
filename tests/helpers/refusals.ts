import { AppError } from "@/lib/errors";

/** The refusal that a call ends with; fails when it doesn't end with one. */
export async function refusalOf(work: Promise<unknown>): Promise<AppError> {
  const outcome = await work.then(
    () => "no refusal",
    (error: unknown) => error,
  );
  if (outcome instanceof AppError) return outcome;
  throw outcome instanceof Error ? outcome : new Error(`Expected a refusal, got: ${String(outcome)}`);
}

export async function codeOf(work: Promise<unknown>): Promise<string> {
  return (await refusalOf(work)).code;
}
