import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Hill, WindInput, WindStrength } from "@/lib/calc/types";
import { BEAUFORT } from "@/lib/calc/tables/beaufort";
import { EXPOSURES } from "@/lib/calc/tables/exposure";
import { WINDBREAKS } from "@/lib/calc/tables/windbreaks";
import {
  airDensityKgM3,
  beaufortFromSpeed,
  beaufortSpeedMs,
  exposureFactor,
  GUST_FACTOR_MEAN_TO_GUST,
  orographicLocationFactor,
  orographyFactor,
  turbulenceIntensity,
  windAtShelter,
  windbreakSpeedRatio,
  windDirections,
} from "@/lib/calc/wind";
import { asceExposureCoefficient, asceTopographicFactor, durstRatio } from "@/lib/calc/wind-asce";

const OPEN: WindInput = {
  strength: { kind: "gust", speedMs: 20 },
  fromDeg: null,
  toDeg: null,
  exposure: "II",
  altitudeM: 0,
  temperatureC: null,
  hill: null,
  windbreak: null,
  underTreesSpeedRatio: null,
};
const HILL: Hill = { shape: "hill", heightM: 50, upwindLengthM: 200, downwindLengthM: 200, fromCrestM: 0 };
const CLIFF: Hill = { shape: "cliff", heightM: 30, upwindLengthM: 50, downwindLengthM: 1, fromCrestM: 0 };

function at(changes: Partial<WindInput>, heightM = 2) {
  const result = windAtShelter({ ...OPEN, ...changes }, heightM);
  if (result.status !== "ok") throw new Error("expected a wind");
  return result.wind;
}
const valueOf = (wind: ReturnType<typeof at>, symbol: string) =>
  wind.workings.find((step) => step.symbol === symbol)?.value;

describe("wind at the shelter", () => {
  it("at 10 m over open ground is the forecast gust itself: the peak factor is not applied again", () => {
    const wind = at({}, 10);
    expect(wind.pressurePa).toBeCloseTo(0.5 * 1.225 * 400, 3);
    expect(wind.gustMs).toBeCloseTo(20, 12);
    expect(wind.openGustMs).toBe(20);
  });

  it("at 2 m in open country has 1.423/2.352 of that pressure", () => {
    expect(at({}).pressurePa).toBeCloseTo(245 * (1.4234 / 2.3523), 1);
    expect(at({}).pressurePa).toBeLessThan(0.5 * 1.225 * 400 * (1 + 7 * turbulenceIntensity("II", 2)));
  });

  it("gives back its pressure from the gust, both ways", () => {
    const wind = at({ hill: HILL, altitudeM: 1800, temperatureC: -4 });
    expect(wind.pressurePa).toBeCloseTo(wind.pressurePerGustSquared * wind.openGustMs ** 2, 9);
    expect(wind.pressurePa).toBeCloseTo(0.5 * airDensityKgM3(1800, -4) * wind.gustMs ** 2, 9);
  });

  it("adds the hill to the mean wind and not to the turbulence", () => {
    const factor = orographyFactor(HILL, 2);
    const expected = exposureFactor("II", 2, factor) / exposureFactor("II", 2);
    expect(at({ hill: HILL }).pressurePa / at({}).pressurePa).toBeCloseTo(expected, 12);
    expect(expected).toBeLessThan(factor ** 2);
    expect(expected).toBeGreaterThan(factor);
  });

  it("takes the better of windbreak and trees, not their product", () => {
    const windbreak = { kind: "conifer-row", heightM: 10, distanceM: 100 } as const;
    const open = at({}).pressurePa;
    expect(at({ windbreak }).pressurePa / open).toBeCloseTo(0.25, 12);
    expect(at({ underTreesSpeedRatio: 0.6 }).pressurePa / open).toBeCloseTo(0.36, 12);
    expect(at({ windbreak, underTreesSpeedRatio: 0.6 }).pressurePa / open).toBeCloseTo(0.25, 12);
  });

  it("turns a mean wind and a Beaufort number into a gust, and says so", () => {
    const mean = at({ strength: { kind: "mean", speedMs: 10 } });
    expect(mean.openGustMs).toBeCloseTo(16.6, 12);
    expect(valueOf(mean, "G")).toBe(1.66);
    const force = at({ strength: { kind: "beaufort", number: 6 } });
    expect(force.openGustMs).toBeCloseTo(13.8 * 1.66, 12);
    expect(valueOf(force, "V_m")).toBe(13.8);
  });

  it("never takes a smaller gust factor than the standards give for open land", () => {
    expect(GUST_FACTOR_MEAN_TO_GUST).toBeGreaterThan(Math.sqrt(1 + 7 * turbulenceIntensity("II", 10)));
    expect(GUST_FACTOR_MEAN_TO_GUST).toBeGreaterThan(durstRatio(3) / durstRatio(600));
  });

  it.each([
    ["camp.gust", { strength: null }],
    ["camp.exposure", { exposure: null }],
    ["camp.altitude", { altitudeM: null }],
  ] as const)("gives no number without %s", (field, changes) => {
    const result = windAtShelter({ ...OPEN, ...changes }, 2);
    expect(result.status).toBe("unknown");
    if (result.status === "unknown") expect(result.gaps.map((gap) => gap.field)).toEqual([field]);
  });

  it("names every gap at once", () => {
    const result = windAtShelter({ ...OPEN, strength: null, exposure: null, altitudeM: null }, 2);
    expect(result.status === "unknown" && result.gaps.length).toBe(3);
  });

  it("writes each step with a source", () => {
    const wind = at({
      hill: HILL,
      strength: { kind: "beaufort", number: 9 },
      windbreak: { kind: "solid", heightM: 3, distanceM: 20 },
      underTreesSpeedRatio: 0.9,
    });
    expect(wind.workings.map((step) => step.symbol)).toEqual([
      "B",
      "V_m",
      "G",
      "V",
      "ρ",
      "s",
      "c_o",
      "z",
      "c_e(z)",
      "c_e(10)",
      "r_w",
      "r_t",
      "q",
      "V_s",
    ]);
    for (const step of wind.workings) expect(step.source.length).toBeGreaterThan(2);
  });

  it.each([
    [/strength\.speedMs/, { strength: { kind: "gust", speedMs: 91 } }],
    [/strength\.speedMs/, { strength: { kind: "mean", speedMs: Number.NaN } }],
    [/Beaufort/, { strength: { kind: "beaufort", number: 6.5 } }],
    [/altitudeM/, { altitudeM: -2000 }],
    [/temperatureC/, { temperatureC: 80 }],
    [/underTreesSpeedRatio/, { underTreesSpeedRatio: 0.1 }],
    [/hill\.heightM/, { hill: { ...HILL, heightM: 0 } }],
    [/hill\.upwindLengthM/, { hill: { ...HILL, upwindLengthM: 0 } }],
    [/hill\.downwindLengthM/, { hill: { ...HILL, downwindLengthM: 0, fromCrestM: 10 } }],
    [/hill\.fromCrestM/, { hill: { ...HILL, fromCrestM: Number.POSITIVE_INFINITY } }],
    [/windbreak\.heightM/, { windbreak: { kind: "solid", heightM: 0, distanceM: 10 } }],
    [/windbreak\.distanceM/, { windbreak: { kind: "solid", heightM: 2, distanceM: -1 } }],
  ] as const)("throws %s when it is out of range", (message, changes) => {
    expect(() => windAtShelter({ ...OPEN, ...(changes as Partial<WindInput>) }, 2)).toThrow(RangeError);
    expect(() => windAtShelter({ ...OPEN, ...(changes as Partial<WindInput>) }, 2)).toThrow(message);
  });

  it("throws for a shelter higher than the formulas reach", () => {
    expect(() => windAtShelter(OPEN, 201)).toThrow(/referenceHeightM/);
  });

  it("rises with the gust, falls with altitude, and is finite for any input in range", () => {
    const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    const strength: fc.Arbitrary<WindStrength> = fc.oneof(
      number(0, 90).map((speedMs) => ({ kind: "gust", speedMs }) as const),
      number(0, 60).map((speedMs) => ({ kind: "mean", speedMs }) as const),
      fc.integer({ min: 0, max: 12 }).map((force) => ({ kind: "beaufort", number: force }) as const),
    );
    const hill = fc.record({
      shape: fc.constantFrom("hill" as const, "cliff" as const),
      heightM: number(1, 500),
      upwindLengthM: number(5, 3000),
      downwindLengthM: number(5, 3000),
      fromCrestM: number(-4000, 4000),
    });
    const input = fc.record({
      strength,
      fromDeg: fc.constant(null),
      toDeg: fc.constant(null),
      exposure: fc.constantFrom(...EXPOSURES.map((row) => row.category)),
      altitudeM: number(-400, 5000),
      temperatureC: fc.option(number(-40, 40), { nil: null }),
      hill: fc.option(hill, { nil: null }),
      windbreak: fc.option(
        fc.record({
          kind: fc.constantFrom(...WINDBREAKS.map((row) => row.kind)),
          heightM: number(0.5, 40),
          distanceM: number(0, 2000),
        }),
        { nil: null },
      ),
      underTreesSpeedRatio: fc.option(number(0.3, 1), { nil: null }),
    });
    fc.assert(
      fc.property(input, number(0.1, 10), (each, heightM) => {
        const wind = at(each, heightM);
        expect(Number.isFinite(wind.pressurePa) && wind.pressurePa >= 0).toBe(true);
        expect(at(each, heightM)).toEqual(wind);
        for (const step of wind.workings) {
          if (typeof step.value === "number") expect(Number.isFinite(step.value)).toBe(true);
        }
        expect(wind.pressurePerGustSquared).toBeLessThanOrEqual(
          at({ ...each, windbreak: null, underTreesSpeedRatio: null }, heightM).pressurePerGustSquared * (1 + 1e-12),
        );
        expect(wind.pressurePerGustSquared).toBeGreaterThanOrEqual(
          at({ ...each, hill: null }, heightM).pressurePerGustSquared * (1 - 1e-12),
        );
        expect(at({ ...each, temperatureC: null, altitudeM: 3000 }, heightM).pressurePa).toBeLessThanOrEqual(
          at({ ...each, temperatureC: null, altitudeM: 0 }, heightM).pressurePa,
        );
      }),
      { numRuns: 200 },
    );
  });
});

describe("hills", () => {
  it("counts nothing on gentle slopes, far away, or high above", () => {
    expect(orographyFactor({ ...HILL, heightM: 9 }, 2)).toBe(1);
    expect(orographicLocationFactor({ ...HILL, fromCrestM: -301 }, 2)).toBe(0);
    expect(orographicLocationFactor({ ...HILL, fromCrestM: 401 }, 2)).toBe(0);
    expect(orographicLocationFactor({ ...CLIFF, fromCrestM: 400 }, 2)).toBe(0);
    expect(orographicLocationFactor({ ...HILL, heightM: 10, upwindLengthM: 20 }, 100)).toBe(0);
  });

  it("uses the lee length behind the crest of a hill (x/L_d, not x/L_u)", () => {
    const near = orographicLocationFactor({ ...HILL, downwindLengthM: 100, fromCrestM: 100 }, 2);
    const far = orographicLocationFactor({ ...HILL, downwindLengthM: 800, fromCrestM: 100 }, 2);
    expect(far).toBeGreaterThan(near * 1.5);
  });

  it("joins crest and lee of a cliff without a jump", () => {
    const l = 100;
    const step = (x: number) => orographicLocationFactor({ ...CLIFF, fromCrestM: x }, 2);
    expect(step(1e-6)).toBeCloseTo(step(0), 6);
    expect(step(0.1 * l - 1e-6)).toBeCloseTo(step(0.1 * l + 1e-6), 6);
    expect(step(0.05 * l)).toBeCloseTo((step(0) + step(0.1 * l)) / 2, 6);
  });

  it("gives the crest of a steep ridge a speed-up like ASCE 7 does", () => {
    const steep: Hill = { shape: "hill", heightM: 30, upwindLengthM: 60, downwindLengthM: 60, fromCrestM: 0 };
    const ours = exposureFactor("II", 2, orographyFactor(steep, 2)) / exposureFactor("II", 2);
    // ASCE's L_h reaches from half height to the crest: half of L_u.
    const theirs = asceTopographicFactor("ridge", 30, 30, 0, 2);
    expect(ours / theirs).toBeGreaterThan(0.6);
    expect(ours / theirs).toBeLessThan(1.1);
  });
});

describe("ASCE 7 as comparison", () => {
  it("has the same fall from 10 m to 5 m as EN within a tenth", () => {
    const en = exposureFactor("II", 5) / exposureFactor("II", 10);
    const asce = asceExposureCoefficient("C", 5) / asceExposureCoefficient("C", 10);
    expect(en / asce).toBeGreaterThan(0.9);
    expect(en / asce).toBeLessThan(1.1);
  });
  it("limits a steep hill to H/L 0.5", () => {
    expect(asceTopographicFactor("ridge", 80, 100, 0, 0)).toBeCloseTo((1 + 1.45 * 0.5) ** 2, 12);
  });
  it("interpolates Durst's curve", () => {
    expect(durstRatio(3600)).toBe(1);
    expect(durstRatio(30)).toBeGreaterThan(1.28);
    expect(durstRatio(30)).toBeLessThan(1.43);
  });
});

describe("windbreaks", () => {
  const ratio = (distanceM: number, heightM = 10, z = 2) =>
    windbreakSpeedRatio({ kind: "conifer-belt", heightM, distanceM }, z);
  it("gives no shelter at the foot of the trees, full shelter from one height, none far away", () => {
    expect(ratio(0)).toBe(1);
    expect(ratio(5)).toBeCloseTo(1 - 0.75 / 2, 12);
    expect(ratio(10)).toBeCloseTo(0.25, 12);
    expect(ratio(30)).toBeCloseTo(0.25, 12);
    expect(ratio(301)).toBe(1);
  });
  it("does not shelter what stands as high as the windbreak", () => {
    expect(ratio(40, 2, 2)).toBe(1);
    expect(ratio(20, 4, 3)).toBeCloseTo(1 - 0.75 / 2, 12);
    expect(ratio(20, 4, 2)).toBeCloseTo(0.25, 12);
  });
  it("refuses a kind that is not in the table", () => {
    const kind = "hedge" as unknown as "solid";
    expect(() => windbreakSpeedRatio({ kind, heightM: 2, distanceM: 5 }, 1)).toThrow(/windbreak.kind/);
  });
});

describe("Beaufort", () => {
  it("contains 0.836·B^1.5 in each band, and the band's upper end is never below it", () => {
    for (const row of BEAUFORT) {
      const speedMs = 0.836 * row.number ** 1.5;
      expect(beaufortFromSpeed(speedMs)).toBe(row.number);
      expect(beaufortSpeedMs(row.number)).toBeGreaterThanOrEqual(speedMs);
      expect(beaufortFromSpeed(row.toMs)).toBe(row.number);
      expect(beaufortFromSpeed(row.fromMs)).toBe(row.number);
    }
  });
  it("refuses numbers that are not on the scale", () => {
    expect(() => beaufortSpeedMs(13)).toThrow(RangeError);
    expect(() => beaufortFromSpeed(-1)).toThrow(RangeError);
  });
});

describe("wind directions", () => {
  it("goes all round in steps of 15° when the wind may come from anywhere", () => {
    expect(windDirections(null, null)).toHaveLength(24);
    expect(windDirections(90, null)).toHaveLength(24);
    expect(windDirections(0, 360)).toHaveLength(24);
    expect(windDirections(null, null)[1]).toBe(15);
  });
  it("covers a range clockwise with both ends, across north", () => {
    expect(windDirections(225, 270)).toEqual([225, 240, 255, 270]);
    expect(windDirections(350, 10)).toEqual([350, 0, 10]);
    expect(windDirections(100, 100)).toEqual([100]);
    expect(windDirections(0, 50)).toEqual([0, 12.5, 25, 37.5, 50]);
    expect(windDirections(-90, 0, 45)).toEqual([270, 315, 0]);
  });
  it("never steps further than asked", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 359.9, noNaN: true }),
        fc.double({ min: 0, max: 359.9, noNaN: true }),
        (from, to) => {
          const directions = windDirections(from, to);
          for (let i = 1; i < directions.length; i += 1) {
            const step = ((directions[i] ?? 0) - (directions[i - 1] ?? 0) + 360) % 360;
            expect(step).toBeLessThanOrEqual(15 + 1e-6);
          }
          for (const direction of directions) {
            expect(direction).toBeGreaterThanOrEqual(0);
            expect(direction).toBeLessThan(360);
          }
        },
      ),
      { numRuns: 200, seed: 7 },
    );
  });
  it("refuses a step of nothing", () => {
    expect(() => windDirections(0, 90, 0)).toThrow(/stepDeg/);
    expect(() => windDirections(900, 90)).toThrow(/fromDeg/);
    expect(() => windDirections(0, 900)).toThrow(/toDeg/);
  });
});

describe("exposure", () => {
  it("refuses an unknown category", () => {
    expect(() => exposureFactor("V" as unknown as "IV", 2)).toThrow(/exposure/);
  });
});
