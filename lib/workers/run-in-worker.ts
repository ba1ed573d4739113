import { existsSync } from "node:fs";
import { join } from "node:path";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { WorkerFailure, WorkerPool } from "./pool";

const POOLS = {
  analysis: { threads: 2, timeoutMs: 20_000, maxWaiting: 200, memoryMb: 128 },
  pdf: { threads: 1, timeoutMs: 60_000, maxWaiting: 40, memoryMb: 512 },
  gpx: { threads: 1, timeoutMs: 20_000, maxWaiting: 20, memoryMb: 384 },
} as const;
export type WorkerName = keyof typeof POOLS;

// On globalThis: bundles of routes and pages are separate, the threads must be shared.
const store = globalThis as typeof globalThis & { leesteadWorkers?: Map<WorkerName, WorkerPool> };

/** Null where no bundle was built: in development and in tests the task runs in this thread, from the source. */
function findPool(name: WorkerName): WorkerPool | null {
  if (!env.isProduction) return null;
  const pools = (store.leesteadWorkers ??= new Map());
  const known = pools.get(name);
  if (known) return known;
  const script = join(/* turbopackIgnore: true */ process.cwd(), ".next", "workers", `${name}.mjs`);
  if (!existsSync(script)) return null;
  const pool = new WorkerPool(script, POOLS[name]);
  pools.set(name, pool);
  return pool;
}

/**
 * Runs a task in a thread of its own, so that other requests are not held up. The payload and the result are cloned:
 * plain data only. `runHere` is the same task for where there is no bundle.
 */
export async function runInWorker<Payload, Result>(
  name: WorkerName,
  payload: Payload,
  runHere: (payload: Payload) => Result | Promise<Result>,
): Promise<Result> {
  const pool = findPool(name);
  if (!pool) return runHere(payload);
  try {
    return (await pool.run(payload)) as Result;
  } catch (error) {
    if (!(error instanceof WorkerFailure) || error.reason === "task-failed") throw error;
    throw new AppError("unavailable", "That took too long just now. Try again in a moment.", { cause: error });
  }
}

/** Ends the idle threads; for a graceful stop. */
export async function closeWorkers(): Promise<void> {
  await Promise.all([...(store.leesteadWorkers?.values() ?? [])].map((pool) => pool.close()));
}
