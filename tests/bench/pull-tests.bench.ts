import { execFileSync } from "node:child_process";
import path from "node:path";
import type { BenchRow } from "./run";

/** Tables of readings and the learning; measured in a process that loads services as the server does. */
export default async function benchPullTests(report: (row: BenchRow) => void): Promise<void> {
  const script = path.join(process.cwd(), "tests/bench/children/measure-pull-tests.ts");
  const tsx = path.join(process.cwd(), "node_modules/.bin/tsx");
  const lines = execFileSync(tsx, ["--conditions=react-server", script], { encoding: "utf8" }).trim().split("\n");
  for (const line of lines) report(JSON.parse(line) as BenchRow);
}
