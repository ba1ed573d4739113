import { beforeEach, describe, expect, it } from "vitest";
import { makeCast } from "../../helpers/actors";
import { makeCampKit, placementOf } from "../../helpers/camp-kit";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { newId } from "@/lib/domain/ids";
import type { PlanChange } from "@/lib/domain/plan/schema";
import type { Context } from "@/lib/services/context/context";
import { listChanges } from "@/lib/services/history/list-changes";
import { deleteKitItem } from "@/lib/services/kit/delete-kit-item";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { previewPlanVersion } from "@/lib/services/plan/preview-plan-version";
import { restorePlanVersion } from "@/lib/services/plan/restore-plan-version";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { createCamp } from "@/lib/services/camps/create-camp";
import { windyCamp } from "../../helpers/camp-kit";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;
const one = <Input extends object>(input: Input) => ({ tripId: cast.tripId, ...input });

async function save(ctx: Context, baseVersion: number, change: PlanChange) {
  const intents = [{ intentId: newId(), baseVersion, change }];
  const { outcomes, planVersion } = await savePlanIntents({ ctx, input: one({ campId: kit.campId, intents }) });
  expect(outcomes[0]?.outcome).toBe("applied");
  return planVersion;
}

const restore = (ctx: Context, version: number, baseVersion: number, intentId = newId()) =>
  restorePlanVersion({ ctx, input: one({ campId: kit.campId, version, baseVersion, intentId }) });
const plan = async () => (await getCampPlan({ ctx: cast.leader.ctx, input: one({ campId: kit.campId }) })).placements;
const preview = (version: number | string, ctx = cast.leader.ctx) =>
  previewPlanVersion({ ctx, input: one({ campId: kit.campId, version }) });

beforeEach(async () => {
  cast = await makeCast();
  kit = await makeCampKit(cast.leader.ctx, cast.tripId);
  await save(cast.leader.ctx, 0, { type: "place", placement: placementOf(kit.pitchId, "ridge-front", kit.bladeId) });
  await save(cast.leader.ctx, 1, { type: "place", placement: placementOf(kit.pitchId, "ridge-rear", kit.wideId) });
  await save(cast.leader.ctx, 2, { type: "lift", pitchId: kit.pitchId, tieOutId: "ridge-front" });
});

describe("an earlier staking plan", () => {
  it("is shown tie-out by tie-out before anything happens", async () => {
    const before = await plan();
    const shown = await preview(2);
    expect(shown).toMatchObject({ version: 2, currentVersion: 3, campName: "Otter Flat", leftOut: [] });
    expect(shown.rows).toEqual([
      {
        key: `${kit.pitchId} ridge-front`,
        where: "Ridge tarp, tie-out 1",
        now: "no anchor",
        then: expect.stringMatching(/^Three-blade.*two half hitches$/) as string,
      },
    ]);
    expect(await plan()).toEqual(before);
  });

  it("comes back as a new version, which can be taken back the same way", async () => {
    const now = await plan();
    expect(await restore(cast.coLeader.ctx, 2, 3)).toEqual({ planVersion: 4 });
    expect((await plan()).map((each) => each.tieOutId).sort()).toEqual(["ridge-front", "ridge-rear"]);
    expect(await restore(cast.leader.ctx, 3, 4)).toEqual({ planVersion: 5 });
    expect(await plan()).toEqual(now);
    expect((await preview(4)).rows).toHaveLength(1);
  });

  it("pressed twice comes back once", async () => {
    const id = newId();
    await restore(cast.leader.ctx, 2, 3, id);
    expect(await restore(cast.leader.ctx, 2, 3, id)).toEqual({ planVersion: 4 });
  });

  it("stays where it is when somebody changed the plan after one looked", async () => {
    await save(cast.coLeader.ctx, 3, { type: "place", placement: placementOf(kit.pitchId, "ridge-front", kit.wideId) });
    const before = await plan();
    const refusal = await refusalOf(restore(cast.leader.ctx, 2, 3));
    expect(refusal.code).toBe("conflict");
    expect(refusal.userMessage).toContain(cast.coLeader.name);
    expect(await plan()).toEqual(before);
  });

  it("leaves out anchors that are gone, and says so beforehand", async () => {
    const impact = { tripId: cast.tripId, kitItemId: kit.bladeId };
    await deleteKitItem({ ctx: cast.leader.ctx, input: { ...impact, confirmed: true } });
    const shown = await preview(2);
    expect(shown.leftOut).toEqual(["Ridge tarp, tie-out 1: an anchor that is no longer in the kit."]);
    expect(shown.rows).toEqual([]);
    await restore(cast.leader.ctx, 2, shown.currentVersion);
    expect((await plan()).map((each) => each.tieOutId)).toEqual(["ridge-rear"]);
  });

  it("is not there for who may not see it, nor in a version that never was", async () => {
    expect(await codeOf(preview(2, cast.participant.ctx))).toBe("forbidden");
    expect(await codeOf(preview(2, cast.stranger.ctx))).toBe("not-found");
    expect(await codeOf(restore(cast.participant.ctx, 2, 3))).toBe("forbidden");
    expect(await codeOf(restore(cast.otherLeader.ctx, 2, 3))).toBe("not-found");
    expect(await codeOf(preview(99))).toBe("not-found");
    for (const bad of ["x", "0", "-1", "1.5", "1e99"]) expect(await codeOf(preview(bad))).toBe("bad-input");
    expect(await codeOf(restore(cast.leader.ctx, 99, 3))).toBe("not-found");
    expect(await codeOf(restore(cast.leader.ctx, 2, 3, "x"))).toBe("bad-input");
  });
});

describe("who changed what", () => {
  it("is told in words, newest first, by camp and by person", async () => {
    await createCamp({ ctx: cast.leader.ctx, input: one({ details: windyCamp({ name: "Low Barn" }) }) });
    await restore(cast.coLeader.ctx, 2, 3);
    const all = await listChanges({ ctx: cast.leader.ctx, input: one({}) });
    expect(all.entries[0]).toMatchObject({
      byName: cast.coLeader.name,
      what: "changed a staking plan",
      summary: "Otter Flat: staking plan",
    });
    expect(all.entries.map((entry) => entry.summary)).toContain("Low Barn");
    expect(JSON.stringify(all.entries)).not.toContain(kit.campId);
    expect(all.people.map((person) => person.name).sort()).toEqual([cast.coLeader.name, cast.leader.name].sort());

    const atCamp = await listChanges({ ctx: cast.leader.ctx, input: one({ campId: kit.campId }) });
    expect(atCamp.entries.map((entry) => entry.summary)).not.toContain("Low Barn");
    expect(atCamp.entries.map((entry) => entry.summary)).toContain("Ridge tarp at Otter Flat");
    const byCoLeader = await listChanges({ ctx: cast.leader.ctx, input: one({ userId: cast.coLeader.id }) });
    expect(byCoLeader.entries).toHaveLength(1);
    const older = await listChanges({ ctx: cast.leader.ctx, input: one({ before: all.entries[0]?.at }) });
    expect(older.entries.length).toBeLessThan(all.entries.length);
  });

  it("is for leader and co-leader, and of this trip only", async () => {
    expect(await codeOf(listChanges({ ctx: cast.participant.ctx, input: one({}) }))).toBe("forbidden");
    expect(await codeOf(listChanges({ ctx: cast.stranger.ctx, input: one({}) }))).toBe("not-found");
    const foreign = await makeCampKit(cast.otherLeader.ctx, cast.otherTripId);
    const input = one({ campId: foreign.campId });
    expect(await codeOf(listChanges({ ctx: cast.leader.ctx, input }))).toBe("not-found");
    expect(await codeOf(listChanges({ ctx: cast.leader.ctx, input: one({ before: "yesterday" }) }))).toBe("bad-input");
  });
});
