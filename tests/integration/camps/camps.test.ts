import { beforeAll, describe, expect, it } from "vitest";
import { makeCast } from "../../helpers/actors";
import { makeCampKit, placementOf, shelterOf, windyCamp } from "../../helpers/camp-kit";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { defaultShelterSpec } from "@/lib/calc/shelter-kinds";
import { newId } from "@/lib/domain/ids";
import { copyCamp } from "@/lib/services/camps/copy-camp";
import { createCamp } from "@/lib/services/camps/create-camp";
import { deleteCamp } from "@/lib/services/camps/delete-camp";
import { findCampDependents } from "@/lib/services/camps/find-camp-dependents";
import { getCamp } from "@/lib/services/camps/get-camp";
import { listCampSummaries } from "@/lib/services/camps/list-camp-summaries";
import { reorderCamps } from "@/lib/services/camps/reorder-camps";
import { updateCamp } from "@/lib/services/camps/update-camp";
import { createPitch } from "@/lib/services/pitches/create-pitch";
import { updatePitch } from "@/lib/services/pitches/update-pitch";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { copyShelter } from "@/lib/services/shelters/copy-shelter";
import { createShelter } from "@/lib/services/shelters/create-shelter";
import { deleteShelter } from "@/lib/services/shelters/delete-shelter";
import { findShelterDependents } from "@/lib/services/shelters/find-shelter-dependents";
import { listShelters } from "@/lib/services/shelters/list-shelters";
import { updateShelter } from "@/lib/services/shelters/update-shelter";
import { getSleepingPlan } from "@/lib/services/sleepers/get-sleeping-plan";
import { saveSleepers } from "@/lib/services/sleepers/save-sleepers";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;
let other: Awaited<ReturnType<typeof makeCampKit>>;
const one = <Input extends object>(input: Input) => ({ tripId: cast.tripId, ...input });

beforeAll(async () => {
  cast = await makeCast();
  kit = await makeCampKit(cast.leader.ctx, cast.tripId);
  other = await makeCampKit(cast.otherLeader.ctx, cast.otherTripId);
});

describe("camps", () => {
  it("are arranged by the leader and filled in by the co-leader too", async () => {
    const details = windyCamp({ name: "Low Barn" });
    for (const [who, code] of [
      [cast.coLeader, "forbidden"],
      [cast.participant, "forbidden"],
      [cast.stranger, "not-found"],
    ] as const) {
      expect(await codeOf(createCamp({ ctx: who.ctx, input: one({ details }) }))).toBe(code);
    }
    const { version } = await getCamp({ ctx: cast.coLeader.ctx, input: one({ campId: kit.campId }) });
    const input = one({ campId: kit.campId, version, details: windyCamp({ notes: "Keep off the bank." }) });
    expect(await codeOf(updateCamp({ ctx: cast.participant.ctx, input }))).toBe("forbidden");
    expect(await updateCamp({ ctx: cast.coLeader.ctx, input })).toEqual({ version: version + 1, lifted: 0 });
    const stale = await refusalOf(updateCamp({ ctx: cast.leader.ctx, input }));
    expect(stale.code).toBe("conflict");
    expect(stale.details).toMatchObject({ by: cast.coLeader.name, current: { version: version + 1 } });
  });

  it("of another trip are not there, whichever id is in the request", async () => {
    const { ctx } = cast.leader;
    const foreign = one({ campId: other.campId });
    expect(await codeOf(getCamp({ ctx, input: foreign }))).toBe("not-found");
    expect(await codeOf(updateCamp({ ctx, input: { ...foreign, version: 1, details: windyCamp() } }))).toBe(
      "not-found",
    );
    expect(await codeOf(copyCamp({ ctx, input: foreign }))).toBe("not-found");
    expect(await codeOf(deleteCamp({ ctx, input: { ...foreign, confirmed: true } }))).toBe("not-found");
    expect(await codeOf(findCampDependents({ ctx, input: foreign }))).toBe("not-found");
    expect(await codeOf(createPitch({ ctx, input: { ...foreign, shelterId: kit.shelterId } }))).toBe("not-found");
    const mixed = one({ campId: kit.campId, shelterId: other.shelterId });
    expect(await codeOf(createPitch({ ctx, input: mixed }))).toBe("not-found");
    expect(await codeOf(reorderCamps({ ctx, input: one({ campIds: [kit.campId, other.campId] }) }))).toBe("conflict");
  });

  it("change their order only as a whole, and their days with it", async () => {
    const { ctx } = cast.leader;
    const { campId } = await createCamp({ ctx, input: one({ details: windyCamp({ name: "Two nights", nights: 2 }) }) });
    await reorderCamps({ ctx, input: one({ campIds: [campId, kit.campId] }) });
    const camps = await listCampSummaries({ ctx, input: one({}) });
    expect(camps.map((camp) => [camp.id, camp.days])).toEqual([
      [campId, ["2027-06-07", "2027-06-08"]],
      [kit.campId, ["2027-06-09"]],
    ]);
    expect(await codeOf(reorderCamps({ ctx, input: one({ campIds: [campId] }) }))).toBe("conflict");
    expect(await codeOf(reorderCamps({ ctx, input: one({ campIds: [campId, campId] }) }))).toBe("conflict");
    expect(await codeOf(reorderCamps({ ctx: cast.coLeader.ctx, input: one({ campIds: [campId, kit.campId] }) }))).toBe(
      "forbidden",
    );
    await deleteCamp({ ctx, input: one({ campId }) });
  });

  it("say what depends on them before they go", async () => {
    const { ctx } = cast.leader;
    const { campId } = await copyCamp({ ctx, input: one({ campId: kit.campId }) });
    const plan = await getCampPlan({ ctx, input: one({ campId }) });
    expect(plan.camp.details.name).toBe("Otter Flat (copy)");
    const pitchId = plan.pitches[0]?.id ?? "";
    const change = { type: "place" as const, placement: placementOf(pitchId, "hem-left", kit.bladeId) };
    await savePlanIntents({ ctx, input: one({ campId, intents: [{ intentId: newId(), baseVersion: 0, change }] }) });
    const sleepers = [{ personId: cast.personIds.leader, pitchId }];
    await saveSleepers({ ctx, input: one({ campId, sleepers }) });
    const sentences = [
      "1 shelter is pitched there.",
      "Its staking plan has 1 anchor set.",
      "1 person has a sleeping place there.",
    ];
    expect(await findCampDependents({ ctx, input: one({ campId }) })).toEqual(sentences);
    const refusal = await refusalOf(deleteCamp({ ctx, input: one({ campId }) }));
    expect(refusal).toMatchObject({ code: "in-use", details: { dependents: sentences } });
    expect(await codeOf(deleteCamp({ ctx: cast.coLeader.ctx, input: one({ campId, confirmed: true }) }))).toBe(
      "forbidden",
    );
    const again = await copyCamp({ ctx, input: one({ campId, withSleepers: true }) });
    const copied = await getSleepingPlan({ ctx, input: one({ campId: again.campId }) });
    expect(copied.pitches[0]?.sleeperIds).toEqual([cast.personIds.leader]);
    const copiedPlan = await getCampPlan({ ctx, input: one({ campId: again.campId }) });
    expect(copiedPlan.placements).toMatchObject([{ tieOutId: "hem-left", anchorId: kit.bladeId }]);
    for (const id of [campId, again.campId]) await deleteCamp({ ctx, input: one({ campId: id, confirmed: true }) });
    expect(await codeOf(getCamp({ ctx, input: one({ campId }) }))).toBe("not-found");
  });
});

describe("shelters and pitches", () => {
  it("turn their back to the wind, a ridge tarp its side", async () => {
    const { ctx } = cast.coLeader;
    const plan = await getCampPlan({ ctx, input: one({ campId: kit.campId }) });
    // Wind from 270° to 315°: its middle is 292.5°. Broadside is a quarter turn further, 22.5°; the back a half turn, 112.5°.
    expect(plan.pitches[0]?.details.headingDeg).toBe(23);
    const details = shelterOf("half-pyramid", { name: "Half pyramid", sleeps: 2 });
    const { shelterId } = await createShelter({ ctx, input: one({ details }) });
    const { pitchId } = await createPitch({ ctx, input: one({ campId: kit.campId, shelterId }) });
    const after = await getCampPlan({ ctx, input: one({ campId: kit.campId }) });
    expect(after.pitches.find((pitch) => pitch.id === pitchId)?.details.headingDeg).toBe(113);
    expect(await codeOf(createPitch({ ctx, input: one({ campId: kit.campId, shelterId }) }))).toBe("conflict");
    expect((await listShelters({ ctx, input: one({}) })).map((row) => row.campNames)).toEqual([
      ["Otter Flat"],
      ["Otter Flat"],
    ]);
    const dependents = await findShelterDependents({ ctx, input: one({ shelterId }) });
    expect(dependents).toEqual(["It is pitched at Otter Flat."]);
    expect(await codeOf(deleteShelter({ ctx, input: one({ shelterId }) }))).toBe("in-use");
    await deleteShelter({ ctx, input: one({ shelterId, confirmed: true }) });
  });

  it("refuse what can't be built, field by field", async () => {
    const { ctx } = cast.leader;
    const spec = { ...defaultShelterSpec("ridge-tarp"), dimensions: { lengthM: 40 - 15, ridgeHeightM: 1.2 } };
    const refusal = await refusalOf(createShelter({ ctx, input: one({ details: shelterOf("ridge-tarp", { spec }) }) }));
    expect(refusal.code).toBe("bad-input");
    expect(Object.keys(refusal.fieldErrors)).toEqual(["details.spec.dimensions.lengthM"]);
    const pitched = { headingDeg: 10, patch: "main" as const, dimensions: { ridgeHeightM: 9 }, lineLengthsM: {} };
    const input = one({ campId: kit.campId, pitchId: kit.pitchId, version: 1, details: pitched });
    expect(Object.keys((await refusalOf(updatePitch({ ctx, input }))).fieldErrors)).toEqual([
      "details.dimensions.ridgeHeightM",
    ]);
    const second = { ...input, details: { ...pitched, dimensions: {}, patch: "second" as const } };
    expect(Object.keys((await refusalOf(updatePitch({ ctx, input: second }))).fieldErrors)).toEqual(["details.patch"]);
  });

  it("are pitched lower or turned by who may, on the version they saw", async () => {
    const details = { headingDeg: 40, patch: "main" as const, dimensions: { ridgeHeightM: 0.9 }, lineLengthsM: {} };
    const input = one({ campId: kit.campId, pitchId: kit.pitchId, version: 1, details });
    expect(await codeOf(updatePitch({ ctx: cast.participant.ctx, input }))).toBe("forbidden");
    expect(await codeOf(updatePitch({ ctx: cast.otherLeader.ctx, input }))).toBe("not-found");
    expect(await codeOf(updatePitch({ ctx: cast.leader.ctx, input: { ...input, pitchId: other.pitchId } }))).toBe(
      "not-found",
    );
    expect(await updatePitch({ ctx: cast.coLeader.ctx, input })).toEqual({ version: 2 });
    const stale = await refusalOf(updatePitch({ ctx: cast.leader.ctx, input }));
    expect(stale).toMatchObject({ code: "conflict", details: { by: cast.coLeader.name } });
    const plan = await getCampPlan({ ctx: cast.leader.ctx, input: one({ campId: kit.campId }) });
    expect(plan.pitches[0]?.spec.dimensions.ridgeHeightM).toBe(0.9);
  });

  it("are copied and changed, with deny cases", async () => {
    const { ctx } = cast.coLeader;
    const { shelterId } = await copyShelter({ ctx, input: one({ shelterId: kit.shelterId }) });
    expect((await listShelters({ ctx, input: one({}) })).at(-1)?.details.name).toBe("Ridge tarp (copy)");
    const input = one({ shelterId, version: 1, details: shelterOf("dome", { name: "Dome" }) });
    expect(await codeOf(updateShelter({ ctx: cast.participant.ctx, input }))).toBe("forbidden");
    expect(await updateShelter({ ctx, input })).toEqual({ version: 2, lifted: 0 });
    expect(await codeOf(updateShelter({ ctx, input }))).toBe("conflict");
    expect(await codeOf(deleteShelter({ ctx, input: one({ shelterId: other.shelterId, confirmed: true }) }))).toBe(
      "not-found",
    );
    await deleteShelter({ ctx, input: one({ shelterId }) });
  });
});

describe("sleepers", () => {
  it("are each in exactly one list, within what the shelter sleeps", async () => {
    const { ctx } = cast.coLeader;
    const { campId, pitchId } = kit;
    const { leader, coLeader, participant } = cast.personIds;
    const before = await getSleepingPlan({ ctx, input: one({ campId }) });
    expect([...before.unplacedIds].sort()).toEqual([leader, coLeader, participant].sort());
    const sleepers = [
      { personId: leader, pitchId },
      { personId: coLeader, pitchId: null },
    ];
    await saveSleepers({ ctx, input: one({ campId, sleepers }) });
    const after = await getSleepingPlan({ ctx, input: one({ campId }) });
    expect(after.pitches[0]?.sleeperIds).toEqual([leader]);
    expect(after.outsideIds).toEqual([coLeader]);
    expect(after.unplacedIds).toEqual([participant]);
    const twice = [...sleepers, { personId: leader, pitchId: null }];
    expect(await codeOf(saveSleepers({ ctx, input: one({ campId, sleepers: twice }) }))).toBe("bad-input");
    for (const foreign of [
      { personId: cast.otherPersonId, pitchId },
      { personId: participant, pitchId: other.pitchId },
    ]) {
      expect(await codeOf(saveSleepers({ ctx, input: one({ campId, sleepers: [foreign] }) }))).toBe("bad-input");
    }
    expect(await codeOf(saveSleepers({ ctx: cast.participant.ctx, input: one({ campId, sleepers }) }))).toBe(
      "forbidden",
    );
    expect(await codeOf(saveSleepers({ ctx: cast.stranger.ctx, input: one({ campId, sleepers }) }))).toBe("not-found");
    expect(await getSleepingPlan({ ctx, input: one({ campId }) })).toEqual(after);
  });

  it("stop a shelter from becoming too small for them", async () => {
    const { ctx } = cast.leader;
    const { leader, coLeader, participant } = cast.personIds;
    const sleepers = [leader, coLeader, participant].map((personId) => ({ personId, pitchId: kit.pitchId }));
    await saveSleepers({ ctx, input: one({ campId: kit.campId, sleepers }) });
    const [shelter] = await listShelters({ ctx, input: one({}) });
    const details = shelterOf("ridge-tarp", { sleeps: 2 });
    const input = one({ shelterId: kit.shelterId, version: shelter?.version ?? 0, details });
    const refusal = await refusalOf(updateShelter({ ctx, input }));
    expect(refusal.fieldErrors).toEqual({
      "details.sleeps": ["3 people sleep in it at Otter Flat. Move somebody first."],
    });
    expect((await listShelters({ ctx, input: one({}) }))[0]?.version).toBe(shelter?.version);
  });
});
