import "../../helpers/database";
import { readFileSync } from "node:fs";
import { NextRequest } from "next/server";
import { describe, expect, it } from "vitest";
import { toOwnPath } from "@/lib/auth/next-path";
import { checkReadiness } from "@/lib/services/health/check-readiness";
import { proxy } from "@/proxy";
import nextConfig from "@/next.config";

const ORIGIN = "http://leestead.test";

describe("where to go after signing in", () => {
  it.each(["/trips", "/trips/abc/camps/def?tab=1#x", "/invitation/abc_-"])("goes to %s", (next) => {
    expect(toOwnPath(next)).toBe(next);
  });

  it.each([
    "//evil.test",
    "/\\evil.test",
    "\\\\evil.test",
    "https:evil.test",
    "https://evil.test",
    "javascript:alert(1)",
    "/\t/evil.test",
    "/\n/evil.test",
    "/ /evil.test",
    "/..//evil.test",
    "",
    "trips",
    "x".repeat(501),
    undefined,
    ["/trips", "//evil.test"],
    { toString: () => "//evil.test" },
  ])("stays at home instead of %j", (next) => {
    expect(toOwnPath(next)).toBe("/trips");
  });

  it("keeps an encoded address as a path of our own", () => {
    expect(new URL(toOwnPath("/%2F%2Fevil.test"), ORIGIN).origin).toBe(ORIGIN);
  });
});

describe("headers of pages", () => {
  const get = (path: string) => proxy(new NextRequest(`${ORIGIN}${path}`));
  const policyOf = (path: string) => get(path).headers.get("content-security-policy") ?? "";

  it("let only scripts with this request's nonce run", () => {
    const nonceOf = (policy: string) => /script-src 'nonce-([^']+)' 'strict-dynamic'/.exec(policy)?.[1];
    const first = policyOf("/trips");
    expect(nonceOf(first)).toMatch(/^[A-Za-z0-9+/=]{24}$/);
    expect(nonceOf(policyOf("/trips"))).not.toBe(nonceOf(first));
    const scripts = first.split("; ").find((one) => one.startsWith("script-src"));
    expect(scripts).not.toContain("unsafe-inline");
    for (const rule of ["object-src 'none'", "base-uri 'none'", "form-action 'self'", "frame-ancestors 'none'"]) {
      expect(first).toContain(rule);
    }
  });

  it("forbid keeping what is personal, and give each request its own number", () => {
    const response = get("/trips");
    expect(response.headers.get("cache-control")).toBe("private, no-store");
    const foreign = new NextRequest(`${ORIGIN}/trips`, { headers: { "x-request-id": "mine" } });
    expect(proxy(foreign).headers.get("x-request-id")).toMatch(/^[0-9a-z]{26}$/);
  });

  it("turn away a change that another site sends, also when a header claims our name for it", () => {
    const send = (headers: Record<string, string>) =>
      proxy(new NextRequest(`${ORIGIN}/trips`, { method: "POST", headers })).status;
    expect(send({ origin: "https://evil.test" })).toBe(403);
    expect(send({ origin: "https://evil.test", "x-forwarded-host": "evil.test" })).toBe(403);
    expect(send({ origin: "null" })).toBe(403);
    expect(send({ origin: ORIGIN })).toBe(200);
  });

  it("are also on files and errors, and no program is named", async () => {
    const [all] = (await nextConfig.headers?.()) ?? [];
    const names = all?.headers.map((one) => one.key);
    expect(all?.source).toBe("/:path*");
    expect(names).toEqual(expect.arrayContaining(["X-Content-Type-Options", "Referrer-Policy", "Permissions-Policy"]));
    expect(nextConfig.poweredByHeader).toBe(false);
  });
});

describe("readiness", () => {
  it("is there with the newest migration and room on the disk", async () => {
    expect(await checkReadiness()).toEqual({
      isReady: true,
      checks: { database: "ok", migrations: "ok", disk: "ok" },
    });
  });
});

describe("packages", () => {
  const lock = JSON.parse(readFileSync("package-lock.json", "utf8")) as {
    packages: Record<string, { version?: string }>;
  };
  const toNumbers = (version: string) => version.split(/[.-]/).slice(0, 3).map(Number);
  const isAtLeast = (version: string, floor: string) => {
    const [a, b] = [toNumbers(version), toNumbers(floor)];
    const at = a.findIndex((part, index) => part !== b[index]);
    return at < 0 || (a[at] ?? 0) > (b[at] ?? 0);
  };

  // Oldest versions without a known published flaw that applies here; more about each in its advisories.
  it.each([
    ["next", "16.3.8"],
    ["react", "19.2.6"],
    ["react-dom", "19.2.6"],
    ["better-auth", "1.7.16"],
    ["drizzle-orm", "0.45.2"],
    ["nodemailer", "9.0.5"],
    ["smtp-server", "3.21.6"],
  ])("%s is at least %s, wherever it is installed", (name, floor) => {
    const found = Object.entries(lock.packages).filter(
      ([path]) => path === `node_modules/${name}` || path.endsWith(`/node_modules/${name}`),
    );
    expect(found.length).toBeGreaterThan(0);
    for (const [path, { version }] of found) {
      // mailparser and smtp-server read mail here, with a copy of nodemailer that sends nothing.
      if (name === "nodemailer" && path !== "node_modules/nodemailer") continue;
      expect(isAtLeast(version ?? "0", floor), `${path} ${version}`).toBe(true);
    }
  });
});
