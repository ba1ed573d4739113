import { beforeAll, describe, expect, it } from "vitest";
import { makeCast } from "../../helpers/actors";
import { anchorOf, makeCampKit, placementOf, shelterOf, windyCamp } from "../../helpers/camp-kit";
import { codeOf } from "../../helpers/refusals";
import { getDb } from "@/db/client";
import { proposePlan } from "@/lib/calc/plan";
import { newId } from "@/lib/domain/ids";
import { toCampInput } from "@/lib/domain/plan/to-camp-input";
import type { PlanChange } from "@/lib/domain/plan/schema";
import { createCamp } from "@/lib/services/camps/create-camp";
import { updateCamp } from "@/lib/services/camps/update-camp";
import type { Context } from "@/lib/services/context/context";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { createPitch } from "@/lib/services/pitches/create-pitch";
import { deletePitch } from "@/lib/services/pitches/delete-pitch";
import { explainTieOutFor } from "@/lib/services/plan/explain-tie-out-for";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { loadEarlierPlan } from "@/lib/services/plan/earlier-plan";
import { findCampState, loadTripState } from "@/lib/services/plan/load-trip-state";
import { listPlanHistory } from "@/lib/services/plan/list-plan-history";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { createShelter } from "@/lib/services/shelters/create-shelter";
import { updateShelter } from "@/lib/services/shelters/update-shelter";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;

const intent = (baseVersion: number, change: PlanChange, intentId = newId()) => ({ intentId, baseVersion, change });
const place = (tieOutId: string, anchorId: string, more = {}): PlanChange => ({
  type: "place",
  placement: placementOf(kit.pitchId, tieOutId, anchorId, more),
});
const save = (ctx: Context, intents: ReturnType<typeof intent>[]) =>
  savePlanIntents({ ctx, input: { tripId: cast.tripId, campId: kit.campId, intents } });
const read = (ctx: Context) => getCampPlan({ ctx, input: { tripId: cast.tripId, campId: kit.campId } });

beforeAll(async () => {
  cast = await makeCast();
});

describe("a staking plan", () => {
  beforeAll(async () => {
    kit = await makeCampKit(cast.leader.ctx, cast.tripId);
  });

  it("starts empty, with the tray of the kit and the pull worked out", async () => {
    const plan = await read(cast.coLeader.ctx);
    expect(plan.planVersion).toBe(0);
    expect(plan.tray.map((anchor) => [anchor.id, anchor.count])).toEqual([
      [kit.bladeId, 6],
      [kit.wideId, 3],
    ]);
    expect(plan.pitches[0]?.analysis?.design.tieOuts).toHaveLength(8);
    expect(plan.camps[0]?.verdict).toBe("unknown");
    expect(plan.camps[0]?.gaps).toEqual([{ field: "plan.anchors", message: "8 tie-outs have no anchor." }]);
  });

  it("is changed by a leader and a co-leader, and by nobody else", async () => {
    const one = await save(cast.leader.ctx, [intent(0, place("ridge-front", kit.bladeId))]);
    expect(one.outcomes[0]?.outcome).toBe("applied");
    expect(one.planVersion).toBe(1);
    const two = await save(cast.coLeader.ctx, [intent(1, place("ridge-rear", kit.bladeId))]);
    expect(two.planVersion).toBe(2);
    expect(two.savedByName).toBe(cast.coLeader.name);
    expect(await codeOf(save(cast.participant.ctx, [intent(2, place("hem-left", kit.bladeId))]))).toBe("forbidden");
    expect(await codeOf(save(cast.stranger.ctx, [intent(2, place("hem-left", kit.bladeId))]))).toBe("not-found");
    expect(await codeOf(save(cast.otherLeader.ctx, [intent(2, place("hem-left", kit.bladeId))]))).toBe("not-found");
    expect(await codeOf(read(cast.participant.ctx))).toBe("forbidden");
    expect((await read(cast.leader.ctx)).placements).toHaveLength(2);
  });

  it("applies an intent once, however often it comes", async () => {
    const batch = [intent(2, place("hem-left", kit.wideId)), intent(2, place("hem-right", kit.wideId))];
    const first = await save(cast.leader.ctx, batch);
    const again = await save(cast.leader.ctx, batch);
    expect(first.outcomes.map((one) => one.outcome)).toEqual(["applied", "applied"]);
    expect(again.outcomes.map((one) => one.outcome)).toEqual(["repeated", "repeated"]);
    expect(again.planVersion).toBe(first.planVersion);
    expect(again.placements).toEqual(first.placements);
  });

  it("merges changes at different tie-outs and stops at the same one", async () => {
    const base = (await read(cast.leader.ctx)).planVersion;
    await save(cast.leader.ctx, [intent(base, place("corner-front-left", kit.bladeId, { leanDeg: 15 }))]);
    const merged = await save(cast.coLeader.ctx, [intent(base, place("corner-rear-left", kit.bladeId))]);
    expect(merged.outcomes[0]?.outcome).toBe("applied");
    const stopped = await save(cast.coLeader.ctx, [intent(base, place("corner-front-left", kit.wideId))]);
    expect(stopped.outcomes[0]).toMatchObject({ outcome: "conflict", by: cast.leader.name });
    const [outcome] = stopped.outcomes;
    expect(outcome?.outcome === "conflict" && outcome.changes).toEqual([
      `${cast.leader.name}: Ridge tarp, tie-out 8: Three-blade, 200 mm, 15° back`,
    ]);
    expect(stopped.placements.find((one) => one.tieOutId === "corner-front-left")?.anchorId).toBe(kit.bladeId);
  });

  it("lets the same change of two people stand, and a whole plan on an old version wait", async () => {
    const base = (await read(cast.leader.ctx)).planVersion;
    const change = place("corner-front-right", kit.bladeId);
    await save(cast.leader.ctx, [intent(base, change)]);
    const same = await save(cast.coLeader.ctx, [intent(base, change)]);
    expect(same.outcomes[0]?.outcome).toBe("applied");
    expect(same.planVersion).toBe(base + 1);
    const whole = await save(cast.coLeader.ctx, [intent(base, { type: "replace", placements: [] })]);
    expect(whole.outcomes[0]?.outcome).toBe("conflict");
    expect(whole.placements.length).toBeGreaterThan(0);
  });

  it("never takes a count below zero", async () => {
    const { planVersion } = await read(cast.leader.ctx);
    // Six three-blades: two at the ridge, three at corners so far; one is left.
    const answer = await save(cast.leader.ctx, [
      intent(planVersion, place("corner-rear-right", kit.bladeId)),
      intent(planVersion, place("hem-left", kit.bladeId)),
    ]);
    expect(answer.outcomes.map((one) => one.outcome)).toEqual(["applied", "refused"]);
    expect(answer.outcomes[1]).toMatchObject({
      reason: "All 6 of Three-blade, 200 mm are placed. Lift one first.",
    });
    const cord = await save(cast.leader.ctx, [
      intent(answer.planVersion, place("hem-left", kit.wideId, { shockCord: true })),
    ]);
    expect(cord.outcomes[0]).toMatchObject({ outcome: "refused", reason: "The kit has no shock cord." });
  });

  it("refuses ids of other trips and camps, nested or not", async () => {
    const other = await makeCampKit(cast.otherLeader.ctx, cast.otherTripId);
    const { planVersion, placements } = await read(cast.leader.ctx);
    const lift: PlanChange = { type: "lift", pitchId: kit.pitchId, tieOutId: "hem-left" };
    const foreign: PlanChange[] = [
      { type: "place", placement: placementOf(other.pitchId, "hem-left", kit.wideId) },
      place("hem-left", other.wideId),
      place("hem-left", kit.wideId, { tandem: { anchorId: other.bladeId, spacingM: 0.2 } }),
      { type: "replace", placements: [placementOf(kit.pitchId, "no-such-tie-out", kit.wideId)] },
      { type: "lift", pitchId: other.pitchId, tieOutId: "hem-left" },
      {
        type: "swap",
        from: { pitchId: other.pitchId, tieOutId: "hem-left" },
        to: { pitchId: kit.pitchId, tieOutId: "hem-left" },
      },
    ];
    const answer = await save(
      cast.leader.ctx,
      foreign.map((change) => intent(planVersion, change)),
    );
    expect(answer.outcomes.map((one) => one.outcome)).toEqual(foreign.map(() => "refused"));
    expect(answer.placements).toEqual(placements);
    const crossed = savePlanIntents({
      ctx: cast.leader.ctx,
      input: { tripId: cast.tripId, campId: other.campId, intents: [intent(0, lift)] },
    });
    expect(await codeOf(crossed)).toBe("not-found");
    // An intent id that somebody used on another trip does nothing here.
    const used = intent(0, { type: "place", placement: placementOf(other.pitchId, "hem-left", other.bladeId) });
    await savePlanIntents({
      ctx: cast.otherLeader.ctx,
      input: { tripId: cast.otherTripId, campId: other.campId, intents: [used] },
    });
    const stolen = await save(cast.leader.ctx, [intent(planVersion, lift, used.intentId)]);
    expect(stolen.outcomes[0]?.outcome).toBe("refused");
  });

  it("keeps every change in a history that adds up to the plan", async () => {
    const plan = await read(cast.leader.ctx);
    const input = { tripId: cast.tripId, campId: kit.campId };
    const history = await listPlanHistory({ ctx: cast.coLeader.ctx, input });
    expect(history[0]?.planVersion).toBe(plan.planVersion);
    const state = await loadTripState(getDb(), cast.tripId);
    const at = (version: number) => loadEarlierPlan(getDb(), findCampState(state, kit.campId), cast.tripId, version);
    const rebuilt = await at(plan.planVersion);
    const sorted = (placements: readonly { tieOutId: string }[]) =>
      [...placements].sort((a, b) => (a.tieOutId < b.tieOutId ? -1 : 1));
    expect(sorted(rebuilt.placements)).toEqual(sorted(plan.placements));
    const early = await at(1);
    expect(early.placements.map((one) => one.tieOutId)).toEqual(["ridge-front"]);
    expect(await codeOf(listPlanHistory({ ctx: cast.participant.ctx, input }))).toBe("forbidden");
  });

  it("explains a margin from the wind to the verdict", async () => {
    const input = { tripId: cast.tripId, campId: kit.campId, pitchId: kit.pitchId, tieOutId: "ridge-front" };
    const view = await explainTieOutFor({ ctx: cast.coLeader.ctx, input });
    expect(view.pitchName).toBe("Ridge tarp");
    expect(view.result.margin).toBeGreaterThan(0);
    expect(view.explanation.sections.length).toBeGreaterThan(3);
    expect(await codeOf(explainTieOutFor({ ctx: cast.coLeader.ctx, input: { ...input, tieOutId: "nowhere" } }))).toBe(
      "not-found",
    );
    expect(await codeOf(explainTieOutFor({ ctx: cast.stranger.ctx, input }))).toBe("not-found");
  });

  it("tells whoever has it open when a shelter goes or changes its kind", async () => {
    const { ctx } = cast.leader;
    const { tripId } = cast;
    const { planVersion, placements } = await read(ctx);
    const lifted = await updateShelter({
      ctx,
      input: { tripId, shelterId: kit.shelterId, version: 1, details: shelterOf("pyramid", { name: "Ridge tarp" }) },
    });
    const after = await read(ctx);
    expect(lifted.lifted).toBe(placements.length - after.placements.length);
    expect(after.planVersion).toBe(planVersion + lifted.lifted);
    await save(ctx, [intent(after.planVersion, place("corner-front-left", kit.bladeId))]);
    const gone = deletePitch({ ctx, input: { tripId, campId: kit.campId, pitchId: kit.pitchId } });
    expect(await codeOf(gone)).toBe("in-use");
    await deletePitch({ ctx, input: { tripId, campId: kit.campId, pitchId: kit.pitchId, confirmed: true } });
    expect((await read(ctx)).placements).toEqual([]);
  });
});

describe("many changes at once", () => {
  beforeAll(async () => {
    kit = await makeCampKit(cast.leader.ctx, cast.tripId, { name: "Low Barn" });
  });

  it("loses none of twenty parallel saves of two people", async () => {
    const tieOuts = (await read(cast.leader.ctx)).pitches[0]?.analysis?.design.tieOuts.map((one) => one.tieOutId) ?? [];
    const { kitItemId } = await createKitItem({
      ctx: cast.leader.ctx,
      input: { tripId: cast.tripId, details: anchorOf("long-nail-230", 20) },
    });
    const answers = await Promise.all(
      Array.from({ length: 20 }, (_, index) => {
        const ctx = index % 2 === 0 ? cast.leader.ctx : cast.coLeader.ctx;
        // Each person has four tie-outs of their own and comes back to them with another lean.
        const own = tieOuts[(index % 2) * 4 + (Math.floor(index / 2) % 4)] ?? "";
        return save(ctx, [intent(0, place(own, kitItemId, { leanDeg: index }))]);
      }),
    );
    expect(answers.every((answer) => answer.outcomes[0]?.outcome === "applied")).toBe(true);
    expect(new Set(answers.map((answer) => answer.planVersion)).size).toBe(20);
    const plan = await read(cast.leader.ctx);
    expect(plan.planVersion).toBe(20);
    expect(plan.placements).toHaveLength(8);
    const history = await listPlanHistory({
      ctx: cast.leader.ctx,
      input: { tripId: cast.tripId, campId: kit.campId },
    });
    expect(history).toHaveLength(20);
  });

  it("gives the last anchor to one of twenty who want it", async () => {
    const { ctx } = cast.leader;
    const { tripId } = cast;
    const { kitItemId } = await createKitItem({ ctx, input: { tripId, details: anchorOf("steel-rod-300", 1) } });
    const { campId } = await createCamp({ ctx, input: { tripId, details: windyCamp({ name: "Last one" }) } });
    const pitches = await Promise.all(
      Array.from({ length: 3 }, async (_, index) => {
        const details = shelterOf("ridge-tarp", { name: `Tarp ${index}` });
        const { shelterId } = await createShelter({ ctx, input: { tripId, details } });
        return createPitch({ ctx, input: { tripId, campId, shelterId } });
      }),
    );
    const tieOuts = ["ridge-front", "ridge-rear", "hem-left", "hem-right", "corner-front-left", "corner-rear-left"];
    const spots = pitches.flatMap(({ pitchId }) => tieOuts.map((tieOutId) => ({ pitchId, tieOutId })));
    const answers = await Promise.all(
      spots.map(({ pitchId, tieOutId }, index) =>
        savePlanIntents({
          ctx: index % 2 === 0 ? cast.leader.ctx : cast.coLeader.ctx,
          input: {
            tripId,
            campId,
            intents: [intent(0, { type: "place", placement: placementOf(pitchId, tieOutId, kitItemId) })],
          },
        }),
      ),
    );
    expect(answers.filter((answer) => answer.outcomes[0]?.outcome === "applied")).toHaveLength(1);
    const plan = await getCampPlan({ ctx, input: { tripId, campId } });
    expect(plan.placements).toHaveLength(1);
  });
});

describe("a proposal", () => {
  it("is saved as a whole plan, and what it was tied to can go", async () => {
    const { ctx } = cast.leader;
    const { tripId } = cast;
    kit = await makeCampKit(ctx, tripId, { name: "Harrow Wood", hasTrees: true, hasRocks: true });
    const plan = await read(ctx);
    expect(plan.tray.filter((anchor) => anchor.found).map((anchor) => anchor.id)).toEqual([
      "rock-20",
      "rock-40",
      "tree",
    ]);
    const input = toCampInput(plan.camp.details, plan.pitches, plan.tray, plan.placements, plan.learned);
    const placements = [...proposePlan(input, { allowFound: true, allowDoubling: true }).placements];
    const saved = await save(ctx, [intent(0, { type: "replace", placements })]);
    expect(saved.outcomes[0]?.outcome).toBe("applied");
    const { version, details } = plan.camp;
    const found = placements.filter((one) => ["tree", "rock-20", "rock-40"].includes(one.anchorId));
    expect(found.length).toBeGreaterThan(0);
    const answer = await updateCamp({
      ctx,
      input: { tripId, campId: kit.campId, version, details: { ...details, hasTrees: false, hasRocks: false } },
    });
    expect(answer.lifted).toBe(found.length);
    const after = await read(ctx);
    expect(after.placements).toHaveLength(placements.length - found.length);
    // The plan goes on from there.
    const next = await save(ctx, [intent(after.planVersion, { type: "replace", placements: [] })]);
    expect(next.outcomes[0]?.outcome).toBe("applied");
  });
});
