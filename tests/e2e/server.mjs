/** The built product on a database of its own, with the demo data; stops with the tests. */
import { spawn, spawnSync } from "node:child_process";
import { mkdirSync, rmSync } from "node:fs";
import path from "node:path";
import process from "node:process";
import { fileURLToPath } from "node:url";

const root = fileURLToPath(new URL("../..", import.meta.url));
const port = process.env.E2E_PORT ?? "3217";
const folder = path.join(root, "test-results", `server-${port}`);
rmSync(folder, { recursive: true, force: true });
mkdirSync(folder, { recursive: true });

const env = {
  ...process.env,
  NODE_ENV: "production",
  DATABASE_URL: `file:${path.join(folder, "leestead.db")}`,
  APP_URL: `http://localhost:${port}`,
  PORT: port,
  AUTH_SECRET: "only-for-the-browser-tests-0123456789-abcdefghij",
  DETAILS_KEYS: "t1:C4tMvZ0l7nQ2xYk9sWbE5uRj8hGfD1aPoI3qLwSeXzA=",
  LEESTEAD_DEMO: "1",
  LOG_LEVEL: "warn",
};

for (const script of ["db:migrate", "db:seed"]) {
  const { status } = spawnSync("npm", ["run", "--silent", script], { cwd: root, env, stdio: "inherit" });
  if (status !== 0) process.exit(status ?? 1);
}

const server = spawn(
  process.execPath,
  ["--max-old-space-size=384", path.join(root, "node_modules/next/dist/bin/next"), "start", "-p", port],
  { cwd: root, env, stdio: "inherit" },
);
for (const signal of ["SIGTERM", "SIGINT"]) process.on(signal, () => server.kill(signal));
server.on("exit", (code) => process.exit(code ?? 0));
