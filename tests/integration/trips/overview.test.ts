import { beforeAll, describe, expect, it } from "vitest";
import { makeCast, makePerson } from "../../helpers/actors";
import { anchorOf, makeCampKit, windyCamp } from "../../helpers/camp-kit";
import { codeOf } from "../../helpers/refusals";
import { proposePlan } from "@/lib/calc/plan";
import { blankCamp } from "@/lib/domain/camp/schema";
import { newId } from "@/lib/domain/ids";
import { toCampInput } from "@/lib/domain/plan/to-camp-input";
import { createCamp } from "@/lib/services/camps/create-camp";
import { getCamp } from "@/lib/services/camps/get-camp";
import { updateCamp } from "@/lib/services/camps/update-camp";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { savePreferences } from "@/lib/services/preferences/save-preferences";
import { createTrip } from "@/lib/services/trips/create-trip";
import { getTripOverview } from "@/lib/services/trips/get-trip-overview";

let cast: Awaited<ReturnType<typeof makeCast>>;
let kit: Awaited<ReturnType<typeof makeCampKit>>;
const thin = "\u2009";
const look = async () => getTripOverview({ ctx: cast.leader.ctx, input: { tripId: cast.tripId } });

beforeAll(async () => {
  cast = await makeCast();
});

describe("the overview", () => {
  it("of an empty trip says what to begin with", async () => {
    const { ctx } = cast.stranger;
    const input = { name: "New", startDate: "2027-06-11", timeZone: "UTC" };
    const { tripId } = await createTrip({ ctx, input });
    const overview = await getTripOverview({ ctx, input: { tripId } });
    expect(overview.headline).toBe("No camps yet");
    expect(overview.subline).toBe("Add the first camp. Its name is enough to begin.");
    expect(overview.todo).toEqual([]);
    expect(overview.papers).toEqual({ version: 1, current: 0, outdated: 0, never: 1 });
  });

  it("names each gap of a camp and where to close it", async () => {
    const { ctx } = cast.leader;
    const { campId } = await createCamp({ ctx, input: { tripId: cast.tripId, details: blankCamp("Low Barn") } });
    const bare = await look();
    expect(bare.headline).toBe("One night has no wind yet");
    kit = await makeCampKit(ctx, cast.tripId, { wind: null });
    const overview = await look();
    expect(overview.headline).toBe("Two nights have no wind yet");
    expect(overview.subline).toBe("Low Barn has no wind yet. Otter Flat has no wind yet.");
    const base = `/trips/${cast.tripId}/camps`;
    expect(overview.todo.map((item) => [item.title, item.href])).toEqual([
      [
        "Low Barn has no wind, no exposure, no altitude, no hours of strong wind and no ground yet",
        `${base}/${campId}/place`,
      ],
      ["Low Barn has no shelter yet", `${base}/${campId}/shelters`],
      ["Otter Flat has no wind yet", `${base}/${kit.campId}/place`],
      ["8 tie-outs at Otter Flat without an anchor", `${base}/${kit.campId}`],
      ["3 people have no place at Otter Flat", `${base}/${kit.campId}/shelters`],
    ]);
  });

  it("counts nights, says what gives way and how it is mended", async () => {
    const { ctx } = cast.leader;
    const { tripId } = cast;
    const { version } = await getCamp({ ctx, input: { tripId, campId: kit.campId } });
    const storm = windyCamp({ nights: 2, wind: { kind: "gust", speedMs: 30 } });
    await updateCamp({ ctx, input: { tripId, campId: kit.campId, version, details: storm } });
    const plan = await getCampPlan({ ctx, input: { tripId, campId: kit.campId } });
    const input = toCampInput(plan.camp.details, plan.pitches, plan.tray, [], plan.learned);
    const placements = [...proposePlan(input, { allowFound: false, allowDoubling: false }).placements];
    const change = { type: "replace" as const, placements };
    await savePlanIntents({
      ctx,
      input: { tripId, campId: kit.campId, intents: [{ intentId: newId(), baseVersion: 0, change }] },
    });
    await createKitItem({ ctx, input: { tripId, details: anchorOf("steel-pin-450", 10) } });
    const overview = await look();
    expect(overview.headline).toBe("Two nights give way, one has no wind yet");
    // 30 m/s are 108 km/h.
    expect(overview.subline).toMatch(
      new RegExp(
        `^Otter Flat gives way at \\d+${thin}km/h in a planned gust of 108${thin}km/h\\. Low Barn has no wind yet\\.$`,
      ),
    );
    expect(overview.todo[0]).toMatchObject({ tone: "gives-way", href: `/trips/${tripId}/camps/${kit.campId}` });
    expect(overview.todo[0]?.action).toMatch(/ → \d+\u2009km\/h$/);
    await savePreferences({
      ctx,
      input: { speedUnit: "m/s", forceUnit: "N", lengthUnit: "m", paperSize: "A4" },
    });
    expect((await look()).subline).toContain(`planned gust of 30${thin}m/s`);
  });

  it("asks after people who have not been invited", async () => {
    await makePerson(cast.tripId, "participant", { name: "Later", email: "later@example.test" });
    const overview = await look();
    expect(overview.peopleCount).toBe(4);
    expect(overview.todo.at(-1)).toMatchObject({ title: "1 person is not invited yet", action: "Invite them" });
  });

  it("is for who plans the trip", async () => {
    const input = { tripId: cast.tripId };
    expect((await getTripOverview({ ctx: cast.coLeader.ctx, input })).camps).toHaveLength(2);
    expect(await codeOf(getTripOverview({ ctx: cast.participant.ctx, input }))).toBe("forbidden");
    expect(await codeOf(getTripOverview({ ctx: cast.otherLeader.ctx, input }))).toBe("not-found");
  });
});
