import { beforeAll, describe, expect, it } from "vitest";
import { makeCast } from "../../helpers/actors";
import { anchorOf, makeCampKit, placementOf, shelterOf } from "../../helpers/camp-kit";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { newId } from "@/lib/domain/ids";
import { createGear } from "@/lib/services/gear/create-gear";
import { deleteGear } from "@/lib/services/gear/delete-gear";
import { listGear } from "@/lib/services/gear/list-gear";
import { updateGear } from "@/lib/services/gear/update-gear";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { deleteKitItem } from "@/lib/services/kit/delete-kit-item";
import { findKitItemDependents } from "@/lib/services/kit/find-kit-item-dependents";
import { listKit } from "@/lib/services/kit/list-kit";
import { updateKitItem } from "@/lib/services/kit/update-kit-item";
import { assignCarry } from "@/lib/services/pack/assign-carry";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;
let other: Awaited<ReturnType<typeof makeCampKit>>;
let cordId: string;
const one = <Input extends object>(input: Input) => ({ tripId: cast.tripId, ...input });
const cord = (count: number) => ({ type: "shock-cord" as const, name: "Loop", lengthM: 0.4, massKg: 0.006, count });

beforeAll(async () => {
  cast = await makeCast();
  const { ctx } = cast.leader;
  kit = await makeCampKit(ctx, cast.tripId);
  other = await makeCampKit(cast.otherLeader.ctx, cast.otherTripId);
  cordId = (await createKitItem({ ctx, input: one({ details: cord(2) }) })).kitItemId;
  const placements = [
    placementOf(kit.pitchId, "ridge-front", kit.bladeId, { shockCord: true }),
    placementOf(kit.pitchId, "ridge-rear", kit.bladeId, {
      shockCord: true,
      tandem: { anchorId: kit.wideId, spacingM: 0.2 },
    }),
    placementOf(kit.pitchId, "hem-left", kit.wideId),
  ];
  const intents = [{ intentId: newId(), baseVersion: 0, change: { type: "replace" as const, placements } }];
  await savePlanIntents({ ctx, input: one({ campId: kit.campId, intents }) });
});

describe("the kit", () => {
  it("counts where its things are used, second stakes in line included", async () => {
    const items = await listKit({ ctx: cast.coLeader.ctx, input: one({}) });
    expect(items.map((item) => [item.id, item.mostUsed, item.campNames])).toEqual([
      [kit.bladeId, 2, ["Otter Flat"]],
      [kit.wideId, 2, ["Otter Flat"]],
      [cordId, 0, []],
    ]);
  });

  it("is changed by leaders and co-leaders of this trip only", async () => {
    const details = anchorOf("v-160", 2);
    expect(await codeOf(createKitItem({ ctx: cast.participant.ctx, input: one({ details }) }))).toBe("forbidden");
    expect(await codeOf(createKitItem({ ctx: cast.stranger.ctx, input: one({ details }) }))).toBe("not-found");
    expect(await codeOf(listKit({ ctx: cast.participant.ctx, input: one({}) }))).toBe("forbidden");
    const foreign = one({ kitItemId: other.bladeId, version: 1, details });
    expect(await codeOf(updateKitItem({ ctx: cast.leader.ctx, input: foreign }))).toBe("not-found");
    const gone = one({ kitItemId: other.bladeId, confirmed: true });
    expect(await codeOf(deleteKitItem({ ctx: cast.leader.ctx, input: gone }))).toBe("not-found");
    expect(
      await codeOf(findKitItemDependents({ ctx: cast.otherLeader.ctx, input: one({ kitItemId: kit.bladeId }) })),
    ).toBe("not-found");
  });

  it("can't get smaller than what is placed", async () => {
    const { ctx } = cast.coLeader;
    const few = one({ kitItemId: kit.wideId, version: 1, details: anchorOf("wide-sand-300", 1) });
    expect((await refusalOf(updateKitItem({ ctx, input: few }))).fieldErrors).toEqual({
      "details.count": ["2 of them are placed at Otter Flat. Lift some first."],
    });
    const changed = { ...few, details: cord(5) };
    expect(Object.keys((await refusalOf(updateKitItem({ ctx, input: changed }))).fieldErrors)).toEqual([
      "details.type",
    ]);
    const cords = one({ kitItemId: cordId, version: 1, details: cord(1) });
    expect(Object.keys((await refusalOf(updateKitItem({ ctx, input: cords }))).fieldErrors)).toEqual(["details.count"]);
    const enough = { ...few, details: anchorOf("wide-sand-300", 2) };
    expect(await updateKitItem({ ctx, input: enough })).toEqual({ version: 2 });
    expect((await refusalOf(updateKitItem({ ctx, input: enough }))).details).toMatchObject({
      by: cast.coLeader.name,
      current: { version: 2 },
    });
  });

  it("says what uses a thing before it goes, and mends the plan when it goes", async () => {
    const { ctx } = cast.leader;
    const carries = [{ type: "kit" as const, personId: cast.personIds.participant, kitItemId: kit.wideId, count: 2 }];
    await assignCarry({ ctx, input: one({ carries }) });
    const dependents = await findKitItemDependents({ ctx, input: one({ kitItemId: kit.wideId }) });
    expect(dependents).toEqual(["2 tie-outs at Otter Flat use it.", `${cast.participant.name} carries 2.`]);
    expect(await refusalOf(deleteKitItem({ ctx, input: one({ kitItemId: kit.wideId }) }))).toMatchObject({
      code: "in-use",
      details: { dependents },
    });
    await deleteKitItem({ ctx, input: one({ kitItemId: kit.wideId, confirmed: true }) });
    await deleteKitItem({ ctx, input: one({ kitItemId: cordId, confirmed: true }) });
    const plan = await getCampPlan({ ctx, input: one({ campId: kit.campId }) });
    expect(plan.placements.map((placement) => [placement.tieOutId, placement.tandem, placement.shockCord])).toEqual([
      ["ridge-front", null, false],
      ["ridge-rear", null, false],
    ]);
    expect(plan.planVersion).toBeGreaterThan(1);
  });
});

describe("own gear", () => {
  it("is each person's own", async () => {
    const { ctx } = cast.stranger;
    const details = { type: "shelter" as const, shelter: shelterOf("dome", { name: "My dome" }) };
    const { gearId } = await createGear({ ctx, input: { details } });
    expect((await listGear({ ctx })).map((row) => row.id)).toEqual([gearId]);
    expect(await listGear({ ctx: cast.leader.ctx })).toEqual([]);
    const input = { gearId, version: 1, details };
    expect(await codeOf(updateGear({ ctx: cast.leader.ctx, input }))).toBe("not-found");
    expect(await codeOf(deleteGear({ ctx: cast.leader.ctx, input }))).toBe("not-found");
    expect(await updateGear({ ctx, input })).toEqual({ version: 2 });
    expect(await codeOf(updateGear({ ctx, input }))).toBe("conflict");
    const spec = { ...details.shelter.spec, dimensions: { lengthM: 29 } };
    const tall = { details: { ...details, shelter: { ...details.shelter, spec } } };
    expect(Object.keys((await refusalOf(createGear({ ctx, input: tall }))).fieldErrors)[0]).toMatch(
      /^details\.shelter\.spec\.dimensions\./,
    );
    await deleteGear({ ctx, input: { gearId } });
    expect(await listGear({ ctx })).toEqual([]);
  });
});
