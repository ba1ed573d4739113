/** Something of the group's: pieces of one kind, each of one mass. */
export interface Shareable {
  readonly id: string;
  readonly massKg: number;
  readonly count: number;
}

/**
 * Shares things out so that loads come out even: the heaviest first, each piece to whoever has least so far (longest
 * processing time first, Graham 1969). Returns how many pieces of each thing each person has, in the order of the
 * people; the same input always gives the same shares.
 */
export function shareOutByMass(
  personIds: readonly string[],
  things: readonly Shareable[],
): { readonly personId: string; readonly thingId: string; readonly count: number }[] {
  if (personIds.length === 0) return [];
  const loads = personIds.map((personId) => ({ personId, massKg: 0, pieces: new Map<string, number>() }));
  const heaviestFirst = [...things].sort((a, b) => b.massKg - a.massKg);
  for (const thing of heaviestFirst) {
    for (let piece = 0; piece < thing.count; piece += 1) {
      const least = loads.reduce((best, one) => (one.massKg < best.massKg - 1e-9 ? one : best));
      least.massKg += thing.massKg;
      least.pieces.set(thing.id, (least.pieces.get(thing.id) ?? 0) + 1);
    }
  }
  return loads.flatMap(({ personId, pieces }) => [...pieces].map(([thingId, count]) => ({ personId, thingId, count })));
}
