/**
 * Spot check of the tests: flips one sign or coefficient at a time in lib/calc on a copy of the checkout and counts how
 * many flips make a test fail. The checkout itself is never touched.
 *
 *   node tests/helpers/flip-formulas.mjs [text in the file name]
 */
import { execFileSync } from "node:child_process";
import { cpSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";

const ANCHOR_TESTS = ["published", "wind", "stake", "capacity"].map((name) => `tests/unit/calc/${name}.test.ts`);

/** Each `find` must occur in the file; its first occurrence is replaced. */
const ANCHOR_FLIPS = [
  ["wind.ts", "0.5 * densityKgM3", "0.6 * densityKgM3"],
  ["wind.ts", "0.19 * (exposureRow", "0.17 * (exposureRow"],
  ["wind.ts", "/ 0.05) ** 0.07", "/ 0.05) ** 0.08"],
  ["wind.ts", "(1 + 7 * turbulenceIntensity", "(1 - 7 * turbulenceIntensity"],
  ["wind.ts", "1 / (orographyFactor * Math.log", "orographyFactor / (Math.log"],
  ["wind.ts", "- 1.9115 * zeta", "+ 1.9115 * zeta"],
  ["wind.ts", "- 1.7637", "+ 1.7637"],
  ["wind.ts", "hill.fromCrestM / hill.downwindLengthM", "hill.fromCrestM / hill.upwindLengthM"],
  ["wind.ts", "0.1606", "0.2606"],
  ["wind.ts", "1 + 2 * s * steepness", "1 + s * steepness"],
  ["wind.ts", "1 + 0.6 * s", "1 - 0.6 * s"],
  ["wind.ts", "coverRatio * coverRatio", "coverRatio"],
  ["wind.ts", "Math.min(ratio, input.underTreesSpeedRatio)", "ratio * input.underTreesSpeedRatio"],
  ["wind.ts", "ISA_LAPSE_K_PER_M * altitudeM", "-ISA_LAPSE_K_PER_M * altitudeM"],
  ["wind.ts", 'exposureFactor("II", 10)', 'exposureFactor("II", 5)'],
  ["stake.ts", "passive - active", "passive + active"],
  ["stake.ts", "1.58 + 4.09", "1.58 - 4.09"],
  ["stake.ts", "kc0 * 2 * sinPlus", "kc0 * sinPlus"],
  ["stake.ts", "wholeMomentNm / 2", "wholeMomentNm / 3"],
  ["stake.ts", "2 * turning.forceN - whole.forceN", "2 * turning.forceN + whole.forceN"],
  ["stake.ts", "groundN * e + largest.momentNm", "groundN * e - largest.momentNm"],
  ["stake.ts", "e * p.forceN + p.momentNm - input.bendingNm", "p.momentNm - input.bendingNm"],
  ["stake.ts", "dq * (square / 2 - lq)", "dq * (square / 2 + lq)"],
  ["lean.ts", "beta + omega - phi)", "beta - omega - phi)"],
  ["lean.ts", "(1 - sinPhi)) / (1 + Math.sin", "(1 + sinPhi)) / (1 + Math.sin"],
  ["lean.ts", "(1 + root) * cosFall", "(1 - root) * cosFall"],
  ["axial.ts", "sin - shaft.frictionCoefficient * cos", "sin + shaft.frictionCoefficient * cos"],
  ["axial.ts", "axial * axial + 4 * normal * normal", "axial * axial + 2 * normal * normal"],
  ["axial.ts", "lengthM - gapM", "lengthM + gapM"],
  ["axial.ts", "BLADE_DISTURBANCE = 0.5", "BLADE_DISTURBANCE = 0.6"],
  ["stake-limits.ts", "input.lineAngleDeg - leanDeg", "input.lineAngleDeg + leanDeg"],
  ["stake-limits.ts", "embeddedM - looseM", "embeddedM + looseM"],
  ["deadman.ts", "(kp - ka) * widthM", "(kp + ka) * widthM"],
  ["deadman.ts", "shape * sideRatio + 1)", "shape * sideRatio - 1)"],
  ["deadman.ts", "0.41 + 0.59 * r", "0.41 - 0.59 * r"],
  ["deadman.ts", "BACKFILL_STRENGTH = 0.5", "BACKFILL_STRENGTH = 0.6"],
  ["surface-weight.ts", "- Math.sin(omega)", "+ Math.sin(omega)"],
  ["surface-weight.ts", "+ frictionCoefficient * Math.sin(theta)", "- frictionCoefficient * Math.sin(theta)"],
  ["screw.ts", "9 * Math.min", "8 * Math.min"],
  ["section.ts", "(t * b ** 3) / 12", "(t * b ** 3) / 3"],
  ["section.ts", "diameterM ** 3 - inner ** 3", "diameterM ** 3 + inner ** 3"],
  ["section.ts", "(4 / 45)", "(4 / 35)"],
  ["loosening.ts", "input.cycles ** -looseningExponent", "input.cycles ** looseningExponent"],
  ["loosening.ts", "STRONG_PULLS_PER_HOUR = 12", "STRONG_PULLS_PER_HOUR = 60"],
  ["ground.ts", "row.saturatedUnitWeightNm3 - WATER_UNIT_WEIGHT_NM3", "row.saturatedUnitWeightNm3"],
  ["constants.ts", "Math.exp(-FIVE", "Math.exp(FIVE"],
  ["capacity.ts", "limit.medianN + share *", "limit.medianN - share *"],
  ["line.ts", "Math.min(knotRow(knot).efficiency", "Math.max(knotRow(knot).efficiency"],
];

const STRUCTURE_FLIPS = [
  ["net-motion.ts", "const half = -0.5 * p", "const half = 0.5 * p"],
  ["net-motion.ts", "const half = -0.5 * p", "const half = -0.6 * p"],
  ["net-motion.ts", "(length <= rest", "(length <= 0.5 * rest"],
  ["net-motion.ts", "(rest - length)) / rest", "(rest + length)) / rest"],
  ["net-motion.ts", "force[b] = (force[b] as number) - pull * dx", "force[b] = (force[b] as number) + pull * dx"],
  ["net-motion.ts", "(turn - (bendRestRad", "(turn + (bendRestRad"],
  [
    "pressure-coefficients.ts",
    "square * (cosine >= 0 ? wall.windward : wall.lee)",
    "square * (cosine < 0 ? wall.windward : wall.lee)",
  ],
  ["pressure-coefficients.ts", "GEAR_BLOCKAGE = 0.2", "GEAR_BLOCKAGE = 0.9"],
  ["shelter-workings.ts", "HOOP_GUY_ALLOWANCE = 1.4", "HOOP_GUY_ALLOWANCE = 1"],
  ["analyse-shelter.ts", "Math.min(2, Math.max(1, ratio))", "Math.min(1, Math.max(1, ratio))"],
  ["analyse-shelter.ts", "pullN <= bestPullN", "pullN >= bestPullN"],
  ["demand.ts", "(to.pullN - from.pullN) * share", "(to.pullN + from.pullN) * share"],
  ["statics.ts", "lineAngleDeg - leanDeg", "lineAngleDeg + leanDeg"],
];

const PLAN_FLIPS = [
  ["verdict.ts", "Math.log(medianN / demandN)", "Math.log(demandN / medianN)"],
  ["verdict.ts", "medianN >= demandN", "medianN <= demandN"],
  ["plan-score.ts", "MARGIN_CAP = 3", "MARGIN_CAP = 1"],
  ["camp.ts", "dependableN / demandN", "demandN / dependableN"],
  ["assignment.ts", "gained < 0", "gained > 0"],
  ["statistics.ts", "fraction = z + k / fraction", "fraction = z - k / fraction"],
];

const LEARNING_FLIPS = [
  ["learning.ts", "(-0.5 * data.count * (data.mean - g) ** 2)", "(0.5 * data.count * (data.mean - g) ** 2)"],
  ["learning.ts", "logNormalDistribution((g - at) / within)", "logNormalDistribution((at - g) / within)"],
  ["learning.ts", "WITHIN_SHARE = 0.6", "WITHIN_SHARE = 0.9"],
  ["learning.ts", "(median - fifth) / FIVE_PERCENT_QUANTILE", "(median + fifth) / FIVE_PERCENT_QUANTILE"],
  ["learning.ts", "1 + z * hazard - hazard * hazard", "1 + z * hazard + hazard * hazard"],
];

const testsOf = (...names) => names.map((name) => `tests/unit/calc/${name}.test.ts`);

const FLIPS = [
  [ANCHOR_FLIPS, ANCHOR_TESTS],
  [STRUCTURE_FLIPS, testsOf("tension", "analyse", "published")],
  [PLAN_FLIPS, testsOf("verdict", "plan", "camp", "assignment", "statistics")],
  [LEARNING_FLIPS, testsOf("learning", "published")],
].flatMap(([flips, tests]) =>
  flips.map(([file, find, replace]) => ({ file: `lib/calc/${file}`, find, replace, tests })),
);

const root = process.cwd();
const copy = mkdtempSync(path.join(tmpdir(), "flip-"));
for (const part of ["lib", "tests", "tsconfig.json", "package.json"]) {
  cpSync(path.join(root, part), path.join(copy, part), { recursive: true });
}
symlinkSync(path.join(root, "node_modules"), path.join(copy, "node_modules"));

function testsPass(tests) {
  try {
    const vitest = path.join(root, "node_modules/vitest/vitest.mjs");
    const args = ["run", "--config", "tests/helpers/vitest.config.ts", "--project", "unit", "--bail", "1", ...tests];
    execFileSync(process.execPath, [vitest, ...args], { cwd: copy, stdio: "ignore", timeout: 600_000 });
    return true;
  } catch {
    return false;
  }
}

const wanted = FLIPS.filter((flip) => flip.file.includes(process.argv[2] ?? ""));
const missed = [];
try {
  if (!testsPass([...new Set(wanted.flatMap((flip) => flip.tests))])) {
    throw new Error("the tests fail before anything is flipped");
  }
  for (const flip of wanted) {
    const file = path.join(copy, flip.file);
    const original = readFileSync(file, "utf8");
    if (!original.includes(flip.find)) throw new Error(`${flip.file} no longer contains: ${flip.find}`);
    writeFileSync(
      file,
      original.replace(flip.find, () => flip.replace),
    );
    const isCaught = !testsPass(flip.tests);
    writeFileSync(file, original);
    if (!isCaught) missed.push(flip);
    console.log(`${isCaught ? "caught" : "MISSED"}  ${flip.file}: ${flip.find} → ${flip.replace}`);
  }
} finally {
  rmSync(copy, { recursive: true, force: true });
}
console.log(`${wanted.length - missed.length} of ${wanted.length} flips caught.`);
process.exitCode = missed.length === 0 ? 0 : 1;
