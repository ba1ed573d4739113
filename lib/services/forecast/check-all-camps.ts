import type { z } from "zod";
import { getDb } from "@/db/client";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { joinWords, plural } from "@/lib/format/words";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { getForecastSource } from "@/lib/weather/get-source";
import type { ForecastSource, TroubleKind } from "@/lib/weather/source";
import { loadTripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { fetchForecast } from "./fetch-forecast";

/** When the service itself is gone, asking it for the next camp only makes people wait. */
const ENDS_IT: ReadonlySet<TroubleKind> = new Set(["slow", "down", "refused"]);

export interface CheckReport {
  /** How many came, newly or within the last ten minutes. */
  readonly fetched: number;
  /** Why one didn't, for people; empty when all came. */
  readonly failures: readonly string[];
  readonly sentence: string;
}

/** Asks for the forecast of every camp that has a position, alternatives too; each is kept or its failure is. */
export async function checkAllCamps({
  ctx,
  input,
  source = getForecastSource(),
  at = new Date(),
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
  source?: ForecastSource;
  at?: Date;
}): Promise<CheckReport> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "camp.edit");
  const state = await loadTripState(getDb(), tripId);
  const camps = [...state.camps, ...state.alternatives].map(({ camp }) => camp);
  const placed = camps.filter(({ details }) => details.latitude !== null && details.longitude !== null);
  const failures: string[] = [];
  let fetched = 0;
  for (const camp of placed) {
    const result = await fetchForecast({ ctx, input: { tripId, campId: camp.id }, source, at });
    if (result.outcome !== "failed") fetched += 1;
    else failures.push(`${camp.details.name}: ${result.sentence}`);
    if (result.outcome === "failed" && ENDS_IT.has(result.kind)) break;
  }
  const without = camps.filter((camp) => !placed.includes(camp)).map(({ details }) => details.name);
  return { fetched, failures, sentence: describe(fetched, placed.length, failures, without) };
}

function describe(fetched: number, asked: number, failures: readonly string[], without: readonly string[]): string {
  const parts = [
    asked === 0 ? "No camp has a position yet." : `Forecasts for ${fetched} of ${plural(asked, "camp")} are here.`,
    ...failures,
    failures.length > 0 ? "What was accepted before stays as it is." : "",
    without.length > 0 && asked > 0 ? `No position yet: ${joinWords(without)}.` : "",
  ];
  return parts.filter(Boolean).join(" ");
}
