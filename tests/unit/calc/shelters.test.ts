import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  buildShelter,
  checkShelterSpec,
  defaultShelterSpec,
  referenceHeightM,
  SHELTER_KINDS,
  shelterKind,
} from "@/lib/calc/shelter-kinds";
import { FABRICS, fabricRow } from "@/lib/calc/tables/fabrics";
import { lineStiffnessN } from "@/lib/calc/tables/line-stiffness";
import { solveShelter } from "@/lib/calc/tension";
import type { FabricId, ShelterKind, ShelterModel, ShelterSpec } from "@/lib/calc/types";
import { bearingDeg, distance } from "@/lib/calc/vectors";

const KINDS = SHELTER_KINDS.map((definition) => definition.kind);

const changed = (kind: ShelterKind, dimensions: Record<string, number>, lineLengthsM: Record<string, number> = {}) => {
  const spec = defaultShelterSpec(kind);
  return { ...spec, dimensions: { ...spec.dimensions, ...dimensions }, lineLengthsM };
};

const find = (model: ShelterModel, id: string) => {
  const found = model.tieOuts.find((tieOut) => tieOut.id === id);
  if (!found) throw new Error(`No tie-out ${id}`);
  return found;
};

describe("the ten kinds", () => {
  it("are ten, each once, with dimensions whose typical value is in range", () => {
    expect(new Set(KINDS).size).toBe(10);
    for (const kind of SHELTER_KINDS) {
      expect(shelterKind(kind.kind)).toBe(kind);
      expect(kind.dimensions.length).toBeGreaterThanOrEqual(2);
      for (const row of kind.dimensions) {
        expect(row.minM).toBeLessThan(row.maxM);
        expect(row.typicalM).toBeGreaterThanOrEqual(row.minM);
        expect(row.typicalM).toBeLessThanOrEqual(row.maxM);
      }
      expect(checkShelterSpec(defaultShelterSpec(kind.kind))).toEqual([]);
    }
  });

  it.each(KINDS)("%s: a sound net of 40 to 100 nodes", (kind) => {
    const model = buildShelter(defaultShelterSpec(kind));
    expect(model.nodes.length).toBeGreaterThanOrEqual(40);
    expect(model.nodes.length).toBeLessThanOrEqual(100);
    const used = new Set(model.links.flatMap((link) => [link.a, link.b]));
    for (const pole of model.poles) used.add(pole.foot);
    expect(model.nodes.map((_, index) => index).filter((index) => !used.has(index))).toEqual([]);
    for (const link of model.links) {
      expect(link.a).not.toBe(link.b);
      expect(link.restLengthM).toBeGreaterThan(0);
      expect(link.stiffnessN).toBeGreaterThan(0);
    }
    const lineEnds = model.links.filter((link) => link.tieOutId !== null).map((link) => link.tieOutId);
    expect([...lineEnds].sort()).toEqual(model.tieOuts.map((tieOut) => tieOut.id).sort());
    expect(model.poles.length + model.hoops.length).toBeGreaterThan(0);
  });

  it.each(KINDS)("%s: panels look outward", (kind) => {
    const model = buildShelter(defaultShelterSpec(kind));
    for (const { nodes } of model.panels) {
      const [a, b, c, d] = nodes.map((node) => model.nodes[node]?.position);
      if (!a || !b || !c || !d) throw new Error("A panel without corners");
      const [u, w] = [
        { x: c.x - a.x, y: c.y - a.y, z: c.z - a.z },
        { x: d.x - b.x, y: d.y - b.y, z: d.z - b.z },
      ];
      const normal = { x: u.y * w.z - u.z * w.y, y: u.z * w.x - u.x * w.z, z: u.x * w.y - u.y * w.x };
      expect(normal.x * (a.x + c.x) + normal.y * (a.y + c.y) + normal.z * (a.z + c.z)).toBeGreaterThanOrEqual(0);
    }
  });

  it.each(KINDS)("%s: tie-outs are named once, numbered clockwise from the front, and reach the ground", (kind) => {
    const { tieOuts } = buildShelter(defaultShelterSpec(kind));
    expect(new Set(tieOuts.map((one) => one.id)).size).toBe(tieOuts.length);
    expect(new Set(tieOuts.map((one) => one.name)).size).toBe(tieOuts.length);
    expect(tieOuts.map((one) => one.number)).toEqual(tieOuts.map((_, index) => index + 1));
    const bearings = tieOuts.map((one) => bearingDeg(one.anchor) % 359.99);
    for (let index = 1; index < bearings.length; index += 1)
      expect(bearings[index]).toBeGreaterThanOrEqual((bearings[index - 1] ?? 0) - 0.02);
    for (const one of tieOuts) {
      expect(one.anchor.z).toBe(0);
      expect(distance(one.point, one.anchor)).toBeCloseTo(one.lineLengthM, 9);
      expect(Math.sin((one.lineAngleDeg * Math.PI) / 180)).toBeCloseTo(one.point.z / one.lineLengthM, 9);
      expect(Math.hypot(one.anchor.x, one.anchor.y)).toBeGreaterThan(Math.hypot(one.point.x, one.point.y) - 1e-9);
    }
  });

  it.each(KINDS)(
    "%s: the drawing has an outline, what holds it up, and places for its sleepers on its ground",
    (kind) => {
      const { drawing } = buildShelter(defaultShelterSpec(kind));
      expect(drawing.outline.length).toBeGreaterThanOrEqual(4);
      expect(drawing.poleFeet.length).toBeGreaterThan(0);
      expect(drawing.sleepingPlaces.length).toBeGreaterThanOrEqual(shelterKind(kind).typicalSleeps);
      const halfWidth = Math.max(...drawing.outline.map((point) => Math.abs(point.x)));
      const halfLength = Math.max(...drawing.outline.map((point) => Math.abs(point.y)));
      for (const { centre } of drawing.sleepingPlaces) {
        expect(Math.abs(centre.x)).toBeLessThanOrEqual(halfWidth);
        expect(Math.abs(centre.y)).toBeLessThanOrEqual(halfLength);
      }
    },
  );

  it("the net of a tarp keeps the size of its cloth: 3 m by 3 m is 9 m²", () => {
    for (const kind of ["ridge-tarp", "diamond", "flying-tarp"] as const) {
      const model = buildShelter(defaultShelterSpec(kind));
      const area = model.panels.reduce((sum, { nodes }) => {
        const [a, b, c, d] = nodes.map((node) => model.nodes[node]?.position);
        if (!a || !b || !c || !d) return Number.NaN;
        const cross = [
          (c.y - a.y) * (d.z - b.z) - (c.z - a.z) * (d.y - b.y),
          (c.z - a.z) * (d.x - b.x) - (c.x - a.x) * (d.z - b.z),
          (c.x - a.x) * (d.y - b.y) - (c.y - a.y) * (d.x - b.x),
        ];
        return sum + Math.hypot(...cross) / 2;
      }, 0);
      expect(area).toBeCloseTo(9, 6);
    }
  });

  it("has the tie-outs that a ridge tarp is known for", () => {
    const kinds = buildShelter(defaultShelterSpec("ridge-tarp")).tieOuts.map((one) => one.kind);
    expect(kinds.filter((kind) => kind === "ridge-end")).toHaveLength(2);
    expect(kinds.filter((kind) => kind === "corner")).toHaveLength(4);
    expect(kinds.filter((kind) => kind === "hem")).toHaveLength(2);
  });
});

describe("lines", () => {
  it("a longer line moves the anchor out along its direction and lowers the angle; the point stays", () => {
    const short = find(buildShelter(changed("ridge-tarp", {}, { "ridge-front": 1.6 })), "ridge-front");
    const long = find(buildShelter(changed("ridge-tarp", {}, { "ridge-front": 2.4 })), "ridge-front");
    expect(long.point).toEqual(short.point);
    expect(long.anchor.x).toBeCloseTo(short.anchor.x, 12);
    expect(long.anchor.y - short.anchor.y).toBeCloseTo(
      Math.sqrt(2.4 ** 2 - 1.2 ** 2) - Math.sqrt(1.6 ** 2 - 1.2 ** 2),
      9,
    );
    expect(short.lineAngleDeg).toBeCloseTo(48.59, 2);
    expect(long.lineAngleDeg).toBeCloseTo(30, 9);
  });

  it("names a line that can't reach the ground, and the one that no such tie-out has", () => {
    expect(checkShelterSpec(changed("ridge-tarp", {}, { "ridge-front": 1 }))).toEqual([
      {
        field: "lineLengthsM.ridge-front",
        message: "Ridge end, front: the line must be 1.23 to 10 m long to reach the ground.",
      },
    ]);
    expect(checkShelterSpec(changed("bell", {}, { nowhere: 1 }))[0]?.field).toBe("lineLengthsM.nowhere");
    expect(() => buildShelter(changed("ridge-tarp", {}, { "ridge-front": 1 }))).toThrow(/can|reach/);
    expect(() => buildShelter(changed("ridge-tarp", {}, { "ridge-front": Number.NaN }))).toThrow(RangeError);
  });

  it("stiffness grows with the square of the diameter", () => {
    expect(lineStiffnessN("polyester", 4) / lineStiffnessN("polyester", 2)).toBeCloseTo(4, 12);
    expect(lineStiffnessN("uhmwpe", 2)).toBeGreaterThan(lineStiffnessN("nylon", 2));
    expect(() => lineStiffnessN("nylon", 0)).toThrow(RangeError);
  });
});

describe("dimensions", () => {
  it("says which one is out of range and which is unknown", () => {
    expect(checkShelterSpec(changed("bell", { diameterM: 60 }))[0]).toEqual({
      field: "dimensions.diameterM",
      message: "Diameter: enter 3 to 6 m.",
    });
    expect(checkShelterSpec(changed("bell", { heightM: Number.NaN }))[0]?.field).toBe("dimensions.heightM");
    expect(checkShelterSpec(changed("bell", { colour: 1 }))[0]?.field).toBe("dimensions.colour");
    const spec = defaultShelterSpec("dome");
    expect(checkShelterSpec({ ...spec, line: { ...spec.line, diameterMm: 0 } })[0]?.field).toBe("line.diameterMm");
  });

  const impossible: readonly (readonly [ShelterKind, Record<string, number>])[] = [
    ["ridge-tarp", { ridgeHeightM: 2.2, hemHeightM: 0.1, widthM: 2 }],
    ["ridge-tarp", { ridgeHeightM: 0.6, hemHeightM: 0.6 }],
    ["poncho-lean-to", { frontHeightM: 1.8, depthM: 1.2 }],
    ["diamond", { frontHeightM: 2.2, sideM: 2 }],
    ["flying-tarp", { frontHeightM: 2.4, rearHeightM: 0.5 }],
    ["half-pyramid", { heightM: 2.2, widthM: 1.6 }],
    ["pyramid", { heightM: 2.8, widthM: 1.8 }],
    ["ridge-tent", { heightM: 2, widthM: 1.1 }],
    ["tunnel", { heightM: 1.8, widthM: 1 }],
    ["dome", { heightM: 2, widthM: 1.2 }],
    ["bell", { heightM: 1.8, wallHeightM: 1.1, diameterM: 6 }],
    ["bell", { heightM: 3.5, wallHeightM: 0.3, diameterM: 3 }],
  ];

  it.each(impossible)("%s: refuses %o with a sentence", (kind, dimensions) => {
    const [problem] = checkShelterSpec(changed(kind, dimensions));
    expect(problem?.field).toMatch(/^dimensions\./);
    expect(problem?.message).toMatch(/\.$/);
    expect(() => buildShelter(changed(kind, dimensions))).toThrow(RangeError);
  });

  it("a missing dimension takes its typical value, and the reference height is the top", () => {
    const spec: ShelterSpec = { ...defaultShelterSpec("pyramid"), dimensions: {} };
    expect(buildShelter(spec)).toEqual(buildShelter(defaultShelterSpec("pyramid")));
    for (const kind of KINDS) {
      const model = buildShelter(defaultShelterSpec(kind));
      const top = Math.max(...model.nodes.map((node) => node.position.z));
      expect(referenceHeightM(defaultShelterSpec(kind))).toBeCloseTo(top, 9);
    }
  });

  it("knows every fabric and no other", () => {
    for (const { id } of FABRICS) expect(fabricRow(id).stiffnessNPerM).toBeGreaterThan(0);
    expect(() => fabricRow("paper" as FabricId)).toThrow(RangeError);
  });
});

const specs = fc.constantFrom(...SHELTER_KINDS).chain((definition) =>
  fc.record({
    kind: fc.constant(definition.kind),
    dimensions: fc.record(
      Object.fromEntries(
        definition.dimensions.map((row) => [row.key, fc.double({ min: row.minM, max: row.maxM, noNaN: true })]),
      ),
    ),
    fabric: fc.constantFrom(...FABRICS.map((row) => row.id)),
    line: fc.record({
      material: fc.constantFrom("polyester" as const, "nylon" as const, "uhmwpe" as const),
      diameterMm: fc.double({ min: 1, max: 6, noNaN: true }),
    }),
    lineLengthsM: fc.constant({}),
  }),
);

describe("any shelter in range", () => {
  it("is either refused with a reason or built from finite numbers", () => {
    fc.assert(
      fc.property(specs, (spec) => {
        const problems = checkShelterSpec(spec);
        if (problems.length > 0) {
          for (const { field, message } of problems) expect(field && message).toBeTruthy();
          return;
        }
        const model = buildShelter(spec);
        for (const { position } of model.nodes)
          expect(Number.isFinite(position.x + position.y + position.z) && position.z >= 0).toBe(true);
        for (const link of model.links) expect(link.restLengthM > 1e-3 && link.stiffnessN > 0).toBe(true);
      }),
      { seed: 11, numRuns: 300 },
    );
  });

  it("gives finite pulls, angles and movements in any wind, settled or not", () => {
    fc.assert(
      fc.property(
        specs,
        fc.double({ min: 0, max: 2500, noNaN: true }),
        fc.double({ min: -360, max: 720, noNaN: true }),
        fc.constantFrom("pressing" as const, "lifting" as const),
        (spec, pressurePa, relativeWindDeg, loadCase) => {
          if (checkShelterSpec(spec).length > 0) return;
          const solved = solveShelter(buildShelter(spec), { pressurePa, relativeWindDeg, loadCase });
          for (const { pullN, lineAngleDeg } of solved.tieOuts) {
            expect(Number.isFinite(pullN) && pullN >= 0).toBe(true);
            expect(lineAngleDeg >= 0 && lineAngleDeg <= 90).toBe(true);
          }
          for (const { compressionN } of solved.poles) expect(Number.isFinite(compressionN)).toBe(true);
          expect(Number.isFinite(solved.largestMovementM)).toBe(true);
          expect(Number.isFinite(solved.headRoomShare)).toBe(true);
        },
      ),
      { seed: 12, numRuns: 80 },
    );
  });
});
