import { readdirSync } from "node:fs";
import os from "node:os";
import { fileURLToPath, pathToFileURL } from "node:url";
import packageJson from "../../package.json" with { type: "json" };

/** One measured figure; `target` says what it should be, as text. */
export interface BenchRow {
  readonly name: string;
  readonly value: string;
  readonly target?: string;
}

export type Bench = (report: (row: BenchRow) => void) => Promise<void>;

/**
 * Runs every *.bench.ts of this folder, or those whose name contains an argument, one after the other in this process,
 * and prints the machine and a table. Figures are for reading; nothing fails on them.
 */
async function run(): Promise<void> {
  const folder = fileURLToPath(new URL(".", import.meta.url));
  const wanted = process.argv.slice(2);
  const files = readdirSync(folder)
    .filter((file) => file.endsWith(".bench.ts"))
    .filter((file) => wanted.length === 0 || wanted.some((part) => file.includes(part)))
    .sort();
  const [cpu] = os.cpus();
  console.log(
    `${cpu?.model ?? "unknown processor"}, ${os.cpus().length} cores, ${Math.round(os.totalmem() / 2 ** 30)} GB`,
  );
  console.log(`Node ${process.version}, ${os.platform()} ${os.release()}, ${packageJson.name} ${packageJson.version}`);
  for (const file of files) {
    const rows: BenchRow[] = [];
    const loaded = (await import(pathToFileURL(`${folder}${file}`).href)) as { default: Bench };
    await loaded.default((row) => rows.push(row));
    printTable(file, rows);
  }
}

function printTable(title: string, rows: readonly BenchRow[]): void {
  const nameWidth = Math.max(title.length, ...rows.map((row) => row.name.length));
  const valueWidth = Math.max("measured".length, ...rows.map((row) => row.value.length));
  console.log(`\n${title.padEnd(nameWidth)}  ${"measured".padEnd(valueWidth)}  target`);
  for (const { name, value, target } of rows) {
    console.log(`${name.padEnd(nameWidth)}  ${value.padEnd(valueWidth)}  ${target ?? ""}`.trimEnd());
  }
}

await run();
