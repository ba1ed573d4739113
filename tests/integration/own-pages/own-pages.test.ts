import { beforeEach, describe, expect, it } from "vitest";
import { makeCast } from "../../helpers/actors";
import { makeCampKit, placementOf } from "../../helpers/camp-kit";
import { codeOf } from "../../helpers/refusals";
import { newId } from "@/lib/domain/ids";
import type { PlanChange } from "@/lib/domain/plan/schema";
import { getOwnHome } from "@/lib/services/own-pages/get-own-home";
import { listOwnPagesStates } from "@/lib/services/own-pages/list-own-pages-states";
import { markOwnPagesRead } from "@/lib/services/own-pages/mark-own-pages-read";
import { savePackItems } from "@/lib/services/pack/save-pack-items";
import { getPaperDocument } from "@/lib/services/papers/get-paper-document";
import { renderPaperFile } from "@/lib/services/papers/render-paper-file";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { sendPapers } from "@/lib/services/post/send-papers";
import { saveSleepers } from "@/lib/services/sleepers/save-sleepers";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;
const one = <Input extends object>(input: Input) => ({ tripId: cast.tripId, ...input });

async function change(...changes: PlanChange[]) {
  for (const each of changes) {
    const intents = [{ intentId: newId(), baseVersion: 999, change: each }];
    await savePlanIntents({ ctx: cast.leader.ctx, input: one({ campId: kit.campId, intents }) });
  }
}

const home = (who: "participant" | "leader" | "coLeader" = "participant") =>
  getOwnHome({ ctx: cast[who].ctx, input: one({}) });

async function read(who: "participant" | "leader" = "participant") {
  const { changedAt } = await home(who);
  await markOwnPagesRead({ ctx: cast[who].ctx, input: one({ changedAt }) });
}

const print = (who: "participant" | "leader" | "stranger" = "participant", fold: "flat" | "pocket" = "flat") =>
  renderPaperFile({
    ctx: cast[who].ctx,
    input: one({ paper: { kind: "pitch-and-pack" as const, personId: cast.personIds.participant, fold } }),
  });

beforeEach(async () => {
  cast = await makeCast();
  kit = await makeCampKit(cast.leader.ctx, cast.tripId);
  const sleepers = [{ personId: cast.personIds.participant, pitchId: kit.pitchId }];
  await saveSleepers({ ctx: cast.leader.ctx, input: one({ campId: kit.campId, sleepers }) });
  await change(
    { type: "place", placement: placementOf(kit.pitchId, "ridge-front", kit.bladeId, { knot: "bowline" }) },
    { type: "place", placement: placementOf(kit.pitchId, "ridge-rear", kit.bladeId) },
  );
});

describe("own pages", () => {
  it("show the own shelter in the order of pitching, main points and windward side first", async () => {
    const { cards, list } = await home();
    expect(cards).toHaveLength(1);
    const [card] = cards;
    expect(card).toMatchObject({ campName: "Otter Flat", shelterName: "Ridge tarp" });
    expect(card?.steps).toHaveLength(8);
    expect(
      card?.steps
        .slice(0, 2)
        .map((step) => step.tieOutId)
        .sort(),
    ).toEqual(["ridge-front", "ridge-rear"]);
    const front = card?.steps.find((step) => step.tieOutId === "ridge-front");
    expect(front).toMatchObject({ knot: "bowline", lean: expect.stringContaining("10°") as string });
    expect(front?.anchor?.name).toMatch(/^Three-blade/);
    expect(card?.steps.filter((step) => step.anchor === null)).toHaveLength(6);
    expect(list.nights[0]).toMatchObject({ shelterName: "Ridge tarp" });
  });

  it("are one's own: who sleeps nowhere has no card, strangers find nothing", async () => {
    expect((await home("coLeader")).cards).toEqual([]);
    expect(await codeOf(getOwnHome({ ctx: cast.stranger.ctx, input: one({}) }))).toBe("not-found");
    const ofLeader = { kind: "pitch-and-pack" as const, personId: cast.personIds.leader, fold: "flat" as const };
    expect(await codeOf(getPaperDocument({ ctx: cast.participant.ctx, input: one({ paper: ofLeader }) }))).toBe(
      "not-found",
    );
    const foreign = { ...ofLeader, personId: cast.otherPersonId };
    expect(await codeOf(getPaperDocument({ ctx: cast.leader.ctx, input: one({ paper: foreign }) }))).toBe("not-found");
  });
});

describe("what changed since I last looked", () => {
  it("is nothing to compare with at first, then nothing, then each change in words", async () => {
    expect((await home()).changes).toBeNull();
    await read();
    expect(await home()).toMatchObject({ changes: [], look: { version: 1 } });
    await change({
      type: "place",
      placement: placementOf(kit.pitchId, "ridge-front", kit.wideId, { knot: "bowline" }),
    });
    const items = [{ id: null, name: "Flute", isGroupThing: false, massKg: null }];
    await savePackItems({ ctx: cast.leader.ctx, input: one({ personId: cast.personIds.participant, items }) });
    const { changes, version } = await home();
    expect(version).toBe(2);
    expect(changes).toEqual([
      expect.stringMatching(/^Otter Flat, Ridge tarp, tie-out 1: Wide sand stake.* now\. Before: Three-blade/),
      "Otter Flat: other anchors are left over for softer ground.",
      "New to bring: Flute.",
    ]);
    await read();
    expect((await home()).changes).toEqual([]);
  });

  it("says where one sleeps now", async () => {
    await read();
    await saveSleepers({ ctx: cast.leader.ctx, input: one({ campId: kit.campId, sleepers: [] }) });
    expect((await home()).changes).toContain("Otter Flat: you have no place to sleep now. Before: in Ridge tarp.");
  });

  it("of somebody else's list is no news", async () => {
    await read();
    const items = [{ id: null, name: "Drum", isGroupThing: false, massKg: null }];
    await savePackItems({ ctx: cast.leader.ctx, input: one({ personId: cast.personIds.leader, items }) });
    expect((await home()).changes).toEqual([]);
  });

  it("can't be marked as read when it changed after one looked", async () => {
    const { changedAt } = await home();
    await change({ type: "lift", pitchId: kit.pitchId, tieOutId: "ridge-rear" });
    expect(await codeOf(markOwnPagesRead({ ctx: cast.participant.ctx, input: one({ changedAt }) }))).toBe("conflict");
    for (const bad of ["soon", -1, null, 1.5]) {
      const input = one({ changedAt: bad as number });
      expect(await codeOf(markOwnPagesRead({ ctx: cast.participant.ctx, input }))).toBe("bad-input");
    }
    expect((await home()).look).toBeNull();
  });
});

describe("copies", () => {
  it("printed at version 1, old at version 2, with what is different", async () => {
    await print();
    expect((await home()).copies).toMatchObject([{ way: "printed", version: 1, changes: [] }]);
    await change({ type: "lift", pitchId: kit.pitchId, tieOutId: "ridge-rear" });
    const { copies, version } = await home();
    expect(version).toBe(2);
    expect(copies).toHaveLength(1);
    expect(copies[0]?.version).toBe(1);
    expect(copies[0]?.changes[0]).toMatch(/^Otter Flat, Ridge tarp, tie-out \d: no anchor now\. Before: Three-blade/);
    await print("leader", "pocket");
    expect((await home()).copies).toMatchObject([{ way: "printed", version: 2, changes: [] }]);
  });

  it("stay right when only other people's pages changed", async () => {
    await print();
    const items = [{ id: null, name: "Drum", isGroupThing: false, massKg: null }];
    await savePackItems({ ctx: cast.leader.ctx, input: one({ personId: cast.personIds.leader, items }) });
    const { copies, version } = await home();
    expect(version).toBe(2);
    expect(copies).toMatchObject([{ version: 1, changes: [] }]);
  });

  it("sent by mail count as sent, and the leader sees who has and has read which version", async () => {
    await sendPapers({
      ctx: cast.leader.ctx,
      input: one({
        requestId: newId(),
        personIds: [cast.personIds.participant],
        pieces: ["pitch-and-pack"],
        subject: "Your pages",
        message: "",
        paperSize: "A4",
      }),
    });
    await read();
    await change({ type: "lift", pitchId: kit.pitchId, tieOutId: "ridge-rear" });
    const states = await listOwnPagesStates({ ctx: cast.coLeader.ctx, input: one({}) });
    const own = states.find((state) => state.personId === cast.personIds.participant);
    expect(own).toMatchObject({ copies: [{ way: "sent", version: 1 }], readVersion: 1 });
    expect(own?.unread).toHaveLength(2);
    expect(states.find((state) => state.personId === cast.personIds.leader)).toMatchObject({
      copies: [],
      readVersion: null,
    });
    expect(await codeOf(listOwnPagesStates({ ctx: cast.participant.ctx, input: one({}) }))).toBe("forbidden");
  });

  it("are not counted for who may not print them", async () => {
    expect(await codeOf(print("stranger"))).toBe("not-found");
    expect((await home()).copies).toEqual([]);
  });
});
