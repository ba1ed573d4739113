import { afterAll, describe, expect, it } from "vitest";
import { PUBLISHED_CASES } from "../../fixtures/published-cases";

const checked = new Set<string>();

describe.each(PUBLISHED_CASES)("$section: $what", (row) => {
  it(`is ${row.published} ${row.unit} (${row.source})`, () => {
    checked.add(row.id);
    const ours = row.ours();
    expect(Number.isFinite(ours)).toBe(true);
    expect(Math.abs(ours - row.published), `ours ${ours}; tolerance: ${row.reason}`).toBeLessThanOrEqual(
      row.tolerance + 1e-12,
    );
  });
});

describe("the list of published cases", () => {
  it("has at least 150 of them, each with its own id, a source and a reason for its tolerance", () => {
    expect(PUBLISHED_CASES.length).toBeGreaterThanOrEqual(150);
    expect(new Set(PUBLISHED_CASES.map((row) => row.id)).size).toBe(PUBLISHED_CASES.length);
    for (const row of PUBLISHED_CASES) {
      expect(row.source).not.toBe("");
      expect(row.reason).not.toBe("");
    }
  });
});

afterAll(() => {
  const skipped = PUBLISHED_CASES.filter((row) => !checked.has(row.id)).map((row) => row.id);
  expect(skipped, "published cases that no test has run").toEqual([]);
});
