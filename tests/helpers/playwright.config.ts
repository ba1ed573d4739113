import { fileURLToPath } from "node:url";
import { defineConfig } from "@playwright/test";

const PORT = Number(process.env.E2E_PORT ?? 3217);
const root = fileURLToPath(new URL("../..", import.meta.url));

export default defineConfig({
  testDir: fileURLToPath(new URL("../e2e", import.meta.url)),
  testMatch: "**/*.spec.ts",
  outputDir: `${root}test-results/e2e`,
  // One worker: the browser, the server and the other core's work share two cores.
  workers: 1,
  fullyParallel: false,
  forbidOnly: true,
  retries: 0,
  timeout: 120_000,
  expect: { timeout: 15_000 },
  reporter: [["list"], ["json", { outputFile: `${root}test-results/playwright.json` }]],
  use: {
    baseURL: `http://localhost:${PORT}`,
    actionTimeout: 10_000,
    locale: "en-GB",
    timezoneId: "Europe/London",
    screenshot: "only-on-failure",
    trace: "retain-on-failure",
    launchOptions: {
      executablePath: process.env.CHROMIUM ?? "/usr/bin/chromium",
      args: [
        "--no-sandbox",
        "--disable-gpu",
        "--disable-quic",
        "--no-first-run",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
      ],
    },
  },
  webServer: {
    command: "node tests/e2e/server.mjs",
    cwd: root,
    url: `http://localhost:${PORT}/readyz`,
    env: { E2E_PORT: String(PORT) },
    timeout: 180_000,
    // By hand: E2E_PORT of a server that already runs.
    reuseExistingServer: process.env.E2E_REUSE === "1",
    gracefulShutdown: { signal: "SIGTERM", timeout: 5000 },
    stdout: "ignore",
    stderr: "pipe",
  },
});
