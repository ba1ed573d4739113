/**
 * Bundles every lib/workers/*.worker.ts into .next/workers/<name>.mjs, after `next build`.
 * Packages stay outside the bundle (they are loaded from node_modules), so fonts and wasm beside them are found.
 */
import { readdirSync } from "node:fs";
import { basename, join, resolve } from "node:path";
import { fileURLToPath } from "node:url";
import { build } from "esbuild";

const folder = fileURLToPath(new URL(".", import.meta.url));
const root = join(folder, "../..");
const entries = readdirSync(folder).filter((file) => /\.worker\.tsx?$/.test(file));

await build({
  absWorkingDir: root,
  entryPoints: entries.map((file) => ({
    in: join(folder, file),
    out: basename(file).replace(/\.worker\.tsx?$/, ""),
  })),
  outdir: resolve(root, process.env.WORKERS_OUT ?? ".next/workers"),
  outExtension: { ".js": ".mjs" },
  bundle: true,
  platform: "node",
  target: "node20",
  format: "esm",
  jsx: "automatic",
  packages: "external",
  alias: { "@": root },
  legalComments: "none",
  logLevel: "warning",
});
console.log(`workers: ${entries.map((file) => basename(file)).join(", ")}`);
