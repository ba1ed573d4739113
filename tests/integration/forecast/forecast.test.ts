import "../../helpers/database";
import { makeCast } from "../../helpers/actors";
import { answerOf, json, startForecastServer } from "../../helpers/forecast-server";
import { anchorOf, makeCampKit, shelterOf, windyCamp } from "../../helpers/camp-kit";
import { clearLimits } from "../../helpers/outbox";
import { codeOf, refusalOf } from "../../helpers/refusals";
import { hashTables } from "../../helpers/table-hash";
import { eq } from "drizzle-orm";
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it, vi } from "vitest";
import { getDb } from "@/db/client";
import { changeLog, forecast, person } from "@/db/schema";
import { proposePlan } from "@/lib/calc/plan";
import { toCampInput } from "@/lib/domain/plan/to-camp-input";
import { newId } from "@/lib/domain/ids";
import { createAlternative } from "@/lib/services/camps/create-alternative";
import { createCamp } from "@/lib/services/camps/create-camp";
import { getCamp } from "@/lib/services/camps/get-camp";
import { updateCamp } from "@/lib/services/camps/update-camp";
import { acceptForecast } from "@/lib/services/forecast/accept-forecast";
import { checkAllCamps } from "@/lib/services/forecast/check-all-camps";
import { fetchForecast } from "@/lib/services/forecast/fetch-forecast";
import { getCampForecast } from "@/lib/services/forecast/get-camp-forecast";
import { listTripForecasts } from "@/lib/services/forecast/list-trip-forecasts";
import { createKitItem } from "@/lib/services/kit/create-kit-item";
import { getPaperDocument } from "@/lib/services/papers/get-paper-document";
import { createPitch } from "@/lib/services/pitches/create-pitch";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { consumeQuota } from "@/lib/services/quota/consume-quota";
import { createShelter } from "@/lib/services/shelters/create-shelter";
import { updateTrip } from "@/lib/services/trips/update-trip";
import { httpSource } from "@/lib/weather/http-source";

let server: Awaited<ReturnType<typeof startForecastServer>>;
let cast: Awaited<ReturnType<typeof makeCast>>;
let campId: string;

const source = () => httpSource({ url: server.url, name: "Local service", timeoutMs: 300, pauseMs: 5 });
const leader = () => cast.leader.ctx;
const camp = () => ({ tripId: cast.tripId, campId });
const NOON = new Date("2027-06-06T12:00:00Z");
const later = (minutes: number) => new Date(NOON.getTime() + minutes * 60_000);
const fetchAt = (minutes: number, ctx = leader()) =>
  fetchForecast({ ctx, input: camp(), source: source(), at: later(minutes) });
const view = () => getCampForecast({ ctx: leader(), input: camp() });

/** Wind of so many m/s in gusts at the place of the trip, its first night 7 June 2027. */
const gusts = (gustMs: number, over: Parameters<typeof answerOf>[2] = {}) =>
  json(answerOf("2027-06-06", 4, { wind_gusts_10m: gustMs, wind_speed_10m: gustMs * 0.6, ...over }));

async function accept(): Promise<void> {
  const { latest, campVersion } = await view();
  await acceptForecast({ ctx: leader(), input: { ...camp(), forecastId: latest?.id ?? "", version: campVersion } });
}

beforeAll(async () => {
  server = await startForecastServer();
});
afterAll(() => server.stop());
afterEach(() => vi.unstubAllEnvs());

beforeEach(async () => {
  cast = await makeCast();
  await clearLimits();
  const kit = await makeCampKit(leader(), cast.tripId, {
    name: "Camp 3",
    latitude: 61.93,
    longitude: 8.72,
    wind: { kind: "gust", speedMs: 8 },
  });
  campId = kit.campId;
  const plan = await getCampPlan({ ctx: leader(), input: camp() });
  const { placements } = proposePlan(toCampInput(plan.camp.details, plan.pitches, plan.tray, [], plan.learned), {
    allowFound: true,
    allowDoubling: true,
  });
  const change = { type: "replace" as const, placements: [...placements] };
  await savePlanIntents({
    ctx: leader(),
    input: { ...camp(), intents: [{ intentId: newId(), baseVersion: 0, change }] },
  });
});

describe("fetching", () => {
  it("keeps the forecast beside the plan, which stays as it is, and says what accepting would do", async () => {
    const before = await getCampPlan({ ctx: leader(), input: camp() });
    expect(before.camps[0]?.verdict).toBe("holds");
    server.script(gusts(45));
    expect(await fetchAt(0)).toMatchObject({ outcome: "fetched" });
    expect(await getCampPlan({ ctx: leader(), input: camp() })).toEqual(before);
    const found = await view();
    expect(found).toMatchObject({
      accepted: null,
      failure: null,
      latest: { source: "Local service", isSample: false, fetchedAt: NOON.toISOString() },
    });
    expect(found.latest?.nights).toEqual([
      expect.objectContaining({ day: "2027-06-07", gustMs: 45, meanMs: 27, fromDeg: 270, temperatureC: 4 }),
    ]);
    expect(found.proposal?.planned).toEqual({
      wind: { kind: "gust", speedMs: 45 },
      windFromDeg: 240,
      windToDeg: 300,
      temperatureC: 4,
    });
    expect(found.proposal?.outlook).toMatchObject({
      sentence: "Camp 3 now gives way: was holds",
      isWorse: true,
      before: { verdict: "holds" },
      after: { verdict: "gives-way" },
    });
    expect((await listTripForecasts({ ctx: leader(), input: { tripId: cast.tripId } }))[0]).toEqual(found);
  });

  it("asks again only after ten minutes, and keeps the newest ten", async () => {
    server.script(gusts(10));
    await fetchAt(0);
    expect((await fetchAt(9)).outcome).toBe("fresh");
    expect(server.asked).toHaveLength(1);
    for (let time = 1; time <= 12; time += 1) await fetchAt(time * 11);
    const rows = await getDb().select().from(forecast).where(eq(forecast.campId, campId));
    expect(rows).toHaveLength(10);
    expect((await view()).latest?.fetchedAt).toBe(later(132).toISOString());
  });

  it("asks again at once when the nights have moved, and a forecast of other nights can't be accepted", async () => {
    server.script(gusts(10));
    await fetchAt(0);
    const { id } = (await view()).latest ?? { id: "" };
    const moved = { name: "Later", startDate: "2027-06-08", timeZone: "UTC", notes: "", contacts: [] };
    await updateTrip({ ctx: leader(), input: { tripId: cast.tripId, version: 1, ...moved } });
    expect((await view()).hindrance).toMatch(/for other nights/);
    const input = { ...camp(), forecastId: id, version: 1 };
    expect((await refusalOf(acceptForecast({ ctx: leader(), input }))).userMessage).toMatch(/for other nights/);
    expect((await fetchAt(1)).outcome).toBe("fetched");
  });

  it("needs a position, and a right to change the camp", async () => {
    const bare = await createCamp({ ctx: leader(), input: { tripId: cast.tripId, details: windyCamp() } });
    const input = { tripId: cast.tripId, campId: bare.campId };
    expect((await refusalOf(fetchForecast({ ctx: leader(), input, source: source() }))).fieldErrors).toHaveProperty(
      "campId",
    );
    const as = (ctx: typeof cast.leader.ctx) => codeOf(fetchForecast({ ctx, input: camp(), source: source() }));
    expect(await as(cast.participant.ctx)).toBe("forbidden");
    expect(await as(cast.stranger.ctx)).toBe("not-found");
    expect(await codeOf(getCampForecast({ ctx: cast.participant.ctx, input: camp() }))).toBe("forbidden");
    const elsewhere = { tripId: cast.otherTripId, campId };
    expect(await codeOf(fetchForecast({ ctx: cast.otherLeader.ctx, input: elsewhere, source: source() }))).toBe(
      "not-found",
    );
  });

  it("writes nothing for who lost the role between question and answer", async () => {
    const before = await hashTables();
    server.script((response, request) => {
      void getDb()
        .update(person)
        .set({ role: "participant" })
        .where(eq(person.id, cast.personIds.coLeader))
        .then(() => gusts(10)(response, request));
    });
    expect(await codeOf(fetchAt(0, cast.coLeader.ctx))).toBe("forbidden");
    await getDb().update(person).set({ role: "co-leader" }).where(eq(person.id, cast.personIds.coLeader));
    expect(await hashTables()).toEqual(before);
  });

  it("is limited per person", async () => {
    server.script(gusts(10));
    await consumeQuota("forecast", cast.leader.id, 119);
    expect((await fetchAt(0)).outcome).toBe("fetched");
    expect(await codeOf(fetchAt(11))).toBe("too-many");
    expect((await fetchAt(11, cast.coLeader.ctx)).outcome).toBe("fetched");
    expect(server.asked).toHaveLength(2);
  });

  it("uses the sample when no service is set, and the service of the environment when one is", async () => {
    await fetchForecast({ ctx: leader(), input: camp(), at: NOON });
    expect((await view()).latest).toMatchObject({ source: "sample data", isSample: true });
    vi.stubEnv("FORECAST_URL", server.url);
    vi.stubEnv("FORECAST_NAME", "Hill weather");
    vi.resetModules();
    const { getForecastSource } = await import("@/lib/weather/get-source");
    expect(getForecastSource()).toMatchObject({ name: "Hill weather", isSample: false });
  });
});

describe("accepting", () => {
  it("takes wind, range and cold into the plan, says so in the change log and counts the camp up", async () => {
    server.script(gusts(24, { temperature_2m: -3 }));
    await fetchAt(0);
    await accept();
    const { details, version } = await getCamp({ ctx: leader(), input: camp() });
    expect(details).toMatchObject({
      wind: { kind: "gust", speedMs: 24 },
      windFromDeg: 240,
      windToDeg: 300,
      temperatureC: -3,
      ground: { kind: "firm-moist-loam" },
    });
    expect(version).toBe(2);
    expect(await view()).toMatchObject({
      proposal: null,
      hindrance: null,
      accepted: { isPlanned: true, acceptedByName: cast.leader.name, source: "Local service" },
    });
    const log = await getDb().select().from(changeLog).where(eq(changeLog.tripId, cast.tripId));
    expect(log.map((row) => row.summary)).toContain("Camp 3: wind of the forecast");
  });

  it("never happens by itself: a later, worse one stands beside until somebody accepts it", async () => {
    server.script(gusts(8), gusts(45));
    await fetchAt(0);
    await accept();
    await fetchAt(60);
    const found = await view();
    expect(found.accepted).toMatchObject({ isPlanned: true, fetchedAt: NOON.toISOString() });
    expect(found.proposal?.outlook.sentence).toBe("Camp 3 now gives way: was holds");
    expect((await getCamp({ ctx: leader(), input: camp() })).details.wind).toEqual({ kind: "gust", speedMs: 8 });
  });

  it("is refused on an older forecast, on an older camp, without the right, and for another camp", async () => {
    server.script(gusts(10), gusts(12));
    await fetchAt(0);
    const old = (await view()).latest?.id ?? "";
    await fetchAt(60);
    const newest = (await view()).latest?.id ?? "";
    const before = await hashTables();
    const as = (over: object, ctx = leader()) =>
      codeOf(acceptForecast({ ctx, input: { ...camp(), forecastId: newest, version: 1, ...over } }));
    expect(await as({ forecastId: old })).toBe("conflict");
    expect(await as({ version: 2 })).toBe("conflict");
    expect(await as({}, cast.participant.ctx)).toBe("forbidden");
    expect(await as({}, cast.stranger.ctx)).toBe("not-found");
    expect(await as({ campId: newId() })).toBe("not-found");
    expect(await as({ forecastId: "" })).toBe("bad-input");
    expect(await hashTables()).toEqual(before);
  });

  it("is told apart from a wind typed over it", async () => {
    server.script(gusts(10));
    await fetchAt(0);
    await accept();
    const { details, version } = await getCamp({ ctx: leader(), input: camp() });
    const typed = { ...details, wind: { kind: "gust" as const, speedMs: 5 } };
    await updateCamp({ ctx: leader(), input: { ...camp(), version, details: typed } });
    expect(await view()).toMatchObject({ accepted: { isPlanned: false }, proposal: { planned: { windFromDeg: 240 } } });
  });
});

describe("a service in trouble", () => {
  const broken = [
    ["slow", () => undefined, /did not answer in time/],
    ["down", json("no", 500), /can't be reached/],
    ["malformed", json("<html>"), /can't be read/],
    ["absurd", gusts(900), /can't be true/],
    ["out of range", json({ error: true }, 400), /has nothing for these nights/],
    ["for other days", json(answerOf("2027-07-01", 2)), /has nothing for these nights/],
  ] as const;

  it.each(broken)("%s: the plan keeps what was accepted, and the page says so", async (_what, answer, sentence) => {
    server.script(gusts(10));
    await fetchAt(0);
    await accept();
    const before = await getCamp({ ctx: leader(), input: camp() });
    server.script(answer);
    expect(await fetchAt(60)).toMatchObject({ outcome: "failed", sentence: expect.stringMatching(sentence) });
    await fetchAt(61);
    const found = await view();
    expect(found).toMatchObject({
      failure: { sentence: expect.stringMatching(sentence), failedAt: later(61).toISOString(), count: 2 },
      accepted: { isPlanned: true, fetchedAt: NOON.toISOString() },
      latest: { fetchedAt: NOON.toISOString() },
    });
    expect(await getCamp({ ctx: leader(), input: camp() })).toEqual(before);
    server.script(gusts(11));
    await fetchAt(120);
    expect((await view()).failure).toBeNull();
  });
});

describe("all camps at once", () => {
  it("asks for each that has a position, alternatives too, and names the others", async () => {
    const details = windyCamp({ name: "Low Barn", latitude: 62, longitude: 8 });
    await createCamp({ ctx: leader(), input: { tripId: cast.tripId, details } });
    const beside = await createAlternative({ ctx: leader(), input: { ...camp(), name: "Bield" } });
    server.script(gusts(10));
    const input = { tripId: cast.tripId };
    const report = await checkAllCamps({ ctx: cast.coLeader.ctx, input, source: source(), at: NOON });
    expect(report).toMatchObject({ fetched: 2, failures: [] });
    expect(report.sentence).toBe("Forecasts for 2 of 2 camps are here. No position yet: Bield.");
    expect(await listTripForecasts({ ctx: leader(), input })).toHaveLength(2);
    const placed = windyCamp({ name: "Bield", latitude: 62, longitude: 9 });
    await updateCamp({ ctx: leader(), input: { ...input, campId: beside.campId, version: 1, details: placed } });
    expect((await checkAllCamps({ ctx: leader(), input, source: source(), at: later(1) })).fetched).toBe(3);
    const own = await getCampForecast({ ctx: leader(), input: { ...input, campId: beside.campId } });
    expect(own.latest?.nights).toHaveLength(1);
  });

  it("stops asking when the service is gone, and says what stays", async () => {
    const details = windyCamp({ name: "Low Barn", latitude: 62, longitude: 8 });
    await createCamp({ ctx: leader(), input: { tripId: cast.tripId, details } });
    server.script(json("no", 500));
    const report = await checkAllCamps({ ctx: leader(), input: { tripId: cast.tripId }, source: source(), at: NOON });
    expect(report.fetched).toBe(0);
    expect(report.sentence).toMatch(/0 of 2 camps.*Camp 3: .*can't be reached.*accepted before stays as it is/);
    expect(server.asked).toHaveLength(2);
  });

  it("is not for participants and strangers", async () => {
    const input = { tripId: cast.tripId };
    expect(await codeOf(checkAllCamps({ ctx: cast.participant.ctx, input }))).toBe("forbidden");
    expect(await codeOf(checkAllCamps({ ctx: cast.stranger.ctx, input }))).toBe("not-found");
    expect(await codeOf(listTripForecasts({ ctx: cast.stranger.ctx, input }))).toBe("not-found");
  });
});

describe("cards", () => {
  it("carry the forecast that the plan stands on, and none that was only fetched", async () => {
    const card = async () => {
      const paper = { kind: "field-card" as const, campId };
      const found = await getPaperDocument({ ctx: leader(), input: { tripId: cast.tripId, paper } });
      if (found.kind !== "field-card") throw new Error("no card");
      return found.camp.forecast;
    };
    server.script(gusts(10));
    await fetchAt(0);
    expect(await card()).toBeNull();
    await accept();
    expect(await card()).toMatchObject({
      source: "Local service",
      isSample: false,
      // Noon UTC on the clock of the trip.
      fetchedAt: "6 June 13:00",
      nights: [{ day: "2027-06-07", gustMs: 10 }],
    });
  });

  it("are made for a shelter that only the alternative has", async () => {
    const beside = await createAlternative({ ctx: leader(), input: { ...camp(), name: "Bield" } });
    const input = { tripId: cast.tripId, campId: beside.campId };
    const dome = shelterOf("dome", { name: "Dome" });
    const { shelterId } = await createShelter({ ctx: leader(), input: { tripId: cast.tripId, details: dome } });
    await createKitItem({ ctx: leader(), input: { tripId: cast.tripId, details: anchorOf("v-160", 4) } });
    const { pitchId } = await createPitch({ ctx: leader(), input: { ...input, shelterId } });
    const paper = { kind: "pitch-card" as const, campId: beside.campId, pitchId };
    const found = await getPaperDocument({ ctx: leader(), input: { tripId: cast.tripId, paper } });
    expect(found.kind).toBe("pitch-card");
  });
});
