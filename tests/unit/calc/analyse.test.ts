import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  analyseShelter,
  analysisKey,
  demandAt,
  describeCase,
  interpolateDemand,
  standsToPa,
} from "@/lib/calc/analyse-shelter";
import { compassPoint, describeTieOut, toWorld } from "@/lib/calc/describe-tie-out";
import { buildShelter, defaultShelterSpec, SHELTER_KINDS } from "@/lib/calc/shelter-kinds";
import { solveShelter } from "@/lib/calc/tension";
import type { ShelterAnalysis, ShelterKind } from "@/lib/calc/types";

const ALL_ROUND = [0, 45, 90, 135, 180, 225, 270, 315];

const kept = new Map<string, ShelterAnalysis>();
const analyse = (kind: ShelterKind, pressurePa = 200, directions: readonly number[] = ALL_ROUND): ShelterAnalysis => {
  const key = `${kind} ${pressurePa} ${directions.join()}`;
  const known = kept.get(key);
  if (known) return known;
  const analysis = analyseShelter({
    spec: defaultShelterSpec(kind),
    relativeWindDirectionsDeg: directions,
    pressurePa,
  });
  kept.set(key, analysis);
  return analysis;
};

const KINDS = SHELTER_KINDS.map((definition) => definition.kind);

describe("analysis of a shelter", () => {
  it("takes the hardest pull over every direction and case, and says which one it was", () => {
    const model = buildShelter(defaultShelterSpec("ridge-tarp"));
    const { design } = analyse("ridge-tarp");
    const cases = ALL_ROUND.flatMap((relativeWindDeg) =>
      (["pressing", "lifting"] as const).map((loadCase) => ({ relativeWindDeg, loadCase, pressurePa: 200 })),
    );
    const solved = cases.map((one) => solveShelter(model, one));
    design.tieOuts.forEach((demand, index) => {
      const pulls = solved.map((one) => one.tieOuts[index]?.pullN ?? Number.NaN);
      expect(demand.tieOutId).toBe(model.tieOuts[index]?.id);
      expect(demand.pullN).toBe(Math.max(...pulls));
      const governing = cases[pulls.indexOf(Math.max(...pulls))];
      expect(demand).toMatchObject({ relativeWindDeg: governing?.relativeWindDeg, loadCase: governing?.loadCase });
    });
    expect(design.poles.map((pole) => pole.poleId)).toEqual(["pole-front", "pole-rear"]);
  });

  it.each(KINDS)("%s: more pressure never asks less of any tie-out or pole", (kind) => {
    const { levels, design } = analyse(kind);
    expect(levels).toContain(design);
    for (let index = 1; index < levels.length; index += 1) {
      const [low, high] = [levels[index - 1], levels[index]];
      if (!low || !high) throw new Error("A level is missing");
      expect(high.pressurePa).toBeGreaterThan(low.pressurePa);
      high.tieOuts.forEach((demand, tieOut) =>
        expect(demand.pullN).toBeGreaterThanOrEqual(low.tieOuts[tieOut]?.pullN ?? Number.NaN),
      );
      high.poles.forEach((pole, at) =>
        expect(pole.compressionN).toBeGreaterThanOrEqual(low.poles[at]?.compressionN ?? Number.NaN),
      );
      expect(low.standing || !high.standing).toBe(true);
    }
  });

  it.each(KINDS)("%s: each loss has a consequence of 1 to 2 and a sentence", (kind) => {
    const { consequences, design } = analyse(kind);
    expect(consequences.map((one) => one.tieOutId)).toEqual(design.tieOuts.map((one) => one.tieOutId));
    for (const { consequence, standing, sentence } of consequences) {
      expect(consequence).toBeGreaterThanOrEqual(1);
      expect(consequence).toBeLessThanOrEqual(2);
      if (!standing) expect(consequence).toBe(2);
      expect(sentence).toMatch(standing ? /^Without it the shelter stands/ : /no standing shape/i);
    }
  });

  it("a ridge end matters more than the middle of a hem", () => {
    const { consequences } = analyse("ridge-tarp");
    const of = (id: string) => consequences.find((one) => one.tieOutId === id);
    expect(of("ridge-front")).toMatchObject({
      consequence: 2,
      standing: false,
      sentence: "Without it: no standing shape.",
    });
    expect(of("hem-right")?.standing).toBe(true);
  });

  it("typical shelters stand in 15 m/s (138 Pa), closed ones in 20 m/s (245 Pa)", () => {
    for (const { kind, form } of SHELTER_KINDS)
      expect([kind, analyse(kind, form === "closed" ? 245 : 138).design.standing]).toEqual([kind, true]);
  });

  it("finds the pressure at which a shelter falls, and names the cases", () => {
    const analysis = analyse("poncho-lean-to", 600);
    expect(analysis.design.standing).toBe(false);
    expect(analysis.design.withoutShape.length).toBeGreaterThan(0);
    const limit = standsToPa(analysis) ?? Number.NaN;
    expect(limit).toBeGreaterThan(0);
    expect(limit).toBeLessThan(600);
    const fallen = analysis.levels.find((level) => !level.standing);
    expect((fallen?.pressurePa ?? 0) - limit).toBeLessThanOrEqual(600 / 16);
    expect(analysis.consequences.map((one) => one.sentence)).toContain(
      "No standing shape in this wind, with it or without it.",
    );
    expect(standsToPa(analyse("bell"))).toBeNull();
  });

  it("works out the working: every line has a meaning, a value and a source", () => {
    for (const kind of ["ridge-tarp", "dome"] as const) {
      const { workings } = analyse(kind);
      expect(workings.length).toBeGreaterThan(8);
      for (const { symbol, meaning, value, source } of workings) {
        expect(symbol && meaning && source).toBeTruthy();
        if (typeof value === "number") expect(Number.isFinite(value)).toBe(true);
      }
    }
    expect(analyse("dome").workings.some((one) => /low confidence/.test(one.source))).toBe(true);
  });

  it("is the same to the bit when repeated", () => {
    const input = { spec: defaultShelterSpec("half-pyramid"), relativeWindDirectionsDeg: [0, 60], pressurePa: 150 };
    expect(analyseShelter(input)).toEqual(analyseShelter(input));
  });

  it("refuses no direction and no pressure", () => {
    const spec = defaultShelterSpec("bell");
    expect(() => analyseShelter({ spec, relativeWindDirectionsDeg: [], pressurePa: 100 })).toThrow(RangeError);
    expect(() => analyseShelter({ spec, relativeWindDirectionsDeg: [0], pressurePa: 0 })).toThrow(RangeError);
    expect(() => analyseShelter({ spec, relativeWindDirectionsDeg: [0], pressurePa: Number.NaN })).toThrow(RangeError);
  });
});

describe("demand at any pressure", () => {
  it("meets the levels and runs straight between and above them", () => {
    const analysis = analyse("pyramid");
    for (const level of analysis.levels)
      level.tieOuts.forEach((demand, index) => {
        expect(demandAt(analysis, index, level.pressurePa).pullN).toBeCloseTo(demand.pullN, 9);
        expect(demandAt(analysis, index, level.pressurePa).lineAngleDeg).toBeCloseTo(demand.lineAngleDeg, 9);
      });
    const [low, high] = analysis.levels.slice(-2);
    if (!low || !high) throw new Error("Levels are missing");
    const slope = ((high.tieOuts[0]?.pullN ?? 0) - (low.tieOuts[0]?.pullN ?? 0)) / (high.pressurePa - low.pressurePa);
    expect(demandAt(analysis, 0, 2 * high.pressurePa).pullN).toBeCloseTo(
      (high.tieOuts[0]?.pullN ?? 0) + slope * high.pressurePa,
      6,
    );
    expect(demandAt(analysis, 0, 2 * high.pressurePa).lineAngleDeg).toBe(high.tieOuts[0]?.lineAngleDeg);
  });

  it("never falls as the pressure rises", () => {
    const analysis = analyse("flying-tarp");
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 3000, noNaN: true }),
        fc.double({ min: 0, max: 500, noNaN: true }),
        (q, more) => {
          const [before, after] = [interpolateDemand(analysis, q), interpolateDemand(analysis, q + more)];
          after.forEach(({ pullN }, index) => expect(pullN).toBeGreaterThanOrEqual((before[index]?.pullN ?? 0) - 1e-9));
        },
      ),
      { seed: 21, numRuns: 100 },
    );
  });

  it("refuses a tie-out or a pressure that is not there", () => {
    expect(() => demandAt(analyse("pyramid"), 99, 100)).toThrow(RangeError);
    expect(() => demandAt(analyse("pyramid"), 0, Number.NaN)).toThrow(RangeError);
  });
});

describe("cache key", () => {
  const spec = defaultShelterSpec("ridge-tarp");

  it("does not mind the order of keys or rounding noise, and minds everything that matters", () => {
    const key = analysisKey(spec, [0, 15], 200);
    const turned = Object.fromEntries(Object.entries(spec.dimensions).reverse());
    expect(analysisKey({ ...spec, dimensions: turned }, [0, 15], 200 + 1e-9)).toBe(key);
    const others = [
      analysisKey(spec, [0, 30], 200),
      analysisKey(spec, [0, 15], 201),
      analysisKey({ ...spec, fabric: "laminate" }, [0, 15], 200),
      analysisKey({ ...spec, lineLengthsM: { "ridge-front": 2 } }, [0, 15], 200),
      analysisKey({ ...spec, dimensions: { ...spec.dimensions, hemHeightM: 0.3 } }, [0, 15], 200),
      analysisKey({ ...spec, line: { material: "nylon", diameterMm: 3 } }, [0, 15], 200),
    ];
    expect(new Set([key, ...others]).size).toBe(7);
  });
});

describe("words for tie-outs", () => {
  const { tieOuts } = buildShelter(defaultShelterSpec("ridge-tarp"));
  const tieOut = (id: string) => {
    const found = tieOuts.find((one) => one.id === id);
    if (!found) throw new Error(`No tie-out ${id}`);
    return found;
  };

  it("names compass points", () => {
    expect([0, 44, 46, 181, 359, -90, 450].map((deg) => compassPoint(deg))).toEqual([
      "north",
      "north-east",
      "north-east",
      "south",
      "north",
      "west",
      "east",
    ]);
    expect(compassPoint(22, 16)).toBe("north-north-east");
    expect(compassPoint(348.8, 16)).toBe("north");
  });

  it("turns the shelter's frame to the map", () => {
    const point = toWorld({ x: 0, y: 2, z: 1 }, 90);
    expect(point.x).toBeCloseTo(2, 12);
    expect(point.y).toBeCloseTo(0, 12);
    expect(point.z).toBe(1);
    const right = toWorld({ x: 1, y: 0, z: 0 }, 0);
    expect([right.x, right.y]).toEqual([1, 0]);
  });

  it("says windward, lee or neither", () => {
    const wind = { fromDeg: 260, toDeg: 300 };
    expect(describeTieOut(tieOut("hem-left"), 0, wind)).toBe("Windward hem, west");
    expect(describeTieOut(tieOut("hem-right"), 0, wind)).toBe("Lee hem, east");
    expect(describeTieOut(tieOut("ridge-rear"), 0, wind)).toBe("Ridge end, south");
    expect(describeTieOut(tieOut("ridge-rear"), 90, wind)).toBe("Windward ridge end, west");
    expect(describeTieOut(tieOut("corner-front-right"), 0, { fromDeg: 350, toDeg: 20 })).toBe(
      "Windward corner, north-east",
    );
    expect(describeTieOut(tieOut("hem-left"), 0, null)).toBe("Hem, west");
    expect(describeTieOut(tieOut("hem-left"), 0, { fromDeg: 0, toDeg: 350 })).toBe("Hem, west");
  });

  it("gives each guy and peg of a bell tent its own place", () => {
    const bell = buildShelter(defaultShelterSpec("bell")).tieOuts;
    for (const heading of [0, 11, 37])
      expect(new Set(bell.map((one) => describeTieOut(one, heading, null))).size).toBe(24);
  });

  it("describes a case in the shelter's frame", () => {
    expect(describeCase({ relativeWindDeg: -45, loadCase: "lifting" })).toBe("wind from the front left, lifting");
    expect(describeCase({ relativeWindDeg: 180, loadCase: "pressing" })).toBe("wind from the rear, pressing");
  });
});
