import { eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { makeCast } from "../../helpers/actors";
import { anchorOf, makeCampKit, shelterOf, windyCamp } from "../../helpers/camp-kit";
import { refusalOf } from "../../helpers/refusals";
import { getDb } from "@/db/client";
import { camp, changeLog, kitItem, shelter, trip } from "@/db/schema";
import { createCamp } from "@/lib/services/camps/create-camp";
import { updateCamp } from "@/lib/services/camps/update-camp";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { createShelter } from "@/lib/services/shelters/create-shelter";
import { createTrip } from "@/lib/services/trips/create-trip";

let cast: Awaited<ReturnType<typeof makeCast>>;
const million = "x".repeat(1e6);

/** What arrives from outside is not typed; the services have to find out. */
const asInput = <Input>(value: unknown) => value as Input;

async function everything() {
  const { tripId } = cast;
  return {
    trips: await getDb().select().from(trip),
    camps: await getDb().select().from(camp).where(eq(camp.tripId, tripId)),
    kit: await getDb().select().from(kitItem).where(eq(kitItem.tripId, tripId)),
    shelters: await getDb().select().from(shelter).where(eq(shelter.tripId, tripId)),
    log: await getDb().select().from(changeLog),
  };
}

beforeAll(async () => {
  cast = await makeCast();
});

describe("bad input is refused with its field, and nothing is stored", () => {
  const campRows: [string, object, string][] = [
    ["no name", { name: "" }, "details.name"],
    ["a name that is a number", { name: 7 }, "details.name"],
    ["a name of a million letters", { name: million }, "details.name"],
    ["a latitude off the globe", { latitude: 90.1, longitude: 0 }, "details.latitude"],
    ["a longitude off the globe", { latitude: 0, longitude: -180.5 }, "details.longitude"],
    ["half a position", { latitude: 10 }, "details.longitude"],
    ["a latitude that is no number", { latitude: Number.NaN, longitude: 0 }, "details.latitude"],
    ["no nights", { nights: 0 }, "details.nights"],
    ["half a night", { nights: 1.5 }, "details.nights"],
    ["nights for ever", { nights: 1e308 }, "details.nights"],
    ["a gust beyond the table", { wind: { kind: "gust", speedMs: 90.1 } }, "details.wind.speedMs"],
    ["a negative gust", { wind: { kind: "gust", speedMs: -1 } }, "details.wind.speedMs"],
    ["an endless gust", { wind: { kind: "gust", speedMs: Number.POSITIVE_INFINITY } }, "details.wind.speedMs"],
    ["a Beaufort between two", { wind: { kind: "beaufort", number: 6.5 } }, "details.wind.number"],
    ["a wind of another kind", { wind: { kind: "hurricane" } }, "details.wind.kind"],
    ["half a wind range", { windToDeg: null }, "details.windToDeg"],
    ["a ground that there isn't", { ground: { kind: "lava", wetness: "dry" } }, "details.ground.kind"],
    ["notes of a million letters", { notes: million }, "details.notes"],
    ["hazards that are text", { hazards: "all" }, "details.hazards"],
  ];
  it.each(campRows)("a camp with %s", async (_, details, field) => {
    const before = await everything();
    const input = { tripId: cast.tripId, details: { ...windyCamp(), ...details } };
    const refusal = await refusalOf(createCamp({ ctx: cast.leader.ctx, input: asInput(input) }));
    expect(refusal.code).toBe("bad-input");
    expect(Object.keys(refusal.fieldErrors)).toContain(field);
    expect(refusal.fieldErrors[field]?.[0]?.length).toBeLessThan(200);
    expect(await everything()).toEqual(before);
  });

  const tripRows: [string, object, string][] = [
    ["no name", { name: " \u200b " }, "name"],
    ["a date that there isn't", { startDate: "2027-02-30" }, "startDate"],
    ["a date with a time", { startDate: "2027-02-03T10:00" }, "startDate"],
    ["a zone that there isn't", { timeZone: "Mars/Olympus" }, "timeZone"],
    ["a number for notes", { notes: 1 }, "notes"],
  ];
  it.each(tripRows)("a trip with %s", async (_, more, field) => {
    const before = await everything();
    const input = { name: "Edge", startDate: "2027-06-11", timeZone: "UTC", notes: "", ...more };
    const refusal = await refusalOf(createTrip({ ctx: cast.leader.ctx, input: asInput(input) }));
    expect(Object.keys(refusal.fieldErrors)).toEqual([field]);
    expect(await everything()).toEqual(before);
  });

  const kitRows: [string, object, string][] = [
    ["a negative count", { count: -1 }, "details.count"],
    ["half a piece", { count: 0.5 }, "details.count"],
    ["a count beyond whole numbers", { count: 9007199254740993 }, "details.count"],
    ["a mass that is text", { massKg: "12 g" }, "details.massKg"],
    ["a type that there isn't", { type: "rope" }, "details.type"],
    ["a stake of no length", { spec: { class: "stake", lengthM: 0 } }, "details.spec.lengthM"],
  ];
  it.each(kitRows)("a kit item with %s", async (_, more, field) => {
    const before = await everything();
    const input = { tripId: cast.tripId, details: { ...anchorOf("three-blade-150", 2), ...more } };
    const refusal = await refusalOf(createKitItem({ ctx: cast.leader.ctx, input: asInput(input) }));
    expect(Object.keys(refusal.fieldErrors)).toContain(field);
    expect(await everything()).toEqual(before);
  });

  it("a shelter with a dimension named like a trap", async () => {
    const spec = { ...shelterOf("dome").spec, dimensions: JSON.parse('{"__proto__":{"x":1},"lengthM":2}') as object };
    const input = { tripId: cast.tripId, details: { ...shelterOf("dome"), spec } };
    const before = await everything();
    const outcome = await createShelter({ ctx: cast.leader.ctx, input: asInput(input) }).catch(
      (error: unknown) => error,
    );
    expect(({} as { x?: number }).x).toBeUndefined();
    expect((await everything()).camps).toEqual(before.camps);
    expect(outcome).toBeDefined();
  });

  it("more nights than a trip can have", async () => {
    const { ctx } = cast.leader;
    const { tripId } = await createTrip({ ctx, input: { name: "Long", startDate: "2027-06-11", timeZone: "UTC" } });
    for (let camps = 0; camps < 4; camps += 1) {
      await createCamp({ ctx, input: { tripId, details: windyCamp({ nights: 14 }) } });
    }
    const refusal = await refusalOf(createCamp({ ctx, input: { tripId, details: windyCamp({ nights: 5 }) } }));
    expect(refusal.fieldErrors).toEqual({
      "details.nights": ["With this camp the trip has 61 nights; at most 60 fit."],
    });
    const { campId } = await createCamp({ ctx, input: { tripId, details: windyCamp({ nights: 4 }) } });
    const longer = { tripId, campId, version: 1, details: windyCamp({ nights: 5 }) };
    expect((await refusalOf(updateCamp({ ctx, input: longer }))).code).toBe("bad-input");
  });

  it("keys that nobody asked for are left out", async () => {
    const { ctx } = cast.leader;
    const input = {
      name: "Mine",
      startDate: "2027-06-11",
      timeZone: "UTC",
      id: cast.tripId,
      createdBy: cast.stranger.id,
      version: 99,
      paperVersion: 99,
      role: "leader",
    };
    const { tripId } = await createTrip({ ctx, input });
    const [row] = await getDb().select().from(trip).where(eq(trip.id, tripId));
    expect(tripId).not.toBe(cast.tripId);
    expect(row).toMatchObject({ createdBy: cast.leader.id, version: 1, paperVersion: 1 });
  });
});

describe("the ends of what is allowed", () => {
  it.each([
    ["no wind at all", { kind: "gust" as const, speedMs: 0 }, 0],
    ["the strongest gust", { kind: "gust" as const, speedMs: 90 }, 90],
    ["a calm by Beaufort", { kind: "beaufort" as const, number: 0 }, null],
  ])("%s gives an answer", async (_, wind, designGustMs) => {
    const { ctx } = cast.leader;
    const { tripId } = await createTrip({ ctx, input: { name: "Ends", startDate: "2027-06-11", timeZone: "UTC" } });
    const { campId } = await makeCampKit(ctx, tripId, { wind });
    const plan = await getCampPlan({ ctx, input: { tripId, campId } });
    if (designGustMs !== null) expect(plan.camps[0]?.designGustMs).toBe(designGustMs);
    const pulls = plan.pitches[0]?.analysis?.design.tieOuts.map((one) => one.pullN) ?? [];
    expect(pulls).toHaveLength(8);
    expect(pulls.every((pull) => Number.isFinite(pull) && pull >= 0)).toBe(true);
  });
});
