import { answerOf } from "../../helpers/forecast-server";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { readAnswer } from "@/lib/weather/read-answer";
import { sampleSource, writeSampleAnswer } from "@/lib/weather/sample-source";
import type { ForecastHour } from "@/lib/weather/source";
import { nightWindow, summariseNights } from "@/lib/weather/summarise-nights";

const DAY = "2027-06-07";
const hoursOf = (over: Parameters<typeof answerOf>[2] = {}) =>
  readAnswer(JSON.stringify(answerOf("2027-06-06", 4, over)));

function change(hours: readonly ForecastHour[], at: string, over: Partial<ForecastHour>): ForecastHour[] {
  const changed = hours.map((hour) => (hour.atMs === Date.parse(at) ? { ...hour, ...over } : hour));
  expect(changed).not.toEqual(hours);
  return changed;
}

const night = (hours: readonly ForecastHour[], zone = "UTC") => {
  const [first] = summariseNights(hours, [DAY], zone);
  if (!first) throw new Error("no night");
  return first;
};

describe("a night out of hours", () => {
  it("is from 16:00 to 10:00 by the trip's clock", () => {
    expect(nightWindow(DAY, "UTC")).toEqual({
      fromMs: Date.parse("2027-06-07T16:00Z"),
      toMs: Date.parse("2027-06-08T10:00Z"),
    });
    // Oslo is two hours ahead in summer.
    expect(nightWindow(DAY, "Europe/Oslo").fromMs).toBe(Date.parse("2027-06-07T14:00Z"));
    // The clock goes forward in the night of 27 to 28 March 2027: an hour less.
    const spring = nightWindow("2027-03-27", "Europe/Oslo");
    expect(spring.toMs - spring.fromMs).toBe(17 * 3_600_000);
    const autumn = nightWindow("2027-10-30", "Europe/Oslo");
    expect(autumn.toMs - autumn.fromMs).toBe(19 * 3_600_000);
  });

  it("has the worst of its hours and all its rain, and nothing of the hours outside", () => {
    let hours: readonly ForecastHour[] = hoursOf();
    hours = change(hours, "2027-06-07T15:00Z", { gustMs: 40, temperatureC: -9 });
    hours = change(hours, "2027-06-08T11:00Z", { gustMs: 40, temperatureC: -9 });
    hours = change(hours, "2027-06-08T03:00Z", { gustMs: 25, meanMs: 15, fromDeg: 300, temperatureC: -2 });
    const found = night(hours);
    expect(found).toMatchObject({ day: DAY, gustMs: 25, meanMs: 15, fromDeg: 300, temperatureC: -2 });
    expect([found.rangeFromDeg, found.rangeToDeg]).toEqual([270, 300]);
    // Eighteen hours end between 17:00 and 10:00: 18 × 0.5 mm.
    expect(found.rainMm).toBeCloseTo(9, 9);
    // 13.12 + 0.6215·(−2) − 11.37·54^0.16 + 0.3965·(−2)·54^0.16, with 54^0.16 = 1.89318.
    expect(found.windChillC).toBeCloseTo(13.12 - 1.243 - 11.37 * 1.89318 - 0.793 * 1.89318, 2);
  });

  it.each(["Asia/Kolkata", "Australia/Eucla", "Pacific/Chatham", "America/St_Johns"])(
    "is whole in %s too, where hours are offset by a part",
    (zone) => {
      expect(night(hoursOf(), zone).gustMs).toBe(16);
    },
  );

  it("of which hours are missing says nothing of what they lack", () => {
    const hours = hoursOf();
    expect(night(change(hours, "2027-06-08T02:00Z", { gustMs: null }))).toMatchObject({ gustMs: null, meanMs: 10 });
    expect(night(change(hours, "2027-06-08T02:00Z", { temperatureC: null })).windChillC).toBeNull();
    expect(night(change(hours, "2027-06-08T02:00Z", { rainMm: null })).rainMm).toBeNull();
    expect(night(change(hours, "2027-06-08T02:00Z", { fromDeg: null })).rangeFromDeg).toBeNull();
    const cut = hours.filter((hour) => hour.atMs < Date.parse("2027-06-08T04:00Z"));
    expect(night(cut)).toEqual({
      day: DAY,
      gustMs: null,
      meanMs: null,
      fromDeg: null,
      rangeFromDeg: null,
      rangeToDeg: null,
      rainMm: null,
      temperatureC: null,
      windChillC: null,
    });
    expect(night([])).toMatchObject({ gustMs: null, rainMm: null });
  });

  it("asks the strong hours only for the direction to plan for, and never has a gust below its mean", () => {
    let hours: readonly ForecastHour[] = hoursOf();
    hours = change(hours, "2027-06-08T02:00Z", { meanMs: 4, gustMs: 6, fromDeg: 90 });
    expect(night(hours)).toMatchObject({ rangeFromDeg: 270, rangeToDeg: 270 });
    expect(night(hoursOf({ wind_gusts_10m: 9 })).gustMs).toBe(10);
  });

  it("has no wind chill in warm air or in a calm", () => {
    expect(night(hoursOf({ temperature_2m: 15 })).windChillC).toBeNull();
    expect(night(hoursOf({ wind_speed_10m: 1, wind_gusts_10m: 1 })).windChillC).toBeNull();
  });
});

describe("the sample", () => {
  it("answers for any place and day through the same reader, always alike, and says what it is", async () => {
    const request = fc.record({
      latitude: fc.double({ min: -90, max: 90, noNaN: true }),
      longitude: fc.double({ min: -180, max: 180, noNaN: true }),
      altitudeM: fc.constant(null),
      day: fc.date({ min: new Date("1970-01-02"), max: new Date("2199-12-01"), noInvalidDate: true }),
      askedAt: fc.date({ min: new Date("2020-01-01"), max: new Date("2100-01-01"), noInvalidDate: true }),
    });
    expect(sampleSource).toMatchObject({ isSample: true, name: "sample data" });
    fc.assert(
      fc.property(request, ({ day, ...place }) => {
        const fromDay = day.toISOString().slice(0, 10);
        const toDay = new Date(day.getTime() + 3 * 86_400_000).toISOString().slice(0, 10);
        const asked = { ...place, fromDay, toDay };
        const text = writeSampleAnswer(asked);
        expect(writeSampleAnswer(asked)).toBe(text);
        const [found] = summariseNights(readAnswer(text), [fromDay], "UTC");
        expect(found?.gustMs).toBeGreaterThan(0);
        expect(found?.temperatureC).toBeGreaterThan(-60);
      }),
      { numRuns: 60 },
    );
  });
});
