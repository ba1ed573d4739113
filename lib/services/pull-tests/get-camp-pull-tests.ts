import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { learningChoice } from "@/db/schema";
import type { CampResult } from "@/lib/calc/types";
import { campRefInput } from "@/lib/domain/camp/schema";
import { NOTHING_LEARNED } from "@/lib/domain/pull-test/learned-grounds";
import { listInfluences } from "@/lib/domain/pull-test/learn";
import { PATCHES } from "@/lib/domain/pull-test/schema";
import type {
  CampPullTestsView,
  PatchLearningView,
  PullTestView,
  ShelterChange,
  ShelterStanding,
} from "@/lib/domain/pull-test/views";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { workOutCamp } from "../analysis/work-out-camp";
import { findCampState, loadTripState, type CampState } from "../plan/load-trip-state";
import { parseInput } from "../trips/parse-input";
import { listCampAnchors, listPhotoIds, listPullRows, type PullTestRow } from "./internal";
import { PAGE_SIZE, toFit, toGroundLearningView, toPullTestView } from "./view";

function standingOf(result: CampResult, pitchId: string): ShelterStanding {
  const shelter = result.shelters.find((one) => one.pitchId === pitchId);
  const weakest = shelter?.tieOuts.find((one) => one.tieOutId === shelter.weakestTieOutId);
  return {
    verdict: shelter?.verdict ?? "unknown",
    holdsToGustMs: shelter?.holdsToGustMs ?? null,
    isHoldsToOpen: shelter?.isHoldsToOpen ?? false,
    margin: weakest?.margin ?? null,
  };
}

/** What each shelter's plan holds by the table, and by what was learned. */
export async function compareStandings(state: CampState): Promise<ShelterChange[]> {
  const byTable = await workOutCamp({ ...state, learned: NOTHING_LEARNED });
  const learned = await workOutCamp(state);
  return state.pitches.map(({ id, name }) => ({
    pitchId: id,
    name,
    byTable: standingOf(byTable.result, id),
    learned: standingOf(learned.result, id),
  }));
}

function viewReadings(
  rows: readonly PullTestRow[],
  { camp, learning }: Pick<CampState, "camp" | "learning">,
  photos: ReadonlyMap<string, string>,
  alsoId: string | null,
): PullTestView[] {
  const shown = rows.filter((row, index) => index < PAGE_SIZE || row.id === alsoId);
  const ids = new Set(shown.map((row) => row.id));
  const kindOf = { main: camp.details.ground?.kind ?? null, second: camp.details.secondGround?.kind ?? null };
  const influences = PATCHES.map((patch) => {
    const own = learning[patch];
    if (!own) return new Map<string, never>();
    return listInfluences(
      rows.filter((row) => row.patch === patch && row.ground.kind === kindOf[patch]),
      ids,
      own,
    );
  });
  return shown.map((row) => {
    const influence = influences.map((one) => one.get(row.id)).find((one) => one !== undefined);
    return toPullTestView(row, toFit(row, kindOf[row.patch ?? "main"], influence), photos.has(row.id));
  });
}

/** A camp's pull tests, what they teach of its ground, and what that does to its plan; `alsoId` beyond the newest. */
export async function getCampPullTests({
  ctx,
  input,
  alsoId = null,
}: {
  ctx: Context;
  input: z.input<typeof campRefInput>;
  alsoId?: string | null;
}): Promise<CampPullTestsView> {
  const { tripId, campId } = parseInput(campRefInput, input);
  await requirePermission(ctx, tripId, "pull-test.read");
  const db = getDb();
  const state = await loadTripState(db, tripId);
  const own = findCampState(state, campId);
  const scope = { kind: "camp", tripId, campId } as const;
  const rows = await listPullRows(db, scope);
  const choices = await db
    .select()
    .from(learningChoice)
    .where(and(eq(learningChoice.tripId, tripId), eq(learningChoice.campId, campId)));
  const { ground, secondGround } = own.camp.details;
  const patches = PATCHES.flatMap((patch): PatchLearningView[] => {
    const kind = (patch === "main" ? ground : secondGround)?.kind;
    const learned = own.learning[patch];
    if (!kind || !learned) return [];
    const usesElsewhere = choices.find((one) => one.patch === patch)?.usesElsewhere ?? true;
    return [{ ...toGroundLearningView(kind, learned), patch, usesElsewhere }];
  });
  const anchors = await listCampAnchors(db, tripId, own.camp.details);
  return {
    campName: own.camp.details.name,
    days: own.camp.days,
    timeZone: state.trip.timeZone,
    patches,
    readings: viewReadings(rows, own, await listPhotoIds(db, scope), alsoId),
    total: rows.length,
    anchors: anchors.map(({ id, name }) => ({ id, name })),
    changes: await compareStandings(own),
  };
}
