import { desc, notInArray } from "drizzle-orm";
import { simpleParser } from "mailparser";
import { withTransaction } from "@/db/client";
import { capturedMail } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import type { ReceivedMail } from "@/lib/email/fake-smtp-server";

const KEPT = 500;

/** Keeps what the local fake server received, the newest 500. */
export async function captureMail({ toAddress, raw }: ReceivedMail): Promise<void> {
  const { subject } = await simpleParser(raw);
  await withTransaction(async (tx) => {
    await tx
      .insert(capturedMail)
      .values({ id: newId(), toAddress, subject: subject ?? "", raw, receivedAt: new Date() });
    const newest = tx
      .select({ id: capturedMail.id })
      .from(capturedMail)
      .orderBy(desc(capturedMail.receivedAt), desc(capturedMail.id))
      .limit(KEPT);
    await tx.delete(capturedMail).where(notInArray(capturedMail.id, newest));
  });
}
