import { makeCast } from "../../helpers/actors";
import { anchorOf, makeCampKit, placementOf, windyCamp } from "../../helpers/camp-kit";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { beforeEach, describe, expect, it } from "vitest";
import { eq } from "drizzle-orm";
import { getDb } from "@/db/client";
import { kitSearch } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import type { KitSearchSettings } from "@/lib/domain/kit/search-schema";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { createCamp } from "@/lib/services/camps/create-camp";
import { listCampSummaries } from "@/lib/services/camps/list-camp-summaries";
import { acceptKit } from "@/lib/services/kit-search/accept-kit";
import { cancelKitSearch } from "@/lib/services/kit-search/cancel-kit-search";
import { getKitProgress } from "@/lib/services/kit-search/get-kit-progress";
import { getKitSearch } from "@/lib/services/kit-search/get-kit-search";
import { startKitSearch } from "@/lib/services/kit-search/start-kit-search";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { listKit } from "@/lib/services/kit/list-kit";
import { createPitch } from "@/lib/services/pitches/create-pitch";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;

beforeEach(async () => {
  cast = await makeCast();
  kit = await makeCampKit(cast.leader.ctx, cast.tripId, { wind: { kind: "gust", speedMs: 7 } });
});

const settingsOf = (over: Partial<KitSearchSettings> = {}): KitSearchSettings => ({
  kinds: [
    { source: "kit", id: kit.bladeId, most: 6 },
    { source: "kit", id: kit.wideId, most: 8 },
  ],
  campIds: [kit.campId],
  foundCampIds: [],
  spares: 0,
  workPriceKg: 0.02,
  allowDoubling: true,
  ...over,
});

async function search(over: Partial<KitSearchSettings> = {}) {
  const { ctx } = cast.leader;
  const { tripId } = cast;
  await startKitSearch({ ctx, input: { tripId, settings: settingsOf(over) } });
  for (;;) {
    const { isRunning } = await getKitProgress({ ctx, input: { tripId } });
    if (!isRunning) return getKitSearch({ ctx, input: { tripId } });
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
}

describe("finding a kit", () => {
  it("leaves kit and plans alone until it is taken over, then every camp holds with the counts found", async () => {
    const { ctx } = cast.leader;
    const { tripId } = cast;
    const before = await listKit({ ctx, input: { tripId } });
    const view = await search();
    const outcome = view.result?.outcome;
    if (outcome?.status !== "found") throw new Error(JSON.stringify(outcome));
    expect(outcome.gap).toBe(0);
    expect(view.result?.isStale).toBe(false);
    expect(await listKit({ ctx, input: { tripId } })).toEqual(before);

    await acceptKit({ ctx, input: { tripId } });
    const counts = new Map(outcome.kinds.map((kind) => [kind.id, kind.count]));
    for (const item of await listKit({ ctx, input: { tripId } })) {
      expect(item.details.count).toBe(counts.get(item.id));
      expect(item.mostUsed).toBeLessThanOrEqual(item.details.count);
    }
    const [camp] = await listCampSummaries({ ctx, input: { tripId } });
    expect(camp?.verdict).toBe("holds");
    const plan = await getCampPlan({ ctx, input: { tripId, campId: kit.campId } });
    expect(plan.placements).toHaveLength(8);
    expect(plan.planVersion).toBe(1);
    expect(await codeOf(acceptKit({ ctx, input: { tripId } }))).toBe("conflict");
  });

  it("takes anchors of the library into the kit, and what was found is then the kit's own", async () => {
    const { ctx } = cast.leader;
    const { tripId } = cast;
    await search({ kinds: [{ source: "library", id: "wide-sand-240", most: null }], spares: 1 });
    await acceptKit({ ctx, input: { tripId } });
    const added = (await listKit({ ctx, input: { tripId } })).find((item) =>
      item.details.name.startsWith("Wide sand stake, 240"),
    );
    const plan = await getCampPlan({ ctx, input: { tripId, campId: kit.campId } });
    const doubled = plan.placements.filter((one) => one.tandem !== null).length;
    expect(plan.placements.every((one) => one.anchorId === added?.id)).toBe(true);
    expect(added?.details.count).toBe(plan.placements.length + doubled + 1);
    const after = await getKitSearch({ ctx, input: { tripId } });
    expect(after.candidates.filter((one) => one.isChosen)).toMatchObject([{ source: "kit", id: added?.id }]);
    expect(after.result?.acceptedAt).not.toBeNull();
  });

  it("is not taken over when the camp, the plan or an anchor changed since", async () => {
    const { ctx } = cast.leader;
    const { tripId } = cast;
    await search();
    const placement = placementOf(kit.pitchId, "ridge-front", kit.bladeId);
    const intents = [{ intentId: newId(), baseVersion: 0, change: { type: "place" as const, placement } }];
    await savePlanIntents({ ctx, input: { tripId, campId: kit.campId, intents } });
    expect(await codeOf(acceptKit({ ctx, input: { tripId } }))).toBe("conflict");
    expect((await getKitSearch({ ctx, input: { tripId } })).result?.isStale).toBe(true);
  });

  it("keeps pinned anchors, and asks for a pinned kind that was not chosen", async () => {
    const { ctx } = cast.leader;
    const { tripId } = cast;
    const placement = placementOf(kit.pitchId, "hem-left", kit.wideId, { pinned: true, leanDeg: 0 });
    const intents = [{ intentId: newId(), baseVersion: 0, change: { type: "place" as const, placement } }];
    await savePlanIntents({ ctx, input: { tripId, campId: kit.campId, intents } });
    const only = { kinds: [{ source: "kit" as const, id: kit.bladeId, most: 9 }] };
    expect(await codeOf(startKitSearch({ ctx, input: { tripId, settings: settingsOf(only) } }))).toBe("bad-input");
    const view = await search();
    expect(view.result?.outcome.status).toBe("found");
    await acceptKit({ ctx, input: { tripId } });
    const plan = await getCampPlan({ ctx, input: { tripId, campId: kit.campId } });
    expect(plan.placements.find((one) => one.tieOutId === "hem-left")).toEqual(placement);
  });

  it("keeps what a camp that was left out uses", async () => {
    const { ctx } = cast.leader;
    const { tripId } = cast;
    const { kitItemId } = await createKitItem({ ctx, input: { tripId, details: anchorOf("steel-pin-450", 5) } });
    const placement = placementOf(kit.pitchId, "ridge-front", kitItemId);
    const intents = [{ intentId: newId(), baseVersion: 0, change: { type: "place" as const, placement } }];
    await savePlanIntents({ ctx, input: { tripId, campId: kit.campId, intents } });
    const wind = { kind: "gust" as const, speedMs: 7 };
    const { campId } = await createCamp({ ctx, input: { tripId, details: windyCamp({ name: "Low Barn", wind }) } });
    expect(await codeOf(search({ campIds: [campId] }))).toBe("bad-input");
    const view = await getKitSearch({ ctx, input: { tripId } });
    expect(view.camps.find((one) => one.id === campId)?.gaps.join()).toMatch(/shelter/);
    await createPitch({ ctx, input: { tripId, campId, shelterId: kit.shelterId } });
    const found = await search({
      campIds: [campId],
      kinds: [...settingsOf().kinds, { source: "kit", id: kitItemId, most: 5 }],
    });
    expect(found.result?.leftOut).toEqual(["Otter Flat"]);
    await acceptKit({ ctx, input: { tripId } });
    const pins = (await listKit({ ctx, input: { tripId } })).find((item) => item.id === kitItemId);
    expect(pins?.details.count).toBe(1);
  });

  it("says where nothing holds and up to which gust, and leaves the last kit found in place when refused", async () => {
    const view = await search({ kinds: [{ source: "kit", id: kit.bladeId, most: 2 }] });
    const outcome = view.result?.outcome;
    if (outcome?.status !== "short") throw new Error("two stakes hold a tarp");
    const [camp] = outcome.camps;
    expect(camp).toMatchObject({ campName: "Otter Flat", fallen: [], gustMs: 7 });
    expect(camp?.available).toBeLessThan(camp?.needed ?? 0);
    expect(camp?.holdsToMs).toBeLessThan(7);
    expect(await codeOf(acceptKit({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } }))).toBe("bad-input");
    const gap = await createCamp({
      ctx: cast.leader.ctx,
      input: { tripId: cast.tripId, details: windyCamp({ name: "No wind", wind: null, ground: null }) },
    });
    expect(await codeOf(search({ campIds: [kit.campId, gap.campId] }))).toBe("bad-input");
    const rows = await getDb().select().from(kitSearch).where(eq(kitSearch.tripId, cast.tripId));
    expect(rows).toHaveLength(1);
  });

  it("can be stopped, and says so", async () => {
    const { ctx } = cast.leader;
    const input = { tripId: cast.tripId };
    await startKitSearch({ ctx, input: { ...input, settings: settingsOf() } });
    expect(await codeOf(startKitSearch({ ctx, input: { ...input, settings: settingsOf() } }))).toBe("conflict");
    await cancelKitSearch({ ctx, input });
    await new Promise((resolve) => setTimeout(resolve, 10));
    expect(await getKitProgress({ ctx, input })).toMatchObject({ isRunning: false, failure: /stopped/ });
    expect((await getKitSearch({ ctx, input })).result).toBeNull();
  });

  it.each([
    ["no anchors", { kinds: [] }, "settings.kinds"],
    ["no camps", { campIds: [] }, "settings.campIds"],
    ["an anchor that is none", { kinds: [{ source: "library" as const, id: "no-such", most: 1 }] }, "settings.kinds"],
    ["a negative count", { kinds: [{ source: "library" as const, id: "v-160", most: -1 }] }, "settings.kinds.0.most"],
    ["half an anchor", { kinds: [{ source: "library" as const, id: "v-160", most: 1.5 }] }, "settings.kinds.0.most"],
    ["spares without end", { spares: 1e9 }, "settings.spares"],
    ["work at a negative price", { workPriceKg: -1 }, "settings.workPriceKg"],
    ["a price that is no number", { workPriceKg: NaN }, "settings.workPriceKg"],
  ])("refuses %s, and starts nothing", async (_what, over, field) => {
    const { ctx } = cast.leader;
    const input = { tripId: cast.tripId, settings: settingsOf(over) };
    expect(Object.keys((await refusalOf(startKitSearch({ ctx, input }))).fieldErrors)).toEqual([field]);
    expect(await getKitProgress({ ctx, input })).toEqual({ isRunning: false, progress: null, failure: null });
  });

  it("is for leaders of the trip only", async () => {
    const input = { tripId: cast.tripId };
    for (const [who, code] of [
      [cast.participant, "forbidden"],
      [cast.stranger, "not-found"],
      [cast.otherLeader, "not-found"],
    ] as const) {
      const { ctx } = who;
      expect(await codeOf(startKitSearch({ ctx, input: { ...input, settings: settingsOf() } }))).toBe(code);
      expect(await codeOf(getKitSearch({ ctx, input }))).toBe(code);
      expect(await codeOf(getKitProgress({ ctx, input }))).toBe(code);
      expect(await codeOf(cancelKitSearch({ ctx, input }))).toBe(code);
      expect(await codeOf(acceptKit({ ctx, input }))).toBe(code);
    }
  });
});
