import { type ChildProcess, execFileSync, spawn } from "node:child_process";
import { mkdirSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { setTimeout as sleep } from "node:timers/promises";

const root = process.cwd();

export interface Served {
  readonly url: string;
  readonly stop: () => Promise<void>;
}

async function untilReady(url: string, child: ChildProcess): Promise<void> {
  for (let tries = 0; tries < 600; tries += 1) {
    if (child.exitCode !== null) throw new Error(`The server stopped with ${child.exitCode}.`);
    try {
      if ((await fetch(url)).ok) return;
    } catch {
      // Not listening yet.
    }
    await sleep(200);
  }
  throw new Error(`Nothing answers at ${url}.`);
}

function served(child: ChildProcess, url: string): Served {
  return {
    url,
    stop: () =>
      new Promise((resolve) => {
        child.once("exit", () => resolve());
        child.kill("SIGTERM");
      }),
  };
}

/** The built product with demo data (`npm run build` first). */
export async function serveProduct(port: number): Promise<Served> {
  const env = { ...process.env, E2E_PORT: String(port) };
  const child = spawn(process.execPath, ["tests/e2e/server.mjs"], { cwd: root, env, stdio: "ignore" });
  const url = `http://localhost:${port}`;
  await untilReady(`${url}/readyz`, child);
  return served(child, url);
}

/** A Next application with one bare page that is rendered at each request, built by the same version. */
export async function serveBare(port: number): Promise<Served> {
  const folder = path.join(root, "test-results", "bare");
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(path.join(folder, "app"), { recursive: true });
  writeFileSync(path.join(folder, "package.json"), '{ "name": "bare", "private": true }');
  writeFileSync(
    path.join(folder, "app/layout.tsx"),
    "export default function Layout({ children }: { children: React.ReactNode }) {\n" +
      '  return <html lang="en"><body>{children}</body></html>;\n}\n',
  );
  writeFileSync(
    path.join(folder, "app/page.tsx"),
    'import { connection } from "next/server";\n' +
      "export default async function Page() {\n  await connection();\n  return <h1>{Math.PI}</h1>;\n}\n",
  );
  // Of its own, so that the product's are not found further up.
  writeFileSync(path.join(folder, "next.config.mjs"), "export default { poweredByHeader: false };\n");
  writeFileSync(path.join(folder, "instrumentation.ts"), "export function register() {}\n");
  const next = path.join(root, "node_modules/next/dist/bin/next");
  execFileSync(process.execPath, [next, "build", folder], { cwd: folder, stdio: "ignore" });
  const child = spawn(process.execPath, [next, "start", folder, "-p", String(port)], {
    cwd: folder,
    stdio: ["ignore", "ignore", "inherit"],
  });
  const url = `http://localhost:${port}`;
  await untilReady(url, child);
  return served(child, url);
}

/** Cookie of a demo person. */
export async function signIn(url: string, email: string): Promise<string> {
  const response = await fetch(`${url}/api/auth/sign-in/email`, {
    method: "POST",
    headers: { "content-type": "application/json", origin: url },
    body: JSON.stringify({ email, password: "four-lines-to-the-lee" }),
  });
  if (!response.ok) throw new Error(`Sign-in answered ${response.status}.`);
  return response.headers
    .getSetCookie()
    .map((cookie) => cookie.split(";")[0])
    .join("; ");
}
