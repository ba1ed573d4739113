import { describe, expect, it } from "vitest";
import type { Placement, TrayAnchor } from "@/lib/calc/types";
import { judgeIntent, type LaterChange } from "@/lib/domain/plan/judge-intent";
import type { PlanChange } from "@/lib/domain/plan/schema";
import { middleOfRange, suggestHeading } from "@/lib/domain/shelter/suggest-heading";

const placement = (tieOutId: string, more: Partial<Placement> = {}): Placement => ({
  pitchId: "p",
  tieOutId,
  anchorId: "a",
  leanDeg: 0,
  depthOutM: 0,
  tandem: null,
  rockKg: 0,
  shockCord: false,
  knot: "bowline",
  pinned: false,
  ...more,
});
const tray: TrayAnchor[] = [
  {
    id: "a",
    name: "Nail",
    spec: { class: "surface-weight", massKg: 20 },
    count: 2,
    massKg: 0.01,
    found: false,
  },
];
const place = (tieOutId: string, more: Partial<Placement> = {}): PlanChange => ({
  type: "place",
  placement: placement(tieOutId, more),
});
const lift = (tieOutId: string): PlanChange => ({ type: "lift", pitchId: "p", tieOutId });
const later = (change: PlanChange): LaterChange => ({ byName: "Bo", at: "2027-06-11T10:00:00.000Z", change });
const judge = (placements: readonly Placement[], change: PlanChange, others: readonly LaterChange[] = [], cords = 1) =>
  judgeIntent({ placements, tray, shockCordCount: cords, isTieOut: (_, id) => id.length === 1 }, change, others)
    .outcome;

describe("what becomes of a change of a plan", () => {
  const swap: PlanChange = {
    type: "swap",
    from: { pitchId: "p", tieOutId: "1" },
    to: { pitchId: "p", tieOutId: "2" },
  };
  const all: PlanChange = { type: "replace", placements: [placement("3")] };
  it.each([
    ["nobody else was there", [], place("1"), [], "applied"],
    ["others touched another tie-out", [placement("2")], place("1"), [later(place("2"))], "applied"],
    ["others touched the same one", [placement("1")], place("1", { leanDeg: 9 }), [later(place("1"))], "conflict"],
    ["others lifted what is moved", [placement("2")], swap, [later(lift("1"))], "conflict"],
    ["others did the same", [placement("1")], place("1"), [later(place("1"))], "applied"],
    ["others took the last anchor", [placement("1"), placement("2")], place("3"), [later(place("2"))], "conflict"],
    ["there is no anchor left", [placement("1"), placement("2")], place("3"), [], "refused"],
    ["a whole plan comes late", [placement("1")], all, [later(place("1"))], "conflict"],
    ["a whole plan came before", [placement("3")], place("1"), [later(all)], "conflict"],
    ["the tie-out is gone", [], place("10"), [], "refused"],
    ["what is lifted was never there", [], lift("10"), [], "refused"],
    ["it was lifted already", [], lift("1"), [later(lift("1"))], "applied"],
    ["there is one shock cord", [], place("1", { shockCord: true }), [], "applied"],
    ["it is in use", [placement("2", { shockCord: true })], place("1", { shockCord: true }), [], "refused"],
  ] as const)("when %s", (_, before, change, others, outcome) => expect(judge(before, change, others)).toBe(outcome));
});

describe("turning a shelter to the wind", () => {
  it.each([
    [270, 315, 292.5],
    [350, 10, 0],
    [0, 0, 0],
    [315, 270, 112.5],
  ])("the middle from %d to %d clockwise is %d", (from, to, middle) => expect(middleOfRange(from, to)).toBe(middle));
  it("sets a ridge tarp broadside, others with their back to it, and nothing without wind", () => {
    expect(suggestHeading("ridge-tarp", 260, 280)).toBe(0);
    expect(suggestHeading("half-pyramid", 260, 280)).toBe(90);
    expect(suggestHeading("dome", null, null)).toBe(0);
  });
});
