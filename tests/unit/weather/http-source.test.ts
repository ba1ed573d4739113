import { answerOf, json, startForecastServer, UNITS } from "../../helpers/forecast-server";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { httpSource } from "@/lib/weather/http-source";
import { ForecastTrouble, type TroubleKind } from "@/lib/weather/source";

let server: Awaited<ReturnType<typeof startForecastServer>>;
beforeAll(async () => {
  server = await startForecastServer();
});
afterAll(() => server.stop());

const REQUEST = {
  latitude: 61.93128,
  longitude: 8.72154,
  altitudeM: 742.4,
  fromDay: "2027-06-06",
  toDay: "2027-06-08",
  askedAt: new Date("2027-06-05T12:00:00Z"),
};
const GOOD = answerOf("2027-06-06", 3);

const source = (over: object = {}) =>
  httpSource({ url: server.url, name: "Local service", timeoutMs: 250, pauseMs: 5, maxBytes: 100_000, ...over });

async function troubleOf(over: object = {}): Promise<ForecastTrouble> {
  const outcome = await source(over)
    .fetchHours(REQUEST)
    .then(
      () => null,
      (error: unknown) => error,
    );
  if (outcome instanceof ForecastTrouble) return outcome;
  throw new Error(`Expected trouble, got ${String(outcome)}`);
}

const withHourly = (over: Partial<typeof GOOD.hourly>) => ({ ...GOOD, hourly: { ...GOOD.hourly, ...over } });
const spoilAt = (values: readonly (number | null)[], index: number, value: number | null) =>
  values.map((one, at) => (at === index ? value : one));

describe("a hosted forecast service", () => {
  it("is asked for a place to a kilometre, its height, SI units, UTC and days; its own query stays", async () => {
    server.script(json(GOOD));
    const hours = await source().fetchHours(REQUEST);
    expect(hours).toHaveLength(72);
    expect(hours[0]).toEqual({
      atMs: Date.parse("2027-06-06T00:00:00Z"),
      meanMs: 10,
      gustMs: 16,
      fromDeg: 270,
      rainMm: 0.5,
      temperatureC: 4,
    });
    expect(server.asked).toHaveLength(1);
    expect(Object.fromEntries(server.asked[0]?.searchParams ?? [])).toEqual({
      key: "k",
      latitude: "61.93",
      longitude: "8.72",
      elevation: "742",
      hourly: Object.keys(UNITS).join(","),
      wind_speed_unit: "ms",
      timezone: "GMT",
      start_date: "2027-06-06",
      end_date: "2027-06-08",
    });
  });

  it("is asked once more when it stumbles, and no more than that", async () => {
    server.script(json("busy", 503), json(GOOD));
    expect(await source().fetchHours(REQUEST)).toHaveLength(72);
    expect(server.asked).toHaveLength(2);
    server.script(json("busy", 500));
    expect((await troubleOf()).kind).toBe("down");
    expect(server.asked).toHaveLength(2);
  });

  it("that never answers, or never ends, is slow", async () => {
    server.script(() => undefined);
    expect(await troubleOf()).toMatchObject({ kind: "slow", sentence: "The forecast service did not answer in time." });
    expect(server.asked).toHaveLength(2);
    server.script((response) => {
      response.writeHead(200, { "content-type": "application/json" });
      response.write('{"hourly":');
    });
    expect((await troubleOf()).kind).toBe("slow");
  });

  it("that hangs up, or isn't there, is down", async () => {
    server.script((response) => response.destroy());
    expect((await troubleOf()).kind).toBe("down");
    expect((await troubleOf({ url: "http://127.0.0.1:9/" })).kind).toBe("down");
  });

  it("may not lead to another address: no redirect is followed, to this machine least of all", async () => {
    for (const location of ["http://127.0.0.1:22/", "http://169.254.169.254/latest/meta-data", server.url]) {
      server.script((response) => {
        response.writeHead(302, { location });
        response.end();
      }, json(GOOD));
      expect((await troubleOf()).kind).toBe("refused");
      expect(server.asked).toHaveLength(1);
    }
  });

  it("is not asked again after too many questions", async () => {
    server.script(json({ reason: "limit" }, 429));
    expect((await troubleOf()).kind).toBe("refused");
    expect(server.asked).toHaveLength(1);
  });

  it("that has nothing for the days says so by 400", async () => {
    server.script(json({ error: true, reason: "out of range" }, 400));
    expect((await troubleOf()).kind).toBe("not-covered");
  });

  it("can't fill the memory: what is too long is cut off", async () => {
    server.script((response) => {
      response.writeHead(200);
      const piece = "x".repeat(50_000);
      const send = () => {
        if (response.destroyed) return;
        response.write(piece, () => setImmediate(send));
      };
      send();
    });
    expect((await troubleOf({ timeoutMs: 5000 })).kind).toBe("too-large");
  });

  const { hourly } = GOOD;
  const rows: readonly [string, TroubleKind, unknown][] = [
    ["text that is no JSON", "malformed", "<html>gateway</html>"],
    ["half an answer", "malformed", JSON.stringify(GOOD).slice(0, 500)],
    ["nothing", "malformed", ""],
    ["null", "malformed", "null"],
    ["a list", "malformed", []],
    ["another shape", "malformed", { list: [] }],
    ["text for numbers", "malformed", withHourly({ wind_gusts_10m: hourly.time.map(() => "16") as never })],
    ["lists of different length", "malformed", withHourly({ wind_gusts_10m: hourly.wind_gusts_10m.slice(1) })],
    ["time that runs back", "malformed", withHourly({ time: [...hourly.time].reverse() })],
    ["time that stands", "malformed", withHourly({ time: hourly.time.map(() => "2027-06-06T00:00") })],
    ["a time that is none", "malformed", withHourly({ time: ["2027-13-45T99:99", ...hourly.time.slice(1)] })],
    ["local time", "malformed", { ...GOOD, utc_offset_seconds: 7200 }],
    ["wind in km/h", "malformed", { ...GOOD, hourly_units: { ...UNITS, wind_gusts_10m: "km/h" } }],
    ["temperature in °F", "malformed", { ...GOOD, hourly_units: { ...UNITS, temperature_2m: "°F" } }],
    ["no units", "malformed", { ...GOOD, hourly_units: {} }],
    ["more hours than a month", "malformed", answerOf("2027-01-01", 40)],
    ["a gust of 900 m/s", "absurd", withHourly({ wind_gusts_10m: spoilAt(hourly.wind_gusts_10m, 30, 900) })],
    ["a gust of −1 m/s", "absurd", withHourly({ wind_gusts_10m: spoilAt(hourly.wind_gusts_10m, 30, -1) })],
    ["a mean of 61 m/s", "absurd", withHourly({ wind_speed_10m: spoilAt(hourly.wind_speed_10m, 3, 61) })],
    ["a gust well below the mean", "absurd", withHourly({ wind_gusts_10m: spoilAt(hourly.wind_gusts_10m, 9, 4.4) })],
    ["air of −200 °C", "absurd", withHourly({ temperature_2m: spoilAt(hourly.temperature_2m, 0, -200) })],
    ["rain of 2 m in an hour", "absurd", withHourly({ precipitation: spoilAt(hourly.precipitation, 0, 2000) })],
    ["a direction of 720°", "absurd", withHourly({ wind_direction_10m: spoilAt(hourly.wind_direction_10m, 0, 720) })],
  ];

  it.each(rows)("that answers %s is %s, and isn't asked again", async (_what, kind, body) => {
    server.script(json(body));
    const trouble = await troubleOf();
    expect(trouble.kind).toBe(kind);
    expect(trouble.sentence).toMatch(/^The forecast service answered /);
    expect(server.asked).toHaveLength(1);
  });

  it("may leave hours open", async () => {
    server.script(json(withHourly({ wind_gusts_10m: spoilAt(hourly.wind_gusts_10m, 5, null) })));
    expect((await source().fetchHours(REQUEST))[5]?.gustMs).toBeNull();
  });
});
