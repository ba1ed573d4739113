import type { z } from "zod";
import { getDb } from "@/db/client";
import { findKitGaps } from "@/lib/calc/kit/read-camp";
import { USUAL_WORK_PRICE_KG } from "@/lib/domain/kit/search-schema";
import type { KitCampView, KitCandidateView, KitSearchView } from "@/lib/domain/kit/search-view";
import { tripRefInput } from "@/lib/domain/trip/schema";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { workOutCamp } from "../analysis/work-out-camp";
import { loadTripState, type TripState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { getKitProgress } from "./get-kit-progress";
import { findKitSearchRow, fingerprint, listCandidates, type Candidate, type KitSearchRow } from "./internal";

/** As it was searched last; the first time the kit's own kinds with their counts. */
function toCandidateView(candidate: Candidate, last: KitSearchRow | null): KitCandidateView {
  const chosen = last?.settings.kinds.find((kind) => kind.source === candidate.source && kind.id === candidate.id);
  const isChosen = last ? chosen !== undefined : candidate.source === "kit";
  return { ...candidate, isChosen, most: chosen ? chosen.most : candidate.owned };
}

async function listKitCamps(state: TripState, last: KitSearchRow | null): Promise<KitCampView[]> {
  return Promise.all(
    state.camps.map(async (camp): Promise<KitCampView> => {
      const { input } = await workOutCamp(camp);
      const gaps = findKitGaps(input).map((gap) => gap.message);
      const isChosen = gaps.length === 0 && (last?.settings.campIds.includes(camp.camp.id) ?? true);
      return {
        id: camp.camp.id,
        name: camp.camp.details.name,
        gaps,
        foundNames: input.tray.filter((anchor) => anchor.found).map((anchor) => anchor.name),
        isChosen,
        allowFound: last?.settings.foundCampIds.includes(camp.camp.id) ?? false,
      };
    }),
  );
}

/** What a kit can be looked for with, how a running search stands, and what the last one found. */
export async function getKitSearch({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<KitSearchView> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "kit.edit");
  const db = getDb();
  const state = await loadTripState(db, tripId);
  const last = await findKitSearchRow(db, tripId);
  const candidates = await listCandidates(db, ctx, state.kit);
  return {
    candidates: candidates.map((candidate) => toCandidateView(candidate, last)),
    camps: await listKitCamps(state, last),
    spares: last?.settings.spares ?? 0,
    workPriceKg: last?.settings.workPriceKg ?? USUAL_WORK_PRICE_KG,
    allowDoubling: last?.settings.allowDoubling ?? true,
    progress: await getKitProgress({ ctx, input: { tripId } }),
    result: last && {
      outcome: last.outcome,
      foundByName: last.foundByName,
      foundAt: last.foundAt.toISOString(),
      acceptedAt: last.acceptedAt?.toISOString() ?? null,
      isStale: last.acceptedAt === null && fingerprint(state, last.settings) !== last.basis,
      leftOut: state.camps
        .filter((one) => !last.settings.campIds.includes(one.camp.id))
        .map((one) => one.camp.details.name),
    },
  };
}
