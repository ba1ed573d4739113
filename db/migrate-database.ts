import path from "node:path";
import { sql } from "drizzle-orm";
import { migrate } from "drizzle-orm/libsql/migrator";
import { readMigrationFiles } from "drizzle-orm/migrator";
import type { Database } from "./client";

function migrationsFolder(): string {
  return path.join(/* turbopackIgnore: true */ process.cwd(), "drizzle");
}

export async function migrateDatabase(db: Database): Promise<void> {
  await migrate(db, { migrationsFolder: migrationsFolder() });
}

/** Whether the newest migration of this program is the newest one in the database. */
export async function isMigrated(db: Database): Promise<boolean> {
  const newest = readMigrationFiles({ migrationsFolder: migrationsFolder() }).at(-1);
  const rows = await db
    .all<{ created_at: number | string }>(
      sql`select created_at from __drizzle_migrations order by created_at desc limit 1`,
    )
    .catch(() => []);
  return newest !== undefined && Number(rows[0]?.created_at) === newest.folderMillis;
}
