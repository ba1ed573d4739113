import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { chanceHolds, dependable, verdictOf, worstVerdict } from "@/lib/calc/verdict";

describe("dependable value", () => {
  // Meeker & Escobar (1998) p. 199: μ̂ 6.564256, σ̂ 0.534049 → 5 % fractile e^(μ − 1.6449 σ) = 294.65.
  it("is the 5 % fractile of a lognormal strength", () => {
    expect(dependable(Math.exp(6.564256), 0.534049)).toBeCloseTo(294.65, 1);
    expect(dependable(200, 0)).toBe(200);
  });

  it("is exceeded in 95 of 100 cases", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 5000, noNaN: true }),
        fc.double({ min: 0.05, max: 1, noNaN: true }),
        (m, s) => {
          expect(chanceHolds(m, s, dependable(m, s))).toBeCloseTo(0.95, 10);
          expect(chanceHolds(m, s, m)).toBeCloseTo(0.5, 10);
        },
      ),
      { seed: 3 },
    );
  });
});

describe("chance", () => {
  it("is Φ of the distance in logarithms", () => {
    // ln(e^0.4 · 100 / 100) / 0.4 = 1 → Φ(1) = 0.841345.
    expect(chanceHolds(100 * Math.exp(0.4), 0.4, 100)).toBeCloseTo(0.841345, 6);
  });
  it("has sensible ends", () => {
    expect(chanceHolds(100, 0.4, 0)).toBe(1);
    expect(chanceHolds(0, 0.4, 10)).toBe(0);
    expect(chanceHolds(100, 0, 99)).toBe(1);
    expect(chanceHolds(100, 0, 101)).toBe(0);
  });
  it("falls with the demand", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 900, noNaN: true }),
        fc.double({ min: 0, max: 500, noNaN: true }),
        (d, more) => {
          expect(chanceHolds(300, 0.4, d + more)).toBeLessThanOrEqual(chanceHolds(300, 0.4, d));
        },
      ),
      { seed: 4 },
    );
  });
});

describe("verdict", () => {
  it.each([
    [300, 150, 150, "holds"],
    [300, 150, 150.01, "thin"],
    [300, 150, 300, "thin"],
    [300, 150, 300.01, "gives-way"],
    [0, 0, 0, "holds"],
  ] as const)("median %d, dependable %d, demand %d: %s", (median, least, demand, expected) => {
    expect(verdictOf(median, least, demand)).toBe(expected);
  });

  it("of a whole is that of its worst part", () => {
    expect(worstVerdict(["holds", "thin"])).toBe("thin");
    expect(worstVerdict(["holds", "unknown", "thin"])).toBe("unknown");
    expect(worstVerdict(["unknown", "gives-way"])).toBe("gives-way");
    expect(worstVerdict(["holds", "holds"])).toBe("holds");
    expect(worstVerdict([])).toBe("unknown");
  });
});
