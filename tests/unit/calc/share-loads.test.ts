import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { boundShare, shareLoads } from "@/lib/calc/load/share-loads";
import type { Carrier, LoadItem } from "@/lib/calc/load/types";
import { createDraws } from "./camp-fixtures";

const largestOf = (carriers: readonly Carrier[], items: readonly LoadItem[], at: readonly string[]) =>
  Math.max(
    ...carriers.map(
      (one) =>
        (one.baseMassKg + items.reduce((sum, item, i) => sum + (at[i] === one.id ? item.massKg : 0), 0)) / one.limitKg,
    ),
  );

/** Every way to give every item to somebody who may carry it. */
function bruteForce(carriers: readonly Carrier[], items: readonly LoadItem[]): number {
  let best = Infinity;
  const visit = (at: string[]): void => {
    const item = items[at.length];
    if (!item) best = Math.min(best, largestOf(carriers, items, at));
    else for (const one of carriers) if (item.carrierIds?.includes(one.id) ?? true) visit([...at, one.id]);
  };
  visit([]);
  return best;
}

function randomCase(seed: number, people: number, things: number, ties: number) {
  const draw = createDraws(seed);
  const carriers = Array.from({ length: people }, (_, at): Carrier => ({
    id: `p${at}`,
    baseMassKg: 5 + Math.round(draw() * 60) / 10,
    limitKg: 10 + Math.round(draw() * 100) / 10,
  }));
  const items = Array.from({ length: things }, (_, at): LoadItem => ({
    id: `i${at}`,
    massKg: Math.round((0.05 + draw() * draw() * 2.5) * 100) / 100,
    carrierIds:
      draw() < ties
        ? carriers
            .filter(() => draw() < 0.5)
            .map((one) => one.id)
            .concat(carriers[0]?.id ?? "")
        : null,
  }));
  return { carriers, items };
}

describe("sharing loads", () => {
  it("equals brute force up to 8 items and 4 people, with and without ties", () => {
    for (let seed = 1; seed <= 80; seed += 1) {
      const { carriers, items } = randomCase(seed, 2 + (seed % 3), 1 + (seed % 8), (seed % 4) * 0.2);
      const share = shareLoads(carriers, items);
      expect(share.largest).toBeCloseTo(bruteForce(carriers, items), 9);
      expect(share.bound).toBeCloseTo(share.largest, 9);
      expect(largestOf(carriers, items, share.carrierIds)).toBeCloseTo(share.largest, 9);
    }
  });

  it.each([1, 2, 3, 4, 5])("is within 2 % of the bound for 60 items and 12 people (seed %i)", (seed) => {
    const { carriers, items } = randomCase(seed, 12, 60, 0.15);
    const share = shareLoads(carriers, items);
    expect(share.largest).toBeLessThanOrEqual(1.02 * share.bound);
    expect(share.largest).toBeGreaterThanOrEqual(share.bound - 1e-9);
    items.forEach((item, at) => {
      if (item.carrierIds) expect(item.carrierIds).toContain(share.carrierIds[at]);
    });
  });

  it("keeps what is fixed, never goes below its bound, and is the same each time", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1e6 }),
        fc.integer({ min: 1, max: 6 }),
        fc.integer({ min: 0, max: 14 }),
        (seed, people, things) => {
          const { carriers, items } = randomCase(seed, people, things, 0.3);
          const [first, ...rest] = items;
          const fixed = first ? [{ ...first, carrierIds: [carriers[people - 1]?.id ?? ""] }, ...rest] : [];
          const share = shareLoads(carriers, fixed);
          if (first) expect(share.carrierIds[0]).toBe(carriers[people - 1]?.id);
          expect(share.largest).toBeGreaterThanOrEqual(boundShare(carriers, fixed) - 1e-9);
          expect(shareLoads(carriers, fixed)).toEqual(share);
        },
      ),
      { numRuns: 60, seed: 7 },
    );
  });

  it("gives what nobody on its list carries to anybody, and refuses what can't be", () => {
    const one: Carrier = { id: "a", baseMassKg: 8, limitKg: 20 };
    const item: LoadItem = { id: "x", massKg: 2, carrierIds: ["somebody else"] };
    expect(shareLoads([one], [item])).toEqual({ carrierIds: ["a"], largest: 0.5, bound: 0.5 });
    expect(shareLoads([one], []).largest).toBe(0.4);
    expect(() => shareLoads([], [item])).toThrow(RangeError);
    expect(() => shareLoads([{ ...one, limitKg: 0 }], [])).toThrow(RangeError);
    expect(() => shareLoads([{ ...one, baseMassKg: -1 }], [])).toThrow(RangeError);
    expect(() => shareLoads([one], [{ ...item, massKg: -1 }])).toThrow(RangeError);
  });
});
