import { describe, expect, it } from "vitest";
import { analyseShelter } from "@/lib/calc/analyse-shelter";
import { panelCoefficients } from "@/lib/calc/pressure-coefficients";
import { compileNet } from "@/lib/calc/relaxation";
import { buildShelter, defaultShelterSpec, SHELTER_KINDS } from "@/lib/calc/shelter-kinds";
import { LINE_PRETENSION_N } from "@/lib/calc/shelters/mesh";
import { compileShelter, panelPressures, solveShelter, solveShelterNet } from "@/lib/calc/tension";
import type { LoadCase, ShelterKind, ShelterModel } from "@/lib/calc/types";
import { PUBLISHED_STRUCTURE_CASES } from "@/tests/fixtures/published-cases-structure";

const KINDS = SHELTER_KINDS.map((definition) => definition.kind);
const CASES: readonly LoadCase[] = ["pressing", "lifting"];
const PRESSURE_PA = 200;

const solve = (model: ShelterModel, relativeWindDeg: number, loadCase: LoadCase, pressurePa = PRESSURE_PA) =>
  solveShelter(model, { pressurePa, relativeWindDeg, loadCase });

describe("published and closed-form cases of the structure", () => {
  it.each(PUBLISHED_STRUCTURE_CASES)("$id: $what", ({ published, tolerance, ours }) => {
    const scale = published === 0 ? 1 : Math.abs(published);
    expect(Math.abs(ours() - published) / scale).toBeLessThanOrEqual(tolerance);
  });

  it("has every case once, with a source and a reason", () => {
    expect(new Set(PUBLISHED_STRUCTURE_CASES.map((one) => one.id)).size).toBe(PUBLISHED_STRUCTURE_CASES.length);
    expect(PUBLISHED_STRUCTURE_CASES.length).toBeGreaterThanOrEqual(40);
    for (const one of PUBLISHED_STRUCTURE_CASES) expect(one.source && one.reason).toBeTruthy();
  });
});

describe("balance of forces", () => {
  const rows = KINDS.flatMap((kind) =>
    [0, 35, 90, 160, 290].flatMap((deg) => CASES.map((loadCase) => ({ kind, deg, loadCase }))),
  );

  it.each(rows)(
    "$kind, wind from $deg°, $loadCase: supports carry the wind within 0.5 %",
    ({ kind, deg, loadCase }) => {
      const solved = solve(buildShelter(defaultShelterSpec(kind)), deg, loadCase);
      expect(solved.settled).toBe(true);
      const scale = Math.max(solved.windLoadSizeN, LINE_PRETENSION_N);
      const left = [0, 1, 2].map((axis) => (solved.windLoadN[axis] ?? NaN) + (solved.reactionN[axis] ?? NaN));
      expect(Math.hypot(...left) / scale).toBeLessThan(0.005);
    },
  );

  it("takes the reactions from the lines, poles and ground that it reports", () => {
    const model = buildShelter(defaultShelterSpec("pyramid"));
    const solved = solve(model, 20, "lifting");
    const down = solved.tieOuts.reduce(
      (sum, tieOut) => sum + tieOut.pullN * Math.sin((tieOut.lineAngleDeg * Math.PI) / 180),
      0,
    );
    const up = solved.poles.reduce((sum, pole) => sum + pole.compressionN, 0);
    const ground = [...Array(model.nodes.length).keys()]
      .filter((node) => !model.nodes[node]?.fixed)
      .reduce((sum, node) => sum + Math.max(0, -(solved.positions[3 * node + 2] ?? 0)) * 20_000, 0);
    expect(up + ground - down).toBeCloseTo(solved.reactionN[2], -1);
  });
});

describe("shape and symmetry", () => {
  const mirrored: readonly (readonly [ShelterKind, string, string])[] = [
    ["ridge-tarp", "corner-front-right", "corner-front-left"],
    ["ridge-tarp", "hem-right", "hem-left"],
    ["poncho-lean-to", "guy-front-right", "guy-front-left"],
    ["diamond", "corner-right", "corner-left"],
    ["half-pyramid", "corner-rear-right", "corner-rear-left"],
    ["pyramid", "hem-right", "hem-left"],
    ["ridge-tent", "pull-out-right", "pull-out-left"],
    ["tunnel", "guy-front-right", "guy-front-left"],
    ["dome", "guy-rear-right", "guy-rear-left"],
    ["bell", "guy-2", "guy-10"],
  ];

  it.each(mirrored)("%s: %s in wind from the right pulls like %s in wind from the left", (kind, right, left) => {
    const model = buildShelter(defaultShelterSpec(kind));
    for (const loadCase of CASES) {
      const pull = (deg: number, id: string) =>
        solve(model, deg, loadCase).tieOuts.find((one) => one.tieOutId === id)?.pullN ?? NaN;
      const size = solve(model, 60, loadCase).windLoadSizeN;
      // Rounding runs another way in the mirrored case; both stop at a residual of 0.4 % of the load.
      expect(Math.abs(pull(60, right) - pull(300, left))).toBeLessThan(0.006 * size);
    }
  });

  it.each(KINDS)("%s: without wind the lines carry no more than what a hand put in", (kind) => {
    const solved = solve(buildShelter(defaultShelterSpec(kind)), 0, "lifting", 0);
    expect(solved.settled && solved.standing).toBe(true);
    for (const { pullN } of solved.tieOuts) {
      expect(pullN).toBeGreaterThanOrEqual(0);
      expect(pullN).toBeLessThanOrEqual(LINE_PRETENSION_N * 1.05);
    }
    expect(solved.largestMovementM).toBeLessThan(0.03);
  });

  const ALLOWED_BELOW = { dome: 0.2, tunnel: 0.2 } as Readonly<Partial<Record<ShelterKind, number>>>;

  // On hoops, a peg in the middle of a hem takes less on a finer mesh: the working mesh is then on the safe side.
  it.each(KINDS)("%s: a mesh twice as fine never raises the largest pull by more than 10 %%", (kind) => {
    const spec = defaultShelterSpec(kind);
    for (const [deg, loadCase] of [
      [90, "pressing"],
      [0, "lifting"],
      [45, "lifting"],
    ] as const) {
      const largest = (refinement: 1 | 2) =>
        Math.max(...solve(buildShelter(spec, refinement), deg, loadCase).tieOuts.map((one) => one.pullN));
      const change = largest(2) / largest(1) - 1;
      expect(change).toBeGreaterThan(-(ALLOWED_BELOW[kind] ?? 0.1));
      expect(change).toBeLessThan(0.1);
    }
  });

  it.each([
    ["dome", 100],
    ["dome", 200],
    ["tunnel", 200],
    ["tunnel", 400],
  ] as const)(
    "%s at %i Pa: over all winds no tie-out pulls more than 10 %% above the plan's figure",
    (kind, pressurePa) => {
      const spec = defaultShelterSpec(kind);
      const envelopeOf = (refinement: 1 | 2) => {
        const model = buildShelter(spec, refinement);
        const most = model.tieOuts.map(() => 0);
        for (let deg = 0; deg < 360; deg += 30)
          for (const loadCase of CASES) {
            const solved = solve(model, deg, loadCase, pressurePa);
            if (solved.settled) solved.tieOuts.forEach((one, i) => (most[i] = Math.max(most[i] ?? 0, one.pullN)));
          }
        return most;
      };
      const directions = Array.from({ length: 12 }, (_, index) => 30 * index);
      const { design } = analyseShelter({ spec, relativeWindDirectionsDeg: directions, pressurePa });
      envelopeOf(2).forEach((fine, index) => expect(fine).toBeLessThan(1.1 * (design.tieOuts[index]?.pullN ?? NaN)));
    },
  );

  it.each(KINDS)("%s: the same case twice is the same to the bit", (kind) => {
    const spec = defaultShelterSpec(kind);
    const [one, two] = [1, 2].map(() => solve(buildShelter(spec), 50, "pressing"));
    expect([...(one?.positions ?? [])]).toEqual([...(two?.positions ?? [])]);
    expect(one?.tieOuts).toEqual(two?.tieOuts);
    expect(one?.iterations).toBe(two?.iterations);
  });

  it("poles push and lines pull, never the other way", () => {
    for (const kind of KINDS) {
      const solved = solve(buildShelter(defaultShelterSpec(kind)), 120, "lifting");
      for (const { pullN, lineAngleDeg } of solved.tieOuts) {
        expect(pullN).toBeGreaterThanOrEqual(0);
        expect(lineAngleDeg).toBeGreaterThanOrEqual(0);
        expect(lineAngleDeg).toBeLessThanOrEqual(90);
      }
      for (const { compressionN } of solved.poles) expect(compressionN).toBeGreaterThanOrEqual(0);
    }
  });

  it("a ridge tarp of 3 m by 3 m pulls 100 to 600 N at its hardest lines in 200 Pa", () => {
    const model = buildShelter(defaultShelterSpec("ridge-tarp"));
    const largest = (deg: number, loadCase: LoadCase) =>
      Math.max(...solve(model, deg, loadCase).tieOuts.map((one) => one.pullN));
    for (const value of [largest(90, "pressing"), largest(0, "lifting")]) {
      expect(value).toBeGreaterThan(100);
      expect(value).toBeLessThan(600);
    }
  });
});

describe("no standing shape", () => {
  it("is what a ridge tarp has when a ridge end is gone", () => {
    const model = buildShelter(defaultShelterSpec("ridge-tarp"));
    const shelter = compileShelter(model);
    const pressures = panelPressures(model, { pressurePa: 200, relativeWindDeg: 90, loadCase: "pressing" });
    const ridgeFront = model.tieOuts.findIndex((one) => one.id === "ridge-front");
    const solved = solveShelterNet(shelter, pressures, { withoutTieOut: ridgeFront });
    expect(solved.standing).toBe(false);
    expect(solved.tieOuts[ridgeFront]?.pullN).toBe(0);
  });

  it("says so when the bound on steps is too small", () => {
    const model = buildShelter(defaultShelterSpec("dome"));
    const pressures = panelPressures(model, { pressurePa: 200, relativeWindDeg: 90, loadCase: "pressing" });
    const solved = solveShelterNet(compileShelter(model), pressures, { iterationLimit: 5 });
    expect(solved).toMatchObject({ settled: false, standing: false, iterations: 5 });
  });

  it("closed tents with all their lines stand in 20 m/s (245 Pa) from every side", () => {
    for (const kind of ["pyramid", "ridge-tent", "tunnel", "dome", "bell"] as const) {
      const model = buildShelter(defaultShelterSpec(kind));
      for (let deg = 0; deg < 360; deg += 30)
        for (const loadCase of CASES) expect(solve(model, deg, loadCase, 245).standing).toBe(true);
    }
  });
});

describe("bad input", () => {
  const model = buildShelter(defaultShelterSpec("bell"));

  it("refuses a pressure that is no number", () => {
    expect(() => solve(model, 0, "lifting", Number.NaN)).toThrow(RangeError);
  });

  it("refuses links to nodes that are not there, and lines that are missing", () => {
    const links = [{ a: 0, b: 99_999, restLengthM: 1, stiffnessN: 1, role: "line" as const, tieOutId: null }];
    expect(() => compileNet({ ...model, links })).toThrow(RangeError);
    expect(() => compileShelter({ ...model, links: [] })).toThrow(RangeError);
  });
});

describe("pressure on the panels", () => {
  const mean = (kind: ShelterKind, deg: number, loadCase: LoadCase, zone: string) => {
    const all = panelCoefficients(buildShelter(defaultShelterSpec(kind)), deg, loadCase).filter(
      (one) => one.zone === zone,
    );
    return all.reduce((sum, one) => sum + one.net, 0) / all.length;
  };

  it("wind presses the windward face of a closed tent and sucks the lee one", () => {
    for (const kind of ["ridge-tent", "pyramid"] as const) {
      expect(mean(kind, 90, "pressing", "right")).toBeGreaterThan(0.7);
      expect(mean(kind, 90, "lifting", "left")).toBeLessThan(-0.2);
    }
    const dome = panelCoefficients(buildShelter(defaultShelterSpec("dome")), 90, "pressing");
    expect(Math.max(...dome.map((one) => one.net))).toBeGreaterThan(0.7);
    expect(Math.min(...dome.map((one) => one.net))).toBeLessThan(-0.6);
  });

  it("wind into an open front lifts the cloth; on the closed back it presses", () => {
    for (const [kind, zone] of [
      ["half-pyramid", "rear"],
      ["poncho-lean-to", "slope"],
    ] as const) {
      expect(mean(kind, 0, "lifting", zone)).toBeLessThan(-0.7);
      expect(mean(kind, 180, "pressing", zone)).toBeGreaterThan(0.7);
    }
  });

  it("a flat roof has its centre of pressure a quarter of its depth behind the windward edge", () => {
    const model = buildShelter({
      ...defaultShelterSpec("flying-tarp"),
      dimensions: { frontHeightM: 1.5, rearHeightM: 1.5 },
    });
    const coefficients = panelCoefficients(model, 0, "lifting");
    let force = 0;
    let moment = 0;
    coefficients.forEach(({ net }, index) => {
      const y =
        (model.panels[index]?.nodes ?? []).reduce((sum, node) => sum + (model.nodes[node]?.position.y ?? 0), 0) / 4;
      force += net;
      moment += net * (1.5 - y);
    });
    expect(force / coefficients.length).toBeCloseTo(-0.5, 6);
    // Constant on each of six strips instead of linear: the centre comes out at 0.257 d.
    expect(moment / force / 3).toBeCloseTo(0.25, 1);
  });

  it("names a source for every panel, and marks vaults and domes as uncertain", () => {
    for (const kind of KINDS) {
      for (const one of panelCoefficients(buildShelter(defaultShelterSpec(kind)), 75, "pressing")) {
        expect(one.source).toMatch(/EN 1991-1-4/);
        expect(Number.isFinite(one.net)).toBe(true);
        if (kind === "dome") expect(one.source).toMatch(/low confidence/);
        if (one.external !== null && one.internal !== null && kind === "pyramid")
          expect(one.net).toBeCloseTo(one.external - one.internal, 12);
      }
    }
  });
});
