import { eq } from "drizzle-orm";
import { createHash } from "node:crypto";
import { getDb } from "@/db/client";
import { requestQuota } from "@/db/schema";
import { AppError } from "@/lib/errors";
import { consumeQuota, QUOTAS } from "./consume-quota";

const RULE = QUOTAS["sign-in-failure"];

/** The address itself is not kept: it may be one that has no account. */
const whoOf = (email: string) => createHash("sha256").update(email.trim().toLowerCase()).digest("hex");

/** Seconds until the account may be tried again, or null when it may be now: holds whatever address the tries come from. */
export async function findSignInPause(email: string): Promise<number | null> {
  const key = `sign-in-failure:${whoOf(email)}`;
  const [row] = await getDb().select().from(requestQuota).where(eq(requestQuota.key, key)).limit(1);
  if (!row || row.count < RULE.max) return null;
  const leftMs = row.windowStart.getTime() + RULE.windowS * 1000 - Date.now();
  return leftMs > 0 ? Math.ceil(leftMs / 1000) : null;
}

export async function countSignInFailure(email: string): Promise<void> {
  try {
    await consumeQuota("sign-in-failure", whoOf(email));
  } catch (error) {
    if (!(error instanceof AppError && error.code === "too-many")) throw error;
  }
}

export async function forgetSignInFailures(email: string): Promise<void> {
  await getDb()
    .delete(requestQuota)
    .where(eq(requestQuota.key, `sign-in-failure:${whoOf(email)}`));
}
