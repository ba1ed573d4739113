import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync, symlinkSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { monitorEventLoopDelay, performance } from "node:perf_hooks";
import { measureFile } from "@/lib/gpx/measure-line";
import { readGpx } from "@/lib/gpx/read-gpx";
import { measureGpx, type GpxAnswer } from "@/lib/workers/gpx-task";
import { WorkerPool } from "@/lib/workers/pool";

type Report = (row: { name: string; value: string; target?: string }) => void;

const ROUNDS = 5;
const POINTS = 50_000;
const ROOT = process.cwd();

/** Ten megabytes as a device writes them: heights, times and extensions at every point. */
function bigFile(): Uint8Array {
  const points = Array.from({ length: POINTS }, (_, index) => {
    const latitude = (60 + index * 1e-5 + Math.sin(index / 7) * 1e-5).toFixed(14);
    const longitude = (8 + Math.sin(index / 900) * 0.1).toFixed(14);
    const height = (500 + 300 * Math.sin(index / 800) + Math.sin(index)).toFixed(6);
    const more = "<extensions><a:TrackPoint><a:hr>123</a:hr><a:cad>60</a:cad></a:TrackPoint></extensions>";
    return `<trkpt lat="${latitude}" lon="${longitude}"><ele>${height}</ele><time>2026-06-14T10:00:00Z</time>${more}</trkpt>`;
  });
  const open = '<gpx version="1.1" xmlns="http://www.topografix.com/GPX/1/1" xmlns:a="urn:a"><trk><trkseg>';
  return new TextEncoder().encode(`${open}\n${points.join("\n")}\n</trkseg></trk></gpx>`);
}

async function medianMs(task: () => unknown): Promise<number> {
  const times: number[] = [];
  for (let round = 0; round < ROUNDS; round += 1) {
    const start = performance.now();
    await task();
    times.push(performance.now() - start);
  }
  return times.sort((a, b) => a - b)[Math.floor(ROUNDS / 2)] ?? 0;
}

const ms = (value: number) => `${value.toFixed(0)} ms`;

async function inWorker(bytes: Uint8Array, report: Report): Promise<void> {
  const folder = mkdtempSync(path.join(tmpdir(), "leestead-bench-"));
  try {
    execFileSync(process.execPath, [path.join(ROOT, "lib/workers/build.mjs")], {
      cwd: ROOT,
      env: { ...process.env, WORKERS_OUT: path.relative(ROOT, folder) },
      stdio: "ignore",
    });
    symlinkSync(path.join(ROOT, "node_modules"), path.join(folder, "node_modules"));
    const script = path.join(folder, "gpx.mjs");
    const pool = new WorkerPool(script, { threads: 1, timeoutMs: 60_000, maxWaiting: 4, memoryMb: 384 });
    const read = async () => (await pool.run(bytes)) as GpxAnswer;
    await read();
    report({
      name: "the same in a worker, there and back, median",
      value: ms(await medianMs(read)),
      target: "≤ 1000 ms",
    });
    const monitor = monitorEventLoopDelay({ resolution: 5 });
    monitor.enable();
    await read();
    monitor.disable();
    report({ name: "event loop held up meanwhile, longest", value: ms(monitor.max / 1e6) });
    report({ name: "event loop held up meanwhile, p99", value: ms(monitor.percentile(99) / 1e6), target: "≤ 50 ms" });
    await pool.close();
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

export default async function benchGpx(report: Report): Promise<void> {
  const bytes = bigFile();
  const size = `${(bytes.length / 1e6).toFixed(1)} MB, ${POINTS} points`;
  const file = readGpx(bytes);
  report({ name: `${size}: read, median`, value: ms(await medianMs(() => readGpx(bytes))) });
  report({ name: "measured, simplified and smoothed, median", value: ms(await medianMs(() => measureFile(file))) });
  report({ name: "both, median", value: ms(await medianMs(() => measureGpx(bytes))), target: "≤ 1000 ms" });
  const { simplified } = measureFile(file);
  report({ name: "points of the simplified line", value: String(simplified.flat().length), target: "≤ 2000" });
  await inWorker(bytes, report);
}
