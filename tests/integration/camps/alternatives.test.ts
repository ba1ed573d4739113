import "../../helpers/database";
import { makeCast } from "../../helpers/actors";
import { anchorOf, makeCampKit, placementOf, shelterOf, windyCamp } from "../../helpers/camp-kit";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { beforeEach, describe, expect, it } from "vitest";
import { newId } from "@/lib/domain/ids";
import { createAlternative } from "@/lib/services/camps/create-alternative";
import { createCamp } from "@/lib/services/camps/create-camp";
import { deleteCamp } from "@/lib/services/camps/delete-camp";
import { findCampDependents } from "@/lib/services/camps/find-camp-dependents";
import { getCamp } from "@/lib/services/camps/get-camp";
import { copyCamp } from "@/lib/services/camps/copy-camp";
import { listAlternatives } from "@/lib/services/camps/list-alternatives";
import { listCampSummaries } from "@/lib/services/camps/list-camp-summaries";
import { reorderCamps } from "@/lib/services/camps/reorder-camps";
import { switchToAlternative } from "@/lib/services/camps/switch-to-alternative";
import { updateCamp } from "@/lib/services/camps/update-camp";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { findKitItemDependents } from "@/lib/services/kit/find-kit-item-dependents";
import { listKit } from "@/lib/services/kit/list-kit";
import { updateKitItem } from "@/lib/services/kit/update-kit-item";
import { getPackList } from "@/lib/services/pack/get-pack-list";
import { getPaperDocument } from "@/lib/services/papers/get-paper-document";
import { findPersonDependents } from "@/lib/services/people/find-person-dependents";
import { createPitch } from "@/lib/services/pitches/create-pitch";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { loadTripPlaces } from "@/lib/services/post/compose-papers";
import { createShelter } from "@/lib/services/shelters/create-shelter";
import { listShelters } from "@/lib/services/shelters/list-shelters";
import { saveSleepers } from "@/lib/services/sleepers/save-sleepers";
import { copyTrip } from "@/lib/services/trips/copy-trip";
import { getTrip } from "@/lib/services/trips/get-trip";
import { getTripOverview } from "@/lib/services/trips/get-trip-overview";
import { listTrips } from "@/lib/services/trips/list-trips";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;
let laterId: string;
let alternativeId: string;
let altPitchId: string;
let altOnlyShelterId: string;

const leader = () => cast.leader.ctx;
const trip = () => ({ tripId: cast.tripId });
const at = (campId: string) => ({ ...trip(), campId });

async function place(campId: string, pitchId: string, tieOutId: string, anchorId: string): Promise<void> {
  const change = { type: "place" as const, placement: placementOf(pitchId, tieOutId, anchorId) };
  const baseVersion = (await getCampPlan({ ctx: leader(), input: at(campId) })).planVersion;
  const intents = [{ intentId: newId(), baseVersion, change }];
  const { outcomes } = await savePlanIntents({ ctx: leader(), input: { ...at(campId), intents } });
  expect(outcomes[0]?.outcome).toBe("applied");
}

beforeEach(async () => {
  cast = await makeCast();
  kit = await makeCampKit(leader(), cast.tripId, { name: "Sill Ridge", nights: 2 });
  const sleepers = [{ personId: cast.personIds.participant, pitchId: kit.pitchId }];
  await saveSleepers({ ctx: leader(), input: { ...at(kit.campId), sleepers } });
  await place(kit.campId, kit.pitchId, "ridge-front", kit.bladeId);
  laterId = (await createCamp({ ctx: leader(), input: { ...trip(), details: windyCamp({ name: "Low Barn" }) } }))
    .campId;
  alternativeId = (
    await createAlternative({ ctx: leader(), input: { ...at(kit.campId), name: "Bield under the ridge" } })
  ).campId;
  const plan = await getCampPlan({ ctx: leader(), input: at(alternativeId) });
  altPitchId = plan.pitches[0]?.id ?? "";
  await place(alternativeId, altPitchId, "ridge-front", kit.wideId);
  await place(alternativeId, altPitchId, "ridge-rear", kit.wideId);
  const dome = shelterOf("dome", { name: "Dome" });
  altOnlyShelterId = (await createShelter({ ctx: leader(), input: { ...trip(), details: dome } })).shelterId;
  await createPitch({ ctx: leader(), input: { ...at(alternativeId), shelterId: altOnlyShelterId } });
});

const names = (camps: readonly { readonly name: string }[]) => camps.map((camp) => camp.name);

describe("an alternative", () => {
  it("takes shelters and sleepers along; ground, wind and plan are its own, and nothing of them is made up", async () => {
    const view = await getCampPlan({ ctx: leader(), input: at(alternativeId) });
    expect(view.camp.details).toMatchObject({ ground: null, wind: null, exposure: null, latitude: null, nights: 2 });
    expect(view.camp.alternativeTo).toEqual({ id: kit.campId, name: "Sill Ridge" });
    expect(view.camp.days).toEqual(["2027-06-07", "2027-06-08"]);
    expect(view.pitches[0]?.sleeperIds).toEqual([cast.personIds.participant]);
    expect(view.placements.map((one) => one.anchorId)).toEqual([kit.wideId, kit.wideId]);
    const main = await getCampPlan({ ctx: leader(), input: at(kit.campId) });
    expect(main.placements.map((one) => one.anchorId)).toEqual([kit.bladeId]);
  });

  it("of an alternative stands by for the same camp, and there are at most three", async () => {
    const make = (campId: string) => createAlternative({ ctx: leader(), input: { ...at(campId), name: "Another" } });
    const second = await make(alternativeId);
    expect((await getCamp({ ctx: leader(), input: at(second.campId) })).alternativeTo?.id).toBe(kit.campId);
    await make(kit.campId);
    expect((await refusalOf(make(kit.campId))).userMessage).toMatch(/3 alternatives already/);
  });

  it("has the nights of the camp that it stands by for, whatever its own form says", async () => {
    const details = windyCamp({ name: "Bield", nights: 5 });
    await updateCamp({ ctx: leader(), input: { ...at(alternativeId), version: 1, details } });
    expect((await getCamp({ ctx: leader(), input: at(alternativeId) })).details.nights).toBe(2);
    const longer = windyCamp({ name: "Sill Ridge", nights: 3 });
    await updateCamp({ ctx: leader(), input: { ...at(kit.campId), version: 1, details: longer } });
    const { days, details: now } = await getCamp({ ctx: leader(), input: at(alternativeId) });
    expect([days.length, now.nights]).toEqual([3, 3]);
  });

  it("is made by a leader, and looked at by leaders only", async () => {
    const input = { ...at(kit.campId), name: "Another" };
    expect(await codeOf(createAlternative({ ctx: cast.coLeader.ctx, input }))).toBe("forbidden");
    expect(await codeOf(createAlternative({ ctx: cast.stranger.ctx, input }))).toBe("not-found");
    expect(await codeOf(listAlternatives({ ctx: cast.participant.ctx, input: trip() }))).toBe("forbidden");
    expect(await codeOf(getCamp({ ctx: cast.otherLeader.ctx, input: at(alternativeId) }))).toBe("not-found");
    const elsewhere = { tripId: cast.otherTripId, campId: alternativeId };
    expect(await codeOf(switchToAlternative({ ctx: cast.otherLeader.ctx, input: elsewhere }))).toBe("not-found");
    expect(await codeOf(createAlternative({ ctx: leader(), input: { ...input, name: " " } }))).toBe("bad-input");
  });
});

describe("every list of camps leaves it out", () => {
  it("nights, summaries, overview and list of trips", async () => {
    const input = trip();
    expect(names(await listCampSummaries({ ctx: leader(), input }))).toEqual(["Sill Ridge", "Low Barn"]);
    const overview = await getTripOverview({ ctx: leader(), input });
    expect(names(overview.camps)).toEqual(["Sill Ridge", "Low Barn"]);
    expect(JSON.stringify(overview.todo)).not.toMatch(/Bield/);
    expect((await getTrip({ ctx: leader(), input })).endDate).toBe("2027-06-10");
    expect((await listTrips({ ctx: leader() }))[0]).toMatchObject({ campCount: 2, nights: 3 });
    const { camps } = await getCampPlan({ ctx: leader(), input: at(alternativeId) });
    expect(names(camps)).toEqual(["Sill Ridge", "Low Barn"]);
  });

  it("order of the camps: it is not part of it", async () => {
    await reorderCamps({ ctx: leader(), input: { ...trip(), campIds: [laterId, kit.campId] } });
    expect((await getCamp({ ctx: leader(), input: at(alternativeId) })).days).toEqual(["2027-06-08", "2027-06-09"]);
    const withIt = { ...trip(), campIds: [laterId, kit.campId, alternativeId] };
    expect(await codeOf(reorderCamps({ ctx: leader(), input: withIt }))).toBe("conflict");
  });

  it("kit counts and where shelters stand; but what its plan uses can't be taken away unsaid", async () => {
    const items = await listKit({ ctx: leader(), input: trip() });
    expect(items.find((item) => item.id === kit.wideId)).toMatchObject({ mostUsed: 0, campNames: [] });
    const shelters = await listShelters({ ctx: leader(), input: trip() });
    expect(shelters.find((one) => one.id === altOnlyShelterId)?.campNames).toEqual([]);
    const dependents = await findKitItemDependents({ ctx: leader(), input: { ...trip(), kitItemId: kit.wideId } });
    expect(dependents).toEqual(["2 tie-outs at Bield under the ridge (alternative) use it."]);
    const fewer = { ...trip(), kitItemId: kit.wideId, version: 1, details: anchorOf("wide-sand-300", 1) };
    const refusal = await refusalOf(updateKitItem({ ctx: leader(), input: fewer }));
    expect(refusal.userMessage).toMatch(/placed at Bield under the ridge \(alternative\)/);
    await createKitItem({ ctx: leader(), input: { ...trip(), details: anchorOf("v-160", 1) } });
  });

  it("pack lists, people and papers to send", async () => {
    const personId = cast.personIds.participant;
    const list = await getPackList({ ctx: cast.participant.ctx, input: { ...trip(), personId } });
    expect([...new Set(list.nights.map((night) => night.campName))]).toEqual(["Sill Ridge", "Low Barn"]);
    const sentences = await findPersonDependents({ ctx: leader(), input: { ...trip(), personId } });
    expect(sentences).toEqual(["They have a sleeping place at 1 camp."]);
    const places = await loadTripPlaces(cast.tripId);
    expect(places.campIds).toEqual([kit.campId, laterId]);
    expect(places.pitches.map((one) => one.pitchId)).toEqual([kit.pitchId]);
  });

  it("the booklet; but its own cards can be printed, and say what they are", async () => {
    const booklet = await getPaperDocument({ ctx: leader(), input: { ...trip(), paper: { kind: "booklet" } } });
    if (booklet.kind !== "booklet") throw new Error("not a booklet");
    expect(booklet.camps.map((one) => one.camp.id)).toEqual([kit.campId, laterId]);
    const paper = { kind: "field-card" as const, campId: alternativeId };
    const card = await getPaperDocument({ ctx: leader(), input: { ...trip(), paper } });
    if (card.kind !== "field-card") throw new Error("not a card");
    expect(card.camp.camp.alternativeTo?.name).toBe("Sill Ridge");
    expect(card.camp.nightNumbers).toBe("1–2 of 3");
    const pitchCard = { kind: "pitch-card" as const, campId: alternativeId, pitchId: altPitchId };
    const input = { ...trip(), paper: pitchCard };
    expect((await getPaperDocument({ ctx: leader(), input })).kind).toBe("pitch-card");
    // Participants see the nights as they are now.
    expect(await codeOf(getPaperDocument({ ctx: cast.participant.ctx, input }))).toBe("not-found");
  });

  it("is asked for where a service reads camps by itself", () => {
    const folder = path.join(process.cwd(), "lib/services");
    const files = readdirSync(folder, { recursive: true, encoding: "utf8" }).filter((file) => file.endsWith(".ts"));
    const reading = files.filter((file) => {
      const text = readFileSync(path.join(folder, file), "utf8");
      const isRead = /\.from\(camp\)|[jJ]oin\(camp,/.test(text);
      return isRead && !/isInLine|alternativeToId|eq\(camp\.id, /.test(text);
    });
    expect(reading, "camps read without saying whether alternatives belong in").toEqual([]);
  });
});

describe("switching", () => {
  it("puts it in the line of nights, with its plan and sleepers, and keeps the other beside", async () => {
    const other = await createAlternative({ ctx: leader(), input: { ...at(kit.campId), name: "Third place" } });
    const done = await switchToAlternative({ ctx: cast.coLeader.ctx, input: at(alternativeId) });
    expect(done).toEqual({ name: "Bield under the ridge", replaced: "Sill Ridge" });
    expect(names(await listCampSummaries({ ctx: leader(), input: trip() }))).toEqual([
      "Bield under the ridge",
      "Low Barn",
    ]);
    const beside = await listAlternatives({ ctx: leader(), input: trip() });
    expect(beside.map((one) => [one.name, one.alternativeTo.id])).toEqual([
      ["Sill Ridge", alternativeId],
      ["Third place", alternativeId],
    ]);
    expect((await getTrip({ ctx: leader(), input: trip() })).endDate).toBe("2027-06-10");
    const items = await listKit({ ctx: leader(), input: trip() });
    expect(items.find((item) => item.id === kit.wideId)?.mostUsed).toBe(2);
    expect(items.find((item) => item.id === kit.bladeId)?.mostUsed).toBe(0);
    const paper = { kind: "pitch-card" as const, campId: alternativeId, pitchId: altPitchId };
    expect((await getPaperDocument({ ctx: cast.participant.ctx, input: { ...trip(), paper } })).kind).toBe(
      "pitch-card",
    );
    // And back.
    await switchToAlternative({ ctx: leader(), input: at(kit.campId) });
    expect(names(await listCampSummaries({ ctx: leader(), input: trip() }))).toEqual(["Sill Ridge", "Low Barn"]);
    expect((await getCamp({ ctx: leader(), input: at(other.campId) })).alternativeTo?.id).toBe(kit.campId);
  });

  it("to one that is in the line already is refused", async () => {
    await switchToAlternative({ ctx: leader(), input: at(alternativeId) });
    expect(await codeOf(switchToAlternative({ ctx: leader(), input: at(alternativeId) }))).toBe("conflict");
  });

  it("is not for participants", async () => {
    expect(await codeOf(switchToAlternative({ ctx: cast.participant.ctx, input: at(alternativeId) }))).toBe(
      "forbidden",
    );
  });
});

describe("copies and deletions", () => {
  it("go with the trip, each with its own camp, and alone it is copied into the line", async () => {
    const input = { ...trip(), name: "Again", startDate: "2028-06-01", withPeople: true };
    const copy = await copyTrip({ ctx: leader(), input });
    const [beside] = await listAlternatives({ ctx: leader(), input: { tripId: copy.tripId } });
    const [first] = await listCampSummaries({ ctx: leader(), input: { tripId: copy.tripId } });
    expect(beside).toMatchObject({
      name: "Bield under the ridge",
      alternativeTo: { id: first?.id, name: "Sill Ridge" },
    });
    expect(names(await listCampSummaries({ ctx: leader(), input: { tripId: copy.tripId } }))).toHaveLength(2);
    await copyCamp({ ctx: leader(), input: at(alternativeId) });
    expect(names(await listCampSummaries({ ctx: leader(), input: trip() }))).toEqual([
      "Sill Ridge",
      "Low Barn",
      "Bield under the ridge (copy)",
    ]);
  });

  it("go with the camp after a second yes", async () => {
    expect(await findCampDependents({ ctx: leader(), input: at(kit.campId) })).toContain(
      "1 alternative stands by for it.",
    );
    expect(await codeOf(deleteCamp({ ctx: leader(), input: at(kit.campId) }))).toBe("in-use");
    await deleteCamp({ ctx: leader(), input: { ...at(kit.campId), confirmed: true } });
    expect(await listAlternatives({ ctx: leader(), input: trip() })).toEqual([]);
    expect(await codeOf(getCamp({ ctx: leader(), input: at(alternativeId) }))).toBe("not-found");
  });

  it("take nothing of the camp along when the alternative goes", async () => {
    await deleteCamp({ ctx: leader(), input: { ...at(alternativeId), confirmed: true } });
    const main = await getCampPlan({ ctx: leader(), input: at(kit.campId) });
    expect(main.placements).toHaveLength(1);
    expect(await listAlternatives({ ctx: leader(), input: trip() })).toEqual([]);
  });
});
