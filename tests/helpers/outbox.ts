import "./database";
import { asc, eq } from "drizzle-orm";
import { getDb } from "@/db/client";
import { outboxMessage, rateLimit, requestQuota } from "@/db/schema";

/** What waits for somebody, oldest first. */
export async function readOutbox(address: string) {
  return getDb()
    .select()
    .from(outboxMessage)
    .where(eq(outboxMessage.toAddress, address))
    .orderBy(asc(outboxMessage.createdAt), asc(outboxMessage.id));
}

/** The value of `name` in the newest link to somebody: ?token=… or the last part of the path. */
export async function readLinkToken(address: string): Promise<string> {
  const text = (await readOutbox(address)).at(-1)?.text ?? "";
  const token = /[?&]token=([^\s&]+)/.exec(text)?.[1] ?? /\/invitation\/([A-Za-z0-9_-]+)/.exec(text)?.[1];
  if (!token) throw new Error(`No link to ${address}`);
  return decodeURIComponent(token);
}

export async function clearLimits(): Promise<void> {
  await getDb().delete(rateLimit);
  await getDb().delete(requestQuota);
}
