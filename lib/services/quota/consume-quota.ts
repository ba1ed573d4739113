import { eq, sql } from "drizzle-orm";
import { withTransaction } from "@/db/client";
import { requestQuota } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { AppError } from "@/lib/errors";

interface Rule {
  readonly max: number;
  readonly windowS: number;
  /** "at most 30 PDFs in ten minutes" */
  readonly sentence: string;
}

/** What costs much, per person. */
export const QUOTAS = {
  pdf: { max: 60, windowS: 600, sentence: "At most 60 pieces of paper in ten minutes." },
  gpx: { max: 40, windowS: 600, sentence: "At most 40 route files in ten minutes." },
  import: { max: 60, windowS: 600, sentence: "At most 60 tables in ten minutes." },
  mail: { max: 300, windowS: 3600, sentence: "At most 300 messages in an hour." },
  invitation: { max: 60, windowS: 3600, sentence: "At most 60 invitations in an hour." },
  forecast: { max: 120, windowS: 3600, sentence: "At most 120 forecasts in an hour." },
  "sign-in-failure": { max: 10, windowS: 900, sentence: "Too many wrong passwords for this account." },
} as const satisfies Record<string, Rule>;

export type QuotaKind = keyof typeof QUOTAS;

const keyOf = (kind: QuotaKind, who: string) => `${kind}:${who}`;

function refuse(rule: Rule, windowStart: Date, now: number): never {
  const retryAfterS = Math.max(1, Math.ceil((windowStart.getTime() + rule.windowS * 1000 - now) / 1000));
  throw new AppError("too-many", `${rule.sentence} Try again in ${Math.ceil(retryAfterS / 60)} min.`, { retryAfterS });
}

/** Counts `cost` for somebody, or refuses when it would pass the limit of the running window. */
export async function consumeQuota(kind: QuotaKind, who: string, cost = 1): Promise<void> {
  const rule: Rule = QUOTAS[kind];
  const key = keyOf(kind, who);
  await withTransaction(async (tx) => {
    const now = Date.now();
    const [row] = await tx.select().from(requestQuota).where(eq(requestQuota.key, key)).limit(1);
    const isOver = !row || now - row.windowStart.getTime() >= rule.windowS * 1000;
    const count = (isOver ? 0 : row.count) + cost;
    if (count > rule.max) refuse(rule, isOver ? new Date(now) : row.windowStart, now);
    const windowStart = isOver ? new Date(now) : row.windowStart;
    await tx
      .insert(requestQuota)
      .values({ id: newId(), key, windowStart, count })
      .onConflictDoUpdate({ target: requestQuota.key, set: { windowStart, count: sql`excluded.count` } });
  });
}
