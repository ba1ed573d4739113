import "server-only";
import { AsyncLocalStorage } from "node:async_hooks";
import { mkdirSync } from "node:fs";
import path from "node:path";
import { createClient, type Client } from "@libsql/client";
import { drizzle, type LibSQLDatabase } from "drizzle-orm/libsql";
import { env } from "@/lib/env";
import { toAppError } from "@/lib/errors";
import * as schema from "./schema";
import { serialiseWrites } from "./serialise-writes";

export type Database = LibSQLDatabase<typeof schema> & { $client: Client };
export type Transaction = Parameters<Parameters<Database["transaction"]>[0]>[0];

interface Opened {
  readonly db: Database;
  readonly url: string;
}

// On globalThis: bundles of routes and of the instrumentation are separate, the queue of writes must be one.
const store = globalThis as typeof globalThis & { leesteadDatabase?: Opened | undefined };

/** The part of a `file:` URL that is a path, or null for a remote database. */
export function toFilePath(url: string): string | null {
  if (!url.startsWith("file:")) return null;
  return url.replace(/^file:(\/\/(localhost)?(?=\/))?/, "").replace(/\?.*$/, "");
}

function open(): Opened {
  const url = env.databaseUrl;
  const file = toFilePath(url);
  if (file === null) {
    const client = createClient({ url, ...(env.databaseAuthToken ? { authToken: env.databaseAuthToken } : {}) });
    return { db: drizzle(client, { schema }), url };
  }
  mkdirSync(path.dirname(path.resolve(/* turbopackIgnore: true */ file)), { recursive: true });
  const client = serialiseWrites(createClient({ url, timeout: 5000 }));
  // First in the queue of writes. WAL stays in the file; synchronous = FULL is the default of each connection.
  client.execute("PRAGMA journal_mode = WAL").catch(() => undefined);
  return { db: drizzle(client, { schema }), url };
}

/** The database, opened when first needed. Inside a transaction use only its `tx`. */
export function getDb(): Database {
  store.leesteadDatabase ??= open();
  return store.leesteadDatabase.db;
}

const openTransactions = new AsyncLocalStorage<{ isOpen: boolean }>();

/** All or nothing, one at a time. A database that can't work just now becomes a refusal that people can read. */
export async function withTransaction<Result>(work: (tx: Transaction) => Promise<Result>): Promise<Result> {
  if (openTransactions.getStore()?.isOpen) throw new Error("A transaction is open already: use its tx.");
  const state = { isOpen: true };
  try {
    return await getDb().transaction((tx) => openTransactions.run(state, () => work(tx)));
  } catch (error) {
    throw toAppError(error) ?? error;
  } finally {
    state.isOpen = false;
  }
}

/** Writes the log back into the database file; requests in flight may go on. */
export async function checkpointDb(): Promise<void> {
  const opened = store.leesteadDatabase;
  if (!opened || toFilePath(opened.url) === null) return;
  await opened.db.$client.execute("PRAGMA wal_checkpoint(TRUNCATE)");
}

/** For scripts and tests: writes the log back and closes; the next use opens the database again. */
export async function closeDb(): Promise<void> {
  const opened = store.leesteadDatabase;
  if (!opened) return;
  try {
    await checkpointDb();
  } finally {
    store.leesteadDatabase = undefined;
    opened.db.$client.close();
  }
}
