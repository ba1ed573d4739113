import { startFakeSmtpServer, type FakeSmtpServer } from "@/lib/email/fake-smtp-server";
import { createTransport } from "@/lib/email/transport";
import { env } from "@/lib/env";
import { log } from "@/lib/log";
import { captureMail } from "./capture-mail";
import { runDue } from "./run-due";
import { runOutboxOnce } from "./run-outbox";

const PAUSE_MS = 1000;
const DUE_EVERY_MS = 30_000;

export interface Post {
  /** Finishes the message that is being sent, then rests. */
  stop(): Promise<void>;
}

/** Starts the worker of the outbox, and the local fake mail server when no real one is set. */
export async function startPost(): Promise<Post> {
  const fake: FakeSmtpServer | null = env.smtpUrl ? null : await startFakeSmtpServer(captureMail);
  const transport = createTransport(env.smtpUrl ?? fake?.url ?? "");
  let isStopping = false;
  let wake: () => void = () => undefined;

  let dueAt = 0;
  async function work(): Promise<void> {
    while (!isStopping) {
      if (Date.now() >= dueAt) {
        await runDue();
        dueAt = Date.now() + DUE_EVERY_MS;
      }
      await runOutboxOnce(transport, { isStopping: () => isStopping }).catch((error: unknown) =>
        log.error("outbox", error),
      );
      if (isStopping) break;
      await new Promise<void>((resolve) => {
        const timer = setTimeout(resolve, PAUSE_MS);
        wake = () => {
          clearTimeout(timer);
          resolve();
        };
      });
    }
  }

  const running = work();
  return {
    async stop() {
      isStopping = true;
      wake();
      await running;
      transport.close();
      await fake?.close();
    },
  };
}
