import { and, desc, eq, inArray, notInArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { acceptedForecast, forecast, forecastFailure } from "@/db/schema";
import { compareVerdicts, isWorse } from "@/lib/domain/forecast/outlook";
import { isStillPlanned, windOfForecast, type PlannedWind } from "@/lib/domain/forecast/plan-wind";
import type { AcceptedForecastView, CampForecastView, OutlookView } from "@/lib/domain/forecast/views";
import { workOutCamp } from "../analysis/work-out-camp";
import { summariseCamp } from "../camps/summarise-camp";
import type { CampState } from "../plan/load-trip-state";
import type { Reader } from "../trips/internal";

export type ForecastRow = typeof forecast.$inferSelect;
export type AcceptedRow = typeof acceptedForecast.$inferSelect;
export type FailureRow = typeof forecastFailure.$inferSelect;

const KEPT_PER_CAMP = 10;

export interface ForecastRows {
  /** Newest first. */
  readonly fetched: readonly ForecastRow[];
  readonly accepted: readonly AcceptedRow[];
  readonly failures: readonly FailureRow[];
}

export async function loadForecastRows(reader: Reader, tripId: string): Promise<ForecastRows> {
  return {
    fetched: await reader
      .select()
      .from(forecast)
      .where(eq(forecast.tripId, tripId))
      .orderBy(desc(forecast.fetchedAt), desc(forecast.id)),
    accepted: await reader.select().from(acceptedForecast).where(eq(acceptedForecast.tripId, tripId)),
    failures: await reader.select().from(forecastFailure).where(eq(forecastFailure.tripId, tripId)),
  };
}

export async function findAcceptedRow(
  reader: Reader,
  tripId: string,
  campId: string,
): Promise<AcceptedRow | undefined> {
  const [row] = await reader
    .select()
    .from(acceptedForecast)
    .where(and(eq(acceptedForecast.tripId, tripId), eq(acceptedForecast.campId, campId)))
    .limit(1);
  return row;
}

/** Forgets all but the newest few of a camp. */
export async function trimForecasts(tx: Transaction, tripId: string, campId: string): Promise<void> {
  const own = and(eq(forecast.tripId, tripId), eq(forecast.campId, campId));
  const newest = tx
    .select({ id: forecast.id })
    .from(forecast)
    .where(own)
    .orderBy(desc(forecast.fetchedAt), desc(forecast.id))
    .limit(KEPT_PER_CAMP);
  const ids = (await newest).map((row) => row.id);
  if (ids.length < KEPT_PER_CAMP) return;
  const old = await tx
    .select({ id: forecast.id })
    .from(forecast)
    .where(and(own, notInArray(forecast.id, ids)));
  if (old.length === 0) return;
  const oldIds = old.map((row) => row.id);
  await tx.delete(forecast).where(and(eq(forecast.tripId, tripId), inArray(forecast.id, oldIds)));
}

function withWind(state: CampState, planned: PlannedWind): CampState {
  return { ...state, camp: { ...state.camp, details: { ...state.camp.details, ...planned } } };
}

/** The camp's verdict now and with another wind, worked out on the plan as it stands. */
export async function compareWinds(state: CampState, planned: PlannedWind): Promise<OutlookView> {
  const after = withWind(state, planned);
  const was = summariseCamp(state, await workOutCamp(state));
  const will = summariseCamp(after, await workOutCamp(after));
  const side = ({ verdict, designGustMs, holdsToGustMs }: typeof was) => ({ verdict, designGustMs, holdsToGustMs });
  return {
    sentence: compareVerdicts(state.camp.details.name, was.verdict, will.verdict),
    isWorse: isWorse(was.verdict, will.verdict),
    before: side(was),
    after: side(will),
  };
}

export function toAcceptedView({ camp }: CampState, row: AcceptedRow | undefined): AcceptedForecastView | null {
  if (!row) return null;
  const said = windOfForecast(row.content, camp.days, camp.details);
  return {
    ...row.content,
    acceptedAt: row.acceptedAt.toISOString(),
    acceptedByName: row.acceptedByName,
    isPlanned: said.isComplete && isStillPlanned(said.planned, camp.details),
  };
}

export async function toCampForecast(state: CampState, rows: ForecastRows): Promise<CampForecastView> {
  const { camp } = state;
  const latest = rows.fetched.find((row) => row.campId === camp.id);
  const acceptedRow = rows.accepted.find((row) => row.campId === camp.id);
  const failure = rows.failures.find((row) => row.campId === camp.id);
  const accepted = toAcceptedView(state, acceptedRow);
  const isNew = latest !== undefined && !(latest.id === acceptedRow?.forecastId && accepted?.isPlanned);
  const said = isNew ? windOfForecast(latest.content, camp.days, camp.details) : null;
  return {
    campId: camp.id,
    campName: camp.details.name,
    campVersion: camp.version,
    days: camp.days,
    hasPosition: camp.details.latitude !== null && camp.details.longitude !== null,
    latest: latest ? { ...latest.content, id: latest.id } : null,
    accepted,
    failure: failure
      ? { sentence: failure.reason, failedAt: failure.failedAt.toISOString(), count: failure.count }
      : null,
    proposal: said?.isComplete ? { planned: said.planned, outlook: await compareWinds(state, said.planned) } : null,
    hindrance: said && !said.isComplete ? said.reason : null,
  };
}
