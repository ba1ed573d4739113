/** What the two commands of the README need before anything else: plain Node.js, nothing installed yet. */
import { spawnSync } from "node:child_process";
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import { createHash } from "node:crypto";
import path from "node:path";
import process from "node:process";

const OLDEST = [20, 9];

export function requireNode() {
  const [major = 0, minor = 0] = process.versions.node.split(".").map(Number);
  if (major < OLDEST[0] || (major === OLDEST[0] && minor < OLDEST[1])) {
    console.error(`Leestead needs Node.js ${OLDEST.join(".")} or newer; this is ${process.versions.node}.`);
    process.exit(1);
  }
}

/** Runs a command and stops the program when it fails. */
export function run(command, args, options = {}) {
  const result = spawnSync(command, args, { stdio: "inherit", ...options });
  if (result.status !== 0) {
    console.error(`\nStopped: ${command} ${args.join(" ")} ended with ${result.status ?? result.signal}.`);
    process.exit(result.status ?? 1);
  }
}

/** Installs the packages of the lock file, once per lock file. */
export function ensurePackages(root) {
  const lock = createHash("sha256")
    .update(readFileSync(path.join(root, "package-lock.json")))
    .digest("hex");
  const stamp = path.join(root, "node_modules", ".leestead-lock");
  if (existsSync(stamp) && readFileSync(stamp, "utf8") === lock) return;
  console.log("Installing packages …");
  run("npm", ["ci", "--no-fund", "--no-audit"], { cwd: root, env: { ...process.env, NODE_ENV: "development" } });
  writeFileSync(stamp, lock);
}

/** The browser for the tests: Debian's chromium, or the one that CHROMIUM names. */
export function ensureChromium() {
  const wanted = process.env.CHROMIUM || "/usr/bin/chromium";
  if (existsSync(wanted)) return wanted;
  const isRoot = process.getuid?.() === 0;
  if (!process.env.CHROMIUM && isRoot && existsSync("/usr/bin/apt-get")) {
    console.log("Installing Debian's chromium for the browser tests …");
    run("apt-get", ["update", "-qq"]);
    run("apt-get", ["install", "-y", "-qq", "--no-install-recommends", "chromium"], {
      env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" },
    });
    return wanted;
  }
  console.error(
    "The browser tests need Chromium. Install it (on Debian or Ubuntu: sudo apt-get install chromium),\n" +
      "or set CHROMIUM to the path of a Chromium or Chrome that is already there, and run npm test again.",
  );
  process.exit(1);
}
