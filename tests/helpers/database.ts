/**
 * A real SQLite file per test file: import this first. The migrations run once into a base file, which is copied.
 */
import { createHash } from "node:crypto";
import {
  copyFileSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
} from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { createClient } from "@libsql/client";
import { drizzle } from "drizzle-orm/libsql";
import { migrate } from "drizzle-orm/libsql/migrator";
import { afterAll } from "vitest";

const migrationsFolder = path.join(process.cwd(), "drizzle");

function hashMigrations(): string {
  const hash = createHash("sha256");
  for (const file of readdirSync(migrationsFolder).sort()) {
    if (file.endsWith(".sql")) hash.update(readFileSync(path.join(migrationsFolder, file)));
  }
  return hash.digest("hex").slice(0, 16);
}

async function ensureBaseFile(): Promise<string> {
  const base = path.join(tmpdir(), `leestead-base-${hashMigrations()}.db`);
  if (existsSync(base)) return base;
  const folder = mkdtempSync(path.join(tmpdir(), "leestead-migrate-"));
  const file = path.join(folder, "base.db");
  const client = createClient({ url: `file:${file}` });
  await migrate(drizzle(client), { migrationsFolder });
  client.close();
  renameSync(file, base);
  rmSync(folder, { recursive: true, force: true });
  return base;
}

/** The folder of this test file, gone afterwards. */
export const testFolder = mkdtempSync(path.join(tmpdir(), "leestead-test-"));
mkdirSync(testFolder, { recursive: true });
export const databaseFile = path.join(testFolder, "test.db");
copyFileSync(await ensureBaseFile(), databaseFile);

process.env.DATABASE_URL = `file:${databaseFile}`;
process.env.APP_URL = "http://leestead.test";
process.env.AUTH_SECRET = "tests-only-3f9c2b7d1e8a40596b7c8d9e0f1a2b3c";
process.env.DETAILS_KEYS = "t1:C4tMvZ0l7nQ2xYk9sWbE5uRj8hGfD1aPoI3qLwSeXzA=";
process.env.LOG_LEVEL = "silent";
process.env.LEESTEAD_DEMO = "0";
delete process.env.SMTP_URL;
delete process.env.TRUSTED_IP_HEADER;

afterAll(async () => {
  const { closeDb } = await import("@/db/client");
  await closeDb();
  rmSync(testFolder, { recursive: true, force: true });
});
