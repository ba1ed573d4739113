import { describe, expect, it } from "vitest";
import { analyseShelter } from "@/lib/calc/analyse-shelter";
import { type AnalysisRequest, designAnalysisRequest, evaluateCamp, planProblems, spotKey } from "@/lib/calc/camp";
import { mendTieOut, pitchMends, quickMends } from "@/lib/calc/mend";
import { buildShelter, defaultShelterSpec } from "@/lib/calc/shelter-kinds";
import type { AnchorSpec, CampInput, Mend, PitchedShelter, Placement } from "@/lib/calc/types";
import {
  analysisOf,
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
const WEAK = IDS[1] ?? "";
const SPOT = { pitchId: "a", tieOutId: WEAK };
const WIDE: AnchorSpec = {
  class: "stake",
  section: { shape: "wide", widthM: 0.04, depthM: 0.012, thicknessM: 0.002 },
  lengthM: 0.3,
  material: "aluminium-6061",
  headRatingN: null,
};
const LOG: AnchorSpec = { class: "deadman", widthM: 0.6, heightM: 0.1, depthM: 0.4 };

const tray = [
  trayOf("hook", SHORT_HOOK, IDS.length + 1),
  trayOf("blade", BLADE, 3),
  trayOf("wide", WIDE, 1, 0.05),
  trayOf("log", LOG, 2, 0, true),
];
const camp = campOf({
  shelters: [
    pitchOf(
      "a",
      "pyramid",
      IDS.map((id) => (id === WEAK ? 120 : 10)),
    ),
  ],
  secondGround: { ...LOAM, kind: "hard-trodden-loam" },
  strongWindHours: 6,
  rocksAvailable: true,
  tray,
  placements: IDS.map((id) =>
    placementOf("a", id, id === IDS[3] ? "blade" : "hook", { leanDeg: -10, depthOutM: 0.03 }),
  ),
});

/** The camp with a mend done. */
function apply(from: CampInput, mend: Mend): CampInput {
  const put = new Map(mend.placements.map((one) => [spotKey(one.pitchId, one.tieOutId), one]));
  const placements = [
    ...from.placements.filter((one) => !put.has(spotKey(one.pitchId, one.tieOutId))),
    ...put.values(),
  ];
  const shelters = from.shelters.map((pitch): PitchedShelter => {
    const { pitchChange } = mend;
    if (!pitchChange || pitch.pitchId !== "a") return pitch;
    const changed: PitchedShelter = {
      ...pitch,
      patch: pitchChange.patch ?? pitch.patch,
      headingDeg: pitchChange.headingDeg ?? pitch.headingDeg,
      spec: {
        ...pitch.spec,
        dimensions: { ...pitch.spec.dimensions, ...pitchChange.dimensions },
        lineLengthsM: { ...pitch.spec.lineLengthsM, ...pitchChange.lineLengthsM },
      },
    };
    if (pitchChange.patch) return changed;
    const request = designAnalysisRequest(from, changed);
    if ("gaps" in request) throw new Error("expected a request");
    return { ...changed, analysis: analyseShelter(request) };
  });
  return { ...from, shelters, placements };
}

const resultAt = (of: CampInput, tieOutId: string) =>
  evaluateCamp(of)
    .shelters.flatMap((shelter) => shelter.tieOuts)
    .find((one) => one.tieOutId === tieOutId);

describe("what would mend a tie-out, without working out the shelter anew", () => {
  const mends = quickMends(camp, SPOT);
  const kinds = new Set(mends.map((mend) => mend.kind));

  it("offers every kind that helps here", () => {
    expect([...kinds].sort()).toEqual(
      ["best-lean", "other-patch", "rock", "shock-cord", "swap", "tandem", "weight-or-deadman"].sort(),
    );
    for (const mend of mends) {
      expect(mend.title.length).toBeGreaterThan(5);
      expect(mend.detail.length).toBeGreaterThan(3);
    }
  });

  it("promises exactly what the camp shows when it is done, and the tray allows it", () => {
    const now = resultAt(camp, WEAK);
    for (const mend of mends) {
      const after = apply(camp, mend);
      expect(planProblems(after)).toEqual([]);
      const then = resultAt(after, WEAK);
      expect(then?.margin).toBeCloseTo(mend.margin, 9);
      expect(then?.holdsToGustMs).toBeCloseTo(mend.holdsToGustMs, 9);
      if (mend.kind === "shock-cord") expect(then?.morningMargin ?? 0).toBeGreaterThan(now?.morningMargin ?? NaN);
      else expect(mend.margin).toBeGreaterThan(now?.margin ?? NaN);
    }
  });

  it("ranks what is enough first, by work; then by margin", () => {
    const enough = mends.filter((mend) => mend.margin >= 1);
    expect(mends.slice(0, enough.length)).toEqual(enough);
    const rest = mends.slice(enough.length).map((mend) => mend.margin);
    expect(rest).toEqual([...rest].sort((a, b) => b - a));
  });

  it("takes from another tie-out only what it can spare", () => {
    const exchange = mends.find((mend) => mend.placements.length === 2);
    expect(exchange?.title).toMatch(/^Exchange with tie-out \d+: anchor blade$/);
    if (!exchange) return;
    const other = exchange.placements.find((one) => one.tieOutId !== WEAK);
    const spared = resultAt(apply(camp, exchange), other?.tieOutId ?? "");
    expect(spared?.margin ?? 0).toBeGreaterThanOrEqual(1);
  });

  it("says how many are left and puts the stronger of two stakes in front", () => {
    expect(mends.find((mend) => mend.title === "Swap with the anchor wide")?.detail).toBe("one left in the tray");
    const tandem = mends.find((mend) => mend.kind === "tandem");
    expect(tandem?.placements[0]).toMatchObject({ anchorId: "wide", tandem: { anchorId: "hook" } });
    expect(tandem?.detail).toMatch(/in front/);
  });

  it("leaves pins and unknown pulls alone", () => {
    const pinned = { ...camp, placements: camp.placements.map((one) => ({ ...one, pinned: true })) };
    expect(quickMends(pinned, SPOT).every((mend) => mend.kind === "other-patch")).toBe(true);
    expect(quickMends({ ...camp, wind: { ...WIND, strength: null } }, SPOT)).toEqual([]);
    expect(quickMends(camp, { pitchId: "a", tieOutId: "none" })).toEqual([]);
    expect(quickMends(camp, { pitchId: "none", tieOutId: WEAK })).toEqual([]);
  });

  it("fills an empty tie-out", () => {
    const empty = { ...camp, placements: camp.placements.filter((one) => one.tieOutId !== WEAK) };
    const offers = quickMends(empty, SPOT);
    expect(offers.map((mend) => mend.title)).toContain("Put in the anchor wide");
    expect(offers.every((mend) => mend.kind === "swap" || mend.kind === "weight-or-deadman")).toBe(true);
  });

  it("does not offer a patch that makes another tie-out the weaker one", () => {
    const worse = { ...camp, secondGround: { ...LOAM, kind: "dry-loose-sand" as const } };
    expect(quickMends(worse, SPOT).some((mend) => mend.kind === "other-patch")).toBe(false);
    expect(quickMends({ ...camp, secondGround: null }, SPOT).some((mend) => mend.kind === "other-patch")).toBe(false);
  });
});

describe("what would mend it by pitching otherwise", () => {
  const spec = { ...defaultShelterSpec("ridge-tarp"), line: { material: "polyester" as const, diameterMm: 3 } };
  const pitch: PitchedShelter = { pitchId: "a", name: "Tarp", spec, headingDeg: 0, patch: "main", analysis: null };
  const open = campOf({
    wind: { ...WIND, fromDeg: 260, toDeg: 280 },
    shelters: [pitch],
    tray: [trayOf("blade", BLADE, 20)],
  });
  const request = designAnalysisRequest(open, pitch);
  if ("gaps" in request) throw new Error("expected a request");
  const placements: Placement[] = buildShelter(spec).tieOuts.map((tieOut) => placementOf("a", tieOut.id, "blade"));
  const tarp = { ...open, shelters: [{ ...pitch, analysis: analyseShelter(request) }], placements };
  const spot = { pitchId: "a", tieOutId: "corner-front-left" };
  const mends = pitchMends(tarp, spot);

  it("offers changes of the pitch, each with what it brings", () => {
    expect(mends.length).toBeGreaterThan(0);
    const now = resultAt(tarp, spot.tieOutId);
    for (const mend of mends) {
      expect(["longer-line", "lower-pitch", "turn-shelter"]).toContain(mend.kind);
      const after = apply(tarp, mend);
      const then = resultAt(after, spot.tieOutId);
      expect(then?.margin).toBeCloseTo(mend.margin, 9);
      expect(mend.margin).toBeGreaterThan(now?.margin ?? NaN);
      const weakest = (of: CampInput) =>
        Math.min(...(evaluateCamp(of).shelters[0]?.tieOuts.map((one) => one.margin ?? 0) ?? []));
      expect(weakest(after)).toBeGreaterThanOrEqual(weakest(tarp) * 0.99);
    }
  });

  it("asks the analysis it is given, and only for what can be built", () => {
    const asked: number[] = [];
    pitchMends(tarp, spot, (wanted) => {
      asked.push(wanted.pressurePa);
      return analyseShelter(wanted);
    });
    expect(asked.length).toBeGreaterThan(3);
    expect(asked.length).toBeLessThanOrEqual(8);
    const anywhere = { ...tarp, wind: { ...tarp.wind, fromDeg: null, toDeg: null } };
    const none: string[] = [];
    const offers = pitchMends(anywhere, spot, (wanted) => {
      none.push(wanted.spec.kind);
      return analyseShelter(wanted);
    });
    expect(offers.some((mend) => mend.kind === "turn-shelter")).toBe(false);
    expect(pitchMends({ ...tarp, placements: [] }, spot)).toEqual([]);
  });

  it("turns by an eighth, a quarter and a half, and lengthens no line beyond 8 m", () => {
    const asked: AnalysisRequest[] = [];
    const longest = { ...spec, lineLengthsM: { "corner-front-left": 5 } };
    const long = { ...tarp, shelters: tarp.shelters.map((one) => ({ ...one, spec: longest })) };
    const still = analysisOf("ridge-tarp", [1000]);
    pitchMends(long, spot, (wanted) => {
      asked.push(wanted);
      return still;
    });
    const lengths = asked.map((wanted) => wanted.spec.lineLengthsM["corner-front-left"]);
    expect(new Set(lengths)).toEqual(new Set([5, 7.5]));
    // The wind comes from 260° with the front to the north; a front turned by 45° sees it at 215°.
    expect(asked.slice(-4).map((wanted) => wanted.relativeWindDirectionsDeg[0])).toEqual([305, 215, 170, 80]);
  });

  it("offers nothing that helps here and hurts elsewhere", () => {
    const ids = tieOutIds("ridge-tarp");
    const shifted = analysisOf(
      "ridge-tarp",
      ids.map((id) => (id === spot.tieOutId ? 1 : 5000)),
    );
    expect(pitchMends(tarp, spot, () => shifted)).toEqual([]);
    const eased = analysisOf("ridge-tarp", [1]);
    expect(pitchMends(tarp, spot, () => eased).map((mend) => mend.kind)).toEqual([
      "longer-line",
      "lower-pitch",
      "turn-shelter",
    ]);
    const fallen = analysisOf("ridge-tarp", [1], { fallsAt: 0.5 });
    expect(pitchMends(tarp, spot, () => fallen)).toEqual([]);
  });

  it("joins both kinds in one ranking", () => {
    const all = mendTieOut(tarp, spot);
    expect(all.filter((mend) => mend.pitchChange !== null).length).toBe(mends.length);
    const enough = all.filter((mend) => mend.margin >= 1).length;
    expect(all.slice(0, enough).every((mend) => mend.margin >= 1)).toBe(true);
  });
});

describe("what is offered depends on what is there", () => {
  const kindsOf = (of: CampInput) => new Set(quickMends(of, SPOT).map((mend) => mend.kind));
  const withHere = (more: Partial<Placement>): CampInput => ({
    ...camp,
    placements: camp.placements.map((one) => (one.tieOutId === WEAK ? { ...one, ...more } : one)),
  });

  it("no rock where there are none or one lies there, no cord where one is, no third stake in line", () => {
    expect(kindsOf({ ...camp, rocksAvailable: false }).has("rock")).toBe(false);
    expect(kindsOf(withHere({ rockKg: 10 })).has("rock")).toBe(false);
    expect(kindsOf(withHere({ shockCord: true })).has("shock-cord")).toBe(false);
    expect(kindsOf({ ...camp, strongWindHours: null }).has("shock-cord")).toBe(false);
    const doubled = withHere({ tandem: { anchorId: "hook", spacingM: 0.15 } });
    expect(kindsOf(doubled).has("tandem")).toBe(false);
    expect(quickMends(doubled, SPOT).every((mend) => !mend.title.startsWith("Exchange"))).toBe(true);
  });

  it("a stake already at its best lean is not driven again, one that stands out is driven home", () => {
    const driven = withHere({
      leanDeg: quickMends(camp, SPOT).find((mend) => mend.kind === "best-lean")?.placements[0]?.leanDeg ?? NaN,
      depthOutM: 0,
    });
    expect(kindsOf(driven).has("best-lean")).toBe(false);
    const lean = (of: CampInput) => quickMends(of, SPOT).find((mend) => mend.kind === "best-lean");
    expect(lean(camp)?.title).toMatch(/^Drive it home /);
    expect(lean(camp)?.detail).toBe("30\u2009mm stand out now");
    expect(lean(withHere({ depthOutM: 0, leanDeg: 60 }))?.detail).toBe("now leaning 60° away from the pull");
    expect(lean(withHere({ depthOutM: 0, leanDeg: -10 }))?.detail).toBe("now leaning 10° towards the pull");
  });

  it("from the second patch back to the main ground, with the leans that suit it", () => {
    const on = { ...camp, ground: { ...LOAM, kind: "hard-trodden-loam" as const }, secondGround: LOAM };
    const second = { ...on, shelters: on.shelters.map((pitch) => ({ ...pitch, patch: "second" as const })) };
    const mend = quickMends(second, SPOT).find((one) => one.kind === "other-patch");
    expect(mend?.title).toBe("Move the shelter to the main ground");
    expect(mend?.pitchChange).toEqual({ patch: "main" });
    expect(mend?.placements.every((one) => one.leanDeg !== -10)).toBe(true);
  });

  it("what can't be driven is replaced by what can lie there", () => {
    const rock = {
      ...camp,
      ground: { ...LOAM, kind: "rock-slab" as const },
      secondGround: null,
      tray: [...tray, trayOf("bag", { class: "surface-weight", massKg: 30 }, 1, 0, true)],
    };
    const offers = quickMends(rock, SPOT);
    expect(offers.map((mend) => mend.kind)).toEqual(["weight-or-deadman"]);
    expect(offers[0]?.title).toBe("Hold it with the anchor bag");
    expect(offers[0]?.detail).toBe("found at the camp");
  });

  it("does not take an anchor whose tie-out would then give way", () => {
    const rings = (pulls: readonly number[]): CampInput => ({
      ...camp,
      shelters: [pitchOf("a", "pyramid", pulls)],
      tray: [trayOf("small", ringOf(100), 1), trayOf("big", ringOf(500), IDS.length - 1)],
      placements: IDS.map((id) => placementOf("a", id, id === WEAK ? "small" : "big")),
    });
    const exchanges = (of: CampInput) => quickMends(of, SPOT).filter((mend) => mend.title.startsWith("Exchange"));
    expect(exchanges(rings(IDS.map((id) => (id === WEAK ? 200 : 180))))).toEqual([]);
    expect(exchanges(rings(IDS.map((id) => (id === WEAK ? 200 : 10)))).length).toBeGreaterThan(0);
  });

  it("names the shelter when another one's anchor is taken", () => {
    const both = {
      ...camp,
      shelters: [...camp.shelters, pitchOf("b", "diamond", [5])],
      tray: [...tray, trayOf("peg", BLADE, 10)],
      placements: [
        ...camp.placements.map((one) => ({ ...one, anchorId: "hook" })),
        ...tieOutIds("diamond").map((id) => placementOf("b", id, "peg")),
      ],
    };
    const exchange = quickMends(both, SPOT).find((mend) => mend.title.startsWith("Exchange"));
    expect(exchange?.title).toMatch(/^Exchange with tie-out \d+ of Shelter b: anchor peg$/);
  });
});

describe("pitching otherwise where little can be changed", () => {
  it("does not lengthen a pegged loop, and has no height to lower where none is chosen at the pitch", () => {
    const spec = defaultShelterSpec("tunnel");
    const model = buildShelter(spec);
    const hem = model.tieOuts.find((tieOut) => tieOut.lineLengthM < 0.2);
    const pitch: PitchedShelter = { pitchId: "a", name: "Tunnel", spec, headingDeg: 0, patch: "main", analysis: null };
    const open = campOf({
      wind: { ...WIND, fromDeg: null, toDeg: null },
      shelters: [pitch],
      tray: [trayOf("blade", BLADE, 30)],
      placements: model.tieOuts.map((tieOut) => placementOf("a", tieOut.id, "blade")),
    });
    const calm = { ...pitch, analysis: analysisOf("tunnel", [40]) };
    const never = () => {
      throw new Error("nothing to analyse");
    };
    expect(pitchMends({ ...open, shelters: [calm] }, { pitchId: "a", tieOutId: hem?.id ?? "" }, never)).toEqual([]);
  });
});
