import type { z } from "zod";
import { getDb } from "@/db/client";
import { WITHIN_SHARE } from "@/lib/calc/learning";
import { groundRow } from "@/lib/calc/ground";
import { designPulls } from "@/lib/calc/pull-design";
import { BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import { idSchema } from "@/lib/domain/ids";
import { groupReadings, learnPatch, type PatchLearning } from "@/lib/domain/pull-test/learn";
import { campSheetQuery, practiceSheetQuery, type PracticeSheetView } from "@/lib/domain/pull-test/practice-sheet";
import { newtonsOf, type TestedGround } from "@/lib/domain/pull-test/schema";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { formatInstant } from "@/lib/format/days";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { renderPracticeSheetInWorker } from "@/lib/workers/render-pdf-in-worker";
import { listKitRows } from "../kit/internal";
import { findCampState, loadTripState } from "../plan/load-trip-state";
import { getPreferences } from "../preferences/get-preferences";
import { consumeQuota } from "../quota/consume-quota";
import { parseInput } from "../trips/parse-input";
import { groundOfPatch, listCampAnchors, listPracticeAnchors, listPullRows, type TestAnchor } from "./internal";

const campSheetInput = campSheetQuery.extend({ tripId: idSchema, campId: idSchema });

const LEANS_DEG = [0, 20, 40];
const LINES_DEG = [20, 45, 60];
/** Kinds of anchors on one sheet: more than one carries to a field. */
const MAX_ANCHORS = 6;
const WHEN_NONE = ["three-blade-200", "v-160", "round-hook-180", "wide-sand-300"];

const builtIns = (): TestAnchor[] =>
  BUILT_IN_ANCHORS.filter((one) => WHEN_NONE.includes(one.id)).map(({ id, name, spec }) => ({ id, name, spec }));

interface SheetOptions {
  readonly scale: number | null;
  readonly unit: PracticeSheetView["forceUnit"];
  readonly count: number;
}

function designRows(
  anchors: readonly TestAnchor[],
  ground: TestedGround,
  learning: PatchLearning,
  { scale, unit, count }: SheetOptions,
): PracticeSheetView["rows"] {
  const candidates = anchors.flatMap(({ name, spec }) =>
    (spec.class === "stake" ? LEANS_DEG : [0]).flatMap((leanDeg) =>
      LINES_DEG.map((lineAngleDeg) => ({ name, anchor: spec, ground, leanDeg, lineAngleDeg, depthOutM: 0 })),
    ),
  );
  const pulls = designPulls({
    candidates,
    mean: learning.result.mean,
    deviation: learning.result.deviation,
    within: WITHIN_SHARE * learning.input.tableScatter,
    scaleEndN: scale === null ? null : newtonsOf({ force: scale, forceUnit: unit }),
    count,
  });
  const first = pulls[0]?.gainBits ?? 1;
  return pulls.flatMap(({ index, expectedN, lowN, highN, chanceExact, gainBits }) => {
    const one = candidates[index];
    if (!one) return [];
    const leanDeg = one.anchor.class === "stake" ? one.leanDeg : null;
    const { name: anchorName, lineAngleDeg } = one;
    return [{ anchorName, leanDeg, lineAngleDeg, expectedN, lowN, highN, chanceExact, worth: gainBits / first }];
  });
}

async function render(
  ctx: Context,
  view: PracticeSheetView,
  size: "A4" | "LETTER" | undefined,
): Promise<{ fileName: string; content: Uint8Array }> {
  if (view.rows.length === 0) {
    throw new AppError("bad-input", "No anchor of yours can be pulled in this ground, so there is nothing to plan.");
  }
  await consumeQuota("pdf", ctx.actor.userId);
  const preferences = await getPreferences({ ctx });
  const content = await renderPracticeSheetInWorker({ practiceSheet: view, size: size ?? preferences.paperSize });
  return { fileName: `${view.title}, practice sheet.pdf`, content };
}

/** The most telling pulls for one patch of a camp's ground, by what is known of it now, as a page to write on. */
export async function makeCampSheet({ ctx, input }: { ctx: Context; input: z.input<typeof campSheetInput> }) {
  const { tripId, campId, patch, size, ...options } = parseInput(campSheetInput, input);
  await requirePermission(ctx, tripId, "pull-test.read");
  const db = getDb();
  const state = await loadTripState(db, tripId);
  const { camp, learning } = findCampState(state, campId);
  const wetness = (patch === "main" ? camp.details.ground : camp.details.secondGround)?.wetness ?? "usual";
  const ground = groundOfPatch(camp.details, patch, wetness);
  const learned = learning[patch];
  const kitIds = new Set((await listKitRows(db, tripId)).map((row) => row.id));
  const carried = (await listCampAnchors(db, tripId, camp.details)).filter((one) => kitIds.has(one.id));
  const anchors = (carried.length > 0 ? carried : builtIns()).slice(0, MAX_ANCHORS);
  const view: PracticeSheetView = {
    kicker: `${state.trip.name} · practice sheet`,
    title: camp.details.name,
    groundName: groundRow(ground.kind).name,
    printedAt: formatInstant(new Date(), state.trip.timeZone),
    address: `${env.appUrl}/trips/${tripId}/camps/${campId}/pull-tests`,
    forceUnit: options.unit,
    scaleEndN: options.scale === null ? null : newtonsOf({ force: options.scale, forceUnit: options.unit }),
    rows: learned ? designRows(anchors, ground, learned, options) : [],
  };
  return render(ctx, view, size);
}

/** The same for a practice field in a ground that is chosen, by the person's own readings. */
export async function makePracticeSheet({ ctx, input }: { ctx: Context; input: z.input<typeof practiceSheetQuery> }) {
  const { ground: kind, size, ...options } = parseInput(practiceSheetQuery, input);
  const rows = await listPullRows(getDb(), { kind: "practice", ownerId: ctx.actor.userId });
  const own = (await listPracticeAnchors(ctx)).filter((one) => /^[0-9a-z]{20,}$/.test(one.id));
  const anchors = (own.length > 0 ? own : builtIns()).slice(0, MAX_ANCHORS);
  const learning = learnPatch(groupReadings(rows, kind), "a new place", kind, true);
  const ground: TestedGround = { kind, wetness: "usual", looseTopM: null, stoneDepthM: null, slopeDeg: 0 };
  const view: PracticeSheetView = {
    kicker: "Practice sheet",
    title: "Practice field",
    groundName: groundRow(kind).name,
    printedAt: `${formatInstant(new Date(), "UTC")} UTC`,
    address: `${env.appUrl}/pull-tests`,
    forceUnit: options.unit,
    scaleEndN: options.scale === null ? null : newtonsOf({ force: options.scale, forceUnit: options.unit }),
    rows: designRows(anchors, ground, learning, options),
  };
  return render(ctx, view, size);
}
