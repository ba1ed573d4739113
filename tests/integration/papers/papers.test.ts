import { beforeAll, describe, expect, it } from "vitest";
import { makeCast } from "../../helpers/actors";
import { makeCampKit, shelterOf } from "../../helpers/camp-kit";
import { codeOf } from "../../helpers/refusals";
import { proposePlan } from "@/lib/calc/plan";
import { newId } from "@/lib/domain/ids";
import { toCampInput } from "@/lib/domain/plan/to-camp-input";
import type { Paper } from "@/lib/domain/paper/schema";
import { createPitch } from "@/lib/services/pitches/create-pitch";
import { getPaperDocument } from "@/lib/services/papers/get-paper-document";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { createShelter } from "@/lib/services/shelters/create-shelter";
import { saveSleepers } from "@/lib/services/sleepers/save-sleepers";
import { getTrip } from "@/lib/services/trips/get-trip";
import { updateTrip } from "@/lib/services/trips/update-trip";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;
let otherPitchId: string;
const one = <Input extends object>(input: Input) => ({ tripId: cast.tripId, ...input });
const get = (who: { ctx: typeof cast.leader.ctx }, paper: Paper) =>
  getPaperDocument({ ctx: who.ctx, input: one({ paper }) });

beforeAll(async () => {
  cast = await makeCast();
  const { ctx } = cast.leader;
  kit = await makeCampKit(ctx, cast.tripId, { nights: 2, hasRocks: true });
  const details = shelterOf("half-pyramid", { name: "Half pyramid" });
  const { shelterId } = await createShelter({ ctx, input: one({ details }) });
  otherPitchId = (await createPitch({ ctx, input: one({ campId: kit.campId, shelterId }) })).pitchId;
  const plan = await getCampPlan({ ctx, input: one({ campId: kit.campId }) });
  const input = toCampInput(plan.camp.details, plan.pitches, plan.tray, [], plan.learned);
  const placements = [...proposePlan(input, { allowFound: true, allowDoubling: false }).placements];
  const intents = [{ intentId: newId(), baseVersion: 0, change: { type: "replace" as const, placements } }];
  await savePlanIntents({ ctx, input: one({ campId: kit.campId, intents }) });
  const sleepers = [
    { personId: cast.personIds.participant, pitchId: kit.pitchId },
    { personId: cast.personIds.leader, pitchId: otherPitchId },
  ];
  await saveSleepers({ ctx, input: one({ campId: kit.campId, sleepers }) });
});

describe("papers", () => {
  it("show a camp worked out, with who sleeps where and what to do when it gets worse", async () => {
    const paper = await get(cast.coLeader, { kind: "field-card", campId: kit.campId });
    if (paper.kind !== "field-card") throw new Error("another paper");
    expect(paper.header).toMatchObject({
      tripName: "Ridge and river",
      address: `http://leestead.test/trips/${cast.tripId}/camps/${kit.campId}`,
    });
    expect(paper.camp.nightNumbers).toBe("1–2 of 2");
    expect(paper.camp.result.designGustMs).toBe(20);
    expect(paper.camp.sleeperNames[kit.pitchId]).toEqual([cast.participant.name]);
    const fallbacks = paper.camp.fallbacks[kit.pitchId] ?? [];
    // Nine stakes and twelve rocks for sixteen tie-outs: at some nothing is left to add.
    expect(fallbacks.length).toBeGreaterThan(0);
    expect(fallbacks.length).toBeLessThanOrEqual(3);
    const form = /^Tie-out \d+(: .+ \(to \d+\u2009km\/h\)\.| gives first, at \d+\u2009km\/h\. Nothing .+)$/;
    for (const step of fallbacks) expect(step).toMatch(form);
  });

  it("give a participant their own list and the cards of shelters they sleep in, nothing else", async () => {
    const { participant, leader } = cast.personIds;
    const { campId } = kit;
    const own = await get(cast.participant, { kind: "pitch-card", campId, pitchId: kit.pitchId });
    if (own.kind !== "pitch-card") throw new Error("another paper");
    expect(own.camp.pitches.map((pitch) => pitch.id)).toEqual([kit.pitchId]);
    expect(own.camp.placements.every((placement) => placement.pitchId === kit.pitchId)).toBe(true);
    // Nothing of another shelter's sleepers is in the bytes.
    expect(JSON.stringify(own)).not.toContain(cast.leader.name);
    expect(own.header.address).toBe(`http://leestead.test/trips/${cast.tripId}/mine`);
    expect((await get(cast.participant, { kind: "pack-list", personId: participant })).kind).toBe("pack-list");
    for (const paper of [
      { kind: "pitch-card", campId, pitchId: otherPitchId },
      { kind: "pack-list", personId: leader },
      { kind: "field-card", campId },
      { kind: "booklet" },
    ] as const) {
      expect(await codeOf(get(cast.participant, paper))).toBe("not-found");
      expect((await get(cast.coLeader, paper)).kind).toBe(paper.kind);
      expect(await codeOf(get(cast.stranger, paper))).toBe("not-found");
      expect(await codeOf(get(cast.otherLeader, paper))).toBe("not-found");
    }
  });

  it("do not mix trips and camps", async () => {
    const other = await makeCampKit(cast.otherLeader.ctx, cast.otherTripId);
    for (const paper of [
      { kind: "field-card", campId: other.campId },
      { kind: "pitch-card", campId: kit.campId, pitchId: other.pitchId },
      { kind: "pack-list", personId: cast.otherPersonId },
    ] as const) {
      expect(await codeOf(get(cast.leader, paper))).toBe("not-found");
    }
  });

  it("count their version up at the first change after somebody had them", async () => {
    const { ctx } = cast.leader;
    const rename = async (name: string) => {
      const { version, startDate, timeZone, notes } = await getTrip({ ctx, input: one({}) });
      await updateTrip({ ctx, input: one({ name, startDate, timeZone, notes, version }) });
      return (await getTrip({ ctx, input: one({}) })).paperVersion;
    };
    await get(cast.leader, { kind: "booklet" });
    const before = (await getTrip({ ctx, input: one({}) })).paperVersion;
    expect(await rename("Once")).toBe(before + 1);
    expect(await rename("Twice")).toBe(before + 1);
    const booklet = await get(cast.leader, { kind: "booklet" });
    expect(booklet.header).toMatchObject({ tripName: "Twice", version: before + 1 });
    expect(await rename("Thrice")).toBe(before + 2);
  });
});
