import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  characteristicFactor,
  characteristicValue,
  normalDensity,
  normalDistribution,
  normalQuantile,
  studentDistribution,
  studentQuantile,
} from "@/lib/calc/statistics";

describe("normal distribution", () => {
  /** Abramowitz & Stegun (1964), Table 26.1: P(x) to the digits given here. */
  it.each([
    [0, 0.5],
    [0.5, 0.691462461274013],
    [1, 0.841344746068543],
    [1.5, 0.933192798731142],
    [2, 0.977249868051821],
    [3, 0.99865010196837],
  ])("Φ(%d) = %d", (x, expected) => {
    expect(normalDistribution(x)).toBeCloseTo(expected, 14);
    expect(normalDistribution(-x)).toBeCloseTo(1 - expected, 14);
  });

  /** Abramowitz & Stegun (1964), Table 26.2 gives −log10 Q(x): Q(5) 6.54265, Q(10) 23.11805. */
  it.each([
    [5, 6.54265],
    [10, 23.11805],
  ])("tail at %d", (x, expected) => {
    expect(-Math.log10(normalDistribution(-x))).toBeCloseTo(expected, 5);
  });

  it("joins the two ways of computing without a step", () => {
    expect(normalDistribution(-4 - 1e-9) / normalDistribution(-4 + 1e-9)).toBeCloseTo(1, 7);
    expect(normalDistribution(-Infinity)).toBe(0);
    expect(normalDistribution(Infinity)).toBe(1);
  });

  /** AS 241's own check values: p 0.25, 0.001 and 1e-20 (Wichura 1988). */
  it.each([
    [0.25, -0.6744897501960817],
    [0.001, -3.090232306167814],
    [1e-20, -9.262340089798408],
  ])("quantile of %d", (p, expected) => {
    expect(normalQuantile(p)).toBeCloseTo(expected, 13);
  });

  it("quantile undoes the distribution", () => {
    fc.assert(
      fc.property(fc.double({ min: -7, max: 7, noNaN: true }), (x) => {
        const p = normalDistribution(x);
        // Near 1 the probability itself has only so many digits left.
        expect(normalQuantile(p)).toBeCloseTo(x, x > 5 ? 1 : 8);
      }),
      { numRuns: 300, seed: 5 },
    );
  });

  it("density is the slope of the distribution", () => {
    for (const x of [-3, -1, 0, 0.7, 2]) {
      const slope = (normalDistribution(x + 1e-5) - normalDistribution(x - 1e-5)) / 2e-5;
      expect(normalDensity(x)).toBeCloseTo(slope, 8);
    }
  });

  it("refuses probabilities outside 0…1", () => {
    for (const p of [0, 1, -0.1, NaN]) expect(() => normalQuantile(p)).toThrow(RangeError);
    for (const p of [0, 1, NaN]) expect(() => studentQuantile(p, 3)).toThrow(RangeError);
    expect(() => studentQuantile(0.9, 0)).toThrow(RangeError);
  });
});

describe("Student's t", () => {
  /** Abramowitz & Stegun (1964), Table 26.10, one-sided 0.95 and two-sided 0.95. */
  it.each([
    [1, 0.95, 6.314],
    [2, 0.95, 2.92],
    [4, 0.95, 2.132],
    [9, 0.95, 1.833],
    [29, 0.95, 1.699],
    [10, 0.975, 2.228],
    [120, 0.975, 1.98],
  ])("%i degrees, p %d", (degrees, p, expected) => {
    expect(studentQuantile(p, degrees)).toBeCloseTo(expected, 3);
    expect(studentQuantile(1 - p, degrees)).toBeCloseTo(-expected, 3);
  });

  /** One degree is the Cauchy distribution, two have a closed form. */
  it("closed forms for one and two degrees", () => {
    for (const t of [-30, -2, -0.3, 0, 0.4, 1, 5, 80]) {
      expect(studentDistribution(t, 1)).toBeCloseTo(0.5 + Math.atan(t) / Math.PI, 12);
      expect(studentDistribution(t, 2)).toBeCloseTo(0.5 + t / (2 * Math.sqrt(2 + t * t)), 12);
    }
  });
});

describe("EN 1990 D.7.2, Table D.1", () => {
  const KNOWN = [
    [1, 2.31],
    [2, 2.01],
    [3, 1.89],
    [4, 1.83],
    [5, 1.8],
    [6, 1.77],
    [8, 1.74],
    [10, 1.72],
    [20, 1.68],
    [30, 1.67],
  ] as const;
  const UNKNOWN = [
    [3, 3.37],
    [4, 2.63],
    [5, 2.33],
    [6, 2.18],
    [8, 2],
    [10, 1.92],
    [20, 1.76],
    [30, 1.73],
  ] as const;

  // The table was made with 1.64 instead of 1.645 and rounded: up to 0.02 apart at n = 1, 0.012 at n = 20.
  it.each(KNOWN)("scatter known, %i readings: %d", (readings, expected) => {
    expect(Math.abs(characteristicFactor(readings, "known") - expected)).toBeLessThan(0.021);
  });
  it.each(UNKNOWN)("scatter unknown, %i readings: %d", (readings, expected) => {
    expect(Math.abs(characteristicFactor(readings, "unknown") - expected)).toBeLessThan(0.013);
  });

  // 310 265 420 355 290 N: m 5.779711, s 0.180512; 212.3 with the exact t, 206.4 with scatter 0.25 and 1.80.
  it("five readings", () => {
    const readings = [310, 265, 420, 355, 290];
    expect(characteristicValue(readings, null)).toBeCloseTo(212.3, 1);
    expect(Math.abs(characteristicValue(readings, 0.25) - 206.4)).toBeLessThan(0.4);
  });

  it("refuses what the table leaves blank and readings that are not forces", () => {
    expect(() => characteristicFactor(2, "unknown")).toThrow(RangeError);
    expect(() => characteristicFactor(0, "known")).toThrow(RangeError);
    expect(() => characteristicValue([100, 0, 90], null)).toThrow(RangeError);
  });
});
