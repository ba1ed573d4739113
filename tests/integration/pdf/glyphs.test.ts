import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { hasGlyph, printable } from "@/lib/pdf/glyphs";
import { layLines, textWidth } from "@/lib/pdf/measure";
import { unpackWoff } from "@/lib/pdf/woff";

/** Code points of a font's format 4 character map (OpenType, table `cmap`). */
function codePointsOf(font: Buffer): number[] {
  const entry = Array.from({ length: font.readUInt16BE(4) }, (_, i) => 12 + i * 16).find(
    (at) => font.toString("latin1", at, at + 4) === "cmap",
  );
  if (entry === undefined) throw new Error("The font has no character map.");
  const table = font.readUInt32BE(entry + 8);
  const found = new Set<number>();
  for (let i = 0; i < font.readUInt16BE(table + 2); i += 1) {
    const map = table + font.readUInt32BE(table + 4 + i * 8 + 4);
    if (font.readUInt16BE(map) !== 4) continue;
    const segments = font.readUInt16BE(map + 6) / 2;
    for (let segment = 0; segment < segments; segment += 1) {
      const end = font.readUInt16BE(map + 14 + segment * 2);
      const start = font.readUInt16BE(map + 16 + segments * 2 + segment * 2);
      for (let code = start; code <= end && code < 0xffff; code += 1) found.add(code);
    }
  }
  return [...found];
}

test.each([400, 600, 800])("what is taken for covered is in the font files of weight %i", (weight) => {
  const inFonts = new Set(
    ["latin", "latin-ext", "cyrillic", "cyrillic-ext", "vietnamese"].flatMap((subset) =>
      codePointsOf(
        unpackWoff(
          readFileSync(`node_modules/@fontsource/nunito-sans/files/nunito-sans-${subset}-${weight}-normal.woff`),
        ),
      ),
    ),
  );
  const missing: string[] = [];
  for (let code = 0x20; code < 0x3000; code += 1) {
    const character = String.fromCodePoint(code);
    if (hasGlyph(character) && !inFonts.has(code)) missing.push(`${character} U+${code.toString(16)}`);
  }
  expect(inFonts.size).toBeGreaterThan(800);
  expect(missing).toEqual([]);
});

describe("printable", () => {
  test.each([
    ["Łódź Żółć", "Łódź Żółć"],
    ["Żo\u0308e", "Żöe"],
    ["Ελένη Παπαδοπούλου", "Eleni Papadopoulou"],
    ["Μπάμπης", "Mpampis"],
    ["ﬁve Ⅳ ①", "five IV 1"],
    ["山田", "[?]"],
    ["a\u202Eb\u0000c\u200Fd", "abcd"],
    ["tab\tand\r\nline", "tab and\nline"],
    ["5 ≤ 6 → 7", "5 <= 6 -> 7"],
    ["👩‍👩‍👧 x", "[?] x"],
    ["\uD800", ""],
  ])("%j becomes %j", (text, expected) => {
    expect(printable(text)).toBe(expected);
  });

  test("whatever goes in, only letters of the fonts come out", () => {
    let all = "";
    for (let code = 0x20; code < 0x3000; code += 1) all += String.fromCodePoint(code);
    for (const character of printable(all)) expect(character === "\n" || hasGlyph(character)).toBe(true);
  });
});

describe("layLines", () => {
  test("no line is wider than its column, no word is lost", () => {
    const text = "Tighten the lines after the first ten strong gusts " + "W".repeat(90) + " and again.";
    const lines = layLines(text, 120, 10);
    for (const line of lines) expect(textWidth(line, 10)).toBeLessThanOrEqual(120);
    expect(lines.join("").replaceAll(" ", "")).toBe(text.replaceAll(" ", ""));
  });

  test("a long address is cut after a sign that joins its parts", () => {
    expect(layLines("leestead.example/trips/abcdefgh", 120, 10)[0]).toBe("leestead.example/trips/");
  });
});
