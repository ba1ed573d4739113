import { AppError } from "@/lib/errors";
import { asTyped } from "./typed-values";

/**
 * Saves on the version that was opened. When somebody else was first, the refusal carries an error at "version", by
 * which the form offers to keep what was typed; with `keepMine` it is then saved on top of theirs.
 */
export async function saveOver<Result>(
  input: Readonly<Record<string, unknown>>,
  save: (version: unknown) => Promise<Result>,
): Promise<Result> {
  try {
    return await save(input.version);
  } catch (error) {
    if (!(error instanceof AppError) || error.code !== "conflict") throw error;
    const { version } = asTyped(asTyped(error.details).current);
    if (input.keepMine === true && typeof version === "number") return save(version);
    throw new AppError("conflict", error.userMessage, { fieldErrors: { version: [error.userMessage] } });
  }
}

/** Lets a refusal because of what depends on it ask for a second yes in the form. */
export async function deleteConfirmed(work: Promise<unknown>): Promise<void> {
  try {
    await work;
  } catch (error) {
    if (!(error instanceof AppError) || error.code !== "in-use") throw error;
    throw new AppError("in-use", error.userMessage, { fieldErrors: { confirmed: [error.userMessage] } });
  }
}
