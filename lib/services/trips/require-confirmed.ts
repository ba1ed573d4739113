import { AppError } from "@/lib/errors";

/** Stops a deletion that nobody confirmed yet when something depends on it, and says what. */
export function requireConfirmed(isConfirmed: boolean, name: string, dependents: readonly string[]): void {
  if (isConfirmed || dependents.length === 0) return;
  throw new AppError("in-use", `${name} is in use. ${dependents.join(" ")}`, { details: { dependents } });
}
