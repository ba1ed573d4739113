import { describe, expect, it } from "vitest";
import { blankCamp, HAZARDS } from "@/lib/domain/camp/schema";
import { suggestHazards } from "@/lib/domain/camp/terrain-hints";
import { compareVerdicts, isWorse } from "@/lib/domain/forecast/outlook";
import { isStillPlanned, windOfForecast } from "@/lib/domain/forecast/plan-wind";
import type { NightForecast } from "@/lib/domain/forecast/schema";
import { formatRain, formatTemperature } from "@/lib/format/weather";

const night = (day: string, over: Partial<NightForecast> = {}): NightForecast => ({
  day,
  gustMs: 20,
  meanMs: 12,
  fromDeg: 280,
  rangeFromDeg: 270,
  rangeToDeg: 290,
  rainMm: 2,
  temperatureC: 4,
  windChillC: 0,
  ...over,
});
const current = { temperatureC: 7 };
const of = (nights: readonly NightForecast[], days = nights.map((one) => one.day)) =>
  windOfForecast({ nights }, days, current);

describe("what a forecast puts into the plan", () => {
  it("is the strongest gust of the nights, from wherever it may come and 30° either side, in the coldest air", () => {
    const second = night("2027-06-08", { gustMs: 26, rangeFromDeg: 300, rangeToDeg: 310, temperatureC: -1 });
    expect(of([night("2027-06-07"), second])).toEqual({
      isComplete: true,
      strongestDay: "2027-06-08",
      planned: { wind: { kind: "gust", speedMs: 26 }, windFromDeg: 240, windToDeg: 340, temperatureC: -1 },
    });
  });

  it("is the mean wind where a night has no gust, any direction where one is not said, and the camp's own cold", () => {
    const planned = of([
      night("2027-06-07", { gustMs: null, rangeFromDeg: null, rangeToDeg: null, temperatureC: null }),
    ]);
    expect(planned).toMatchObject({
      planned: { wind: { kind: "mean", speedMs: 12 }, windFromDeg: null, windToDeg: null, temperatureC: 7 },
    });
  });

  it("goes over north, and all round becomes any direction", () => {
    const north = of([night("2027-06-07", { rangeFromDeg: 350, rangeToDeg: 10 })]);
    expect(north).toMatchObject({ planned: { windFromDeg: 320, windToDeg: 40 } });
    const round = of([night("2027-06-07", { rangeFromDeg: 0, rangeToDeg: 300 })]);
    expect(round).toMatchObject({ planned: { windFromDeg: null, windToDeg: null } });
  });

  it("is nothing when it is for other nights or does not reach over all", () => {
    expect(of([night("2027-06-07")], ["2027-06-07", "2027-06-08"])).toMatchObject({ isComplete: false });
    const open = of([night("2027-06-07"), night("2027-06-08", { gustMs: null, meanMs: null })]);
    expect(open).toMatchObject({ isComplete: false, reason: /does not reach/ });
  });

  it("is still planned after a form that shows tenths is saved, not after another wind is typed", () => {
    const found = of([night("2027-06-07", { gustMs: 25.013 })]);
    if (!found.isComplete) throw new Error("incomplete");
    const { planned } = found;
    expect(isStillPlanned(planned, { ...planned, wind: { kind: "gust", speedMs: 90 / 3.6 } })).toBe(true);
    expect(isStillPlanned(planned, { ...planned, wind: { kind: "gust", speedMs: 24 } })).toBe(false);
    expect(isStillPlanned(planned, { ...planned, wind: { kind: "mean", speedMs: 25 } })).toBe(false);
    expect(isStillPlanned(planned, { ...planned, windToDeg: 0 })).toBe(false);
    expect(isStillPlanned(planned, { ...planned, wind: null })).toBe(false);
  });
});

describe("an outlook", () => {
  it("says what was and what will be", () => {
    expect(compareVerdicts("Camp 3", "holds", "gives-way")).toBe("Camp 3 now gives way: was holds");
    expect(compareVerdicts("Camp 3", "thin", "holds")).toBe("Camp 3 now holds: was thin");
    expect(compareVerdicts("Camp 3", "thin", "thin")).toBe("Camp 3 is still thin");
    expect(compareVerdicts("Camp 3", "holds", "thin")).toBe("Camp 3 is now thin: was holds");
    expect(isWorse("holds", "thin")).toBe(true);
    expect(isWorse("thin", "gives-way")).toBe(true);
    expect(isWorse("unknown", "holds")).toBe(false);
    expect(isWorse("gives-way", "gives-way")).toBe(false);
  });
});

describe("terrain", () => {
  it("is hinted at by what else was said, once each, and never for what is ticked", () => {
    const camp = { ...blankCamp("Otter Flat"), hasTrees: true, underTreesSpeedRatio: 0.8, waterDistanceM: 20 };
    expect(suggestHazards(camp).map((hint) => hint.key)).toEqual(["dead-limbs", "flood-plain"]);
    expect(suggestHazards({ ...camp, hazards: ["dead-limbs", "flood-plain"] })).toEqual([]);
    expect(suggestHazards(blankCamp("Nowhere"))).toEqual([]);
    const hill = { shape: "hill" as const, heightM: 50, upwindLengthM: 200, downwindLengthM: 200, fromCrestM: -20 };
    const ridge = { ...blankCamp("Ridge"), hill, exposure: "I" as const };
    expect(suggestHazards(ridge).map((hint) => hint.key)).toEqual(["ridge", "lightning"]);
    expect(suggestHazards({ ...ridge, hill: { ...hill, fromCrestM: 150 } }).map((hint) => hint.key)).toEqual([
      "lightning",
    ]);
  });

  it("has a caution for each hazard", () => {
    for (const hazard of HAZARDS) expect(hazard.caution).toMatch(/^[A-Z].{20,}\.$/);
  });
});

describe("weather in people's units", () => {
  it.each([
    [formatTemperature(-2.6), "−3\u2009°C"],
    [formatTemperature(-0.2), "0\u2009°C"],
    [formatTemperature(-10, "ft"), "14\u2009°F"],
    [formatRain(0), "none"],
    [formatRain(0.4), "< 1\u2009mm"],
    [formatRain(4.2), "4\u2009mm"],
    [formatRain(25.4, "ft"), "1.00\u2009in"],
    [formatRain(0.1, "ft"), "< 0.01\u2009in"],
  ])("%s", (ours, expected) => {
    expect(ours).toBe(expected);
  });
});
