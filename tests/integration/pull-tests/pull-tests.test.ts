import { beforeEach, describe, expect, it } from "vitest";
import { makeCast, makePerson, makeTrip, makeUser } from "../../helpers/actors";
import { makeCampKit, placementOf, windyCamp } from "../../helpers/camp-kit";
import { practicePullOf, pullOf } from "../../helpers/pulls";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { hashTables } from "../../helpers/table-hash";
import { newId } from "@/lib/domain/ids";
import { createCamp } from "@/lib/services/camps/create-camp";
import { getCamp } from "@/lib/services/camps/get-camp";
import { updateCamp } from "@/lib/services/camps/update-camp";
import { explainTieOutFor } from "@/lib/services/plan/explain-tie-out-for";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { chooseElsewhere, startAgainFromTable } from "@/lib/services/pull-tests/choose-learning";
import { createCampPullTest, createPracticePullTest } from "@/lib/services/pull-tests/create-pull-test";
import { deletePullTest } from "@/lib/services/pull-tests/delete-pull-test";
import { getCampPullTests } from "@/lib/services/pull-tests/get-camp-pull-tests";
import { getPracticeField } from "@/lib/services/pull-tests/get-practice-field";
import { logCampPull } from "@/lib/services/pull-tests/log-camp-pull";
import { switchPullTest } from "@/lib/services/pull-tests/switch-pull-test";
import { updateCampPullTest } from "@/lib/services/pull-tests/update-pull-test";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;
let at: { tripId: string; campId: string };

beforeEach(async () => {
  cast = await makeCast();
  kit = await makeCampKit(cast.leader.ctx, cast.tripId);
  at = { tripId: cast.tripId, campId: kit.campId };
  const placement = placementOf(kit.pitchId, "ridge-front", kit.bladeId);
  const change = { type: "place" as const, placement };
  await savePlanIntents({
    ctx: cast.leader.ctx,
    input: { ...at, intents: [{ intentId: newId(), baseVersion: 0, change }] },
  });
});

const log = (over: Parameters<typeof pullOf>[1] = {}, ctx = cast.leader.ctx) =>
  logCampPull({ ctx, input: { ...at, ...pullOf(newId(), over) } });
const view = () => getCampPullTests({ ctx: cast.leader.ctx, input: at });
const learnedOf = async (campId = kit.campId) =>
  (await getCampPlan({ ctx: cast.leader.ctx, input: { tripId: cast.tripId, campId } })).learned;
const marginOf = async () => {
  const input = { ...at, pitchId: kit.pitchId, tieOutId: "ridge-front" };
  return (await explainTieOutFor({ ctx: cast.leader.ctx, input })).result.margin ?? 0;
};

describe("a reading at a camp", () => {
  it("moves the ground's estimate and every margin that stands on it, and says so", async () => {
    expect(await learnedOf()).toEqual({ main: null, second: null });
    const before = await marginOf();
    const strong = await log({ force: 400, forceUnit: "N" });
    expect(strong.before.factor).toBeNull();
    expect(strong.after.factor).toBeGreaterThan(1.2);
    const { main } = await learnedOf();
    expect(main?.factor).toBe(strong.after.factor);
    const lifted = await marginOf();
    expect(lifted).toBeGreaterThan(before * 1.2);
    const { patches, changes, readings } = await view();
    expect(patches[0]).toMatchObject({ from: "own", ownCount: 1, kind: "firm-moist-loam" });
    expect(readings[0]?.fit).toMatchObject({ status: "counts", kind: "exact" });
    expect(changes[0]?.name).toBe("Ridge tarp");

    await log({ force: 20, forceUnit: "N" });
    expect(await marginOf()).toBeLessThan(lifted);
  });

  it("that only held never lowers what can be relied on", async () => {
    await log({ force: 150, forceUnit: "N" });
    const before = (await view()).patches[0];
    await log({ force: 30, forceUnit: "N", outcome: "still-holding" });
    await log({ force: 170, forceUnit: "N", outcome: "bent" });
    const after = (await view()).patches[0];
    expect(after?.factor).toBeGreaterThan(before?.factor ?? 9);
    expect(after?.dependableFactor).toBeGreaterThan(before?.dependableFactor ?? 9);
    expect(after?.ownCount).toBe(3);
  });

  it("is switched off and on, corrected, deleted; the table comes back when none counts", async () => {
    const { pullTestId } = await log({ force: 400, forceUnit: "N" });
    const learned = await learnedOf();
    const { ctx } = cast.coLeader;
    await switchPullTest({ ctx, input: { pullTestId, isOff: true } });
    expect(await learnedOf()).toEqual({ main: null, second: null });
    expect((await view()).readings[0]?.fit.status).toBe("off");
    await switchPullTest({ ctx, input: { pullTestId, isOff: false } });
    expect(await learnedOf()).toEqual(learned);
    const input = { ...at, ...pullOf(pullTestId, { force: 100, forceUnit: "N" }), anchorId: "as-logged", version: 3 };
    expect(await updateCampPullTest({ ctx, input })).toEqual({ version: 4 });
    expect((await refusalOf(updateCampPullTest({ ctx, input }))).code).toBe("conflict");
    expect((await learnedOf()).main?.factor).toBeLessThan(1);
    await deletePullTest({ ctx, input: { pullTestId } });
    expect((await view()).total).toBe(0);
  });

  it("is made once however often the form is sent", async () => {
    const input = { ...at, ...pullOf(newId()) };
    await createCampPullTest({ ctx: cast.leader.ctx, input });
    await createCampPullTest({ ctx: cast.leader.ctx, input });
    expect((await view()).total).toBe(1);
    const other = await makeCampKit(cast.otherLeader.ctx, cast.otherTripId);
    const foreign = { ...input, tripId: cast.otherTripId, campId: other.campId };
    expect(await codeOf(createCampPullTest({ ctx: cast.otherLeader.ctx, input: foreign }))).toBe("conflict");
  });

  it("keeps the ground it was logged in when the camp's ground becomes another", async () => {
    await log({ force: 400, forceUnit: "N" });
    const { ctx } = cast.leader;
    const { version } = await getCamp({ ctx, input: at });
    const sand = { kind: "dry-loose-sand" as const, wetness: "usual" as const, looseTopM: null, stoneDepthM: null };
    await updateCamp({ ctx, input: { ...at, version, details: windyCamp({ ground: sand }) } });
    const { patches, readings } = await view();
    expect(patches[0]).toMatchObject({ from: "table", kind: "dry-loose-sand" });
    expect(readings[0]?.fit).toEqual({ status: "other-ground", groundName: "Firm moist loam" });
  });

  it("points out what does not fit and what must be a slip, and drops neither silently", async () => {
    for (const force of [160, 170, 150, 165]) await log({ force, forceUnit: "N" });
    await log({ force: 15, forceUnit: "N", note: "a root hole" });
    await log({ force: 19, forceUnit: "N", outcome: "came-out", depthOutM: 0.02 });
    await log({ force: 6000, forceUnit: "N", outcome: "came-out" });
    const byForce = new Map((await view()).readings.map((one) => [one.force, one.fit]));
    expect(byForce.get(160)).toMatchObject({ status: "counts", isOutlier: false });
    expect(byForce.get(15)).toMatchObject({ status: "counts", isOutlier: true });
    expect(byForce.get(6000)).toMatchObject({ status: "implausible" });
  });
});

describe("readings elsewhere", () => {
  const secondCamp = async () =>
    (
      await createCamp({
        ctx: cast.leader.ctx,
        input: { tripId: cast.tripId, details: windyCamp({ name: "Low Barn" }) },
      })
    ).campId;

  it("in the same kind of ground count for less, and not at all once they are left out", async () => {
    const campId = await secondCamp();
    await log({ force: 400, forceUnit: "N" });
    const own = (await learnedOf()).main?.factor ?? 0;
    const away = (await learnedOf(campId)).main?.factor ?? 0;
    expect(away).toBeGreaterThan(1.05);
    expect(away).toBeLessThan(own);
    const input = { tripId: cast.tripId, campId };
    const there = () => getCampPullTests({ ctx: cast.leader.ctx, input });
    expect((await there()).patches[0]).toMatchObject({ from: "elsewhere", elsewhereCount: 1, placeCount: 1 });
    await chooseElsewhere({ ctx: cast.coLeader.ctx, input: { ...input, patch: "main", usesElsewhere: false } });
    expect((await learnedOf(campId)).main).toBeNull();
    expect((await there()).patches[0]).toMatchObject({ from: "table", usesElsewhere: false });
  });

  it("come from the practice field of whoever leads, never from a participant's or a stranger's", async () => {
    const practise = async (ctx: typeof cast.leader.ctx) => {
      const { pullTestId } = await createPracticePullTest({
        ctx,
        input: practicePullOf(newId(), { force: 400, forceUnit: "N" }),
      });
      return pullTestId;
    };
    await practise(cast.participant.ctx);
    await practise(cast.stranger.ctx);
    expect((await learnedOf()).main).toBeNull();
    await practise(cast.coLeader.ctx);
    expect((await learnedOf()).main?.factor).toBeGreaterThan(1.05);
    // Nobody else sees them one by one.
    expect((await getPracticeField({ ctx: cast.leader.ctx })).total).toBe(0);
    expect((await view()).readings).toEqual([]);
  });

  it("start again from the table switches off and leaves out, and loses none", async () => {
    const campId = await secondCamp();
    await log({ force: 400, forceUnit: "N" });
    await logCampPull({
      ctx: cast.leader.ctx,
      input: { tripId: cast.tripId, campId, ...pullOf(newId(), { force: 300, forceUnit: "N" }) },
    });
    const input = { ...at, patch: "main" as const };
    expect(await startAgainFromTable({ ctx: cast.leader.ctx, input })).toEqual({ switchedOff: 1 });
    expect((await learnedOf()).main).toBeNull();
    expect((await view()).total).toBe(1);
    expect((await learnedOf(campId)).main?.factor).toBeGreaterThan(1);
  });
});

describe("who may", () => {
  it("log, read and change: leader and co-leader; a participant is refused, a stranger finds nothing", async () => {
    const { pullTestId } = await log({}, cast.coLeader.ctx);
    const before = await hashTables();
    for (const [who, code] of [
      [cast.participant, "forbidden"],
      [cast.stranger, "not-found"],
      [cast.otherLeader, "not-found"],
    ] as const) {
      const { ctx } = who;
      expect(await codeOf(log({}, ctx))).toBe(code);
      expect(await codeOf(getCampPullTests({ ctx, input: at }))).toBe(code);
      expect(await codeOf(switchPullTest({ ctx, input: { pullTestId, isOff: true } }))).toBe(code);
      expect(await codeOf(deletePullTest({ ctx, input: { pullTestId } }))).toBe(code);
      expect(await codeOf(startAgainFromTable({ ctx, input: { ...at, patch: "main" } }))).toBe(code);
      const update = { ...at, ...pullOf(pullTestId), version: 1 };
      expect(await codeOf(updateCampPullTest({ ctx, input: update }))).toBe(code);
    }
    expect(await hashTables()).toEqual(before);
  });

  it("of another trip's camp or reading: nothing, even for a leader of both", async () => {
    const twice = await makeUser();
    const tripId = await makeTrip();
    await makePerson(tripId, "leader", twice);
    const own = await makeCampKit(twice.ctx, tripId);
    const { pullTestId } = await log();
    const before = await hashTables();
    const { ctx } = twice;
    const foreignCamp = { tripId, campId: kit.campId, ...pullOf(newId()) };
    expect(await codeOf(createCampPullTest({ ctx, input: foreignCamp }))).toBe("not-found");
    const foreignReading = { tripId, campId: own.campId, ...pullOf(pullTestId), version: 1 };
    expect(await codeOf(updateCampPullTest({ ctx, input: foreignReading }))).toBe("not-found");
    expect(await hashTables()).toEqual(before);
  });
});

describe("bad readings", () => {
  it.each([
    [{ force: 0 }, "reading.force"],
    [{ force: -5 }, "reading.force"],
    [{ force: 20_001, forceUnit: "N" as const }, "reading.force"],
    [{ force: 2040, forceUnit: "kgf" as const }, "reading.force"],
    [{ force: 0.5, forceUnit: "N" as const }, "reading.force"],
    [{ force: Number.NaN }, "reading.force"],
    [{ leanDeg: 61 }, "reading.leanDeg"],
    [{ lineAngleDeg: -1 }, "reading.lineAngleDeg"],
    [{ depthOutM: 0.2 }, "reading.depthOutM"],
    [{ patch: "second" as const }, "reading.patch"],
    [{ note: "x".repeat(501) }, "reading.note"],
  ])("%j is refused at %s and nothing is stored", async (over, field) => {
    const before = await hashTables();
    const refusal = await refusalOf(log(over));
    expect(refusal.code).toBe("bad-input");
    expect(Object.keys(refusal.fieldErrors)).toEqual([field]);
    expect(await hashTables()).toEqual(before);
  });

  it("an anchor that is not there, and one that says nothing of the ground", async () => {
    for (const anchorId of ["no-such-anchor", newId(), "rock-20", "tree"]) {
      const input = { ...at, ...pullOf(newId()), anchorId };
      const refusal = await refusalOf(createCampPullTest({ ctx: cast.leader.ctx, input }));
      expect(Object.keys(refusal.fieldErrors), anchorId).toEqual(["anchorId"]);
    }
  });

  it("a stake in rock", async () => {
    const { ctx } = cast.leader;
    const ground = { kind: "rock-slab" as const, wetness: "usual" as const, looseTopM: null, stoneDepthM: null };
    const { campId } = await createCamp({ ctx, input: { tripId: cast.tripId, details: windyCamp({ ground }) } });
    const input = { tripId: cast.tripId, campId, ...pullOf(newId()) };
    expect((await refusalOf(createCampPullTest({ ctx, input }))).code).toBe("bad-input");
    expect((await getCampPullTests({ ctx, input: { tripId: cast.tripId, campId } })).patches[0]?.from).toBe("table");
  });
});
