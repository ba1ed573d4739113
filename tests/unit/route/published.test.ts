import { describe, expect, it } from "vitest";
import { PUBLISHED_ROUTE_CASES } from "../../fixtures/published-cases-route";

describe.each(PUBLISHED_ROUTE_CASES)("$what", (row) => {
  it(`is ${row.published} ${row.unit} (${row.source})`, () => {
    const ours = row.ours();
    expect(Number.isFinite(ours)).toBe(true);
    expect(Math.abs(ours - row.published), `ours ${ours}; tolerance: ${row.reason}`).toBeLessThanOrEqual(
      row.tolerance + 1e-12,
    );
  });
});

it("every case has its own id", () => {
  expect(new Set(PUBLISHED_ROUTE_CASES.map((row) => row.id)).size).toBe(PUBLISHED_ROUTE_CASES.length);
});
