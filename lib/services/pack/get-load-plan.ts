import type { z } from "zod";
import { getDb } from "@/db/client";
import { shelterKind } from "@/lib/calc/shelter-kinds";
import type { LoadPlanView } from "@/lib/domain/pack/load-view";
import { effectiveLimitKg } from "@/lib/domain/pack/schema";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadTripState, type TripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import type { Reader } from "../trips/internal";
import { buildPackList, loadPackSources } from "./internal";
import { listPieces, toShares } from "./load-pieces";

export async function buildLoadPlan(reader: Reader, state: TripState): Promise<LoadPlanView> {
  const sources = await loadPackSources(reader, state);
  const { loads: loadSources, carries } = sources;
  const pieces = listPieces(state, loadSources);
  const known = new Set(pieces.map((piece) => piece.key));
  return {
    pieces,
    shares: carries.flatMap((row) => toShares(row, loadSources.splits)).filter((share) => known.has(share.key)),
    people: state.people.map(({ id, name }) => {
      const load = loadSources.loads.get(id);
      const list = buildPackList(sources, { id, name });
      const lines = [...list.own, ...list.group];
      return {
        id,
        name,
        baseMassKg: load?.baseMassKg ?? null,
        limitKg: load ? effectiveLimitKg(load) : null,
        packedCount: lines.filter((line) => line.isTicked).length,
        lineCount: lines.length,
      };
    }),
    shelters: state.shelters.map(({ id, name, massKg, spec }) => ({
      id,
      name,
      massKg,
      polesMassKg: loadSources.splits.get(id)?.polesMassKg ?? null,
      staysWithSleepers: loadSources.splits.get(id)?.staysWithSleepers ?? false,
      hasPoles: shelterKind(spec.kind).support !== "trees-or-poles",
    })),
    things: loadSources.things.map(({ id, name, massKg }) => ({ id, name, massKg })),
  };
}

/** Who carries what of the group's gear, by which limits, and who has packed. */
export async function getLoadPlan({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<LoadPlanView> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "pack.edit");
  const db = getDb();
  return buildLoadPlan(db, await loadTripState(db, tripId));
}
