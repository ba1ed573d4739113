import { and, asc, eq, inArray, lt, lte, notExists, or, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/sqlite-core";
import { getDb, withTransaction } from "@/db/client";
import { outboxAttachment, outboxFile, outboxMessage } from "@/db/schema";
import type { MailTransport, OutgoingMail } from "@/lib/email/transport";
import { env } from "@/lib/env";
import { log } from "@/lib/log";
import { nextTryInMs } from "./retry-times";

const LEASE_MS = 120_000;
type Row = typeof outboxMessage.$inferSelect;

/** Takes the oldest message that is due for the time of a lease. A later one to the same person waits for it. */
async function claimNext(now: Date): Promise<Row | null> {
  return withTransaction(async (tx) => {
    const earlier = alias(outboxMessage, "earlier");
    const hasEarlier = tx
      .select({ one: sql`1` })
      .from(earlier)
      .where(
        and(
          eq(earlier.toAddress, outboxMessage.toAddress),
          inArray(earlier.state, ["waiting", "sending"]),
          or(
            lt(earlier.createdAt, outboxMessage.createdAt),
            and(eq(earlier.createdAt, outboxMessage.createdAt), lt(earlier.id, outboxMessage.id)),
          ),
        ),
      );
    const [row] = await tx
      .select()
      .from(outboxMessage)
      .where(
        and(
          or(
            and(eq(outboxMessage.state, "waiting"), lte(outboxMessage.nextAttemptAt, now)),
            and(eq(outboxMessage.state, "sending"), lt(outboxMessage.leaseUntil, now)),
          ),
          notExists(hasEarlier),
        ),
      )
      .orderBy(asc(outboxMessage.createdAt), asc(outboxMessage.id))
      .limit(1);
    if (!row) return null;
    const claim = {
      state: "sending" as const,
      attempts: row.attempts + 1,
      leaseUntil: new Date(now.getTime() + LEASE_MS),
    };
    await tx.update(outboxMessage).set(claim).where(eq(outboxMessage.id, row.id));
    return { ...row, ...claim };
  });
}

async function toOutgoing(row: Row): Promise<OutgoingMail> {
  const files = await getDb()
    .select({
      fileName: outboxAttachment.fileName,
      contentType: outboxAttachment.contentType,
      content: outboxFile.content,
    })
    .from(outboxAttachment)
    .innerJoin(outboxFile, eq(outboxFile.id, outboxAttachment.fileId))
    .where(eq(outboxAttachment.messageId, row.id))
    .orderBy(asc(outboxAttachment.position));
  return {
    from: { name: "Leestead", address: env.mailFrom },
    to: { name: row.toName, address: row.toAddress },
    replyTo: row.replyToAddress ? { name: row.replyToName ?? "", address: row.replyToAddress } : null,
    subject: row.subject,
    text: row.text,
    html: row.html,
    messageId: row.messageId,
    date: row.createdAt,
    files,
  };
}

function readFailure(error: unknown): { responseCode: number | null; sentence: string } {
  const code = error instanceof Error && "responseCode" in error ? error.responseCode : null;
  const responseCode = typeof code === "number" ? code : null;
  const answer = error instanceof Error && "response" in error ? error.response : null;
  const said = typeof answer === "string" ? answer.replace(/[\p{Cc}\s]+/gu, " ").slice(0, 200) : "";
  if (responseCode !== null) return { responseCode, sentence: `The mail server answered: ${said || responseCode}` };
  return { responseCode, sentence: "The mail server could not be reached." };
}

/** Only the holder of the lease writes the outcome. */
async function settle(row: Row, outcome: Partial<Row>): Promise<void> {
  await withTransaction(async (tx) => {
    await tx
      .update(outboxMessage)
      .set({ leaseUntil: null, ...outcome })
      .where(
        and(eq(outboxMessage.id, row.id), eq(outboxMessage.state, "sending"), eq(outboxMessage.attempts, row.attempts)),
      );
  });
}

async function sendOne(row: Row, transport: MailTransport, now: Date): Promise<void> {
  try {
    await transport.send(await toOutgoing(row));
  } catch (error) {
    const { responseCode, sentence } = readFailure(error);
    const ageMs = now.getTime() - row.createdAt.getTime();
    const waitMs = nextTryInMs({ responseCode, attempts: row.attempts, ageMs }, Math.random());
    log.warn("mail not sent", { messageId: row.id, responseCode, attempts: row.attempts, givesUp: waitMs === null });
    await settle(
      row,
      waitMs === null
        ? { state: "failed", lastError: sentence }
        : { state: "waiting", lastError: sentence, nextAttemptAt: new Date(now.getTime() + waitMs) },
    );
    return;
  }
  await settle(row, { state: "sent", sentAt: new Date(), lastError: null });
}

/** Sends everything that is due, one after the other. Returns how many were tried. */
export async function runOutboxOnce(
  transport: MailTransport,
  options: { readonly now?: () => Date; readonly isStopping?: () => boolean } = {},
): Promise<number> {
  const now = options.now ?? (() => new Date());
  let count = 0;
  while (!options.isStopping?.()) {
    const row = await claimNext(now());
    if (!row) break;
    await sendOne(row, transport, now());
    count += 1;
  }
  return count;
}
