import { createHash } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { gear, kitSearch } from "@/db/schema";
import { findKitGaps, type KitKindChoice } from "@/lib/calc/kit/read-camp";
import type { KitSearch } from "@/lib/calc/kit/search-input";
import { BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import type { KitSearchSettings } from "@/lib/domain/kit/search-schema";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { workOutCamp } from "../analysis/work-out-camp";
import type { KitRow } from "../kit/internal";
import { findCampState, type CampState, type TripState } from "../plan/load-trip-state";
import type { Reader } from "../trips/internal";

export type KitSearchRow = typeof kitSearch.$inferSelect;

export async function findKitSearchRow(reader: Reader, tripId: string): Promise<KitSearchRow | null> {
  const [row] = await reader.select().from(kitSearch).where(eq(kitSearch.tripId, tripId)).limit(1);
  return row ?? null;
}

export interface Candidate extends Omit<KitKindChoice, "most"> {
  readonly source: KitSearchSettings["kinds"][number]["source"];
  /** How many there are; null for the library. */
  readonly owned: number | null;
}

/** Every kind that a kit may take: the trip's kit, the person's own gear, the built-in library. */
export async function listCandidates(reader: Reader, ctx: Context, kit: readonly KitRow[]): Promise<Candidate[]> {
  const own = await reader
    .select({ id: gear.id, details: gear.details })
    .from(gear)
    .where(and(eq(gear.ownerId, ctx.actor.userId)));
  const inKit = kit.flatMap(({ id, details }): Candidate[] =>
    details.type === "anchor"
      ? [{ source: "kit", id, name: details.name, spec: details.spec, massKg: details.massKg, owned: details.count }]
      : [],
  );
  const inGear = own.flatMap(({ id, details }): Candidate[] => {
    if (details.type !== "anchor" || details.anchor.type !== "anchor") return [];
    const { name, spec, massKg, count } = details.anchor;
    return [{ source: "gear", id, name, spec, massKg, owned: count }];
  });
  const library = BUILT_IN_ANCHORS.filter((anchor) => !anchor.found).map(({ id, name, spec, massKg }): Candidate => ({
    source: "library",
    id,
    name,
    spec,
    massKg,
    owned: null,
  }));
  return [...inKit, ...inGear, ...library];
}

/** Fingerprint of everything of the trip that a kit stands on; when it changes, the kit may no longer hold. */
export function fingerprint(state: TripState, settings: KitSearchSettings): string {
  const camps = state.camps
    .filter((one) => settings.campIds.includes(one.camp.id))
    .map(({ camp, pitches, placements, learned }) => [camp.id, camp.details, pitches, placements, learned]);
  const chosen = new Set(settings.kinds.map((kind) => kind.id));
  const kit = state.kit
    .filter((row) => chosen.has(row.id))
    .map(({ id, details }) => [id, details.type === "anchor" && [details.spec, details.massKg]]);
  return createHash("sha256")
    .update(JSON.stringify([camps, kit]))
    .digest("base64");
}

const refuse = (field: string, message: string): never => {
  throw new AppError("bad-input", message, { fieldErrors: { [`settings.${field}`]: [message] } });
};

function chooseKinds(candidates: readonly Candidate[], settings: KitSearchSettings): KitKindChoice[] {
  const chosen = settings.kinds.map((kind): KitKindChoice => {
    const found = candidates.find((one) => one.source === kind.source && one.id === kind.id);
    if (!found) return refuse("kinds", "One of the chosen anchors is no longer there. Load the page again.");
    const { id, name, spec, massKg } = found;
    return { id, name, spec, massKg, most: kind.most };
  });
  if (new Set(chosen.map((kind) => kind.id)).size !== chosen.length) refuse("kinds", "An anchor was chosen twice.");
  return chosen;
}

/** A pinned anchor has to be in the kit, whatever else is. */
function requirePinned(camps: readonly CampState[], kinds: readonly KitKindChoice[], kit: readonly KitRow[]): void {
  for (const { camp, placements } of camps) {
    for (const { pinned, anchorId, tandem } of placements) {
      if (!pinned) continue;
      for (const id of [anchorId, tandem?.anchorId]) {
        const item = kit.find((row) => row.id === id);
        if (!item || kinds.some((kind) => kind.id === id)) continue;
        refuse("kinds", `${item.details.name} is pinned at ${camp.details.name}: choose it too, or take the pin off.`);
      }
    }
  }
}

/** The search that the settings ask for, or a refusal that names each gap. */
export async function buildSearch(
  state: TripState,
  candidates: readonly Candidate[],
  settings: KitSearchSettings,
): Promise<KitSearch> {
  const kinds = chooseKinds(candidates, settings);
  const chosen = [...new Set(settings.campIds)].map((campId) => findCampState(state, campId));
  requirePinned(chosen, kinds, state.kit);
  const worked = await Promise.all(chosen.map(async (camp) => ({ camp, input: (await workOutCamp(camp)).input })));
  const gaps = worked.flatMap(({ camp, input }) =>
    findKitGaps(input).map((gap) => `${camp.camp.details.name}: ${gap.message}`),
  );
  if (gaps.length > 0) {
    throw new AppError("bad-input", gaps.join(" "), { fieldErrors: { "settings.campIds": gaps } });
  }
  const taken = new Set(kinds.map((kind) => kind.id));
  return {
    camps: worked.map(({ camp, input }) => ({
      id: camp.camp.id,
      name: camp.camp.details.name,
      input,
      allowFound: settings.foundCampIds.includes(camp.camp.id),
    })),
    kinds,
    otherKinds: candidates
      .filter((one) => one.source === "library" && !taken.has(one.id))
      .map(({ id, name, spec, massKg }) => ({ id, name, spec, massKg, most: null })),
    settings: {
      spares: settings.spares,
      workPriceKg: settings.workPriceKg,
      allowDoubling: settings.allowDoubling,
    },
  };
}
