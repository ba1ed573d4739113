import { describe, expect, it } from "vitest";
import { obliqueTensionN, shaftResistance } from "@/lib/calc/axial";
import { bromsClay } from "@/lib/calc/broms";
import { deadmanResistance, undrainedPlateFactor } from "@/lib/calc/deadman";
import { groundNumbers } from "@/lib/calc/ground";
import { leanFactors } from "@/lib/calc/lean";
import { bendingStrength, sectionProperties } from "@/lib/calc/section";
import { seriesStiffnessNm, rampLoadFactor, lineTensionN } from "@/lib/calc/statics";
import {
  brinchHansenCoefficients,
  CRUSHING_COEFFICIENTS,
  pileResistance,
  pressureCoefficientsAt,
  type PileInput,
} from "@/lib/calc/stake";
import {
  feetFromMetres,
  inchesFromMetres,
  kilogramsForceFromNewtons,
  kmhFromMs,
  knotsFromMs,
  metresFromFeet,
} from "@/lib/calc/units";
import {
  degreesFromRadians,
  metresFromInches,
  mphFromMs,
  msFromKmh,
  msFromKnots,
  msFromMph,
  newtonsFromKilogramsForce,
  newtonsFromPoundsForce,
  pascalsFromPsf,
  poundsForceFromNewtons,
  psfFromPascals,
  radiansFromDegrees,
} from "@/lib/calc/units";
import { wedgePush } from "../../helpers/wedge";
import { groundOf } from "./anchor-arbitraries";

function pile(changes: Partial<PileInput> = {}): PileInput {
  return {
    coefficients: brinchHansenCoefficients(33),
    widthM: 0.02,
    lengthM: 0.25,
    eccentricityM: 0.01,
    unitWeightNm3: 17_000,
    cohesionPa: 5_000,
    bendingNm: 1e9,
    ...changes,
  };
}

/** The same pile cut into slices: turning point by bisection on the sum of moments. */
function slicedPile(input: PileInput): { groundN: number; rotationDepthM: number; largestMomentNm: number } {
  const slices = 20_000;
  const dz = input.lengthM / slices;
  const depths = Array.from({ length: slices }, (_, i) => (i + 0.5) * dz);
  const forces = depths.map((z) => {
    const { kq, kc } = pressureCoefficientsAt(input.coefficients, z / input.widthM);
    return (input.unitWeightNm3 * z * kq + input.cohesionPa * kc) * input.widthM * dz;
  });
  const moments = depths.map((z, i) => (forces[i] ?? 0) * (z + input.eccentricityM));
  const wholeMoment = moments.reduce((sum, each) => sum + each, 0);
  let turning = 0;
  for (let sum = 0; turning < slices && sum < wholeMoment / 2; turning += 1) sum += moments[turning] ?? 0;
  const above = forces.slice(0, turning).reduce((sum, each) => sum + each, 0);
  const below = forces.slice(turning).reduce((sum, each) => sum + each, 0);
  const groundN = above - below;
  let shear = groundN;
  let moment = groundN * input.eccentricityM;
  for (let i = 0; i < slices && shear > 0; i += 1) {
    moment += shear * dz;
    shear -= forces[i] ?? 0;
  }
  return { groundN, rotationDepthM: turning * dz, largestMomentNm: moment };
}

describe("a short rigid pile", () => {
  it.each([
    ["mixed ground", {}],
    ["clean sand", { cohesionPa: 0 }],
    ["clay", { coefficients: brinchHansenCoefficients(0), unitWeightNm3: 0, cohesionPa: 36_000 }],
    ["standing out by a third", { eccentricityM: 0.08 }],
    ["snow", { coefficients: CRUSHING_COEFFICIENTS, unitWeightNm3: 0, cohesionPa: 10_000 }],
    ["a thin long nail", { widthM: 0.004, lengthM: 0.4 }],
  ] as const)("agrees with a sum over 20 000 slices in %s", (_, changes) => {
    const input = pile(changes);
    const ours = pileResistance(input);
    const sliced = slicedPile(input);
    // The turning point is found to one slice; the pull is a difference of two sums, so it is off by several slices' worth.
    expect(Math.abs(ours.rotationDepthM / sliced.rotationDepthM - 1)).toBeLessThan(0.0005);
    expect(Math.abs(ours.groundN / sliced.groundN - 1)).toBeLessThan(0.002);
    expect(Math.abs(ours.largestMomentNm / sliced.largestMomentNm - 1)).toBeLessThan(0.002);
  });

  it("in uniform ground without eccentricity turns at L/√2 and holds (√2 − 1)·p·L", () => {
    const ours = pileResistance(
      pile({
        coefficients: CRUSHING_COEFFICIENTS,
        unitWeightNm3: 0,
        cohesionPa: 1000,
        widthM: 1,
        lengthM: 1,
        eccentricityM: 0,
      }),
    );
    expect(ours.rotationDepthM).toBeCloseTo(Math.SQRT1_2, 10);
    expect(ours.groundN).toBeCloseTo(1000 * (Math.SQRT2 - 1), 7);
    // Shear is zero at (√2 − 1)·L; moment there is p·z²/2.
    expect(ours.momentDepthM).toBeCloseTo(Math.SQRT2 - 1, 10);
    expect(ours.largestMomentNm).toBeCloseTo((1000 * (Math.SQRT2 - 1) ** 2) / 2, 7);
  });

  it("bends where the moment of the ground above the hinge equals its strength: M = p·z²/2, H = √(2·p·M)", () => {
    const ours = pileResistance(
      pile({
        coefficients: CRUSHING_COEFFICIENTS,
        unitWeightNm3: 0,
        cohesionPa: 1000,
        widthM: 1,
        lengthM: 1,
        eccentricityM: 0,
        bendingNm: 20,
      }),
    );
    expect(ours.bendingN).toBeCloseTo(Math.sqrt(2 * 1000 * 20), 8);
    expect(pileResistance(pile({ bendingNm: 1e6 })).bendingN).toBeNull();
  });

  it("bends at less when the line pulls higher up: M = H·e + H²/(2p)", () => {
    const e = 0.1;
    const ours = pileResistance(
      pile({
        coefficients: CRUSHING_COEFFICIENTS,
        unitWeightNm3: 0,
        cohesionPa: 1000,
        widthM: 1,
        lengthM: 1,
        eccentricityM: e,
        bendingNm: 20,
      }),
    );
    expect(ours.bendingN).toBeCloseTo(1000 * (Math.sqrt(e * e + 2 * 0.02) - e), 8);
  });

  it("is of Broms' order in clay for stakes at least ten widths long (0.5–1.2)", () => {
    for (const widthM of [0.005, 0.01, 0.02, 0.04]) {
      for (const lengthM of [0.15, 0.2, 0.3, 0.45]) {
        // Broms leaves out 1.5 widths at the top, which is too much of a short wide stake.
        if (lengthM < 10 * widthM) continue;
        const ours = pileResistance(
          pile({
            coefficients: brinchHansenCoefficients(0),
            unitWeightNm3: 0,
            cohesionPa: 50_000,
            widthM,
            lengthM,
            eccentricityM: 0,
          }),
        ).groundN;
        const ratio = ours / bromsClay(50_000, widthM, lengthM, 0).ultimateN;
        expect(ratio).toBeGreaterThan(0.5);
        expect(ratio).toBeLessThan(1.2);
      }
    }
  });

  it("has coefficients that rise with depth and with the angle of friction", () => {
    let last = { kq: 0, kc: 0 };
    for (const phi of [5, 10, 20, 30, 40, 45]) {
      const coefficients = brinchHansenCoefficients(phi);
      const now = pressureCoefficientsAt(coefficients, 4);
      expect(now.kq).toBeGreaterThan(last.kq);
      expect(now.kc).toBeGreaterThan(last.kc);
      expect(pressureCoefficientsAt(coefficients, 8).kq).toBeGreaterThan(now.kq);
      last = now;
    }
  });

  it("comes down to the undrained limit without a jump", () => {
    const limit = pressureCoefficientsAt(brinchHansenCoefficients(0), 6).kc;
    expect(pressureCoefficientsAt(brinchHansenCoefficients(1.001), 6).kc / limit).toBeCloseTo(1, 0);
  });
});

describe("lean factors", () => {
  const cases = [0, 20, 29, 33, 39].flatMap((phi) =>
    [-10, 0, 15, 30, 45, 60].flatMap((lean) => [0, 10, 20].map((slope) => [phi, lean, slope] as const)),
  );
  it.each(cases.filter(([phi, , slope]) => phi === 0 || slope < phi - 2))(
    "agree with a searched wedge at φ %d, lean %d, slope %d",
    (phi, lean, slope) => {
      const ours = leanFactors(phi, lean, slope);
      const push = (unitWeight: number, cohesion: number, leanDeg: number, slopeDeg: number) =>
        wedgePush({ phiDeg: phi, unitWeight, cohesion, length: 1, leanDeg, slopeDeg });
      // The search walks in steps of a 20 000th of a right angle; the minimum is flat.
      expect(ours.cohesion / (push(0, 1, lean, slope) / push(0, 1, 0, 0))).toBeCloseTo(1, 3);
      if (phi > 0) expect(ours.weight / (push(1, 0, lean, slope) / push(1, 0, 0, 0))).toBeCloseTo(1, 3);
      // Each part by itself never promises more than the two together.
      const together = push(17, 5, lean, slope);
      const parts = ours.cohesion * push(0, 5, 0, 0) + (phi > 0 ? ours.weight * push(17, 0, 0, 0) : 0);
      expect(parts).toBeLessThanOrEqual(together * 1.001);
    },
  );

  it("stay above zero where the wedge has gone", () => {
    expect(leanFactors(0, 60, 35)).toEqual({ weight: 0.02, cohesion: 0.02 });
    expect(leanFactors(0, 60, 29).cohesion).toBeGreaterThanOrEqual(0.02);
  });
});

describe("along the stake", () => {
  const clay = groundNumbers(groundOf("firm-moist-loam"));
  const sand = groundNumbers(groundOf("dry-loose-sand"));
  const snow = groundNumbers(groundOf("wind-packed-snow"));
  const rod = {
    perimeterM: Math.PI * 0.01,
    lengthM: 0.25,
    rotationDepthM: 0,
    leanDeg: 0,
    isBladed: false,
    isWood: false,
    strengthFactor: 1,
  };
  function shaft(ground: typeof clay, changes: Partial<typeof rod> = {}) {
    if (ground.kind === "undriveable") throw new Error("not driven");
    return shaftResistance({ ground, ...rod, ...changes });
  }
  it("is a quarter of s_u on a smooth shaft, half between blades", () => {
    // 0.25 · 36 kPa · π · 10 mm · 250 mm
    expect(shaft(clay).axialN).toBeCloseTo(70.69, 1);
    expect(shaft(clay, { isBladed: true }).axialN).toBeCloseTo(141.37, 1);
  });
  it("loses half of it over the depth of turning", () => {
    expect(shaft(clay, { rotationDepthM: 0.2 }).axialN).toBeCloseTo(70.69 * 0.6, 1);
  });
  it("is only a few newtons in sand: (0.25·300 + 0.8·15 500·0.125·tan 20°)·π·0.01·0.25", () => {
    expect(shaft(sand).axialN).toBeCloseTo((75 + 0.8 * 15_500 * 0.125 * Math.tan(Math.PI / 9)) * Math.PI * 0.0025, 6);
    expect(shaft(sand).axialN).toBeLessThan(8);
  });
  it("is rougher on wood and between blades", () => {
    expect(shaft(sand, { isWood: true }).frictionCoefficient).toBeCloseTo(Math.tan((0.75 * 29 * Math.PI) / 180), 9);
    expect(shaft(sand, { isBladed: true }).frictionCoefficient).toBeCloseTo(0.5 * Math.tan((29 * Math.PI) / 180), 9);
  });
  it("is the adhesion of the snow in snow", () => {
    expect(shaft(snow).axialN).toBeCloseTo(1500 * Math.PI * 0.0025, 9);
  });
});

describe("both together", () => {
  const parts = { axialN: 100, frictionCoefficient: 0 };
  it("is H for a level pull or one that pushes in, V for a pull along the stake", () => {
    expect(obliqueTensionN(0, 400, parts, "quadratic")).toBe(400);
    expect(obliqueTensionN(-30, 400, parts, "quadratic")).toBe(400);
    expect(obliqueTensionN(90, 400, parts, "quadratic")).toBeCloseTo(100, 9);
    expect(obliqueTensionN(90, 400, parts, "linear-square")).toBeCloseTo(100, 9);
  });
  it("lets friction carry a flat pull in sand, but no more than H", () => {
    expect(obliqueTensionN(10, 400, { axialN: 5, frictionCoefficient: 0.36 }, "linear-square")).toBe(400);
  });
  it("solves (axial − tanδ·normal)/V + (normal/H)² = 1", () => {
    const [angle, normalN, axialN, tan] = [40, 300, 20, 0.3];
    const t = obliqueTensionN(angle, normalN, { axialN, frictionCoefficient: tan }, "linear-square");
    const n = t * Math.cos((angle * Math.PI) / 180);
    const a = t * Math.sin((angle * Math.PI) / 180);
    expect((a - tan * n) / axialN + (n / normalN) ** 2).toBeCloseTo(1, 10);
  });
});

describe("sections", () => {
  it("of a three-blade is √3 blades wide and shears along its triangle", () => {
    const section = sectionProperties({ shape: "three-blade", bladeM: 0.01, thicknessM: 0.002 });
    expect(section.widthM).toBeCloseTo(0.01732, 5);
    expect(section.perimeterM).toBeCloseTo(0.05196, 5);
    expect(section.areaM2).toBeCloseTo(60e-6, 12);
    expect(section.plasticModulusM3).toBeCloseTo(173.2e-9, 10);
  });
  it("of a V is √2 legs wide", () => {
    const section = sectionProperties({ shape: "v", legM: 0.01, thicknessM: 0.001 });
    expect(section.widthM).toBeCloseTo(0.014142, 6);
    expect(section.perimeterM).toBeCloseTo(0.034142, 6);
    expect(section.areaM2).toBeCloseTo(20e-6, 12);
    expect(section.plasticModulusM3).toBeCloseTo(35.355e-9, 12);
  });
  it("of a wide curved blade agrees with a numeric arc", () => {
    const [w, d, t] = [0.04, 0.014, 0.0015];
    const section = sectionProperties({ shape: "wide", widthM: w, depthM: d, thicknessM: t });
    const rise = d - t;
    const n = 100_000;
    let mean = 0;
    let square = 0;
    for (let i = 0; i < n; i += 1) {
      const u = ((i + 0.5) / n) * 2 - 1;
      const y = rise * (1 - u * u);
      mean += y / n;
      square += (y * y) / n;
    }
    const inertia = w * t * (square - mean * mean) + (w * t ** 3) / 12;
    expect(section.secondMomentM4 / inertia).toBeCloseTo(1, 6);
    expect(section.elasticModulusM3).toBeCloseTo(inertia / (mean + t / 2), 15);
    expect(section.perimeterM).toBeCloseTo(2 * (w + d), 12);
    expect(section.isBladed).toBe(true);
    expect(sectionProperties({ shape: "wide", widthM: 0.04, depthM: 0.003, thicknessM: 0.0015 }).isBladed).toBe(false);
    expect(section.plasticModulusM3).toBeCloseTo((w * t * rise) / 4, 12);
  });
  it("of a T has its equal-area axis in the flange or in the web", () => {
    const wideFlange = sectionProperties({ shape: "t", widthM: 0.03, depthM: 0.012, thicknessM: 0.003 });
    // Flange 90 mm² of 117 mm²: axis 1.95 mm down; Z = 30·1.95²/2 + 30·1.05²/2 + 27·(7.5 − 1.95).
    expect(wideFlange.plasticModulusM3 * 1e9).toBeCloseTo(57.0375 + 16.5375 + 149.85, 6);
    const deepWeb = sectionProperties({ shape: "t", widthM: 0.01, depthM: 0.03, thicknessM: 0.002 });
    // Flange 20 mm², web 56 mm²: axis 11 mm down; Z = 20·10 + 2·9²/2 + 2·19²/2.
    expect(deepWeb.plasticModulusM3 * 1e9).toBeCloseTo(200 + 81 + 361, 6);
  });
  it("bends plastic and wood at first yield with their factor, metal plastically", () => {
    const rod = sectionProperties({ shape: "round", diameterM: 0.012 });
    const abs = bendingStrength(rod, "plastic-abs");
    expect(abs.ultimateNm).toBe(abs.firstYieldNm);
    expect(abs.ultimateNm).toBeCloseTo((0.9 * 40e6 * Math.PI * 0.012 ** 3) / 32, 9);
    expect(bendingStrength(rod, "mild-steel").ultimateNm).toBeGreaterThan(
      bendingStrength(rod, "mild-steel").firstYieldNm,
    );
  });
  it.each([
    [/bladeM/, { shape: "three-blade", bladeM: 0, thicknessM: 0.001 }],
    [/thicknessM/, { shape: "v", legM: 0.01, thicknessM: 0.02 }],
    [/legM/, { shape: "v", legM: 1, thicknessM: 0.02 }],
    [/diameterM/, { shape: "round", diameterM: Number.NaN }],
    [/wallM/, { shape: "tube", diameterM: 0.01, wallM: 0.006 }],
    [/widthM/, { shape: "wide", widthM: 0, depthM: 0.01, thicknessM: 0.001 }],
    [/depthM/, { shape: "wide", widthM: 0.02, depthM: 0.0005, thicknessM: 0.001 }],
    [/widthM/, { shape: "t", widthM: 0, depthM: 0.01, thicknessM: 0.001 }],
    [/depthM/, { shape: "t", widthM: 0.02, depthM: 0, thicknessM: 0.001 }],
  ] as const)("throws naming %s", (message, section) => {
    expect(() => sectionProperties(section)).toThrow(message);
  });
  it("refuses a material that is not in the table", () => {
    const rod = sectionProperties({ shape: "round", diameterM: 0.012 });
    expect(() => bendingStrength(rod, "gold" as unknown as "mild-steel")).toThrow(/material/);
  });
});

describe("deadmen", () => {
  const loam = groundNumbers(groundOf("firm-moist-loam"));
  function deadman(lineAngleDeg: number, ground = loam, depthM = 0.4) {
    if (ground.kind === "undriveable") throw new Error("not dug");
    return deadmanResistance({ widthM: 0.5, heightM: 0.1, depthM, lineAngleDeg, ground, strengthFactor: 1 });
  }
  it("in clay: plate factor on the face level, half of it and the ground on top upwards", () => {
    const level = undrainedPlateFactor(36_000, 4, 0.2) * 36_000 * 0.05;
    expect(deadman(0).tensionN).toBeCloseTo(level, 6);
    expect(deadman(90).tensionN).toBeCloseTo(level / 2 + 18_000 * 0.05 * 0.4, 6);
    expect(deadman(45).tensionN).toBeCloseTo(
      1 / Math.hypot(Math.SQRT1_2 / deadman(0).tensionN, Math.SQRT1_2 / deadman(90).tensionN),
      6,
    );
  });
  it("falls with the line's angle and with a loose top, and rises with depth about as the field table does", () => {
    const sand = groundNumbers(groundOf("dry-loose-sand"));
    expect(deadman(30, sand).tensionN).toBeLessThan(deadman(15, sand).tensionN);
    const loose = groundNumbers(groundOf("dry-loose-sand", { looseTopM: 0.1 }));
    expect(deadman(30, loose).tensionN).toBeLessThan(deadman(30, sand).tensionN);
    // Field table, 1:1: load ∝ depth^2.12 between 3 and 4 ft.
    const exponent = Math.log(deadman(45, sand, 0.8).tensionN / deadman(45, sand, 0.4).tensionN) / Math.log(2);
    expect(exponent).toBeGreaterThan(1.5);
    expect(exponent).toBeLessThan(2.5);
  });
  it("in snow bears on its face", () => {
    const snow = groundNumbers(groundOf("settled-snow"));
    expect(deadman(0, snow).tensionN).toBeCloseTo(10_000 * 0.05, 9);
    expect(deadman(90, snow).tensionN).toBeCloseTo(5_000 * 0.05, 9);
  });
  it("refuses a body higher than its depth", () => {
    expect(() => deadman(0, loam, 0.05)).toThrow(/depthM/);
  });
});

describe("lines and units", () => {
  it("joins stiffnesses in series and limits the ramp factor to 2", () => {
    expect(seriesStiffnessNm(3000, 1000)).toBeCloseTo(750, 9);
    expect(rampLoadFactor(0)).toBe(2);
    expect(() => rampLoadFactor(-1)).toThrow(/riseToPeriod/);
    expect(() => lineTensionN(1, 90)).toThrow(/lineAngleDeg/);
  });
  it("converts there and back", () => {
    expect(poundsForceFromNewtons(newtonsFromPoundsForce(34))).toBeCloseTo(34, 12);
    expect(kilogramsForceFromNewtons(newtonsFromKilogramsForce(7))).toBeCloseTo(7, 12);
    expect(feetFromMetres(metresFromFeet(3))).toBeCloseTo(3, 12);
    expect(inchesFromMetres(metresFromInches(9))).toBeCloseTo(9, 12);
    expect(kmhFromMs(msFromKmh(50))).toBeCloseTo(50, 12);
    expect(mphFromMs(msFromMph(40))).toBeCloseTo(40, 12);
    expect(knotsFromMs(msFromKnots(25))).toBeCloseTo(25, 12);
    expect(psfFromPascals(pascalsFromPsf(12.5))).toBeCloseTo(12.5, 12);
    expect(degreesFromRadians(radiansFromDegrees(33))).toBeCloseTo(33, 12);
    expect(msFromKmh(36)).toBeCloseTo(10, 12);
    expect(msFromKnots(1)).toBeCloseTo(0.514444, 6);
    expect(pascalsFromPsf(1)).toBeCloseTo(47.88026, 5);
    expect(metresFromInches(1)).toBe(0.0254);
    expect(newtonsFromKilogramsForce(1)).toBe(9.80665);
  });
});
