import { spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";

const CANARY = "zyzzyva-canary";
const PHONES = ["+99 000 77 66", "+99 000 77 67"];
const folder = mkdtempSync(path.join(tmpdir(), "leestead-canary-"));
const file = path.join(folder, "canary.db");
let printed = "";
let report: { toOthers: string[]; toThose: Record<string, string>; mailCount: number };

beforeAll(() => {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    ["--import", "tsx", "--conditions=react-server", "tests/helpers/details-scenario.ts"],
    {
      encoding: "utf8",
      env: {
        ...process.env,
        NODE_ENV: "production",
        DATABASE_URL: `file:${file}`,
        APP_URL: "http://leestead.test",
        AUTH_SECRET: "tests-only-3f9c2b7d1e8a40596b7c8d9e0f1a2b3c",
        DETAILS_KEYS: "c1:C4tMvZ0l7nQ2xYk9sWbE5uRj8hGfD1aPoI3qLwSeXzA=",
        LOG_LEVEL: "debug",
        KEEP_WAL: "1",
        OUT: path.join(folder, "report.json"),
      },
    },
  );
  printed = stdout + stderr;
  expect(status, printed).toBe(0);
  report = JSON.parse(readFileSync(path.join(folder, "report.json"), "utf8")) as typeof report;
}, 90_000);

afterAll(() => rmSync(folder, { recursive: true, force: true }));

const tells = (text: string | Buffer) => [CANARY, ...PHONES].filter((word) => text.includes(word));

describe("what somebody wrote about themselves", () => {
  it("comes back to themselves, in their export, and to the leader", () => {
    for (const [who, answer] of Object.entries(report.toThose)) {
      expect(tells(answer), who).toEqual([CANARY, ...PHONES]);
      for (const part of ["health", "diet", "contact", "relation"]) expect(answer).toContain(`${CANARY}-${part}`);
    }
  });

  it("is in no answer to anybody else, no refusal, no list, no mail", () => {
    expect(report.mailCount).toBe(1);
    expect(report.toOthers.length).toBeGreaterThan(10);
    for (const answer of report.toOthers) expect(tells(answer), answer.slice(0, 300)).toEqual([]);
  });

  it("is in no line of the log, though the refusals are", () => {
    expect(printed).toContain("refused");
    expect(tells(printed)).toEqual([]);
  });

  it("is nowhere in the clear in the bytes of the database, nor of its log", () => {
    const parts = ["", "-wal", "-shm"].map((end) => `${file}${end}`).filter((one) => existsSync(one));
    const bytes = Buffer.concat(parts.map((one) => readFileSync(one)));
    expect(bytes.includes("Ridge")).toBe(true);
    expect(bytes.includes("c1.")).toBe(true);
    expect(tells(bytes)).toEqual([]);
  });
});
