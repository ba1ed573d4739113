import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { performance } from "node:perf_hooks";
import { newId } from "@/lib/domain/ids";
import type { PullReading } from "@/lib/calc/learning";

/** Runs as a process of its own, since services only load as on a server; prints its rows as JSON. */
const report = (row: { name: string; value: string; target?: string }) => console.log(JSON.stringify(row));

const ROWS = 20_000;
const ANCHORS = ["three-blade-200", "three-blade-150", "v-160", "wide-sand-300"];
const OUTCOMES = ["came-out", "still-holding", "bent"];
const HEAD = "pulled_at,place,ground,wetness,anchor,lean_deg,line_angle_deg,force,unit,outcome,note";

function makeTable(): string {
  const rows = Array.from({ length: ROWS }, (_, i) => {
    const at = new Date(Date.UTC(2027, 0, 1, 0, i)).toISOString();
    const cells = [at, "Field", "firm-moist-loam", "usual", ANCHORS[i % 4], (i % 7) * 5, 30 + (i % 4) * 10];
    return [...cells, 60 + (i % 150), "N", OUTCOMES[i % 3], `"row ${i}, dry"`].join(",");
  });
  return `${HEAD}\r\n${rows.join("\r\n")}\r\n`;
}

interface Took {
  readonly wallMs: number;
  /** Of this process: what a machine that has nothing else to do would need. */
  readonly processorMs: number;
}

async function timed<Result>(task: () => Promise<Result> | Result): Promise<readonly [Took, Result]> {
  const start = performance.now();
  const before = process.cpuUsage();
  const result = await task();
  const { user, system } = process.cpuUsage(before);
  return [{ wallMs: performance.now() - start, processorMs: (user + system) / 1000 }, result];
}

/** A table of 20,000 readings in, again (nothing new), and out, on a real file; and what the learning takes. */
async function measure(): Promise<void> {
  const folder = mkdtempSync(path.join(tmpdir(), "leestead-bench-"));
  process.env.DATABASE_URL = `file:${path.join(folder, "bench.db")}`;
  const { getDb, closeDb } = await import("@/db/client");
  const { migrateDatabase } = await import("@/db/migrate-database");
  const { user } = await import("@/db/schema");
  const { importPracticePullTests } = await import("@/lib/services/pull-tests/csv/import-pull-tests");
  const { exportPracticePullTests } = await import("@/lib/services/pull-tests/csv/export-pull-tests");
  const { getPracticeField } = await import("@/lib/services/pull-tests/get-practice-field");
  const { learnGround, readingInfluences } = await import("@/lib/calc/learning");
  await migrateDatabase(getDb());
  const now = new Date();
  const actor = { userId: newId(), name: "Bench", email: "bench@example.test" };
  await getDb()
    .insert(user)
    .values({ id: actor.userId, name: actor.name, email: actor.email, createdAt: now, updatedAt: now });
  const ctx = { actor, requestId: newId() };
  const seconds = ({ wallMs, processorMs }: Took) =>
    `${(wallMs / 1000).toFixed(2)} s (${(processorMs / 1000).toFixed(2)} s of a processor)`;
  const content = new TextEncoder().encode(makeTable());
  const [first, added] = await timed(() => importPracticePullTests({ ctx, content }));
  report({ name: `${added.added} readings in from CSV`, value: seconds(first), target: "< 2 s" });
  const [out, file] = await timed(() => exportPracticePullTests({ ctx }));
  report({ name: "the same out", value: seconds(out) });
  const [again, known] = await timed(() =>
    importPracticePullTests({ ctx, content: new TextEncoder().encode(file.text) }),
  );
  report({ name: `in again: ${known.known} known, ${known.added} added`, value: seconds(again), target: "< 2 s" });
  const [page] = await timed(() => getPracticeField({ ctx }));
  report({ name: "page of a field with all of them", value: seconds(page) });
  const own = Array.from({ length: 20 }, (_, i): PullReading => ({
    logRatio: Math.sin(i) / 2,
    kind: i % 3 ? "exact" : "at-least",
  }));
  const input = { tableScatter: 0.5, own, elsewhere: [own.slice(5), own.slice(10)] };
  learnGround(input);
  const [learn] = await timed(() => learnGround(input));
  report({ name: "learning from 20 readings here and 25 at two other places", value: `${learn.wallMs.toFixed(0)} ms` });
  const [fit] = await timed(() =>
    readingInfluences(
      input,
      own.map((_, i) => i),
    ),
  );
  report({ name: "pull and fit of each of the 20", value: `${fit.wallMs.toFixed(0)} ms` });
  await closeDb();
  rmSync(folder, { recursive: true, force: true });
}

await measure();
