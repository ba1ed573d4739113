import type { z } from "zod";
import { getDb, withTransaction } from "@/db/client";
import { kitSearch } from "@/db/schema";
import type { KitOutcome } from "@/lib/calc/kit/search-kit";
import { kitSearchStartInput, type KitSearchSettings } from "@/lib/domain/kit/search-schema";
import { AppError } from "@/lib/errors";
import { log } from "@/lib/log";
import { requirePermission } from "@/lib/auth/permission";
import { KitJobEnded, startKitJob } from "@/lib/workers/start-kit-job";
import type { Context } from "@/lib/services/context/context";
import { loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { buildSearch, fingerprint, listCandidates } from "./internal";
import { getSearchState, MOST_SEARCHES } from "./running";

const REASONS: Readonly<Record<KitJobEnded["reason"], string>> = {
  cancelled: "You stopped the search. Nothing was changed.",
  "timed-out": "No kit was found in two minutes. Choose fewer kinds or camps. Nothing was changed.",
  failed: "The search failed on our side. Nothing was changed; start it again.",
};

interface Found {
  readonly tripId: string;
  readonly settings: KitSearchSettings;
  readonly basis: string;
}

async function saveOutcome(ctx: Context, { tripId, settings, basis }: Found, outcome: KitOutcome): Promise<void> {
  const values = { settings, outcome, basis, foundByName: ctx.actor.name, foundAt: new Date(), acceptedAt: null };
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "kit.edit", tx);
    await tx
      .insert(kitSearch)
      .values({ tripId, ...values })
      .onConflictDoUpdate({ target: kitSearch.tripId, set: values });
  });
}

function describeEnd(error: unknown, requestId: string): string {
  if (error instanceof KitJobEnded && error.reason !== "failed") return REASONS[error.reason];
  log.error("kit search failed", error, { requestId });
  return REASONS.failed;
}

/**
 * Starts the search for a kit; it goes on when nobody looks. One search a trip. The kit and the plans stay as they are
 * until somebody takes the result over.
 */
export async function startKitSearch({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof kitSearchStartInput>;
}): Promise<{ isStarted: true }> {
  const { tripId, settings } = parseInput(kitSearchStartInput, input);
  await requirePermission(ctx, tripId, "kit.edit");
  const { running, failures } = getSearchState();
  const refuseBusy = () => {
    if (running.has(tripId)) throw new AppError("conflict", "A search for this trip is running already.");
    if (running.size >= MOST_SEARCHES) throw new AppError("unavailable", "Other searches are running. Try again soon.");
  };
  refuseBusy();
  const db = getDb();
  const state = await loadTripState(db, tripId);
  const search = await buildSearch(state, await listCandidates(db, ctx, state.kit), settings);
  refuseBusy();
  failures.delete(tripId);
  const started = {
    job: startKitJob(search, (progress) => void (started.progress = progress)),
    progress: { step: "Starting", done: 0, total: 1 },
  };
  running.set(tripId, started);
  started.job.outcome
    .then((outcome) => saveOutcome(ctx, { tripId, settings, basis: fingerprint(state, settings) }, outcome))
    .catch((error: unknown) => void failures.set(tripId, describeEnd(error, ctx.requestId)))
    .finally(() => running.delete(tripId));
  return { isStarted: true };
}
