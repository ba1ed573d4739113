import fc from "fast-check";

/** One seed for all: what is tried today is what is tried tomorrow. */
export const SEED = 20_270_607;

const MILLION = "x".repeat(1e6);

/** What a client can put where something else is expected. */
export const HOSTILE: readonly unknown[] = [
  null,
  true,
  "",
  " ",
  "NaN",
  "Infinity",
  "0x10",
  "-1",
  "undefined",
  "__proto__",
  "constructor",
  "' OR 1=1--",
  "../../etc/passwd",
  "a\u0000b",
  "\u202Ereversed",
  "\uD800",
  "ada@example.test\r\nBcc: eve@example.test",
  "<img src=x onerror=alert(1)>",
  MILLION,
  "9".repeat(400),
  0,
  -1,
  -0.5,
  1.5,
  1e308,
  -1e308,
  9007199254740993,
  2 ** 31,
  [],
  [null],
  [[[[]]]],
  {},
  { length: 4_000_000_000 },
  { toString: 1, valueOf: 1 },
  { kind: "__proto__" },
  JSON.parse('{"__proto__":{"polluted":true},"constructor":{"prototype":{"polluted":true}}}') as unknown,
];

type Path = readonly (string | number)[];

/** Every place in a value, the value itself left out. */
export function listPaths(value: unknown, at: Path = []): Path[] {
  if (typeof value !== "object" || value === null) return [];
  return Object.entries(value).flatMap(([key, one]) => {
    const path = [...at, Array.isArray(value) ? Number(key) : key];
    return [path, ...listPaths(one, path)];
  });
}

export const MISSING = Symbol("missing");

/** A copy with something else at one place, or without it. */
export function replaceAt(value: unknown, [key, ...rest]: Path, replacement: unknown): unknown {
  if (key === undefined) return replacement;
  if (Array.isArray(value)) {
    const copy = [...(value as unknown[])];
    if (rest.length === 0 && replacement === MISSING) copy.splice(Number(key), 1);
    else copy[Number(key)] = replaceAt(copy[Number(key)], rest, replacement);
    return copy;
  }
  const entries = Object.entries(value as object);
  if (rest.length === 0 && replacement === MISSING) return Object.fromEntries(entries.filter(([one]) => one !== key));
  return Object.fromEntries(entries.map(([one, it]) => [one, one === key ? replaceAt(it, rest, replacement) : it]));
}

/** A valid body with one or two places spoilt. */
export function spoilt(valid: object): fc.Arbitrary<unknown> {
  const paths = listPaths(valid);
  const change = fc.record({
    path: fc.constantFrom(...paths),
    value: fc.oneof(
      { weight: 4, arbitrary: fc.constantFrom<unknown>(...HOSTILE) },
      { weight: 1, arbitrary: fc.constant<unknown>(MISSING) },
      { weight: 1, arbitrary: fc.double() },
      { weight: 1, arbitrary: fc.jsonValue({ maxDepth: 3 }) },
    ),
  });
  return fc.array(change, { minLength: 1, maxLength: 2 }).map((changes) =>
    changes.reduce<unknown>((body, { path, value }) => {
      try {
        return replaceAt(body, path, value);
      } catch {
        // The first change has taken away where the second would be.
        return body;
      }
    }, valid),
  );
}
