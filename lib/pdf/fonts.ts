import { existsSync, readFileSync } from "node:fs";
import { createRequire } from "node:module";
import path from "node:path";
import { Font } from "@react-pdf/renderer";
import { markPostscriptName, unpackWoff } from "./woff";

/** Each file of the family holds one subset of letters; a text takes each letter from the first that has it. */
const SUBSETS = ["latin", "latin-ext", "cyrillic", "cyrillic-ext", "vietnamese"] as const;
const WEIGHTS = [400, 600, 800] as const;
export type FontWeight = (typeof WEIGHTS)[number];

export const FONT_STACK: string[] = SUBSETS.map((subset) => `Nunito Sans ${subset}`);

const PACKAGE = "@fontsource/nunito-sans/package.json";

/** Beside the bundle when bundled, beside the source in tests; the working directory when a bundler moved both. */
function findFontFolder(): string {
  for (const base of [import.meta.url, path.join(process.cwd(), "package.json")]) {
    try {
      const folder = path.join(path.dirname(createRequire(base).resolve(PACKAGE)), "files");
      if (existsSync(folder)) return folder;
    } catch {
      continue;
    }
  }
  throw new Error("The fonts of the papers are missing: run npm install.");
}

function readFont(file: string, mark: string): string {
  const font = unpackWoff(readFileSync(file));
  markPostscriptName(font, mark);
  return `data:font/ttf;base64,${font.toString("base64")}`;
}

let isRegistered = false;

/** woff, not woff2: with woff2 the text is there but cannot be seen. */
export function registerFonts(): void {
  if (isRegistered) return;
  const folder = findFontFolder();
  for (const [index, subset] of SUBSETS.entries()) {
    Font.register({
      family: `Nunito Sans ${subset}`,
      fonts: WEIGHTS.map((fontWeight) => ({
        src: readFont(path.join(folder, `nunito-sans-${subset}-${fontWeight}-normal.woff`), "NOPQR".charAt(index)),
        fontWeight,
      })),
    });
  }
  Font.registerHyphenationCallback((word) => [word]);
  isRegistered = true;
}
