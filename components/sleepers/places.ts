import type { SleepingPlanView } from "@/lib/domain/views";

/** A pitch's id, or one of the two lists beside the shelters. */
export type PlaceId = string;
export const UNPLACED = "unplaced";
export const OUTSIDE = "outside";

export interface Place {
  readonly id: PlaceId;
  readonly name: string;
  /** Null: as many as like. */
  readonly places: number | null;
}

/** Person id → place id. */
export type Sleeping = Readonly<Record<string, PlaceId>>;

export function toPlaces(plan: SleepingPlanView): readonly Place[] {
  return [
    { id: UNPLACED, name: "Not placed yet", places: null },
    ...plan.pitches.map((pitch) => ({ id: pitch.id, name: pitch.name, places: pitch.sleeps })),
    { id: OUTSIDE, name: "Outside, by choice", places: null },
  ];
}

export function toSleeping(plan: SleepingPlanView): Sleeping {
  return Object.fromEntries([
    ...plan.unplacedIds.map((id) => [id, UNPLACED] as const),
    ...plan.outsideIds.map((id) => [id, OUTSIDE] as const),
    ...plan.pitches.flatMap((pitch) => pitch.sleeperIds.map((id) => [id, pitch.id] as const)),
  ]);
}

export function sleepersIn(sleeping: Sleeping, placeId: PlaceId): readonly string[] {
  return Object.entries(sleeping).flatMap(([personId, place]) => (place === placeId ? [personId] : []));
}

/** Moves one person, or says why not. Whoever moves comes last in the new place. */
export function movePerson(
  sleeping: Sleeping,
  personId: string,
  place: Place,
): { readonly sleeping: Sleeping } | { readonly refusal: string } {
  if (sleeping[personId] === place.id) return { sleeping };
  const taken = sleepersIn(sleeping, place.id).length;
  if (place.places !== null && taken >= place.places) {
    return { refusal: `${place.name} is full: ${taken} of ${place.places} places taken.` };
  }
  const { [personId]: _from, ...rest } = sleeping;
  return { sleeping: { ...rest, [personId]: place.id } };
}

/** Fills free places with those who have none, in the order of the lists. */
export function placeEverybody(sleeping: Sleeping, places: readonly Place[]): Sleeping {
  return sleepersIn(sleeping, UNPLACED).reduce((current, personId) => {
    const free = places.find((place) => place.places !== null && sleepersIn(current, place.id).length < place.places);
    if (!free) return current;
    const moved = movePerson(current, personId, free);
    return "sleeping" in moved ? moved.sleeping : current;
  }, sleeping);
}

/** What is saved: everybody who is somewhere; null = outside any shelter. */
export function toSleeperRows(sleeping: Sleeping): { personId: string; pitchId: string | null }[] {
  return Object.entries(sleeping).flatMap(([personId, place]) =>
    place === UNPLACED ? [] : [{ personId, pitchId: place === OUTSIDE ? null : place }],
  );
}
