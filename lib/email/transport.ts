import nodemailer from "nodemailer";

export interface OutgoingMail {
  readonly from: { readonly name: string; readonly address: string };
  readonly to: { readonly name: string; readonly address: string };
  readonly replyTo: { readonly name: string; readonly address: string } | null;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly messageId: string;
  readonly date: Date;
  readonly files: readonly {
    readonly fileName: string;
    readonly contentType: string;
    readonly content: Uint8Array;
  }[];
}

/** A calendar file goes as such: programs offer to take it over. "text/calendar; method=PUBLISH" */
const CALENDAR = /^text\/calendar; method=(PUBLISH|CANCEL)$/;

export interface MailTransport {
  send(mail: OutgoingMail): Promise<void>;
  close(): void;
}

/** Over a real SMTP exchange. Content only ever comes from the message itself, never from a path or an address. */
export function createTransport(smtpUrl: string): MailTransport {
  const transport = nodemailer.createTransport({
    url: smtpUrl,
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 30_000,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  return {
    async send(mail) {
      const calendar = mail.files.find((file) => CALENDAR.test(file.contentType));
      const method = CALENDAR.exec(calendar?.contentType ?? "")?.[1];
      await transport.sendMail({
        from: { ...mail.from },
        to: { ...mail.to },
        ...(mail.replyTo ? { replyTo: { ...mail.replyTo } } : {}),
        envelope: { from: mail.from.address, to: [mail.to.address] },
        subject: mail.subject,
        text: mail.text,
        html: mail.html,
        messageId: mail.messageId,
        date: mail.date,
        headers: { "Auto-Submitted": "auto-generated", "X-Auto-Response-Suppress": "All" },
        ...(calendar && method
          ? { icalEvent: { method, filename: calendar.fileName, content: Buffer.from(calendar.content) } }
          : {}),
        attachments: mail.files
          .filter((file) => file !== calendar)
          .map((file) => ({
            filename: file.fileName,
            contentType: file.contentType,
            content: Buffer.from(file.content),
            contentDisposition: "attachment" as const,
          })),
        disableFileAccess: true,
        disableUrlAccess: true,
      });
    },
    close: () => transport.close(),
  };
}
