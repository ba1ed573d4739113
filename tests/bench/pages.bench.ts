import { performance } from "node:perf_hooks";
import { gzipSync } from "node:zlib";
import type { Bench } from "./run";
import { serveBare, serveProduct, signIn } from "./served/server";

const ROUNDS = 500;

async function html(url: string, cookie: string): Promise<string> {
  const response = await fetch(url, { headers: { cookie } });
  if (!response.ok) throw new Error(`${url} answered ${response.status}.`);
  return response.text();
}

/** Gzipped size, kB, of the scripts that a page names in its HTML, without those for old browsers only. */
async function firstLoadKb(page: string, origin: string): Promise<number> {
  const tags = [...page.matchAll(/<script\b[^>]*>/g)].map(([tag]) => tag).filter((tag) => !/\bnoModule\b/i.test(tag));
  const sources = new Set(tags.flatMap((tag) => /src="([^"]+)"/.exec(tag)?.[1] ?? []));
  let bytes = 0;
  for (const source of sources) {
    const body = await (await fetch(new URL(source.replaceAll("&amp;", "&"), origin))).arrayBuffer();
    bytes += gzipSync(Buffer.from(body)).length;
  }
  return bytes / 1000;
}

function p95(times: readonly number[]): number {
  return [...times].sort((a, b) => a - b)[Math.floor(times.length * 0.95)] ?? Number.NaN;
}

async function timed(url: string, cookie: string): Promise<number> {
  const start = performance.now();
  await html(url, cookie);
  return performance.now() - start;
}

/** First-load JavaScript and server time against a bare page of the same Next version, in one run. */
const bench: Bench = async (report) => {
  const product = await serveProduct(3291);
  const bare = await serveBare(3292);
  try {
    const cookie = await signIn(product.url, "runa@leestead.example");
    const list = await html(`${product.url}/trips`, cookie);
    const trip = /\/trips\/[0-9a-z]{20,}/.exec(list)?.[0];
    if (!trip) throw new Error("There is no trip in the demo data.");
    const overview = await html(`${product.url}${trip}`, cookie);
    const camp = /\/trips\/[0-9a-z]{20,}\/camps\/[0-9a-z]{20,}/.exec(overview)?.[0];
    if (!camp) throw new Error("There is no camp in the demo data.");

    const bareKb = await firstLoadKb(await html(bare.url, ""), bare.url);
    const boardKb = await firstLoadKb(await html(`${product.url}${camp}`, cookie), product.url);
    const readKb = await firstLoadKb(overview, product.url);
    report({ name: "bare page, JS", value: `${bareKb.toFixed(1)} kB gz` });
    report({
      name: "staking plan, first-load JS",
      value: `${boardKb.toFixed(1)} kB gz: bare + ${(boardKb - bareKb).toFixed(1)}`,
      target: "bare + 60 kB",
    });
    report({
      name: "trip overview, first-load JS",
      value: `${readKb.toFixed(1)} kB gz: bare + ${(readKb - bareKb).toFixed(1)}`,
      target: "bare + 25 kB",
    });

    const times = { bare: [] as number[], overview: [] as number[], list: [] as number[] };
    for (let round = -20; round < ROUNDS; round += 1) {
      const one = {
        bare: await timed(bare.url, ""),
        overview: await timed(`${product.url}${trip}`, cookie),
        list: await timed(`${product.url}/trips`, cookie),
      };
      if (round < 0) continue;
      times.bare.push(one.bare);
      times.overview.push(one.overview);
      times.list.push(one.list);
    }
    const base = p95(times.bare);
    report({ name: `bare page, p95 of ${ROUNDS}`, value: `${base.toFixed(1)} ms` });
    for (const [name, target] of [
      ["overview", "≤ 5 × bare"],
      ["list", "≤ 3 × bare"],
    ] as const) {
      const ms = p95(times[name]);
      report({ name: `${name}, p95`, value: `${ms.toFixed(1)} ms: ${(ms / base).toFixed(2)} ×`, target });
    }
  } finally {
    await product.stop();
    await bare.stop();
  }
};

export default bench;
