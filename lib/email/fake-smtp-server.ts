import type { AddressInfo } from "node:net";
import { SMTPServer } from "smtp-server";

export interface ReceivedMail {
  readonly toAddress: string;
  readonly raw: Buffer;
}

export interface FakeSmtpServer {
  readonly url: string;
  close(): Promise<void>;
}

const MAX_BYTES = 40 * 1024 * 1024;

/** Stands in for a mail server while none is set: takes every message and hands it over. Only this machine reaches it. */
export async function startFakeSmtpServer(keep: (mail: ReceivedMail) => Promise<void>): Promise<FakeSmtpServer> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["AUTH", "STARTTLS"],
    disableReverseLookup: true,
    size: MAX_BYTES,
    logger: false,
    onData(stream, session, done) {
      const parts: Buffer[] = [];
      stream.on("data", (part: Buffer) => parts.push(part));
      stream.on("end", () => {
        if (stream.sizeExceeded) {
          done(Object.assign(new Error("Message is too large."), { responseCode: 552 }));
          return;
        }
        const toAddress = session.envelope.rcptTo.map((one) => one.address).join(", ");
        keep({ toAddress, raw: Buffer.concat(parts) }).then(
          () => done(),
          () => done(Object.assign(new Error("Could not be kept."), { responseCode: 451 })),
        );
      });
    },
  });
  server.on("error", () => undefined);
  const port = await new Promise<number>((resolve, reject) => {
    server.once("error", reject);
    const net = server.listen(0, "127.0.0.1", () => resolve((net.address() as AddressInfo).port));
  });
  return {
    url: `smtp://127.0.0.1:${port}`,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
