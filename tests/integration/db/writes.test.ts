import { databaseFile } from "../../helpers/database";
import { makeTrip, makeUser } from "../../helpers/actors";
import { createClient } from "@libsql/client";
import { eq, sql } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { getDb, withTransaction } from "@/db/client";
import { isMigrated } from "@/db/migrate-database";
import { serialiseWrites } from "@/db/serialise-writes";
import { outboxFile, trip } from "@/db/schema";
import { AppError } from "@/lib/errors";
import { newId } from "@/lib/domain/ids";

const versionOf = async (id: string) =>
  (await getDb().select({ version: trip.version }).from(trip).where(eq(trip.id, id)))[0]?.version;

async function addOne(id: string, pauseMs: number): Promise<void> {
  await withTransaction(async (tx) => {
    const [row] = await tx.select({ version: trip.version }).from(trip).where(eq(trip.id, id));
    await new Promise((resolve) => setTimeout(resolve, pauseMs));
    await tx
      .update(trip)
      .set({ version: (row?.version ?? 0) + 1 })
      .where(eq(trip.id, id));
  });
}

describe("writes", () => {
  it("loses none of 50 concurrent read-then-write transactions", async () => {
    const id = await makeTrip({ version: 0 });
    const others = Array.from({ length: 20 }, () => makeUser());
    await Promise.all([...Array.from({ length: 50 }, () => addOne(id, 1)), ...others]);
    expect(await versionOf(id)).toBe(50);
  });

  it("takes back everything of a transaction that fails", async () => {
    const id = await makeTrip({ version: 0 });
    await expect(
      withTransaction(async (tx) => {
        await tx.update(trip).set({ version: 9 }).where(eq(trip.id, id));
        throw new Error("half-way");
      }),
    ).rejects.toThrow("half-way");
    expect(await versionOf(id)).toBe(0);
    await addOne(id, 0);
    expect(await versionOf(id)).toBe(1);
  });

  it("says so instead of waiting for ever when a transaction is opened inside one", async () => {
    await expect(withTransaction(() => withTransaction(async () => 1))).rejects.toThrow("use its tx");
  });

  it("lets others on when a transaction was forgotten", async () => {
    const client = serialiseWrites(createClient({ url: `file:${databaseFile}`, timeout: 1000 }), { maxHoldMs: 30 });
    const forgotten = await client.transaction("write");
    const id = await makeTripWith(client);
    expect(forgotten.closed).toBe(true);
    expect(await versionOf(id)).toBe(1);
    client.close();
  });

  it("refuses with a sentence while another program holds the file, and works again afterwards", async () => {
    const id = await makeTrip({ version: 0 });
    const outside = createClient({ url: `file:${databaseFile}` });
    await getDb().run(sql`pragma busy_timeout = 50`);
    const held = await outside.transaction("write");
    const refused = await addOne(id, 0).catch((error: unknown) => error);
    expect(refused).toBeInstanceOf(AppError);
    expect(refused).toMatchObject({ code: "unavailable", status: 503 });
    held.close();
    outside.close();
    await Promise.all(Array.from({ length: 20 }, () => addOne(id, 0)));
    expect(await versionOf(id)).toBe(20);
  }, 30_000);
});

async function makeTripWith(client: ReturnType<typeof createClient>): Promise<string> {
  const id = newId();
  await client.execute({
    sql: "insert into trip (id, name, start_date, time_zone, created_at, updated_at) values (?, 'T', '2027-01-01', 'UTC', 0, 0)",
    args: [id],
  });
  return id;
}

describe("the file", () => {
  it("is in WAL mode, sound, and has the newest migration", async () => {
    const db = getDb();
    expect(await db.all(sql`pragma journal_mode`)).toEqual([{ journal_mode: "wal" }]);
    expect(await db.all(sql`pragma synchronous`)).toEqual([{ synchronous: 2 }]);
    expect(await db.all(sql`pragma foreign_keys`)).toEqual([{ foreign_keys: 1 }]);
    expect(await db.all(sql`pragma integrity_check`)).toEqual([{ integrity_check: "ok" }]);
    expect(await db.all(sql`pragma foreign_key_check`)).toEqual([]);
    expect(await isMigrated(db)).toBe(true);
  });

  it("gives back the bytes of small and large files", async () => {
    for (const size of [0, 1, 5, 5000, 300_000]) {
      const id = newId();
      const content = Buffer.from(Uint8Array.from({ length: size }, (_, index) => index % 251));
      await getDb().insert(outboxFile).values({ id, content, createdAt: new Date() });
      const [row] = await getDb().select().from(outboxFile).where(eq(outboxFile.id, id));
      expect(Buffer.compare(row?.content ?? Buffer.from("x"), content)).toBe(0);
    }
  });
});
