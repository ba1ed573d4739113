import type { AddressInfo } from "node:net";
import { simpleParser, type ParsedMail } from "mailparser";
import { SMTPServer } from "smtp-server";

export interface Received {
  readonly recipients: readonly string[];
  readonly raw: string;
  readonly mail: ParsedMail;
}

/**
 * A mail server on this machine that does what a script says: each number answers one message with that code,
 * then everything is accepted.
 */
export async function startMailServer() {
  const received: Received[] = [];
  const script: number[] = [];
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["AUTH", "STARTTLS"],
    disableReverseLookup: true,
    logger: false,
    onData(stream, session, done) {
      const parts: Buffer[] = [];
      stream.on("data", (part: Buffer) => parts.push(part));
      stream.on("end", () => {
        const code = script.shift();
        if (code !== undefined) {
          done(Object.assign(new Error(`Scripted answer ${code}`), { responseCode: code }));
          return;
        }
        const raw = Buffer.concat(parts);
        const recipients = session.envelope.rcptTo.map((one) => one.address);
        simpleParser(raw).then((mail) => {
          received.push({ recipients, raw: raw.toString("utf8"), mail });
          done();
        }, done);
      });
    },
  });
  const port = await new Promise<number>((resolve) => {
    const net = server.listen(0, "127.0.0.1", () => resolve((net.address() as AddressInfo).port));
  });
  return {
    url: `smtp://127.0.0.1:${port}`,
    received,
    /** Codes for the next messages, one each. */
    answerWith: (...codes: number[]) => script.push(...codes),
    close: () => new Promise<void>((resolve) => server.close(() => resolve())),
  };
}

export type MailServer = Awaited<ReturnType<typeof startMailServer>>;
