import { statfs } from "node:fs/promises";
import path from "node:path";
import { sql } from "drizzle-orm";
import { getDb, toFilePath } from "@/db/client";
import { isMigrated } from "@/db/migrate-database";
import { env } from "@/lib/env";

type Check = "ok" | "failed";

async function toCheck(work: () => Promise<boolean>): Promise<Check> {
  return work().then(
    (isGood) => (isGood ? "ok" : "failed"),
    () => "failed",
  );
}

async function hasRoom(): Promise<boolean> {
  const file = toFilePath(env.databaseUrl);
  if (file === null) return true;
  const { bavail, blocks, bsize } = await statfs(path.dirname(path.resolve(/* turbopackIgnore: true */ file)));
  return bavail / blocks > 0.05 || bavail * bsize > 2e9;
}

/** Whether this process can do its work: the database answers, is of this program's version, and has room to grow. */
export async function checkReadiness(): Promise<{ isReady: boolean; checks: Readonly<Record<string, Check>> }> {
  const checks = {
    database: await toCheck(async () => (await getDb().all(sql`select 1`)).length === 1),
    migrations: await toCheck(() => isMigrated(getDb())),
    disk: await toCheck(hasRoom),
  };
  return { isReady: Object.values(checks).every((one) => one === "ok"), checks };
}
