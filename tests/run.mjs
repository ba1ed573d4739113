/** `npm test`: installs what is missing, then format, lint, types, tests of every kind, and counts them. */
import { spawnSync } from "node:child_process";
import { mkdirSync, readFileSync, rmSync } from "node:fs";
import path from "node:path";
import process from "node:process";
import { fileURLToPath } from "node:url";
import { ensureChromium, ensurePackages, requireNode } from "../lib/setup/install.mjs";

const root = fileURLToPath(new URL("..", import.meta.url));
const results = path.join(root, "test-results");
const vitestReport = path.join(results, "vitest.json");
const playwrightReport = path.join(results, "playwright.json");

requireNode();
ensurePackages(root);
const chromium = ensureChromium();
rmSync(results, { recursive: true, force: true });
mkdirSync(results, { recursive: true });

const failedSteps = [];

function step(name, command, args, env = {}) {
  const started = Date.now();
  console.log(`\n── ${name}`);
  const { status } = spawnSync(command, args, { cwd: root, stdio: "inherit", env: { ...process.env, ...env } });
  console.log(`── ${name}: ${status === 0 ? "good" : "FAILED"}, ${Math.round((Date.now() - started) / 1000)} s`);
  if (status !== 0) failedSteps.push(name);
  return status === 0;
}

const bin = (name) => path.join(root, "node_modules", ".bin", name);

step("format", bin("prettier"), ["--check", "--log-level", "warn", "."]);
step("lint", bin("eslint"), [".", "--max-warnings", "0"]);
step("types of routes", bin("next"), ["typegen"]);
step("types", bin("tsc"), ["--noEmit"]);
step("unit, database, mail and component tests", bin("vitest"), [
  "run",
  "--config",
  "tests/helpers/vitest.config.ts",
  "--coverage",
  "--reporter=default",
  "--reporter=json",
  `--outputFile.json=${vitestReport}`,
]);
if (step("build", "npm", ["run", "build"], { NODE_ENV: "production" })) {
  step(
    "browser and accessibility tests",
    bin("playwright"),
    ["test", "--config", "tests/helpers/playwright.config.ts"],
    {
      CHROMIUM: chromium,
    },
  );
}

function readReport(file) {
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch {
    return null;
  }
}

const vitest = readReport(vitestReport);
const browser = readReport(playwrightReport)?.stats;
const passed = (vitest?.numPassedTests ?? 0) + (browser?.expected ?? 0);
const failed = (vitest?.numFailedTests ?? 0) + (browser?.unexpected ?? 0) + (browser?.flaky ?? 0);
const skipped = (vitest?.numPendingTests ?? 0) + (browser?.skipped ?? 0);
if (skipped > 0) failedSteps.push(`${skipped} tests were skipped`);
if (failedSteps.length > 0) console.log(`\nNot good: ${failedSteps.join("; ")}.`);
console.log(`\n${passed} passed, ${failed} failed`);
process.exit(failedSteps.length === 0 && failed === 0 && passed > 0 ? 0 : 1);
