import { getDb } from "@/db/client";
import type { Preferences } from "@/lib/domain/preferences";
import type { PaperCamp, PaperForecast } from "@/lib/domain/views";
import { formatInstant } from "@/lib/format/days";
import { workOutCamp } from "../analysis/work-out-camp";
import { findAcceptedRow, toAcceptedView } from "../forecast/internal";
import type { CampState, TripState } from "../plan/load-trip-state";
import { listFallbacks } from "./fallbacks";

/** What every paper of a trip is made from. */
export interface PaperDesk {
  readonly state: TripState;
  readonly speedUnit: Preferences["speedUnit"];
  /** By the camp's id; papers without it do not print the way. */
  readonly ways?: ReadonlyMap<string, readonly string[]>;
}

/** "3 of 5", or "3–4 of 5" for two nights. */
function numberNights(state: TripState, { camp }: CampState): string {
  const days = state.camps.flatMap((one) => one.camp.days);
  const first = days.indexOf(camp.days[0] ?? "") + 1;
  const last = first + camp.days.length - 1;
  return `${first === last ? first : `${first}–${last}`} of ${days.length}`;
}

/** Only what the plan stands on: a forecast that was typed over since has no place on a card. */
async function findPaperForecast({ state }: PaperDesk, own: CampState): Promise<PaperForecast | null> {
  const { camp } = own;
  const accepted = toAcceptedView(own, await findAcceptedRow(getDb(), state.trip.id, camp.id));
  if (!accepted?.isPlanned) return null;
  return {
    source: accepted.source,
    isSample: accepted.isSample,
    fetchedAt: formatInstant(accepted.fetchedAt, state.trip.timeZone),
    nights: accepted.nights.filter((night) => camp.days.includes(night.day)),
  };
}

/** A camp worked out for printing; one pitch of it, or all. */
export async function toPaperCamp(desk: PaperDesk, own: CampState, pitchId: string | null): Promise<PaperCamp> {
  const { state, speedUnit, ways } = desk;
  const worked = await workOutCamp(own);
  const isWanted = (id: string) => pitchId === null || id === pitchId;
  const names = new Map(state.people.map((one) => [one.id, one.name]));
  const pitches = worked.pitches.filter((one) => isWanted(one.id));
  const fallbacks = await listFallbacks(worked, speedUnit);
  return {
    camp: own.camp,
    forecast: await findPaperForecast(desk, own),
    nightNumbers: numberNights(state, own),
    pitches,
    tray: own.tray,
    placements: own.placements.filter((one) => isWanted(one.pitchId)),
    result: { ...worked.result, shelters: worked.result.shelters.filter((one) => isWanted(one.pitchId)) },
    sleeperNames: Object.fromEntries(
      pitches.map((pitch) => [pitch.id, pitch.sleeperIds.flatMap((id) => names.get(id) ?? [])]),
    ),
    fallbacks: Object.fromEntries(Object.entries(fallbacks).filter(([id]) => isWanted(id))),
    way: ways?.get(own.camp.id) ?? [],
  };
}
