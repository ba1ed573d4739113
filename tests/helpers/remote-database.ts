/** A database server on 127.0.0.1 that speaks the JSON form of the Hrana 2 protocol over HTTP, as `libsql://` asks for. */
import { randomUUID } from "node:crypto";
import { createServer, type IncomingMessage } from "node:http";
import type { AddressInfo } from "node:net";
import Database from "libsql";

type Cond = { type: string; step?: number; cond?: Cond; conds?: Cond[] };
interface Value {
  readonly type: "null" | "integer" | "float" | "text" | "blob";
  readonly value?: string | number;
  readonly base64?: string;
}
interface Stmt {
  readonly sql?: string;
  readonly sql_id?: number;
  readonly args?: readonly Value[];
  readonly named_args?: readonly { readonly name: string; readonly value: Value }[];
}
interface StreamRequest {
  readonly type: string;
  readonly stmt?: Stmt;
  readonly sql?: string;
  readonly sql_id?: number;
  readonly batch?: { readonly steps: readonly { readonly condition?: Cond; readonly stmt: Stmt }[] };
}

interface Connection {
  readonly db: InstanceType<typeof Database>;
  /** Statements that the client has given a number. */
  readonly texts: Map<number, string>;
}

const toSqlite = ({ type, value, base64 }: Value): unknown => {
  if (type === "null") return null;
  if (type === "integer") return BigInt(value ?? 0);
  return type === "blob" ? Buffer.from(base64 ?? "", "base64") : value;
};

const fromSqlite = (value: unknown): Value => {
  if (value === null || value === undefined) return { type: "null" };
  if (typeof value === "bigint") return { type: "integer", value: String(value) };
  if (typeof value === "number") return { type: "float", value };
  if (typeof value === "string") return { type: "text", value };
  return { type: "blob", base64: Buffer.from(value as Uint8Array).toString("base64") };
};

function execute({ db, texts }: Connection, { sql = "", sql_id: id, args = [], named_args: named = [] }: Stmt) {
  const text = id === undefined ? sql : (texts.get(id) ?? "");
  const statement = db.prepare(text);
  const values =
    named.length > 0
      ? Object.fromEntries(named.map((one) => [one.name.replace(/^[:@$]/, ""), toSqlite(one.value)]))
      : args.map(toSqlite);
  if (!statement.reader) {
    const done = statement.run(values);
    return { cols: [], rows: [], affected_row_count: done.changes, last_insert_rowid: String(done.lastInsertRowid) };
  }
  const rows = statement.safeIntegers(true).raw(true).all(values) as unknown[][];
  const cols = statement.columns().map(({ name, type }) => ({ name, decltype: type }));
  const changed = /^\s*(insert|update|delete)/i.test(text) ? rows.length : 0;
  return { cols, rows: rows.map((row) => row.map(fromSqlite)), affected_row_count: changed };
}

const reason = (error: unknown) => ({
  message: error instanceof Error ? error.message : String(error),
  code: (error as { code?: string }).code ?? "UNKNOWN",
});

function batch(stream: Connection, steps: NonNullable<StreamRequest["batch"]>["steps"]) {
  const results: unknown[] = [];
  const errors: unknown[] = [];
  const isMet = (cond: Cond | undefined): boolean => {
    if (!cond) return true;
    if (cond.type === "not") return !isMet(cond.cond);
    if (cond.type === "and") return (cond.conds ?? []).every(isMet);
    if (cond.type === "or") return (cond.conds ?? []).some(isMet);
    if (cond.type === "is_autocommit") return !stream.db.inTransaction;
    return Boolean((cond.type === "ok" ? results : errors)[cond.step ?? -1]);
  };
  for (const { condition, stmt } of steps) {
    let [result, error]: [unknown, unknown] = [null, null];
    try {
      if (isMet(condition)) result = execute(stream, stmt);
    } catch (thrown) {
      error = reason(thrown);
    }
    results.push(result);
    errors.push(error);
  }
  return { step_results: results, step_errors: errors };
}

function answer(stream: Connection, { type, stmt, sql, sql_id: id, batch: steps }: StreamRequest): unknown {
  try {
    if (type === "execute" && stmt) return { type: "ok", response: { type, result: execute(stream, stmt) } };
    if (type === "batch" && steps) return { type: "ok", response: { type, result: batch(stream, steps.steps) } };
    if (type === "sequence") stream.db.exec(sql ?? "");
    if (type === "store_sql" && id !== undefined) stream.texts.set(id, sql ?? "");
    const more = type === "get_autocommit" ? { is_autocommit: !stream.db.inTransaction } : {};
    return { type: "ok", response: { type, ...more } };
  } catch (error) {
    return { type: "error", error: reason(error) };
  }
}

async function bodyOf(request: IncomingMessage): Promise<{ baton?: string; requests: StreamRequest[] }> {
  const chunks: Buffer[] = [];
  for await (const chunk of request) chunks.push(chunk as Buffer);
  return JSON.parse(Buffer.concat(chunks).toString("utf8")) as { baton?: string; requests: StreamRequest[] };
}

export interface RemoteDatabase {
  readonly url: string;
  /** Pipelines that were answered, and how many came without the token. */
  readonly seen: { answered: number; refused: number };
  readonly stop: () => Promise<void>;
}

/** One writer at a time, as such a server does: a stream in a transaction keeps the others waiting. */
export async function startRemoteDatabase(file: string, token: string): Promise<RemoteDatabase> {
  const streams = new Map<string, Connection>();
  const seen = { answered: 0, refused: 0 };
  let holder: string | null = null;
  const waiting: (() => void)[] = [];
  const server = createServer(async (request, response) => {
    if (request.headers.authorization !== `Bearer ${token}`) {
      seen.refused += 1;
      response.writeHead(401, { "content-type": "application/json" }).end('{"message":"unauthorized"}');
      return;
    }
    const { baton, requests } = await bodyOf(request);
    const id = baton ?? randomUUID();
    while (holder !== null && holder !== id) await new Promise<void>((resolve) => waiting.push(resolve));
    const stream = streams.get(id) ?? { db: new Database(file), texts: new Map() };
    streams.set(id, stream);
    const results = requests.map((one) => answer(stream, one));
    const isClosed = requests.some((one) => one.type === "close");
    if (isClosed) {
      stream.db.close();
      streams.delete(id);
    }
    holder = !isClosed && stream.db.inTransaction ? id : null;
    if (holder === null) waiting.splice(0).forEach((go) => go());
    seen.answered += 1;
    response.writeHead(200, { "content-type": "application/json" });
    response.end(JSON.stringify({ baton: isClosed ? null : id, base_url: null, results }));
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  return {
    url: `libsql://127.0.0.1:${port}?tls=0`,
    seen,
    stop: async () => {
      for (const { db } of streams.values()) db.close();
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
    },
  };
}
