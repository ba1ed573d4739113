import { asc, eq } from "drizzle-orm";
import { person, pitch, sleeper, stakingPlan } from "@/db/schema";
import type { Placement, TrayAnchor } from "@/lib/calc/types";
import type { LearnedGrounds } from "@/lib/domain/pull-test/learned-grounds";
import type { CampView, PitchView } from "@/lib/domain/views";
import { AppError } from "@/lib/errors";
import { listAlternativeRows, listCampRows, toAlternativeViews, toCampViews } from "../camps/internal";
import { listKitRows, type KitRow } from "../kit/internal";
import { countShockCords, toTray } from "../kit/to-tray";
import {
  loadCampLearnings,
  NO_LEARNING,
  toLearnedGrounds,
  type CampLearning,
} from "../pull-tests/load-learned-grounds";
import { toPitchDetails, toPitchSpec } from "../pitches/internal";
import { listShelterRows, type ShelterRow } from "../shelters/internal";
import { loadTripRow, type Reader, type TripRow } from "../trips/internal";
import { listPlacementRows, toPlacement, type PlanRow } from "./internal";

export type UnworkedPitch = Omit<PitchView, "analysis">;

/** A camp with everything that its plan stands on, but not yet worked out. */
export interface CampState {
  readonly camp: CampView;
  readonly pitches: readonly UnworkedPitch[];
  readonly tray: readonly TrayAnchor[];
  readonly placements: readonly Placement[];
  /** What pull tests say of its ground. */
  readonly learned: LearnedGrounds;
  /** The same with its curve and where it comes from. */
  readonly learning: CampLearning;
  readonly plan: PlanRow | null;
  readonly sleepers: readonly { readonly personId: string; readonly pitchId: string | null }[];
}

export interface TripState {
  readonly trip: TripRow;
  readonly people: readonly { readonly id: string; readonly name: string }[];
  readonly shelters: readonly ShelterRow[];
  readonly kit: readonly KitRow[];
  readonly shockCordCount: number;
  /** The line of nights. */
  readonly camps: readonly CampState[];
  /** Kept beside for bad weather: in no count, list or paper of the trip unless asked for by id. */
  readonly alternatives: readonly CampState[];
}

/** Everything of a trip that plans and papers are made of: one query per table, all by the trip's id. */
export async function loadTripState(reader: Reader, tripId: string): Promise<TripState> {
  const trip = await loadTripRow(reader, tripId);
  const campRows = await listCampRows(reader, tripId);
  const alternativeRows = await listAlternativeRows(reader, tripId);
  const shelters = await listShelterRows(reader, tripId);
  const kit = await listKitRows(reader, tripId);
  const pitchRows = await reader
    .select()
    .from(pitch)
    .where(eq(pitch.tripId, tripId))
    .orderBy(asc(pitch.position), asc(pitch.id));
  const sleeperRows = await reader.select().from(sleeper).where(eq(sleeper.tripId, tripId));
  const placementRows = await listPlacementRows(reader, tripId);
  const planRows = await reader.select().from(stakingPlan).where(eq(stakingPlan.tripId, tripId));
  const people = await reader
    .select({ id: person.id, name: person.name })
    .from(person)
    .where(eq(person.tripId, tripId))
    .orderBy(asc(person.name), asc(person.id));

  const shelterById = new Map(shelters.map((row) => [row.id, row]));
  const views = toCampViews(trip.startDate, campRows);
  const alternativeViews = toAlternativeViews(trip.startDate, campRows, alternativeRows);
  const learnings = await loadCampLearnings(reader, tripId, [...views, ...alternativeViews]);
  const toState = (camp: CampView): CampState => {
    const sleepers = sleeperRows.filter((row) => row.campId === camp.id);
    const pitches = pitchRows.flatMap((row): UnworkedPitch[] => {
      const own = shelterById.get(row.shelterId);
      if (row.campId !== camp.id || !own) return [];
      const details = toPitchDetails(row);
      return [
        {
          id: row.id,
          shelterId: row.shelterId,
          name: own.name,
          sleeps: own.sleeps,
          position: row.position,
          details,
          version: row.version,
          spec: toPitchSpec(own.spec, details),
          sleeperIds: sleepers.filter((one) => one.pitchId === row.id).map((one) => one.personId),
        },
      ];
    });
    return {
      camp,
      pitches,
      tray: toTray(kit, camp.details),
      placements: placementRows.filter((row) => row.campId === camp.id).map(toPlacement),
      learned: toLearnedGrounds(learnings.get(camp.id)),
      learning: learnings.get(camp.id) ?? NO_LEARNING,
      plan: planRows.find((row) => row.campId === camp.id) ?? null,
      sleepers: sleepers.map(({ personId, pitchId }) => ({ personId, pitchId })),
    };
  };
  return {
    trip,
    people,
    shelters,
    kit,
    shockCordCount: countShockCords(kit),
    camps: views.map(toState),
    alternatives: alternativeViews.map(toState),
  };
}

/** In the line of nights or beside it. */
export function findCampState(state: TripState, campId: string): CampState {
  const found = [...state.camps, ...state.alternatives].find((one) => one.camp.id === campId);
  if (!found) throw new AppError("not-found", "There is no such camp on this trip.");
  return found;
}
