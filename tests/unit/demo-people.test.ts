import { expect, it } from "vitest";
import { DEMO_PASSWORD, DEMO_PEOPLE, SECOND_LEADER } from "@/db/demo/people";
import demo from "@/lib/domain/demo/people.json";

it("the log-ins that the demo shows are those that the seed makes", () => {
  expect(demo.password).toBe(DEMO_PASSWORD);
  const seeded = new Map(
    [...DEMO_PEOPLE.filter((one) => one.hasAccount), SECOND_LEADER].map((one) => [one.email, one]),
  );
  for (const { email, name } of demo.people) expect(seeded.get(email)?.name).toBe(name);
});
