/** `npm run demo`: from a fresh checkout to a running demo. Plain Node.js: nothing is installed yet when it starts. */
import { spawn } from "node:child_process";
import { randomBytes } from "node:crypto";
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from "node:fs";
import path from "node:path";
import process from "node:process";
import { fileURLToPath } from "node:url";
import { ensurePackages, requireNode, run } from "../lib/setup/install.mjs";

const root = fileURLToPath(new URL("..", import.meta.url));
const data = path.join(root, "data");
const port = process.env.PORT || "3000";
const databaseUrl = process.env.DATABASE_URL || "file:data/demo.db";
const isFresh = process.argv.includes("--fresh");

requireNode();
ensurePackages(root);
mkdirSync(data, { recursive: true });

/** Made once and kept: new ones would sign everybody out, and leave people's own details unreadable. */
function readSecret(name, make) {
  if (process.env[name]) return process.env[name];
  const file = path.join(data, "demo.env");
  const text = existsSync(file) ? readFileSync(file, "utf8") : "";
  const known = new RegExp(`^${name}=(\\S{32,})$`, "m").exec(text)?.[1];
  if (known) return known;
  const secret = make();
  writeFileSync(file, `${text}${name}=${secret}\n`, { mode: 0o600 });
  return secret;
}

const env = {
  ...process.env,
  NODE_ENV: "production",
  LEESTEAD_DEMO: "1",
  PORT: port,
  APP_URL: process.env.APP_URL || `http://localhost:${port}`,
  DATABASE_URL: databaseUrl,
  AUTH_SECRET: readSecret("AUTH_SECRET", () => randomBytes(48).toString("base64url")),
  DETAILS_KEYS: readSecret("DETAILS_KEYS", () => `k1:${randomBytes(32).toString("base64")}`),
  LOG_LEVEL: process.env.LOG_LEVEL || "warn",
};

function removeDatabase() {
  if (!databaseUrl.startsWith("file:")) {
    console.error("--fresh only works on a database file. Empty the database server yourself.");
    process.exit(1);
  }
  const file = path.resolve(root, databaseUrl.replace(/^file:(\/\/(localhost)?(?=\/))?/, "").replace(/\?.*$/, ""));
  for (const end of ["", "-wal", "-shm"]) rmSync(`${file}${end}`, { force: true });
}

const SOURCES = ["app", "components", "db", "lib", "public", "drizzle"];
const SOURCE_FILES = ["package-lock.json", "next.config.ts", "proxy.ts", "instrumentation.ts", "postcss.config.mjs"];

function newestChange(entry) {
  if (!existsSync(entry)) return 0;
  const { mtimeMs } = statSync(entry);
  if (!statSync(entry).isDirectory()) return mtimeMs;
  return readdirSync(entry).reduce((newest, name) => Math.max(newest, newestChange(path.join(entry, name))), mtimeMs);
}

function isBuilt() {
  const build = path.join(root, ".next", "BUILD_ID");
  if (!existsSync(build)) return false;
  const builtAt = statSync(build).mtimeMs;
  return [...SOURCES, ...SOURCE_FILES].every((name) => newestChange(path.join(root, name)) <= builtAt);
}

const npm = process.platform === "win32" ? "npm.cmd" : "npm";
if (isBuilt()) console.log("The build is up to date.");
else {
  console.log("Building …");
  run(npm, ["run", "--silent", "build"], { cwd: root, env });
}
if (isFresh) removeDatabase();
run(npm, ["run", "--silent", "db:migrate"], { cwd: root, env });
run(npm, ["run", "--silent", "db:seed"], { cwd: root, env, stdio: ["ignore", "ignore", "inherit"] });

const server = spawn(
  process.execPath,
  ["--max-old-space-size=384", path.join(root, "node_modules/next/dist/bin/next"), "start", "-p", port],
  { cwd: root, env, stdio: ["ignore", "ignore", "inherit"] },
);
for (const signal of ["SIGINT", "SIGTERM"]) process.on(signal, () => server.kill(signal));
server.on("exit", (code, signal) => process.exit(signal || code === 143 || code === 130 ? 0 : (code ?? 1)));

async function isUp() {
  for (let attempt = 0; attempt < 150; attempt += 1) {
    await new Promise((resolve) => setTimeout(resolve, 200));
    const answer = await fetch(`http://127.0.0.1:${port}/readyz`).catch(() => null);
    if (answer?.ok) return true;
  }
  return false;
}

if (!(await isUp())) {
  console.error("The server did not get ready within 30 s.");
  server.kill("SIGTERM");
} else {
  const demo = JSON.parse(readFileSync(path.join(root, "lib/domain/demo/people.json"), "utf8"));
  console.log(`\nLeestead runs on ${env.APP_URL}\n\nLog-ins, each with the password "${demo.password}":`);
  for (const one of demo.people) console.log(`  ${one.email.padEnd(28)} ${one.role}`);
  console.log(`\nMails of the demo: ${env.APP_URL}/demo/mail\nStop with Ctrl+C.`);
}
