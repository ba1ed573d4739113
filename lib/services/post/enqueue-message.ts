import { createHash } from "node:crypto";
import type { Transaction } from "@/db/client";
import { outboxAttachment, outboxFile, outboxMessage } from "@/db/schema";
import { newId } from "@/lib/domain/ids";
import { emailSchema, lineText } from "@/lib/domain/text";
import type { RenderedMail } from "@/lib/email/letter";
import { env } from "@/lib/env";

export interface MailAddress {
  readonly name: string;
  readonly address: string;
}

export interface MailFile {
  readonly fileName: string;
  readonly contentType: string;
  readonly content: Uint8Array;
}

export interface NewMessage {
  readonly kind:
    | "verification"
    | "reset"
    | "existing-account"
    | "sign-in-link"
    | "invitation"
    | "reminder"
    | "place"
    | "papers"
    | "test"
    | "digest"
    | "calendar"
    | "emergency"
    | "comment";
  /** The same request never makes two messages to one address. */
  readonly requestId: string;
  readonly tripId?: string;
  readonly personId?: string;
  readonly to: MailAddress;
  readonly replyTo?: MailAddress;
  readonly mail: RenderedMail;
  readonly files?: readonly MailFile[];
  /** When what it says was true; now, if not given. */
  readonly createdAt?: Date;
}

const nameSchema = lineText("a name", 200);
const subjectSchema = lineText("a subject", 250);

function checkAddress({ name, address }: MailAddress): MailAddress {
  return { name: nameSchema.parse(name), address: emailSchema.parse(address) };
}

/** Without quotes, slashes and line breaks, whatever a trip is called. */
function cleanFileName(fileName: string): string {
  return fileName.replace(/[^\p{L}\p{N} ._()-]/gu, "").slice(0, 120) || "file";
}

/** Puts a message into the outbox, in the transaction of what causes it. Returns its id. */
export async function enqueueMessage(tx: Transaction, message: NewMessage): Promise<string> {
  const to = checkAddress(message.to);
  const replyTo = message.replyTo ? checkAddress(message.replyTo) : null;
  const id = newId();
  const createdAt = message.createdAt ?? new Date();
  await tx.insert(outboxMessage).values({
    id,
    tripId: message.tripId ?? null,
    personId: message.personId ?? null,
    kind: message.kind,
    requestId: message.requestId,
    toName: to.name,
    toAddress: to.address,
    replyToName: replyTo?.name ?? null,
    replyToAddress: replyTo?.address ?? null,
    subject: subjectSchema.parse(message.mail.subject),
    text: message.mail.text,
    html: message.mail.html,
    messageId: `<${id}@${env.mailFrom.split("@")[1] ?? "localhost"}>`,
    nextAttemptAt: new Date(),
    createdAt,
  });
  for (const [position, file] of (message.files ?? []).entries()) {
    const fileId = createHash("sha256").update(file.content).digest("hex");
    await tx
      .insert(outboxFile)
      .values({ id: fileId, content: Buffer.from(file.content), createdAt })
      .onConflictDoNothing();
    await tx.insert(outboxAttachment).values({
      id: newId(),
      messageId: id,
      fileId,
      fileName: cleanFileName(file.fileName),
      contentType: file.contentType,
      position,
    });
  }
  return id;
}
