import { testFolder } from "../../helpers/database";
import path from "node:path";
import { eq } from "drizzle-orm";
import { afterAll, describe, expect, it } from "vitest";
import { makeTrip, makeUser } from "../../helpers/actors";
import { codeOf } from "../../helpers/refusals";
import { startRemoteDatabase } from "../../helpers/remote-database";
import { closeDb, getDb, toFilePath, withTransaction } from "@/db/client";
import { isMigrated, migrateDatabase } from "@/db/migrate-database";
import { trip } from "@/db/schema";
import { createTrip } from "@/lib/services/trips/create-trip";
import { getTrip } from "@/lib/services/trips/get-trip";
import { listTrips } from "@/lib/services/trips/list-trips";

const TOKEN = "a-token-of-the-tests";
const server = await startRemoteDatabase(path.join(testFolder, "remote.db"), TOKEN);
// Read when the database is first opened.
process.env.DATABASE_URL = server.url;
process.env.DATABASE_AUTH_TOKEN = TOKEN;

afterAll(async () => {
  await closeDb();
  await server.stop();
});

/** The same code as on a file, over a protocol of its own; nothing but the two settings differs. */
describe("a database on another machine", () => {
  it("is reached by its libsql:// address with the token, and migrated", async () => {
    expect(toFilePath(server.url)).toBeNull();
    expect(await isMigrated(getDb())).toBe(false);
    await migrateDatabase(getDb());
    expect(await isMigrated(getDb())).toBe(true);
    expect(server.seen.refused).toBe(0);
    expect(server.seen.answered).toBeGreaterThan(0);
  });

  it("serves the services: trips are created, listed and kept from strangers", async () => {
    const [leader, stranger] = [await makeUser(), await makeUser()];
    const details = { name: "Over the wire", startDate: "2027-06-11", timeZone: "Europe/Oslo", notes: "" };
    const { tripId } = await createTrip({ ctx: leader.ctx, input: details });
    expect(await getTrip({ ctx: leader.ctx, input: { tripId } })).toMatchObject({ name: details.name, role: "leader" });
    expect((await listTrips({ ctx: leader.ctx })).map((one) => one.id)).toEqual([tripId]);
    expect(await codeOf(getTrip({ ctx: stranger.ctx, input: { tripId } }))).toBe("not-found");
  });

  it("takes back a transaction that fails, and loses none of 20 at once", async () => {
    const id = await makeTrip({ version: 0 });
    const versionOf = async () => (await getDb().select({ v: trip.version }).from(trip).where(eq(trip.id, id)))[0]?.v;
    await expect(
      withTransaction(async (tx) => {
        await tx.update(trip).set({ version: 9 }).where(eq(trip.id, id));
        throw new Error("half-way");
      }),
    ).rejects.toThrow("half-way");
    expect(await versionOf()).toBe(0);
    const addOne = () =>
      withTransaction(async (tx) => {
        const [row] = await tx.select({ v: trip.version }).from(trip).where(eq(trip.id, id));
        await tx
          .update(trip)
          .set({ version: (row?.v ?? 0) + 1 })
          .where(eq(trip.id, id));
      });
    await Promise.all(Array.from({ length: 20 }, addOne));
    expect(await versionOf()).toBe(20);
  });
});
