import type { Client, InArgs, InStatement, ResultSet, Transaction } from "@libsql/client";

/**
 * One writer at a time in this process. libSQL runs `file:` SQL synchronously on the main thread, so a second
 * overlapping write transaction can never wait for the first: it blocks the very loop that would let it finish.
 * Waiting happens here instead, in a queue of promises.
 */
interface Limits {
  /** A transaction open for longer is rolled back: whoever opened it has forgotten it. */
  readonly maxHoldMs: number;
}

class WriteLock {
  private tail: Promise<void> = Promise.resolve();

  /** Resolves when it is the caller's turn, with the function that ends the turn. */
  async acquire(): Promise<() => void> {
    const before = this.tail;
    let release: () => void = () => undefined;
    this.tail = new Promise((resolve) => {
      release = resolve;
    });
    await before;
    return release;
  }
}

const READS = /^\s*(select|explain|pragma\s+\w+\s*(\(\w+\))?\s*;?\s*$)/i;
const CHECKPOINT = /wal_checkpoint|optimize|incremental_vacuum/i;

function isRead(sql: string): boolean {
  return READS.test(sql) && !CHECKPOINT.test(sql);
}

function isBusy(error: unknown): boolean {
  return error instanceof Error && "code" in error && (error.code === "SQLITE_BUSY" || error.code === "SQLITE_LOCKED");
}

/** Wraps a client of a `file:` database; give the wrapped one to everything that works with the database. */
export function serialiseWrites(client: Client, limits: Limits = { maxHoldMs: 30_000 }): Client {
  const lock = new WriteLock();

  /** A connection that met BUSY stays broken: all are opened anew. Nothing else is open while the lock is held. */
  async function reopenAfterBusy(error: unknown): Promise<never> {
    if (isBusy(error)) await client.reconnect();
    throw error;
  }

  async function write<Result>(work: () => Promise<Result>): Promise<Result> {
    const release = await lock.acquire();
    try {
      return await work().catch(reopenAfterBusy);
    } finally {
      release();
    }
  }

  async function openTransaction(): Promise<Transaction> {
    const release = await lock.acquire();
    try {
      const inner = await client.transaction("write").catch(reopenAfterBusy);
      const timer = setTimeout(() => {
        inner.close();
        release();
      }, limits.maxHoldMs);
      timer.unref();
      return releaseAtEnd(inner, () => {
        clearTimeout(timer);
        release();
      });
    } catch (error) {
      release();
      throw error;
    }
  }

  const wrapped: Partial<Client> = {
    execute: (statement: InStatement, args?: InArgs) => {
      const isText = typeof statement === "string";
      const run = (): Promise<ResultSet> => (isText ? client.execute(statement, args) : client.execute(statement));
      return isRead(isText ? statement : statement.sql) ? run() : write(run);
    },
    batch: (statements) => write(() => client.batch(statements, "write")),
    migrate: (statements) => write(() => client.migrate(statements)),
    executeMultiple: (sql) => write(() => client.executeMultiple(sql)),
    transaction: openTransaction,
  };
  return new Proxy(client, {
    get(target, name) {
      if (name in wrapped) return wrapped[name as keyof Client];
      const value: unknown = Reflect.get(target, name, target);
      return typeof value === "function" ? (value.bind(target) as unknown) : value;
    },
  });
}

function releaseAtEnd(inner: Transaction, release: () => void): Transaction {
  const wrapped: Partial<Transaction> = {
    commit: () => inner.commit().finally(release),
    rollback: () => inner.rollback().finally(release),
    close: () => {
      try {
        inner.close();
      } finally {
        release();
      }
    },
  };
  return new Proxy(inner, {
    get(target, name) {
      if (name in wrapped) return wrapped[name as keyof Transaction];
      const value: unknown = Reflect.get(target, name, target);
      return typeof value === "function" ? (value.bind(target) as unknown) : value;
    },
  });
}
