import { asc, eq } from "drizzle-orm";
import { groupThing, personLoad, shelterSplit } from "@/db/schema";
import type { LoadPieceView, LoadShareView } from "@/lib/domain/pack/load-view";
import type { TripState } from "../plan/load-trip-state";
import type { Reader } from "../trips/internal";
import type { CarryRow } from "./internal";

export type SplitRow = typeof shelterSplit.$inferSelect;
export type ThingRow = typeof groupThing.$inferSelect;
export type PersonLoadRow = typeof personLoad.$inferSelect;

export interface LoadSources {
  readonly splits: ReadonlyMap<string, SplitRow>;
  readonly things: readonly ThingRow[];
  readonly loads: ReadonlyMap<string, PersonLoadRow>;
}

export async function loadLoadSources(reader: Reader, tripId: string): Promise<LoadSources> {
  const splits = await reader.select().from(shelterSplit).where(eq(shelterSplit.tripId, tripId));
  const things = await reader
    .select()
    .from(groupThing)
    .where(eq(groupThing.tripId, tripId))
    .orderBy(asc(groupThing.position), asc(groupThing.id));
  const loads = await reader.select().from(personLoad).where(eq(personLoad.tripId, tripId));
  return {
    splits: new Map(splits.map((row) => [row.shelterId, row])),
    things,
    loads: new Map(loads.map((row) => [row.personId, row])),
  };
}

/** Everybody who sleeps in a shelter at some camp of the trip. */
function listSleepers(state: TripState, shelterId: string): string[] {
  const ids = state.camps.flatMap(({ pitches }) =>
    pitches.filter((pitch) => pitch.shelterId === shelterId).flatMap((pitch) => pitch.sleeperIds),
  );
  return [...new Set(ids)];
}

/** Parts of a shelter, as they are carried. */
export function partsOf(split: SplitRow | undefined): readonly ("shelter" | "fly" | "poles")[] {
  return split && split.polesMassKg !== null ? ["fly", "poles"] : ["shelter"];
}

/** Everything of the group's that somebody has to carry, in one order: shelters, kit, other things. */
export function listPieces(state: TripState, { splits, things }: LoadSources): LoadPieceView[] {
  const shelters = state.shelters.flatMap(({ id, name, massKg }): LoadPieceView[] => {
    const split = splits.get(id);
    const sleepers = split?.staysWithSleepers ? listSleepers(state, id) : [];
    const carrierIds = sleepers.length > 0 ? sleepers : null;
    const polesMassKg = split?.polesMassKg ?? null;
    const piece = (part: "shelter" | "fly" | "poles", of: string, kg: number | null): LoadPieceView => ({
      key: `${part}:${id}`,
      name: `${name}${of}`,
      massKgEach: kg,
      count: 1,
      carrierIds,
    });
    if (polesMassKg === null) return [piece("shelter", "", massKg)];
    const flyKg = massKg === null ? null : Math.max(0, massKg - polesMassKg);
    return [piece("fly", ", fly", flyKg), piece("poles", ", poles", polesMassKg)];
  });
  const kit = state.kit
    .filter((row) => row.details.count > 0)
    .map(({ id, details }): LoadPieceView => {
      const { name, massKg, count } = details;
      return { key: `kit:${id}`, name, massKgEach: massKg, count, carrierIds: null };
    });
  const own = things.map(({ id, name, massKg }): LoadPieceView => ({
    key: `thing:${id}`,
    name,
    massKgEach: massKg,
    count: 1,
    carrierIds: null,
  }));
  return [...shelters, ...kit, ...own];
}

/** What a stored row gives to its person; a shelter given whole before it was split comes as its parts. */
export function toShares(row: CarryRow, splits: LoadSources["splits"]): LoadShareView[] {
  const { personId, count, isFixed } = row;
  const share = (key: string): LoadShareView => ({ key, personId, count, isFixed });
  if (row.kitItemId) return [share(`kit:${row.kitItemId}`)];
  if (row.groupThingId) return [share(`thing:${row.groupThingId}`)];
  const { shelterId } = row;
  if (!shelterId) return [];
  const parts = partsOf(splits.get(shelterId));
  if (parts.length === 1) return row.part === "poles" ? [] : [share(`shelter:${shelterId}`)];
  return row.part ? [share(`${row.part}:${shelterId}`)] : parts.map((part) => share(`${part}:${shelterId}`));
}
