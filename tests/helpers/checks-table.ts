/**
 * The table of published checks in DEVELOPERS.md, written from the rows that the tests run:
 * `npx tsx tests/helpers/checks-table.ts` writes it, a unit test says when it is out of date.
 */
import { readFileSync, writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { PUBLISHED_CASES } from "../fixtures/published-cases";
import { PUBLISHED_LEARNING_CASES } from "../fixtures/published-cases-learning";
import { PUBLISHED_ROUTE_CASES } from "../fixtures/published-cases-route";
import { PUBLISHED_STRUCTURE_CASES } from "../fixtures/published-cases-structure";
import { PUBLISHED_WEATHER_CASES } from "../fixtures/published-cases-weather";

const FILE = fileURLToPath(new URL("../../DEVELOPERS.md", import.meta.url));
const START = "<!-- checks: written by tests/helpers/checks-table.ts -->\n<!-- prettier-ignore-start -->\n";
const END = "<!-- prettier-ignore-end -->\n";

function figure(value: number): string {
  return String(Number(value.toPrecision(5)));
}

function difference(published: number, ours: number): string {
  if (published === 0) return figure(ours);
  return `${((ours / published - 1) * 100).toFixed(1).replace("-0.0", "0.0")} %`;
}

function cell(text: string): string {
  return text.replaceAll("|", "\\|").replaceAll("\n", " ");
}

export function checksTable(): string {
  const rows = [
    ...PUBLISHED_CASES,
    ...PUBLISHED_STRUCTURE_CASES,
    ...PUBLISHED_LEARNING_CASES,
    ...PUBLISHED_WEATHER_CASES,
    ...PUBLISHED_ROUTE_CASES,
  ].map((row) => {
    const ours = row.ours();
    const numbers = [`${figure(row.published)} ${row.unit}`, figure(ours), difference(row.published, ours)];
    return `| ${[row.section, row.what, row.source, ...numbers].map((text) => cell(text.trim())).join(" | ")} |`;
  });
  const head = "| about | check | source | published | ours | difference |\n| --- | --- | --- | --- | --- | --- |";
  return `${[head, ...rows].join("\n")}\n`;
}

/** DEVELOPERS.md as it should read. */
export function withChecksTable(text: string): string {
  const from = text.indexOf(START);
  const to = text.indexOf(END, from);
  if (from < 0 || to < 0) throw new Error("DEVELOPERS.md has lost the marks around its table of checks.");
  return `${text.slice(0, from + START.length)}${checksTable()}${text.slice(to)}`;
}

export function readDevelopers(): string {
  return readFileSync(FILE, "utf8");
}

if (process.argv[1] === fileURLToPath(import.meta.url)) writeFileSync(FILE, withChecksTable(readDevelopers()));
