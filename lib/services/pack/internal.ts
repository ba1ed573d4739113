import { and, asc, eq } from "drizzle-orm";
import { carry, packItem, packTick, person } from "@/db/schema";
import { listShelterCord } from "@/lib/calc/cord";
import type { PackLine, PackListView } from "@/lib/domain/views";
import { AppError } from "@/lib/errors";
import { formatAnchorSpec } from "@/lib/format/anchors";
import { plural } from "@/lib/format/words";
import { formatLength } from "@/lib/format/lengths";
import type { KitRow } from "../kit/internal";
import type { TripState } from "../plan/load-trip-state";
import type { Reader } from "../trips/internal";
import { listPieces, loadLoadSources, toShares, type LoadSources } from "./load-pieces";

export type CarryRow = typeof carry.$inferSelect;
export type PackItemRow = typeof packItem.$inferSelect;

export async function listCarryRows(reader: Reader, tripId: string): Promise<CarryRow[]> {
  return reader.select().from(carry).where(eq(carry.tripId, tripId)).orderBy(asc(carry.id));
}

export async function listPackItemRows(reader: Reader, tripId: string): Promise<PackItemRow[]> {
  return reader
    .select()
    .from(packItem)
    .where(eq(packItem.tripId, tripId))
    .orderBy(asc(packItem.position), asc(packItem.id));
}

/** Keys of ticked lines by person. */
export async function listTicks(reader: Reader, tripId: string): Promise<ReadonlyMap<string, ReadonlySet<string>>> {
  const rows = await reader
    .select({ personId: packTick.personId, key: packTick.itemKey })
    .from(packTick)
    .where(eq(packTick.tripId, tripId));
  const ticks = new Map<string, Set<string>>();
  for (const row of rows) ticks.set(row.personId, (ticks.get(row.personId) ?? new Set()).add(row.key));
  return ticks;
}

export async function loadPerson(reader: Reader, tripId: string, personId: string) {
  const [row] = await reader
    .select({ id: person.id, name: person.name })
    .from(person)
    .where(and(eq(person.id, personId), eq(person.tripId, tripId)))
    .limit(1);
  if (!row) throw new AppError("not-found", "There is no such person on this trip.");
  return row;
}

function describeKit({ details }: KitRow): string {
  if (details.type === "anchor") return formatAnchorSpec(details.spec);
  if (details.type === "cord") return `${details.diameterMm} mm cord, ${formatLength(details.lengthM)} each`;
  return `shock cord, ${formatLength(details.lengthM)} each`;
}

export interface PackSources {
  readonly state: TripState;
  readonly items: readonly PackItemRow[];
  readonly carries: readonly CarryRow[];
  readonly ticks: ReadonlyMap<string, ReadonlySet<string>>;
  readonly loads: LoadSources;
}

export async function loadPackSources(reader: Reader, state: TripState): Promise<PackSources> {
  const tripId = state.trip.id;
  return {
    state,
    items: await listPackItemRows(reader, tripId),
    carries: await listCarryRows(reader, tripId),
    ticks: await listTicks(reader, tripId),
    loads: await loadLoadSources(reader, tripId),
  };
}

/** How many it sleeps, and the guy lines that go with it. */
function describeShelter(state: TripState, { id, name, sleeps }: TripState["shelters"][number]): string {
  const pitches = state.camps.flatMap((camp) =>
    camp.pitches.filter((one) => one.shelterId === id).map((one) => one.spec),
  );
  const { lineCount, totalM } = listShelterCord({ name, pitches });
  if (lineCount === 0) return `sleeps ${sleeps}`;
  return `sleeps ${sleeps}, with ${plural(lineCount, "line")}: ${formatLength(totalM)} of cord`;
}

function listGroupLines({ state, carries, loads }: PackSources, personId: string): PackLine[] {
  const pieces = new Map(listPieces(state, loads).map((piece) => [piece.key, piece]));
  return carries
    .filter((row) => row.personId === personId)
    .flatMap((row) => toShares(row, loads.splits))
    .flatMap(({ key, count }): PackLine[] => {
      const piece = pieces.get(key);
      if (!piece) return [];
      const item = state.kit.find((one) => key === `kit:${one.id}`);
      const shelter = state.shelters.find((one) => key === `shelter:${one.id}` || key === `fly:${one.id}`);
      return [
        {
          key,
          name: item ? `${count} × ${piece.name}` : piece.name,
          detail: item ? describeKit(item) : shelter ? describeShelter(state, shelter) : "",
          massKg: piece.massKgEach === null ? null : piece.massKgEach * count,
          isTicked: false,
        },
      ];
    });
}

function listNights({ state }: PackSources, personId: string): PackListView["nights"] {
  const names = new Map(state.people.map((one) => [one.id, one.name]));
  return state.camps.flatMap(({ camp, pitches, sleepers }) => {
    const own = sleepers.find((one) => one.personId === personId);
    const pitch = pitches.find((one) => one.id === own?.pitchId);
    const withNames = pitch
      ? sleepers
          .filter((one) => one.pitchId === pitch.id && one.personId !== personId)
          .flatMap((one) => names.get(one.personId) ?? [])
      : [];
    return camp.days.map((day) => ({
      campId: camp.id,
      campName: camp.details.name,
      day,
      shelterName: pitch ? pitch.name : own ? "outside" : null,
      pitchId: pitch?.id ?? null,
      withNames,
    }));
  });
}

export function buildPackList(
  sources: PackSources,
  person: { readonly id: string; readonly name: string },
): PackListView {
  const ticked = sources.ticks.get(person.id);
  const tick = (line: PackLine): PackLine => ({ ...line, isTicked: ticked?.has(line.key) ?? false });
  const items = sources.items
    .filter((row) => row.personId === null || row.personId === person.id)
    .map((row) => ({
      isGroupThing: row.isGroupThing,
      line: tick({ key: `item:${row.id}`, name: row.name, detail: "", massKg: row.massKg, isTicked: false }),
    }));
  const group = [
    ...listGroupLines(sources, person.id).map(tick),
    ...items.filter((item) => item.isGroupThing).map((item) => item.line),
  ];
  return {
    person: { id: person.id, name: person.name },
    own: items.filter((item) => !item.isGroupThing).map((item) => item.line),
    group,
    groupMassKg: group.reduce((sum, line) => sum + (line.massKg ?? 0), 0),
    nights: listNights(sources, person.id),
  };
}
