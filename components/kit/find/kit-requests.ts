import { z } from "zod";
import type { KitProgressView } from "@/lib/domain/kit/search-view";

const progressSchema = z.object({
  isRunning: z.boolean(),
  progress: z.object({ step: z.string(), done: z.number(), total: z.number() }).nullable(),
  failure: z.string().nullable(),
});

const refusalSchema = z.object({
  error: z.object({ message: z.string(), fieldErrors: z.record(z.string(), z.array(z.string())).optional() }),
});

const addressOf = (tripId: string) => `/api/trips/${tripId}/kit-search`;
const UNREACHABLE = "No connection: the search was not started. Try again with signal.";

export async function askProgress(tripId: string): Promise<KitProgressView> {
  const response = await fetch(addressOf(tripId), { cache: "no-store" });
  return progressSchema.parse(await response.json());
}

/** What is wrong with it, one sentence each; empty when the search runs. */
export async function startSearch(tripId: string, settings: object): Promise<{ readonly problems: readonly string[] }> {
  const response = await fetch(addressOf(tripId), {
    method: "POST",
    headers: { "Content-Type": "application/json" },
    body: JSON.stringify({ settings }),
  }).catch(() => null);
  if (!response) return { problems: [UNREACHABLE] };
  if (response.ok) return { problems: [] };
  const refusal = refusalSchema.safeParse(await response.json().catch(() => null));
  if (!refusal.success) return { problems: ["The search could not be started. Try again in a moment."] };
  const fields = Object.values(refusal.data.error.fieldErrors ?? {}).flat();
  return { problems: fields.length > 0 ? [...new Set(fields)] : [refusal.data.error.message] };
}

export async function stopSearch(tripId: string): Promise<void> {
  await fetch(addressOf(tripId), { method: "DELETE" });
}
