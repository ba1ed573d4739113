import { beforeAll, describe, expect, it } from "vitest";
import { makeCast } from "../../helpers/actors";
import { makeCampKit } from "../../helpers/camp-kit";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { addSeasonItems } from "@/lib/services/pack/add-season-items";
import { assignCarry } from "@/lib/services/pack/assign-carry";
import { getLoadPlan } from "@/lib/services/pack/get-load-plan";
import { getPackList } from "@/lib/services/pack/get-pack-list";
import { listPackItems } from "@/lib/services/pack/list-pack-items";
import { saveGroupThings } from "@/lib/services/pack/save-group-things";
import { saveLimit, saveOwnLoad } from "@/lib/services/pack/save-person-load";
import { saveShelterSplit } from "@/lib/services/pack/save-shelter-split";
import { savePackItems } from "@/lib/services/pack/save-pack-items";
import { shareOutEvenly } from "@/lib/services/pack/share-out-evenly";
import { tickPackItem } from "@/lib/services/pack/tick-pack-item";
import { saveSleepers } from "@/lib/services/sleepers/save-sleepers";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;
const one = <Input extends object>(input: Input) => ({ tripId: cast.tripId, ...input });
const line = (name: string, more = {}) => ({ id: null, name, isGroupThing: false, massKg: null, ...more });

beforeAll(async () => {
  cast = await makeCast();
  kit = await makeCampKit(cast.leader.ctx, cast.tripId, { nights: 2 });
});

describe("pack lists", () => {
  it("hold everybody's lines, own lines and where one sleeps", async () => {
    const { ctx } = cast.coLeader;
    const { participant, leader } = cast.personIds;
    await savePackItems({ ctx, input: one({ personId: null, items: [line("Mug"), line("Mat")] }) });
    const items = [line("Stove", { isGroupThing: true, massKg: 0.4 }), line("Flute")];
    await savePackItems({ ctx, input: one({ personId: participant, items }) });
    const sleepers = [
      { personId: participant, pitchId: kit.pitchId },
      { personId: leader, pitchId: kit.pitchId },
    ];
    await saveSleepers({ ctx, input: one({ campId: kit.campId, sleepers }) });
    const list = await getPackList({ ctx: cast.participant.ctx, input: one({ personId: "self" }) });
    expect(list.own.map((row) => row.name).sort()).toEqual(["Flute", "Mat", "Mug"]);
    expect(list.group).toMatchObject([{ name: "Stove", massKg: 0.4 }]);
    expect(list.nights).toMatchObject([
      { day: "2027-06-07", shelterName: "Ridge tarp", withNames: [cast.leader.name] },
      { day: "2027-06-08", shelterName: "Ridge tarp", withNames: [cast.leader.name] },
    ]);
    const other = await getPackList({ ctx, input: one({ personId: "self" }) });
    expect(other.nights[0]).toMatchObject({ shelterName: null, withNames: [] });
  });

  it("are read by their person and by who leads, and edited by who leads", async () => {
    const { participant, leader } = cast.personIds;
    expect((await getPackList({ ctx: cast.coLeader.ctx, input: one({ personId: participant }) })).person.id).toBe(
      participant,
    );
    expect(await codeOf(getPackList({ ctx: cast.participant.ctx, input: one({ personId: leader }) }))).toBe(
      "not-found",
    );
    expect(await codeOf(getPackList({ ctx: cast.stranger.ctx, input: one({ personId: "self" }) }))).toBe("not-found");
    expect(await codeOf(getPackList({ ctx: cast.leader.ctx, input: one({ personId: cast.otherPersonId }) }))).toBe(
      "not-found",
    );
    const input = one({ personId: participant, items: [] });
    expect(await codeOf(savePackItems({ ctx: cast.participant.ctx, input }))).toBe("forbidden");
    const foreign = one({ personId: cast.otherPersonId, items: [line("Spy")] });
    expect(await codeOf(savePackItems({ ctx: cast.leader.ctx, input: foreign }))).toBe("not-found");
    const unknown = one({ personId: participant, items: [line("Mug", { id: "0000000000000000000000000x" })] });
    expect(await codeOf(savePackItems({ ctx: cast.leader.ctx, input: unknown }))).toBe("conflict");
  });

  it("keep ticks of the lines that stay, and take only one's own lines", async () => {
    const { ctx } = cast.participant;
    const before = await getPackList({ ctx, input: one({ personId: "self" }) });
    const [first] = before.own;
    const key = first?.key ?? "";
    await tickPackItem({ ctx, input: one({ key, isTicked: true }) });
    await tickPackItem({ ctx, input: one({ key, isTicked: true }) });
    expect((await getPackList({ ctx, input: one({ personId: "self" }) })).own[0]?.isTicked).toBe(true);
    // Everybody's line, but ticked by one person only.
    const others = await getPackList({ ctx: cast.leader.ctx, input: one({ personId: "self" }) });
    expect(others.own.some((row) => row.isTicked)).toBe(false);
    const own = (await listPackItems({ ctx: cast.leader.ctx, input: one({}) })).find(
      (row) => row.personId === cast.personIds.participant,
    );
    const notMine = one({ key: `item:${own?.id ?? ""}`, isTicked: true });
    expect(await codeOf(tickPackItem({ ctx: cast.coLeader.ctx, input: notMine }))).toBe("not-found");
    const bad = one({ key: "item:'; drop table--", isTicked: true });
    expect(await codeOf(tickPackItem({ ctx, input: bad }))).toBe("bad-input");
    await tickPackItem({ ctx, input: one({ key, isTicked: false }) });
    expect((await getPackList({ ctx, input: one({ personId: "self" }) })).own[0]?.isTicked).toBe(false);
  });
});

describe("loads", () => {
  it("come out even and complete", async () => {
    const { ctx } = cast.coLeader;
    await shareOutEvenly({ ctx, input: one({}) });
    const plan = await getLoadPlan({ ctx, input: one({}) });
    for (const piece of plan.pieces) {
      const given = plan.shares.filter((share) => share.key === piece.key);
      expect(given.reduce((sum, share) => sum + share.count, 0)).toBe(piece.count);
    }
    const list = await getPackList({ ctx: cast.participant.ctx, input: one({ personId: "self" }) });
    expect(list.groupMassKg).toBeGreaterThan(0);
  });

  it("are never more than there is, and stay on this trip", async () => {
    const { ctx } = cast.leader;
    const other = await makeCampKit(cast.otherLeader.ctx, cast.otherTripId);
    const { leader, participant } = cast.personIds;
    const kitLoad = (personId: string, kitItemId: string, count: number) => ({
      type: "kit" as const,
      personId,
      kitItemId,
      count,
    });
    const tarp = (personId: string, shelterId: string) => ({ type: "shelter" as const, personId, shelterId });
    const before = await getLoadPlan({ ctx, input: one({}) });
    for (const carries of [
      [kitLoad(leader, kit.bladeId, 4), kitLoad(participant, kit.bladeId, 3)],
      [tarp(leader, kit.shelterId), tarp(participant, kit.shelterId)],
      [kitLoad(cast.otherPersonId, kit.bladeId, 1)],
      [kitLoad(leader, other.bladeId, 1)],
      [tarp(leader, other.shelterId)],
    ]) {
      expect(Object.keys((await refusalOf(assignCarry({ ctx, input: one({ carries }) }))).fieldErrors)).toEqual([
        "carries",
      ]);
    }
    expect(await getLoadPlan({ ctx, input: one({}) })).toEqual(before);
    expect(await codeOf(shareOutEvenly({ ctx: cast.participant.ctx, input: one({}) }))).toBe("forbidden");
    expect(await codeOf(getLoadPlan({ ctx: cast.stranger.ctx, input: one({}) }))).toBe("not-found");
  });
});

describe("fair shares", () => {
  it("keep to limits, fixed pieces and who sleeps where, and are as even as they can be", async () => {
    const { ctx } = cast.leader;
    const { leader, coLeader, participant } = cast.personIds;
    await saveGroupThings({
      ctx,
      input: one({
        things: [
          { id: null, name: "Stove", massKg: 0.4 },
          { id: null, name: "Pots", massKg: 0.9 },
        ],
      }),
    });
    await saveShelterSplit({
      ctx,
      input: one({ shelterId: kit.shelterId, polesMassKg: 0.3, staysWithSleepers: true }),
    });
    await saveLimit({ ctx, input: one({ personId: leader, baseMassKg: 10, limitKg: 20 }) });
    await saveLimit({ ctx, input: one({ personId: coLeader, baseMassKg: 10, limitKg: 12 }) });
    const own = { baseMassKg: 8, bodyMassKg: 70, limitShare: 0.2, limitKg: null };
    await saveOwnLoad({ ctx: cast.participant.ctx, input: one(own) });
    const before = await getLoadPlan({ ctx, input: one({}) });
    expect(before.people.find((person) => person.id === participant)?.limitKg).toBeCloseTo(14, 9);
    expect(JSON.stringify(before)).not.toContain("bodyMassKg");
    const stove = before.things[0]?.id ?? "";
    const fixed = { type: "thing" as const, personId: coLeader, thingId: stove, isFixed: true };
    await assignCarry({ ctx, input: one({ carries: [fixed] }) });
    const { largest, bound } = await shareOutEvenly({ ctx, input: one({}) });
    expect(largest).toBeLessThanOrEqual(bound * 1.02);
    const plan = await getLoadPlan({ ctx, input: one({}) });
    expect(plan.shares.find((share) => share.key === `thing:${stove}`)).toMatchObject({
      personId: coLeader,
      isFixed: true,
    });
    const sleepers = new Set([participant, leader]);
    const ofTarp = plan.shares.filter((share) => /^(fly|poles):/.test(share.key));
    expect(ofTarp).toHaveLength(2);
    expect(ofTarp.every((share) => sleepers.has(share.personId))).toBe(true);
    const list = await getPackList({ ctx: cast.coLeader.ctx, input: one({ personId: "self" }) });
    expect(list.group).toMatchObject([{ key: `thing:${stove}`, name: "Stove", massKg: 0.4 }]);
    await tickPackItem({ ctx: cast.coLeader.ctx, input: one({ key: `thing:${stove}`, isTicked: true }) });
    const after = await getLoadPlan({ ctx, input: one({}) });
    expect(after.people.find((person) => person.id === coLeader)).toMatchObject({ packedCount: 1 });
  });

  it("say when nobody can meet their limit, and refuse what no load can be", async () => {
    const { ctx } = cast.leader;
    const { leader } = cast.personIds;
    await saveLimit({ ctx, input: one({ personId: leader, baseMassKg: 10, limitKg: 1 }) });
    expect((await shareOutEvenly({ ctx, input: one({}) })).largest).toBe(10);
    const bad = [
      saveLimit({ ctx, input: one({ personId: leader, baseMassKg: -1, limitKg: 10 }) }),
      saveLimit({ ctx, input: one({ personId: leader, baseMassKg: 1, limitKg: 0 }) }),
      saveOwnLoad({ ctx, input: one({ baseMassKg: 1, bodyMassKg: 70, limitShare: 2, limitKg: null }) }),
      saveShelterSplit({ ctx, input: one({ shelterId: kit.shelterId, polesMassKg: 5, staysWithSleepers: false }) }),
      saveGroupThings({ ctx, input: one({ things: [{ id: null, name: "", massKg: -2 }] }) }),
    ];
    for (const work of bad) expect(await codeOf(work)).toBe("bad-input");
    const foreign = one({ personId: cast.otherPersonId, baseMassKg: 1, limitKg: 10 });
    expect(await codeOf(saveLimit({ ctx, input: foreign }))).toBe("not-found");
    expect(await codeOf(saveLimit({ ctx: cast.participant.ctx, input: foreign }))).toBe("forbidden");
  });

  it("come with what a season needs, once", async () => {
    const { ctx } = cast.leader;
    const { added } = await addSeasonItems({ ctx, input: one({ season: "winter" }) });
    expect(added).toBeGreaterThan(4);
    expect((await addSeasonItems({ ctx, input: one({ season: "winter" }) })).added).toBe(0);
    const names = (await listPackItems({ ctx, input: one({}) })).map((item) => item.name);
    expect(names).toContain("Snow shovel");
  });
});
