import { describe, expect, test } from "vitest";
import { hasGlyph, printable } from "@/lib/pdf/glyphs";
import { layLines, textWidth } from "@/lib/pdf/measure";

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
