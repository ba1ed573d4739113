import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { legBetween, runningTotals } from "@/lib/calc/route/climb";
import { liftingWorkJ, walkingPowerW, waterWhileWalkingL } from "@/lib/calc/route/energy";
import { legEnergy } from "@/lib/calc/route/leg-energy";
import { buildProfile, heightAtM } from "@/lib/calc/route/profile";
import { simplifyToCount } from "@/lib/calc/route/simplify";
import { din33466H, naismithH, tranterH, withBreaksH } from "@/lib/calc/route/walking-time";
import { lowerFitness } from "@/lib/calc/tables/tranter";

/** A way of so many points 40 m apart. */
const profileOf = (heights: readonly number[]) =>
  buildProfile({ atM: heights.map((_, index) => index * 40), heightsM: heights });
const hills = fc.array(fc.double({ min: -400, max: 4000, noNaN: true }), { minLength: 2, maxLength: 120 });

describe("ascent and descent", () => {
  it("a ramp of 200 m is 200 m, but for the ends that smoothing flattens", () => {
    const ramp = Array.from({ length: 101 }, (_, index) => 100 + index * 2);
    const leg = legBetween(runningTotals(profileOf(ramp)), 0, 4000);
    expect(leg.ascentM).toBeCloseTo(200, 0);
    expect(leg.descentM).toBe(0);
  });

  it("scatter of two metres on a level way is no ascent", () => {
    const noise = Array.from({ length: 200 }, (_, index) => 500 + (index % 2 === 0 ? 2 : -2));
    expect(legBetween(runningTotals(profileOf(noise)), 0, 199 * 40).ascentM).toBe(0);
  });

  it("up and down again are counted both, gently and steeply by the slope", () => {
    const hill = [
      ...Array.from({ length: 51 }, (_, i) => i * 10),
      ...Array.from({ length: 50 }, (_, i) => 490 - i * 10),
    ];
    const leg = legBetween(runningTotals(profileOf(hill)), 0, 4000);
    expect(leg.ascentM).toBeGreaterThan(480);
    // 10 m in 40 m is 14°.
    expect(leg.steepDescentM).toBeGreaterThan(450);
    expect(leg.gentleDescentM).toBeLessThan(20);
  });

  it("what goes up and what comes down differ by what the way rises, but for what is not counted", () => {
    fc.assert(
      fc.property(hills, (heights) => {
        const profile = profileOf(heights);
        const leg = legBetween(runningTotals(profile), 0, profile.lengthM);
        const rise = (profile.heightsM[profile.heightsM.length - 1] ?? 0) - (profile.heightsM[0] ?? 0);
        expect(Math.abs((leg.ascentM ?? 0) - (leg.descentM ?? 0) - rise)).toBeLessThanOrEqual(10 + 1e-6);
      }),
    );
  });

  it("splitting a leg never changes the total, wherever it is split", () => {
    fc.assert(
      fc.property(
        hills,
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (heights, a, b) => {
          const profile = profileOf(heights);
          const totals = runningTotals(profile);
          const [from, to] = [Math.min(a, b) * profile.lengthM, profile.lengthM];
          const middle = from + (to - from) * Math.max(a, b);
          const whole = legBetween(totals, from, to);
          const parts = [legBetween(totals, from, middle), legBetween(totals, middle, to)];
          for (const key of [
            "distanceM",
            "ascentM",
            "descentM",
            "gentleDescentM",
            "steepDescentM",
            "toblerH",
          ] as const) {
            const sum = parts.reduce((total, part) => total + (part[key] ?? Number.NaN), 0);
            expect(sum, key).toBeCloseTo(whole[key] ?? Number.NaN, 6);
          }
          const naismith = parts.reduce((total, part) => total + naismithH(part.distanceM, part.ascentM ?? 0), 0);
          expect(naismith).toBeCloseTo(naismithH(whole.distanceM, whole.ascentM ?? 0), 6);
          // The rule of DIN 33466 is for a leg as a whole: its parts never take less.
          const din = parts.reduce(
            (total, part) => total + din33466H(part.distanceM, part.ascentM ?? 0, part.descentM ?? 0),
            0,
          );
          expect(din).toBeGreaterThanOrEqual(
            din33466H(whole.distanceM, whole.ascentM ?? 0, whole.descentM ?? 0) - 1e-9,
          );
        },
      ),
      { numRuns: 200 },
    );
  });

  it("heights that are missing over more than 500 m are not made up", () => {
    const profile = buildProfile({ atM: [0, 100, 900, 1000, 1100], heightsM: [10, 12, 40, 42, 44] });
    const totals = runningTotals(profile);
    expect(legBetween(totals, 0, 1100)).toMatchObject({ ascentM: null, descentM: null, toblerH: null });
    expect(legBetween(totals, 950, 1100).ascentM).not.toBeNull();
    expect(heightAtM(profile, 500)).toBeNull();
    const none = buildProfile({ atM: [0, 3000], heightsM: [Number.NaN, Number.NaN] });
    expect(legBetween(runningTotals(none), 0, 3000)).toMatchObject({ distanceM: 3000, ascentM: null });
  });

  it("a leg off the line is refused", () => {
    const totals = runningTotals(profileOf([1, 2, 3]));
    expect(() => legBetween(totals, 50, 10)).toThrow(RangeError);
    expect(() => legBetween(totals, 0, 1e6)).toThrow(RangeError);
    expect(() => legBetween(totals, Number.NaN, 10)).toThrow(RangeError);
  });
});

describe("rules of time", () => {
  it("Tranter's table ends where a day is too much", () => {
    expect(tranterH(24, 15)).toBe(24);
    expect(tranterH(24.1, 15)).toBeNull();
    expect(tranterH(5.1, 50)).toBeNull();
    expect(tranterH(0, 30)).toBe(0);
    expect(lowerFitness(25, 1)).toBe(30);
    expect(lowerFitness(50, 1)).toBeNull();
  });

  it("nobody gets faster by being less fit, or by walking longer", () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 5, noNaN: true }), fc.double({ min: 0, max: 5, noNaN: true }), (a, b) => {
        const [short, long] = [Math.min(a, b), Math.max(a, b)];
        for (const [fit, unfit] of [
          [15, 20],
          [20, 25],
          [25, 30],
          [30, 40],
          [40, 50],
        ] as const) {
          expect(tranterH(long, unfit) ?? 99).toBeGreaterThanOrEqual(tranterH(long, fit) ?? 99);
          expect(tranterH(long, fit) ?? 99).toBeGreaterThanOrEqual(tranterH(short, fit) ?? 99);
        }
      }),
    );
  });

  it("breaks lengthen the day, and bad numbers are refused", () => {
    expect(withBreaksH(4, 15)).toBe(5);
    expect(() => withBreaksH(4, -1)).toThrow(RangeError);
    expect(() => naismithH(-1, 0)).toThrow(RangeError);
    expect(() => naismithH(Number.NaN, 0)).toThrow(RangeError);
  });
});

describe("energy and water", () => {
  const load = { bodyKg: 70, packKg: 15, terrain: 1.1 };

  it("is never less than standing, nor than the work of lifting uphill", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -0.6, max: 0.6, noNaN: true }),
        fc.double({ min: 0.2, max: 1.8, noNaN: true }),
        (slope, speedMs) => {
          const power = walkingPowerW(load, speedMs, slope);
          expect(power).toBeGreaterThanOrEqual(walkingPowerW(load, 0, 0) - 1e-9);
          if (slope > 0.02) expect(power).toBeGreaterThan(liftingWorkJ(85, slope * speedMs));
        },
      ),
    );
  });

  it("adds up over the steps of a leg: level ground is power times time", () => {
    const profile = buildProfile({ atM: [0, 400, 800, 1000], heightsM: [100, 100, 100, 100] });
    const hours = 1 / 4;
    const found = legEnergy(profile, { fromM: 0, toM: 1000, hours }, load);
    expect(found?.powerW).toBeCloseTo(walkingPowerW(load, 1000 / 900, 0), 6);
    expect(found?.energyJ).toBeCloseTo((found?.powerW ?? 0) * 900, 6);
    expect(legEnergy(profile, { fromM: 500, toM: 500, hours }, load)).toBeNull();
  });

  it("water is bounded by the day's limit and has no lower end in cool air", () => {
    expect(waterWhileWalkingL(600, 20, "extreme").highL).toBeCloseTo(12 * 0.946352946, 6);
    expect(waterWhileWalkingL(250, 4, "cool")).toEqual({ lowL: null, highL: 4 * 0.5 * 0.946352946 });
  });
});

describe("simplified lines", () => {
  const x = Float64Array.from({ length: 500 }, (_, index) => index * 10);

  it("keep the ends and the corners, and no more points than asked for", () => {
    const corner = Float64Array.from({ length: 500 }, (_, index) => (index < 250 ? index * 10 : (500 - index) * 10));
    expect(simplifyToCount(x, corner, 3)).toEqual([0, 250, 499]);
    const wave = Float64Array.from({ length: 500 }, (_, index) => 50 * Math.sin(index / 9));
    const kept = simplifyToCount(x, wave, 60);
    expect(kept).toHaveLength(60);
    expect([kept[0], kept[59]]).toEqual([0, 499]);
  });

  it("leave a short line as it is", () => {
    expect(simplifyToCount([], [], 9)).toEqual([]);
    expect(simplifyToCount([1], [1], 9)).toEqual([0]);
    expect(simplifyToCount([1, 2, 3], [0, 9, 0], 9)).toEqual([0, 1, 2]);
  });

  it("are in order, each point once, however wild the line", () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: -1e5, max: 1e5, noNaN: true }), { minLength: 3, maxLength: 80 }), (y) => {
        const kept = simplifyToCount(x.slice(0, y.length), y, 10);
        expect(kept).toEqual([...new Set(kept)].sort((a, b) => a - b));
        expect(kept.length).toBe(Math.min(10, y.length));
      }),
    );
  });
});
