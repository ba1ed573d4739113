import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, describe, expect, it } from "vitest";
import { WorkerFailure, WorkerPool } from "@/lib/workers/pool";

const folder = mkdtempSync(join(tmpdir(), "leestead-pool-"));
const script = join(folder, "double.mjs");
writeFileSync(
  script,
  `import { parentPort } from "node:worker_threads";
  parentPort.on("message", (task) => {
    if (task === "crash") process.exit(3);
    if (task === "hang") return;
    parentPort.postMessage(task === "fail" ? { failure: "no" } : { result: task * 2 });
  });`,
);
const makePool = (more = {}) =>
  new WorkerPool(script, { threads: 2, timeoutMs: 60_000, maxWaiting: 20, memoryMb: 64, ...more });
const reasonOf = (work: Promise<unknown>) =>
  work.then(
    () => "done",
    (error: unknown) => (error instanceof WorkerFailure ? error.reason : String(error)),
  );

afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe("a pool of threads", () => {
  it("works through more tasks than it has threads, in any order, each with its own result", async () => {
    const pool = makePool();
    const results = await Promise.all(Array.from({ length: 15 }, (_, index) => pool.run(index)));
    expect(results).toEqual(Array.from({ length: 15 }, (_, index) => index * 2));
    await pool.close();
  });

  it("goes on after a task that fails, hangs or ends its thread", async () => {
    const pool = makePool({ timeoutMs: 500 });
    expect(await reasonOf(pool.run("fail"))).toBe("task-failed");
    expect(await reasonOf(pool.run("crash"))).toBe("crashed");
    expect(await reasonOf(pool.run("hang"))).toBe("timed-out");
    await pool.close();
    const after = makePool();
    expect(await after.run(21)).toBe(42);
    await after.close();
  });

  it("refuses what it could not get to", async () => {
    const pool = makePool({ threads: 1, maxWaiting: 1 });
    const [first, second, third] = [pool.run(1), pool.run(2), pool.run(3)];
    expect(await reasonOf(third)).toBe("busy");
    expect(await Promise.all([first, second])).toEqual([2, 4]);
    await pool.close();
  });
});
