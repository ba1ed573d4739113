import { expect, it } from "vitest";
import { readDevelopers, withChecksTable } from "../../helpers/checks-table";

it("DEVELOPERS.md shows every published check with our present value", () => {
  const text = readDevelopers();
  expect(text, "run npx tsx tests/helpers/checks-table.ts").toBe(withChecksTable(text));
});
