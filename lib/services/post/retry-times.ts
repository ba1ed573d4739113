const MINUTES = [1, 5, 30, 120, 480] as const;
const PATIENCE_MS = 3 * 86_400_000;

interface Failure {
  /** Of the server, or null when it could not be reached at all. */
  readonly responseCode: number | null;
  /** Including this one. */
  readonly attempts: number;
  readonly ageMs: number;
}

/**
 * How long to wait before the next try, or null to give up: at once when the server says never (5xx), after six
 * refusals for now (4xx), after three days when it can't be reached. `chance` in [0, 1) spreads the tries by ±20 %.
 */
export function nextTryInMs({ responseCode, attempts, ageMs }: Failure, chance: number): number | null {
  if (responseCode !== null && responseCode >= 500) return null;
  if (responseCode !== null && attempts > MINUTES.length) return null;
  if (ageMs > PATIENCE_MS) return null;
  const minutes = MINUTES[Math.min(attempts, MINUTES.length) - 1] ?? 1;
  return Math.round(minutes * 60_000 * (0.8 + 0.4 * chance));
}
