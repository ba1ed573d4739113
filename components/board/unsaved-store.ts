import type { PlanIntent } from "@/lib/domain/plan/schema";

/** Changes that the server has not got yet, kept on this device per camp and person. */
const keyOf = (campId: string, userId: string) => `leestead.plan.${campId}.${userId}`;

export function readUnsaved(campId: string, userId: string): readonly PlanIntent[] {
  try {
    const kept: unknown = JSON.parse(window.localStorage.getItem(keyOf(campId, userId)) ?? "[]");
    return Array.isArray(kept) ? kept.filter(isIntent) : [];
  } catch {
    return [];
  }
}

export function keepUnsaved(campId: string, userId: string, pending: readonly PlanIntent[]): void {
  try {
    if (pending.length === 0) window.localStorage.removeItem(keyOf(campId, userId));
    else window.localStorage.setItem(keyOf(campId, userId), JSON.stringify(pending));
  } catch {
    // A full or blocked store must not stop the work; the state line still says "not saved".
  }
}

/** Only the frame: the server checks the rest and refuses what it does not know. */
function isIntent(value: unknown): value is PlanIntent {
  if (typeof value !== "object" || value === null) return false;
  const { intentId, baseVersion, change } = value as Record<string, unknown>;
  if (typeof intentId !== "string" || typeof baseVersion !== "number") return false;
  if (typeof change !== "object" || change === null) return false;
  const { type } = change as Record<string, unknown>;
  return type === "place" || type === "lift" || type === "swap" || type === "replace";
}
