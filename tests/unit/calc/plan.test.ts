import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { evaluateCamp, planProblems, prepareCamp } from "@/lib/calc/camp";
import { proposePlan } from "@/lib/calc/plan";
import { bestLean } from "@/lib/calc/capacity";
import { tandemSpacingM } from "@/lib/calc/plan-reinforce";
import { isBetter, scorePlan, weightedMargin } from "@/lib/calc/plan-score";
import type { AnchorSpec, CampInput, Placement, TieOutResult, TrayAnchor } from "@/lib/calc/types";
import {
  BLADE,
  campOf,
  LOAM,
  pitchOf,
  placementOf,
  ringOf,
  SHORT_HOOK,
  tieOutIds,
  trayOf,
  WIND,
} from "./camp-fixtures";

const IDS = tieOutIds("pyramid");
const PULLS = IDS.map((_, index) => 60 + 15 * index);
const ONLY_SINGLE = { allowFound: true, allowDoubling: false };

const byName = (a: Placement, b: Placement) => (`${a.pitchId} ${a.tieOutId}` < `${b.pitchId} ${b.tieOutId}` ? -1 : 1);
const propose = (camp: CampInput, options = ONLY_SINGLE) => proposePlan(camp, options).placements;
const score = (camp: CampInput, placements: readonly Placement[]) => scorePlan(prepareCamp(camp), placements);

function results(camp: CampInput, placements: readonly Placement[]): TieOutResult[] {
  return evaluateCamp({ ...camp, placements }).shelters.flatMap((shelter) => shelter.tieOuts);
}

/** Weighted margins from what the camp shows: dependable ÷ (demand × consequence), at most 3, worst first. */
function shownValues(camp: CampInput, placements: readonly Placement[]): number[] {
  return results(camp, placements)
    .map((one) =>
      one.capacity?.status === "ok" && one.demandN !== null
        ? Math.min(3, one.capacity.dependableN / (one.demandN * (one.consequence?.consequence ?? NaN)))
        : -1 - (one.priority ?? 0) / 100,
    )
    .sort((a, b) => a - b);
}

function compareValues(a: readonly number[], b: readonly number[]): number {
  for (let i = 0; i < a.length; i++) {
    const difference = (a[i] ?? NaN) - (b[i] ?? NaN);
    if (Math.abs(difference) > 2e-6) return difference;
  }
  return 0;
}

describe("the best staking plan", () => {
  it("equals trying everything", () => {
    const tray = [trayOf("ring", ringOf(250), 1), trayOf("blade", BLADE, 2), trayOf("hook", SHORT_HOOK, 1)];
    const free = IDS.slice(0, 4);
    const pins = IDS.slice(4).map((id) => placementOf("a", id, "pin", { pinned: true }));
    const spare = trayOf("pin", ringOf(900), pins.length);
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 20, max: 260 }), { minLength: IDS.length, maxLength: IDS.length }),
        fc.array(fc.constantFrom(1, 1.4, 2), { minLength: IDS.length, maxLength: IDS.length }),
        (pulls, consequences) => {
          const camp = campOf({
            shelters: [pitchOf("a", "pyramid", pulls, { consequences })],
            tray: [...tray, spare],
            placements: pins,
          });
          const found = propose(camp);
          // The lean each anchor is given is the plan's; which goes where is tried out here.
          const leanOf = (id: string, anchor: string) =>
            propose({
              ...campOf({
                shelters: camp.shelters,
                tray: [{ ...(tray.find((one) => one.id === anchor) ?? spare), count: 99 }],
              }),
            }).find((one) => one.tieOutId === id)?.leanDeg ?? 0;
          let best: number[] | null = null;
          const walk = (index: number, left: ReadonlyMap<string, number>, placements: Placement[]) => {
            const id = free[index];
            if (id === undefined) {
              const values = shownValues(camp, [...pins, ...placements]);
              if (best === null || compareValues(values, best) > 0) best = values;
              return;
            }
            walk(index + 1, left, placements);
            for (const [anchor, count] of left) {
              if (count === 0) continue;
              walk(index + 1, new Map(left).set(anchor, count - 1), [
                ...placements,
                placementOf("a", id, anchor, { leanDeg: leans.get(`${id} ${anchor}`) ?? 0, knot: "taut-line-hitch" }),
              ]);
            }
          };
          const leans = new Map(
            free.flatMap((id) => tray.map((anchor) => [`${id} ${anchor.id}`, leanOf(id, anchor.id)] as const)),
          );
          walk(0, new Map(tray.map((anchor) => [anchor.id, anchor.count])), []);
          expect(compareValues(shownValues(camp, found), best ?? [])).toBe(0);
        },
      ),
      { numRuns: 4, seed: 41 },
    );
  });

  it("is best anchor to highest priority when what an anchor holds does not depend on the place", () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 100, max: 400 }), { minLength: IDS.length, maxLength: IDS.length }),
        fc.array(fc.integer({ min: 60, max: 330 }), { minLength: IDS.length, maxLength: IDS.length }),
        (pulls, ratings) => {
          const tray = ratings.map((rating, index) => trayOf(`r${String(index).padStart(2, "0")}`, ringOf(rating), 1));
          const camp = campOf({ shelters: [pitchOf("a", "pyramid", pulls)], tray });
          const ranked = results(camp, propose(camp)).sort((a, b) => (b.demandN ?? 0) - (a.demandN ?? 0));
          const greedy = [...ratings]
            .sort((a, b) => b - a)
            .map((rating, index) => rating / (ranked[index]?.demandN ?? NaN));
          const ours = ranked.map(
            (one) => (ratings[Number(one.placement?.anchorId.slice(1))] ?? NaN) / (one.demandN ?? NaN),
          );
          expect(
            compareValues(
              [...ours].sort((a, b) => a - b),
              greedy.sort((a, b) => a - b),
            ),
          ).toBe(0);
        },
      ),
      { numRuns: 60, seed: 42 },
    );
  });

  it("saves strong anchors where the margin is ample and takes the light one", () => {
    const tray = [trayOf("heavy", ringOf(300), 20, 0.05), trayOf("light", ringOf(299), 20, 0.01)];
    const camp = campOf({ shelters: [pitchOf("a", "pyramid", [5])], tray });
    expect(new Set(propose(camp).map((one) => one.anchorId))).toEqual(new Set(["light"]));
  });

  const anchors: TrayAnchor[] = [
    trayOf("ring", ringOf(250), 2),
    trayOf("blade", BLADE, 3),
    trayOf("hook", SHORT_HOOK, 5, 0.005),
  ];
  const small = campOf({
    shelters: [pitchOf("a", "pyramid", PULLS, { anglesDeg: [10, 35, 55] }), pitchOf("b", "dome", [30, 70])],
    tray: anchors,
  });

  it("is never worse with one more anchor in the tray", () => {
    fc.assert(
      fc.property(fc.tuple(fc.nat(4), fc.nat(4), fc.nat(4)), fc.nat(2), (counts, pick) => {
        const tray = anchors.map((anchor, index) => ({ ...anchor, count: counts[index] ?? 0 }));
        const more = tray.map((anchor, index) => (index === pick ? { ...anchor, count: anchor.count + 1 } : anchor));
        const before = score(small, propose({ ...small, tray }));
        const after = score(small, propose({ ...small, tray: more }));
        expect(compareValues(after.values, before.values)).toBeGreaterThanOrEqual(0);
      }),
      { numRuns: 25, seed: 43 },
    );
  });

  it("is never worse than the plan that is there, keeps pins and counts", () => {
    const spots = small.shelters.flatMap((pitch) =>
      tieOutIds(pitch.spec.kind).map((id) => [pitch.pitchId, id] as const),
    );
    const placement = fc.record({
      spot: fc.constantFrom(...spots),
      anchorId: fc.constantFrom("ring", "blade", "hook"),
      leanDeg: fc.integer({ min: -10, max: 45 }),
      tandem: fc.constantFrom(null, { anchorId: "hook", spacingM: 0.15 }),
      pinned: fc.boolean(),
    });
    fc.assert(
      fc.property(fc.array(placement, { maxLength: 9 }), fc.boolean(), (drawn, allowDoubling) => {
        const placements: Placement[] = [];
        for (const { spot, ...more } of drawn) {
          const next = [...placements, placementOf(spot[0], spot[1], more.anchorId, more)];
          if (planProblems({ ...small, placements: next }).length === 0) placements.push(...next.slice(-1));
        }
        const camp = { ...small, placements };
        const proposal = proposePlan(camp, { allowFound: true, allowDoubling });
        expect(planProblems({ ...camp, placements: proposal.placements })).toEqual([]);
        for (const pinned of placements.filter((one) => one.pinned)) expect(proposal.placements).toContain(pinned);
        if (allowDoubling || placements.every((one) => one.tandem === null || one.pinned)) {
          expect(isBetter(score(camp, placements), score(camp, proposal.placements))).toBe(false);
        }
        const again = proposePlan({ ...camp, placements: proposal.placements }, { allowFound: true, allowDoubling });
        expect([...again.placements].sort(byName)).toEqual([...proposal.placements].sort(byName));
      }),
      { numRuns: 60, seed: 44 },
    );
  });

  it("does not depend on the order of shelters and tray", () => {
    const turned = { ...small, shelters: [...small.shelters].reverse(), tray: [...small.tray].reverse() };
    expect([...propose(turned)].sort(byName)).toEqual([...propose(small)].sort(byName));
    expect(JSON.stringify(proposePlan(small, ONLY_SINGLE))).toBe(JSON.stringify(proposePlan(small, ONLY_SINGLE)));
  });

  it("leaves the least important tie-outs empty when the tray runs out, and says so", () => {
    const camp = campOf({
      shelters: [pitchOf("a", "pyramid", PULLS)],
      tray: [trayOf("ring", ringOf(250), IDS.length - 2)],
    });
    const proposal = proposePlan(camp, ONLY_SINGLE);
    const empty = IDS.filter((id) => proposal.placements.every((one) => one.tieOutId !== id));
    expect(empty.sort()).toEqual(IDS.slice(0, 2).sort());
    expect(proposal.problems.map((problem) => problem.tieOutId).sort()).toEqual(empty);
    expect(proposal.problems[0]?.message).toMatch(/Nothing is left in the tray/);
  });

  it("gives nothing that can't be driven into the ground there", () => {
    const camp = campOf({
      ground: { ...LOAM, kind: "rock-slab" },
      shelters: [pitchOf("a", "pyramid", [20])],
      tray: [trayOf("blade", BLADE, 30), trayOf("rock", { class: "surface-weight", massKg: 25 }, 3, 0, true)],
    });
    const used = propose(camp).map((one) => one.anchorId);
    expect(used).toEqual(["rock", "rock", "rock"]);
    expect(propose(camp, { allowFound: false, allowDoubling: false })).toEqual([]);
  });

  it("leaves alone what it can't compute, and names why", () => {
    const present = [placementOf("a", IDS[0] ?? "", "blade")];
    const camp = { ...small, wind: { ...WIND, strength: null }, placements: present };
    const proposal = proposePlan(camp, ONLY_SINGLE);
    expect(proposal.placements).toEqual(present);
    expect(proposal.problems[0]?.message).toMatch(/Enter a gust/);
  });
});

describe("steps after the exact one", () => {
  const weak = campOf({
    shelters: [pitchOf("a", "pyramid", [30, 30, 400])],
    tray: [trayOf("blade", BLADE, IDS.length + 1), trayOf("hook", SHORT_HOOK, 2, 0.005)],
  });

  it("doubles in order of priority what would not hold, with what is left", () => {
    const single = proposePlan(weak, ONLY_SINGLE);
    expect(single.placements.every((one) => one.tandem === null)).toBe(true);
    const doubled = proposePlan(weak, { allowFound: false, allowDoubling: true });
    const pairs = doubled.placements.filter((one) => one.tandem !== null);
    expect(pairs.length).toBeGreaterThan(0);
    expect(doubled.steps.filter((step) => step.text.startsWith("Doubled"))).toHaveLength(pairs.length);
    // The longer stake goes in front.
    expect(pairs.every((one) => one.anchorId === "blade")).toBe(true);
    expect(planProblems({ ...weak, placements: doubled.placements })).toEqual([]);
    const before = results(weak, single.placements);
    for (const one of results(weak, doubled.placements)) {
      const margin = before.find((other) => other.tieOutId === one.tieOutId)?.margin ?? NaN;
      if (one.placement?.tandem) {
        expect(margin).toBeLessThan(1);
        expect(one.margin ?? NaN).toBeGreaterThan(margin);
      } else expect(one.margin).toBe(margin);
    }
  });

  const oneSpare = (spares: readonly TrayAnchor[], pulls: readonly number[]) => {
    const camp = campOf({
      shelters: [pitchOf("a", "pyramid", pulls)],
      tray: [trayOf("blade", BLADE, IDS.length), ...spares],
    });
    const { placements } = proposePlan(camp, { allowFound: false, allowDoubling: true });
    return placements.filter((one) => one.tandem !== null);
  };
  /** Pulls that a single blade just fails to hold, and one it holds with less than twice as much. */
  const single = results(weak, propose(weak)).map((one) =>
    one.capacity?.status === "ok" ? one.capacity.dependableN : NaN,
  );
  const least = Math.min(...single.filter((value) => value > 0));
  const most = Math.max(...single);

  it("doubles the more important one when there is one spare, and nothing that holds already", () => {
    const pulls = IDS.map((_, index) => (index === 2 ? 1.3 * most : index === 5 ? 1.2 * most : 0.6 * most));
    const [pair, ...more] = oneSpare([trayOf("spare", BLADE, 1)], pulls);
    expect(pair?.tieOutId).toBe(IDS[2]);
    expect(more).toEqual([]);
    expect(
      oneSpare(
        [trayOf("spare", BLADE, 5)],
        IDS.map(() => 0.6 * most),
      ),
    ).toEqual([]);
  });

  it("takes the lighter of two that make it hold", () => {
    const pulls = IDS.map((_, index) => (index === 2 ? 1.1 * most : 0.1 * least));
    const heavyFirst = [trayOf("a-heavy", BLADE, 1, 0.06), trayOf("b-light", BLADE, 1, 0.02)];
    expect(oneSpare(heavyFirst, pulls)[0]?.tandem?.anchorId).not.toBe("a-heavy");
  });

  it("sets two in line half the longer one's length apart, to the next 5 cm", () => {
    const longer = (lengthM: number): AnchorSpec => (BLADE.class === "stake" ? { ...BLADE, lengthM } : BLADE);
    expect(tandemSpacingM(longer(0.2), longer(0.16))).toBeCloseTo(0.1, 10);
    expect(tandemSpacingM(longer(0.16), longer(0.3))).toBeCloseTo(0.15, 10);
    expect(tandemSpacingM(longer(0.31), longer(0.3))).toBeCloseTo(0.2, 10);
    expect(tandemSpacingM(longer(0.1), longer(0.1))).toBeCloseTo(0.1, 10);
  });

  it("leans stakes within 3 % of the best lean that a search in steps of 1° finds", () => {
    const anglesDeg = [5, 22, 38, 47, 61, 78];
    const camp = campOf({
      shelters: [pitchOf("a", "pyramid", [100], { anglesDeg })],
      tray: [trayOf("blade", BLADE, 40)],
    });
    const leans = new Set<number>();
    for (const one of results(camp, propose(camp))) {
      if (one.capacity?.status !== "ok" || !one.placement || one.lineAngleDeg === null)
        throw new Error("expected a stake");
      const { line } = camp.shelters[0]?.spec ?? { line: { material: "uhmwpe" as const, diameterMm: 5 } };
      const rigging = {
        leanDeg: 0,
        depthOutM: 0,
        tandem: null,
        rockKg: 0,
        shockCord: false,
        line,
        knot: one.placement.knot,
      };
      const { capacity } = bestLean({ anchor: BLADE, ground: LOAM, lineAngleDeg: one.lineAngleDeg, rigging });
      if (capacity.status !== "ok") throw new Error("expected a capacity");
      expect(one.capacity.dependableN).toBeGreaterThan(0.97 * capacity.dependableN);
      leans.add(one.placement.leanDeg);
    }
    expect(leans.size).toBeGreaterThan(2);
  });

  it("puts rocks on the lip only where there are rocks and found things are allowed", () => {
    const rocky = { ...weak, rocksAvailable: true };
    const rocks = (camp: CampInput, allowFound: boolean) =>
      proposePlan(camp, { allowFound, allowDoubling: false }).placements.filter((one) => one.rockKg > 0);
    expect(rocks(weak, true)).toEqual([]);
    expect(rocks(rocky, false)).toEqual([]);
    const backed = rocks(rocky, true);
    expect(backed.length).toBeGreaterThan(0);
    const before = results(weak, propose(weak, { allowFound: false, allowDoubling: false }));
    for (const one of backed) expect(before.find((other) => other.tieOutId === one.tieOutId)?.margin).toBeLessThan(1);
  });

  it("weighs an empty tie-out below any that has something", () => {
    expect(weightedMargin(null, 10, 100)).toBeLessThan(weightedMargin(0.001, 1e6, 1e6));
    expect(weightedMargin(null, 100, 100)).toBeLessThan(weightedMargin(null, 10, 100));
    expect(weightedMargin(1e9, 1, 1)).toBe(3);
    expect(weightedMargin(null, 0, 0)).toBe(-1);
  });
});
