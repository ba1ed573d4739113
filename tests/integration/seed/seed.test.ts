import "../../helpers/database";
import { count, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { Browser } from "../../helpers/browser";
import { getDb } from "@/db/client";
import { DEMO_PASSWORD } from "@/db/demo/people";
import { seedDemo, type SeedReport } from "@/db/demo/seed-demo";
import { outboxMessage, person, trip, user } from "@/db/schema";
import { readContext } from "@/lib/auth/session";
import { getSleepingPlan } from "@/lib/services/sleepers/get-sleeping-plan";
import { getTripOverview } from "@/lib/services/trips/get-trip-overview";

let report: SeedReport | null;

async function countRows() {
  const tables = [user, trip, person, outboxMessage];
  return Promise.all(tables.map(async (table) => (await getDb().select({ rows: count() }).from(table))[0]?.rows));
}

beforeAll(async () => {
  report = await seedDemo();
}, 120_000);

describe("the demo data", () => {
  it("is a trip of five nights that everybody can look at", async () => {
    const email = "runa@leestead.example";
    const browser = new Browser();
    expect((await browser.call("/sign-in/email", { email, password: DEMO_PASSWORD })).status).toBe(200);
    const ctx = await readContext(browser.headers());
    if (!ctx) throw new Error("The leader can't sign in.");
    const tripId = report?.tripIds[0] ?? "";
    const overview = await getTripOverview({ ctx, input: { tripId } });
    expect(overview.peopleCount).toBe(8);
    expect(overview.camps.flatMap((camp) => camp.days)).toHaveLength(5);
    expect(new Set(overview.camps.map((camp) => camp.groundName)).size).toBeGreaterThanOrEqual(3);
    expect(overview.camps.every((camp) => camp.gaps.length === 0)).toBe(true);
    const byVerdict = (verdict: string) => overview.camps.filter((camp) => camp.verdict === verdict).length;
    expect(byVerdict("holds")).toBeGreaterThanOrEqual(2);
    expect(byVerdict("gives-way") + byVerdict("thin")).toBeGreaterThanOrEqual(1);
    expect(overview.todo[0]?.action).toMatch(/→ \d+/);
    for (const { id } of overview.camps) {
      const plan = await getSleepingPlan({ ctx, input: { tripId, campId: id } });
      expect(plan.unplacedIds).toEqual([]);
      expect(plan.pitches).toHaveLength(4);
    }
  });

  it("is never put over what is there", async () => {
    const before = await countRows();
    expect(await seedDemo()).toBeNull();
    expect(await countRows()).toEqual(before);
  });

  it("sends no mail that asks for a confirmation", async () => {
    const rows = await getDb().select().from(outboxMessage).where(eq(outboxMessage.kind, "verification"));
    expect(rows).toEqual([]);
  });
});
