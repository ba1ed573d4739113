import "./database";
import { createHash } from "node:crypto";
import type { InStatement } from "@libsql/client";
import { getDb } from "@/db/client";

/** Counters of limits and what is worked out again at any time: no data of anybody. */
const COUNTERS = ["rate_limit", "request_quota", "analysis_cache", "__drizzle_migrations"];

async function listTables(): Promise<string[]> {
  const { rows } = await getDb().$client.execute(
    "select name from sqlite_master where type = 'table' and name not like 'sqlite_%' order by name",
  );
  return rows.map((row) => String(row.name)).filter((name) => !COUNTERS.includes(name));
}

/** A hash of all rows of each table. */
export async function hashTables(): Promise<Readonly<Record<string, string>>> {
  const hashes: Record<string, string> = {};
  for (const table of await listTables()) {
    const { rows, columns } = await getDb().$client.execute(`select * from "${table}" order by rowid`);
    const values = rows.map((row) => columns.map((_, index) => toText(row[index])));
    hashes[table] = createHash("sha256").update(JSON.stringify(values)).digest("hex");
  }
  return hashes;
}

/** All rows of the tables that carry a trip's id, of that trip only. */
export async function readTrip(tripId: string): Promise<Readonly<Record<string, unknown>>> {
  const found: Record<string, unknown> = {};
  for (const table of await listTables()) {
    const { rows, columns } = await getDb().$client.execute(`select * from "${table}" order by rowid`);
    const key = table === "trip" ? "id" : "trip_id";
    if (!columns.includes(key)) continue;
    found[table] = rows
      .filter((row) => row[key] === tripId)
      .map((row) => columns.map((_, index) => toText(row[index])));
  }
  return found;
}

function toText(value: unknown): string {
  return value instanceof ArrayBuffer ? Buffer.from(value).toString("base64") : String(value);
}

/** Puts every row back as it was; the connection stays open, since sign-in holds on to it. */
export async function keepRows(): Promise<() => Promise<void>> {
  const client = getDb().$client;
  const { rows: tables } = await client.execute(
    "select name from sqlite_master where type = 'table' and name not like 'sqlite_%' and name not like '\\_\\_%' escape '\\'",
  );
  const names = tables.map((table) => String(table.name));
  const inserts: InStatement[] = [];
  for (const name of names) {
    const { rows, columns } = await client.execute(`select * from "${name}" order by rowid`);
    const sql = `insert into "${name}" values (${columns.map(() => "?").join(", ")})`;
    for (const row of rows) inserts.push({ sql, args: columns.map((_, index) => row[index] ?? null) });
  }
  const deletes = names.map((name) => `delete from "${name}"`);
  return async () => {
    await client.batch(["pragma defer_foreign_keys = on", ...deletes, ...inserts], "write");
  };
}
