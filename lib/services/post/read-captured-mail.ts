import { desc, eq } from "drizzle-orm";
import { simpleParser } from "mailparser";
import { getDb } from "@/db/client";
import { capturedMail } from "@/db/schema";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";

export interface CapturedMailItem {
  readonly id: string;
  readonly toAddress: string;
  readonly subject: string;
  readonly receivedAt: string;
}

export interface CapturedMailView extends CapturedMailItem {
  readonly fromText: string;
  readonly text: string;
  readonly files: readonly { readonly fileName: string; readonly contentType: string; readonly sizeBytes: number }[];
}

/** Messages hold links that sign people in: they are shown only by a demo that sends to itself. */
function requireDemo(): void {
  if (!env.isDemo || env.smtpUrl) throw new AppError("not-found", "There is nothing here.");
}

export async function listCapturedMail(): Promise<CapturedMailItem[]> {
  requireDemo();
  const rows = await getDb()
    .select({
      id: capturedMail.id,
      toAddress: capturedMail.toAddress,
      subject: capturedMail.subject,
      receivedAt: capturedMail.receivedAt,
    })
    .from(capturedMail)
    .orderBy(desc(capturedMail.receivedAt), desc(capturedMail.id))
    .limit(200);
  return rows.map((row) => ({ ...row, receivedAt: row.receivedAt.toISOString() }));
}

async function loadParsed(id: string) {
  requireDemo();
  const [row] = await getDb().select().from(capturedMail).where(eq(capturedMail.id, id));
  if (!row) throw new AppError("not-found", "There is no such message.");
  return { row, mail: await simpleParser(row.raw) };
}

export async function getCapturedMail({ input }: { input: { readonly id: string } }): Promise<CapturedMailView> {
  const { row, mail } = await loadParsed(input.id);
  return {
    id: row.id,
    toAddress: row.toAddress,
    subject: row.subject,
    receivedAt: row.receivedAt.toISOString(),
    fromText: mail.from?.text ?? "",
    text: mail.text ?? "",
    files: mail.attachments.map((one) => ({
      fileName: one.filename ?? "file",
      contentType: one.contentType,
      sizeBytes: one.size,
    })),
  };
}

export async function getCapturedFile({
  input,
}: {
  input: { readonly id: string; readonly position: number };
}): Promise<{ readonly fileName: string; readonly contentType: string; readonly content: Uint8Array }> {
  const { mail } = await loadParsed(input.id);
  const file = mail.attachments[input.position];
  if (!file) throw new AppError("not-found", "There is no such file.");
  return { fileName: file.filename ?? "file", contentType: file.contentType, content: file.content };
}
