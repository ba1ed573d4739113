import { mkdtempSync, rmSync, symlinkSync } from "node:fs";
import { execFileSync } from "node:child_process";
import { tmpdir } from "node:os";
import path from "node:path";
import { monitorEventLoopDelay, performance } from "node:perf_hooks";
import type { PaperDocument } from "@/lib/domain/views";
import { renderPaper } from "@/lib/pdf/render";
import { WorkerPool } from "@/lib/workers/pool";
import { booklet, packList, paperCamp, PEOPLE, pitchCard } from "../integration/pdf/fixture";

type Report = (row: { name: string; value: string; target?: string }) => void;

const ROUNDS = 5;
const ROOT = process.cwd();

/** A booklet of at least ten pages: two camps with two shelters each, and pack lists. */
function tenPages(): PaperDocument {
  const camp = paperCamp([
    { kind: "ridge-tarp", sleepers: PEOPLE.slice(0, 3) },
    { kind: "half-pyramid", headingDeg: 90, sleepers: PEOPLE.slice(3, 5) },
  ]);
  return booklet([camp], PEOPLE.slice(0, 3).map(packList));
}

async function medianMs(task: () => Promise<unknown>): Promise<number> {
  const times: number[] = [];
  for (let round = 0; round < ROUNDS; round += 1) {
    const start = performance.now();
    await task();
    times.push(performance.now() - start);
  }
  return times.sort((a, b) => a - b)[Math.floor(ROUNDS / 2)] ?? 0;
}

function pagesIn(pdf: Uint8Array): number {
  return (
    Buffer.from(pdf)
      .toString("latin1")
      .match(/\/Type \/Page\b/g)?.length ?? 0
  );
}

/** Longest and 99th percentile hold-up of this thread while a task runs, ms. */
async function holdUp(task: () => Promise<unknown>): Promise<{ p99: number; max: number }> {
  const monitor = monitorEventLoopDelay({ resolution: 5 });
  await new Promise((resolve) => setTimeout(resolve, 50));
  monitor.enable();
  await task();
  await new Promise((resolve) => setTimeout(resolve, 50));
  monitor.disable();
  return { p99: monitor.percentile(99) / 1e6, max: monitor.max / 1e6 };
}

export default async function benchPdf(report: Report): Promise<void> {
  const card = pitchCard("ridge-tarp");
  const document = tenPages();
  const ms = (value: number) => `${value.toFixed(0)} ms`;

  const coldStart = performance.now();
  const first = await renderPaper(card, { size: "A4" });
  report({
    name: `pitch card, first one of the process, ${pagesIn(first)} page(s)`,
    value: ms(performance.now() - coldStart),
  });
  report({
    name: "pitch card, warm, median",
    value: ms(await medianMs(() => renderPaper(card, { size: "A4" }))),
    target: "≤ 150 ms",
  });
  const whole = await renderPaper(document, { size: "A4" });
  report({
    name: `booklet of ${pagesIn(whole)} pages, ${(whole.length / 1024).toFixed(0)} kB, median`,
    value: ms(await medianMs(() => renderPaper(document, { size: "A4" }))),
    target: "< 1500 ms",
  });
  const here = await holdUp(() => renderPaper(document, { size: "A4" }));
  report({ name: "event loop held up by a booklet in this thread, longest", value: ms(here.max) });

  const folder = mkdtempSync(path.join(tmpdir(), "leestead-bench-"));
  try {
    execFileSync(process.execPath, [path.join(ROOT, "lib/workers/build.mjs")], {
      cwd: ROOT,
      env: { ...process.env, WORKERS_OUT: path.relative(ROOT, folder) },
      stdio: "ignore",
    });
    symlinkSync(path.join(ROOT, "node_modules"), path.join(folder, "node_modules"));
    const pool = new WorkerPool(path.join(folder, "pdf.mjs"), {
      threads: 1,
      timeoutMs: 60_000,
      maxWaiting: 10,
      memoryMb: 512,
    });
    const render = () => pool.run({ papers: [document], options: { size: "A4" } });
    await render();
    report({ name: "the same booklet in a worker, median", value: ms(await medianMs(render)), target: "< 1500 ms" });
    const worker = await holdUp(render);
    report({ name: "event loop held up meanwhile, p99", value: `${worker.p99.toFixed(1)} ms`, target: "≤ 50 ms" });
    report({ name: "event loop held up meanwhile, longest", value: `${worker.max.toFixed(1)} ms` });
    await pool.close();
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
