import { eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { makeCast, makeUser } from "../../helpers/actors";
import { anchorOf, makeCampKit, placementOf, windyCamp } from "../../helpers/camp-kit";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { getDb } from "@/db/client";
import { camp, changeLog, person, pitch, placement, sleeper, trip } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { createCamp } from "@/lib/services/camps/create-camp";
import { listCampSummaries } from "@/lib/services/camps/list-camp-summaries";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { getPackList } from "@/lib/services/pack/get-pack-list";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { saveSleepers } from "@/lib/services/sleepers/save-sleepers";
import { copyTrip } from "@/lib/services/trips/copy-trip";
import { createTrip } from "@/lib/services/trips/create-trip";
import { deleteTrip } from "@/lib/services/trips/delete-trip";
import { getTrip } from "@/lib/services/trips/get-trip";
import { MOST_TRIPS } from "@/lib/services/trips/internal";
import { listTrips } from "@/lib/services/trips/list-trips";
import { updateTrip } from "@/lib/services/trips/update-trip";

let cast: Awaited<ReturnType<typeof makeCast>>;
const details = { name: "Edge and tarn", startDate: "2027-06-11", timeZone: "Europe/Oslo", notes: "" };

beforeAll(async () => {
  cast = await makeCast();
});

describe("a trip", () => {
  it("is led by whoever creates it, with a list that everybody starts from", async () => {
    const { ctx } = cast.stranger;
    const { tripId } = await createTrip({ ctx, input: details });
    expect(await getTrip({ ctx, input: { tripId } })).toMatchObject({ role: "leader", endDate: "2027-06-11" });
    const list = await getPackList({ ctx, input: { tripId, personId: "self" } });
    expect(list.own.map((line) => line.name)).toContain("Sleeping bag");
    expect((await listTrips({ ctx })).map((one) => one.id)).toEqual([tripId]);
    const log = await getDb().select().from(changeLog).where(eq(changeLog.tripId, tripId));
    expect(log).toMatchObject([{ action: "create", entity: "trip", userName: cast.stranger.name }]);
  });

  it("is refused to somebody who leads 200 already, new or as a copy", async () => {
    const { ctx, id: userId, name, email } = await makeUser();
    const { tripId } = await createTrip({ ctx, input: details });
    const now = new Date();
    const ids = Array.from({ length: MOST_TRIPS - 1 }, () => newId());
    await getDb()
      .insert(trip)
      .values(ids.map((id) => ({ id, ...details, createdBy: userId, createdAt: now, updatedAt: now })));
    await getDb()
      .insert(person)
      .values(
        ids.map((id) => ({ id: newId(), tripId: id, userId, name, email, role: "leader" as const, createdAt: now })),
      );
    expect(await codeOf(createTrip({ ctx, input: details }))).toBe("conflict");
    const copy = { tripId, name: "Again", startDate: "2027-07-01", withPeople: false };
    expect(await refusalOf(copyTrip({ ctx, input: copy }))).toMatchObject({
      userMessage: "You lead 200 trips, the most one person can. Delete one first.",
    });
    expect(await listTrips({ ctx })).toHaveLength(MOST_TRIPS);
  });

  it("ends on the morning after its last night", async () => {
    const { ctx } = cast.leader;
    const { tripId } = await createTrip({ ctx, input: { ...details, startDate: "2028-02-27" } });
    await createCamp({ ctx, input: { tripId, details: windyCamp({ nights: 2 }) } });
    await createCamp({ ctx, input: { tripId, details: windyCamp({ name: "Low Barn" }) } });
    // 27 and 28 February, 29 February of the leap year, home on 1 March.
    expect((await getTrip({ ctx, input: { tripId } })).endDate).toBe("2028-03-01");
    const camps = await listCampSummaries({ ctx, input: { tripId } });
    expect(camps.map((one) => one.days)).toEqual([["2028-02-27", "2028-02-28"], ["2028-02-29"]]);
    expect((await listTrips({ ctx })).find((one) => one.id === tripId)).toMatchObject({ nights: 3, campCount: 2 });
  });

  it("is read by all on it and changed by the leader alone", async () => {
    const { tripId } = cast;
    for (const who of [cast.leader, cast.coLeader, cast.participant]) {
      expect((await getTrip({ ctx: who.ctx, input: { tripId } })).id).toBe(tripId);
    }
    for (const who of [cast.stranger, cast.otherLeader]) {
      expect(await codeOf(getTrip({ ctx: who.ctx, input: { tripId } }))).toBe("not-found");
    }
    const input = { ...details, tripId, version: 1, contacts: [] };
    expect(await codeOf(updateTrip({ ctx: cast.coLeader.ctx, input }))).toBe("forbidden");
    expect(await codeOf(updateTrip({ ctx: cast.participant.ctx, input }))).toBe("forbidden");
    expect(await codeOf(updateTrip({ ctx: cast.otherLeader.ctx, input }))).toBe("not-found");
    expect(await updateTrip({ ctx: cast.leader.ctx, input })).toEqual({ version: 2 });
    const stale = await refusalOf(updateTrip({ ctx: cast.leader.ctx, input: { ...input, name: "Late" } }));
    expect(stale.code).toBe("conflict");
    expect(stale.userMessage).toContain(cast.leader.name);
    expect(stale.details).toMatchObject({ by: cast.leader.name, current: { name: details.name, version: 2 } });
  });

  it("is deleted by the leader after its name was typed, and by nobody else", async () => {
    const { ctx } = cast.leader;
    const { tripId } = await createTrip({ ctx, input: { ...details, name: "Short lived" } });
    const input = { tripId, confirmName: "Short lived" };
    expect(await codeOf(deleteTrip({ ctx: cast.stranger.ctx, input }))).toBe("not-found");
    expect(await codeOf(deleteTrip({ ctx, input: { tripId, confirmName: "short" } }))).toBe("bad-input");
    const own = { tripId: cast.tripId, confirmName: details.name };
    expect(await codeOf(deleteTrip({ ctx: cast.coLeader.ctx, input: own }))).toBe("forbidden");
    await deleteTrip({ ctx, input });
    expect(await codeOf(getTrip({ ctx, input: { tripId } }))).toBe("not-found");
    expect(await getDb().select().from(changeLog).where(eq(changeLog.tripId, tripId))).toEqual([]);
  });
});

describe("a copy of a trip", () => {
  it("has everything under new ids, and people only when wanted", async () => {
    const { ctx } = cast.leader;
    const { tripId } = cast;
    const kit = await makeCampKit(ctx, tripId, { hasRocks: true });
    const placements = [
      placementOf(kit.pitchId, "ridge-front", kit.bladeId, { tandem: { anchorId: kit.wideId, spacingM: 0.2 } }),
      placementOf(kit.pitchId, "ridge-rear", "rock-20"),
    ];
    const intents = [{ intentId: newId(), baseVersion: 0, change: { type: "replace" as const, placements } }];
    await savePlanIntents({ ctx, input: { tripId, campId: kit.campId, intents } });
    const sleepers = [
      { personId: cast.personIds.leader, pitchId: kit.pitchId },
      { personId: cast.personIds.participant, pitchId: kit.pitchId },
      { personId: cast.personIds.coLeader, pitchId: null },
    ];
    await saveSleepers({ ctx, input: { tripId, campId: kit.campId, sleepers } });

    const alone = await copyTrip({ ctx, input: { tripId, name: "Again", startDate: "2027-09-01" } });
    const rows = await getDb().select().from(placement).where(eq(placement.tripId, alone.tripId));
    expect(rows).toHaveLength(2);
    expect(rows.map((row) => row.anchorId)).toContain("rock-20");
    expect(rows.some((row) => [kit.bladeId, kit.wideId].includes(row.anchorId))).toBe(false);
    expect(rows.find((row) => row.tandem)?.tandem?.anchorId).not.toBe(kit.wideId);
    const [copied] = await getDb().select().from(pitch).where(eq(pitch.tripId, alone.tripId));
    expect(copied?.id).not.toBe(kit.pitchId);
    const people = await getDb().select().from(person).where(eq(person.tripId, alone.tripId));
    expect(people).toMatchObject([{ userId: cast.leader.id, role: "leader" }]);
    expect(await getDb().select().from(sleeper).where(eq(sleeper.tripId, alone.tripId))).toHaveLength(1);

    const together = await copyTrip({ ctx, input: { tripId, name: "All", startDate: "2027-09-01", withPeople: true } });
    const all = await getDb().select().from(person).where(eq(person.tripId, together.tripId));
    expect(all).toHaveLength(3);
    // Nobody is on a trip by account without having been asked.
    expect(all.filter((row) => row.userId !== null).map((row) => row.userId)).toEqual([cast.leader.id]);
    expect(await getDb().select().from(sleeper).where(eq(sleeper.tripId, together.tripId))).toHaveLength(3);
    // The copy goes its own way.
    const [copy] = await getDb().select().from(camp).where(eq(camp.tripId, together.tripId));
    await createKitItem({ ctx, input: { tripId: together.tripId, details: anchorOf("v-160", 2) } });
    expect(copy?.id).not.toBe(kit.campId);
    expect((await getDb().select().from(trip).where(eq(trip.id, tripId)))[0]?.name).not.toBe("All");
  });

  it("is for the leader to make", async () => {
    const input = { tripId: cast.tripId, name: "Mine", startDate: "2027-09-01" };
    expect(await codeOf(copyTrip({ ctx: cast.coLeader.ctx, input }))).toBe("forbidden");
    expect(await codeOf(copyTrip({ ctx: cast.otherLeader.ctx, input }))).toBe("not-found");
  });
});
