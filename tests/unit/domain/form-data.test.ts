import { describe, expect, it } from "vitest";
import { readDecimal, readFormData } from "@/lib/domain/form-data";

function read(...entries: readonly (readonly [string, string])[]) {
  const form = new FormData();
  for (const [name, value] of entries) form.append(name, value);
  return readFormData(form);
}

describe("a form", () => {
  it("is read by the suffixes of its names", () => {
    const input = read(
      ["name", " Otter Flat "],
      ["details.altitudeM:number", "1 250,5"],
      ["details.slopeDeg:number", ""],
      ["hasRocks:boolean", "on"],
      ["hasTrees:boolean", "false"],
      ["patch:nullable", ""],
      ["ids:json", '["a","b"]'],
      ["contacts.0.name", "Ada"],
      ["contacts.1.name", "Bo"],
      ["$ACTION_ID_123", "ours"],
    );
    expect(input).toEqual({
      name: " Otter Flat ",
      details: { altitudeM: 1250.5, slopeDeg: null },
      hasRocks: true,
      hasTrees: false,
      patch: null,
      ids: ["a", "b"],
      contacts: [{ name: "Ada" }, { name: "Bo" }],
    });
  });

  it("gives a number that is none to the schema as it was typed", () => {
    for (const text of ["NaN", "Infinity", "0x10", "1e308", "1e3", "--1", "1.2.3", "١٢", "one", "+", "."]) {
      expect(readDecimal(text)).toBe(text);
    }
    expect([readDecimal("-1"), readDecimal("\u22121,5"), readDecimal(".5"), readDecimal("5.")]).toEqual([
      -1, -1.5, 0.5, 5,
    ]);
    expect(readDecimal("9007199254740993")).toBe(9007199254740992);
  });

  it("does not weigh a text of a million digits: it is none of ours", () => {
    for (const text of ["1".repeat(1e6), `${"1".repeat(1e6)}x`, " ".repeat(1e6), `-${"9".repeat(400)}`]) {
      expect(readDecimal(text)).toBe(text);
    }
  });

  it("has names that can't reach what every object has", () => {
    const input = read(
      ["__proto__.polluted", "yes"],
      ["constructor.prototype.polluted", "yes"],
      ["details.__proto__.polluted", "yes"],
      ["a:json", '{"__proto__":{"polluted":"yes"}}'],
      ["a.toString.polluted", "yes"],
      ["toString", "mine"],
    );
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
    expect(Object.getPrototypeOf(input)).toBe(Object.prototype);
    expect(input.toString).toBe("mine");
  });

  it("lets no other field reach into what came as JSON, above all not into the length of a list", () => {
    const input = read(
      ["sleepers:json", "[]"],
      ["sleepers.length:number", "4000000000"],
      ["items:json", '["a"]'],
      ["items.3999999999", "x"],
      ["negative:json", "[]"],
      ["negative.length:number", "-1"],
    );
    expect(input).toEqual({
      sleepers: { length: 4_000_000_000 },
      items: { "3999999999": "x" },
      negative: { length: -1 },
    });
  });

  it("has no depth that would be too much, in its names or in its JSON", () => {
    const deep = `${'{"a":'.repeat(20_000)}1${"}".repeat(20_000)}`;
    const input = read(["a.".repeat(100_000) + "a", "x"], ["deep:json", deep], ["b.c", "kept"]);
    expect(Object.keys(input).sort()).toEqual(["b", "deep"]);
    expect(input.b).toEqual({ c: "kept" });
  });
});
